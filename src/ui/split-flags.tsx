// Small flags over and under the bar of a split: what each side asks, what the terms would give.
import clsx from 'clsx';
import { formatCents, type Cents } from '../../shared/kernel/money';
import { cssVars } from './css-vars';

export interface SplitFlag {
  /** "Quenby's ask" */
  readonly label: string;
  /** What the left side would get. */
  readonly leftCents: Cents;
  /** Asks stand above, terms below. */
  readonly place: 'above' | 'below';
}

interface SplitFlagsProps {
  readonly flags: readonly SplitFlag[];
  readonly totalCents: Cents;
  readonly place: SplitFlag['place'];
}

/** Flags closer than this share of the bar would write over each other, so the next one moves a line away. */
const ROOM = 0.42;

interface PlacedFlag extends SplitFlag {
  readonly share: number;
  readonly lane: number;
}

function placed(flags: readonly SplitFlag[], totalCents: Cents): PlacedFlag[] {
  const result: PlacedFlag[] = [];
  for (const flag of [...flags].sort((a, b) => a.leftCents - b.leftCents)) {
    const share = totalCents === 0 ? 0 : flag.leftCents / totalCents;
    const taken = result.filter((other) => share - other.share < ROOM).map((other) => other.lane);
    let lane = 0;
    while (taken.includes(lane)) lane += 1;
    result.push({ ...flag, share, lane });
  }
  return result;
}

export function SplitFlags({ flags, totalCents, place }: SplitFlagsProps) {
  const here = placed(
    flags.filter((flag) => flag.place === place),
    totalCents,
  );
  if (here.length === 0) return null;
  const lanes = Math.max(...here.map((flag) => flag.lane)) + 1;
  return (
    <ul className={`split-flags split-flags-${place}`} style={cssVars({ '--lanes': lanes })}>
      {here.map((flag) => (
        <li
          key={flag.label}
          className={clsx('split-flag', flag.share < 0.4 && 'split-flag-right')}
          style={cssVars({ left: `${flag.share * 100}%`, '--lane': flag.lane })}
        >
          {flag.label}
          <span className="num block">{formatCents(flag.leftCents)}</span>
        </li>
      ))}
    </ul>
  );
}
