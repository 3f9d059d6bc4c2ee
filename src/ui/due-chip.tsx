// A deadline as a rule that runs out: solid is time left, ticks are time gone; red soon, a black block when late.
import clsx from 'clsx';
import { formatShortDay, timeLeftWords, type Instant } from './dates';

interface DueChipProps {
  readonly words: string;
  /** 1 is all of the time, 0 is none; no rule when left out. */
  readonly leftShare?: number;
  readonly tone?: 'calm' | 'soon' | 'late';
}

export function DueChip({ words, leftShare, tone = 'calm' }: DueChipProps) {
  const percent = leftShare === undefined ? 0 : Math.round(Math.min(1, Math.max(0, leftShare)) * 100);
  return (
    <span className={clsx('due', tone !== 'calm' && `due-${tone}`)}>
      <span>{words}</span>
      {leftShare !== undefined && tone !== 'late' && (
        <span className="due-rule" aria-hidden="true">
          <i style={{ width: `${percent}%` }} />
        </span>
      )}
    </span>
  );
}

interface DueByProps {
  readonly dueAt: Instant;
  /** When the time began to run. */
  readonly startedAt: Instant;
  /** The server's time: the demo's clock can run ahead of the browser's. */
  readonly now: Instant;
  /** The zone the deadline is counted in. */
  readonly zone?: string;
  /** Red from this many hours before; three days when left out. */
  readonly soonHours?: number;
}

/** "9 days left, Wed 25 Mar" from a deadline. */
export function DueBy({ dueAt, startedAt, now, zone, soonHours = 72 }: DueByProps) {
  const leftMs = Date.parse(dueAt) - Date.parse(now);
  const wholeMs = Math.max(1, Date.parse(dueAt) - Date.parse(startedAt));
  const tone = leftMs < 0 ? 'late' : leftMs <= soonHours * 3_600_000 ? 'soon' : 'calm';
  const words = `${timeLeftWords(now, dueAt, zone)}, ${formatShortDay(dueAt, zone)}`;
  return <DueChip words={words} leftShare={leftMs / wholeMs} tone={tone} />;
}
