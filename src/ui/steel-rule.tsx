// A steel rule with ticks: time that runs out (grey gone, red line at today), or an upload that fills up.
import type { CSSProperties } from 'react';
import { cssVars } from './css-vars';

interface SteelRuleProps {
  /** 0 to 1 of the rule is behind us. */
  readonly goneShare: number;
  /** One short tick each (a day, for deadlines). */
  readonly ticks: number;
  /** A long tick each so many short ones. */
  readonly longEvery?: number;
}

const scale = (ticks: number, longEvery: number): CSSProperties =>
  cssVars({ '--steel-ticks': ticks, '--steel-long': ticks / longEvery });

const percent = (share: number) => `${Math.min(1, Math.max(0, share)) * 100}%`;

/** Decoration: the days stand in words beside it. */
export function SteelRule({ goneShare, ticks, longEvery = 5 }: SteelRuleProps) {
  return (
    <div className="steel" style={scale(ticks, longEvery)} aria-hidden="true">
      <div className="steel-gone" style={{ width: percent(goneShare) }} />
    </div>
  );
}

interface ProgressRuleProps {
  readonly label: string;
  readonly done: number;
  readonly of: number;
  /** What stands right of the label; "3 of 9" when left out. */
  readonly words?: string;
}

/** Progress of an upload or an import. */
export function ProgressRule({ label, done, of, words }: ProgressRuleProps) {
  const said = words ?? `${done} of ${of}`;
  return (
    <div className="progress">
      <div className="progress-words">
        <span className="b">{label}</span>
        <span className="num">{said}</span>
      </div>
      <div
        className="steel"
        style={scale(10, 5)}
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={of}
        aria-valuenow={done}
        aria-valuetext={said}
      >
        <div className="progress-done" style={{ width: percent(of === 0 ? 0 : done / of) }} />
      </div>
    </div>
  );
}
