// The deposit as a tube with a dollar rule: red goes back to the builder, the hatch goes to the yard.
import type { Cents } from '../../shared/kernel/money';
import { Money } from './money';

interface DepositGlassProps {
  readonly depositCents: Cents;
  /** What the deductions add up to; the rest goes back. */
  readonly toYardCents: Cents;
  readonly yardName: string;
  readonly builderName: string;
}

const STEPS = [1, 2, 5];
const MOST_TICKS = 7;

/** Whole, round dollar steps that leave at most seven ticks above zero. */
export function ruleTicks(depositCents: Cents): number[] {
  const dollars = depositCents / 100;
  for (let power = 1; power <= 1_000_000; power *= 10) {
    const step = STEPS.map((one) => one * power).find((one) => dollars / one <= MOST_TICKS);
    if (step !== undefined)
      return Array.from({ length: Math.floor(dollars / step) + 1 }, (_, index) => index * step);
  }
  return [0];
}

export function DepositGlass({ depositCents, toYardCents, yardName, builderName }: DepositGlassProps) {
  const backCents = depositCents - toYardCents;
  const yardShare = depositCents === 0 ? 0 : toYardCents / depositCents;
  const percent = (share: number) => `${share * 100}%`;
  return (
    <div className="glass" aria-live="polite">
      <div className="glass-rule" aria-hidden="true">
        {ruleTicks(depositCents).map((dollars) => (
          <span key={dollars} style={{ bottom: percent((dollars * 100) / Math.max(1, depositCents)) }}>
            ${dollars.toLocaleString('en-US')}
          </span>
        ))}
      </div>
      <div className="glass-tube" aria-hidden="true">
        <div className="glass-yard" style={{ height: percent(yardShare) }} />
        <div className="glass-back" />
      </div>
      <div className="glass-words">
        <p style={{ flexGrow: Math.max(yardShare, 0.22) }}>
          <Money cents={toYardCents} />
          to {yardName}
        </p>
        <p className="glass-words-back" style={{ flexGrow: Math.max(1 - yardShare, 0.22) }}>
          <Money cents={backCents} tone="held" />
          back to {builderName}
        </p>
      </div>
    </div>
  );
}
