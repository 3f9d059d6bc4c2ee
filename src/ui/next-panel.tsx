// "Next: ...": what to do now, how long there is for it, up to three short steps, and the one red button.
import type { ReactNode } from 'react';
import { Count } from './count';
import { daysBetween, formatDay, type Instant } from './dates';
import { SteelRule } from './steel-rule';

export interface NextClock {
  readonly dueAt: Instant;
  readonly startedAt: Instant;
  /** The server's time. */
  readonly now: Instant;
  readonly zone?: string;
  /** "Pickup by", before the date. */
  readonly lead: string;
}

interface NextPanelProps {
  /** "Next: send the core back" */
  readonly title: string;
  readonly clock?: NextClock;
  readonly steps?: readonly string[];
  /** The red button, then one plain one. */
  readonly actions?: ReactNode;
  readonly children?: ReactNode;
}

function Clock({ dueAt, startedAt, now, zone, lead }: NextClock) {
  const days = daysBetween(now, dueAt, zone);
  const whole = Math.max(1, daysBetween(startedAt, dueAt, zone));
  const unit = Math.abs(days) === 1 ? 'day' : 'days';
  const gone =
    (Date.parse(now) - Date.parse(startedAt)) / Math.max(1, Date.parse(dueAt) - Date.parse(startedAt));
  return (
    <div className="next-clock">
      <Count value={Math.abs(days)} />
      <span>
        {unit} {days < 0 ? 'late' : 'left'}. {lead}
        <strong className="b block">{formatDay(dueAt, zone)}</strong>
      </span>
      <SteelRule goneShare={gone} ticks={Math.min(whole, 60)} />
    </div>
  );
}

export function NextPanel({ title, clock, steps = [], actions, children }: NextPanelProps) {
  return (
    <section className="panel panel-body next" aria-label="Next step">
      <h2>{title}</h2>
      {clock && <Clock {...clock} />}
      {steps.length > 0 && (
        <ol className="next-steps">
          {steps.map((step) => (
            <li key={step}>{step}</li>
          ))}
        </ol>
      )}
      {children}
      {actions && <div className="next-actions">{actions}</div>}
    </section>
  );
}
