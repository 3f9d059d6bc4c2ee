// Money broken down: every fee has a line, what is held says so and why, the total stands under a race rule.
import clsx from 'clsx';
import type { ReactNode } from 'react';
import type { Cents } from '../../shared/kernel/money';
import { Money } from './money';

export interface MoneyLine {
  readonly label: string;
  readonly cents: Cents;
  /** Who holds it, or how it came about. */
  readonly note?: ReactNode;
  /** `held` is money not yet moved, `back` is money on its way to the reader. */
  readonly state?: 'held' | 'back';
}

interface MoneyLinesProps {
  readonly lines: readonly MoneyLine[];
  readonly total?: MoneyLine;
  readonly className?: string;
}

function Row({ line, className }: { readonly line: MoneyLine; readonly className?: string }) {
  return (
    <div className={className}>
      <dt>
        {line.label}
        {line.note && <small>{line.note}</small>}
      </dt>
      <dd>
        <Money cents={line.cents} />
      </dd>
    </div>
  );
}

export function MoneyLines({ lines, total, className }: MoneyLinesProps) {
  return (
    <dl className={clsx('led', className)}>
      {lines.map((line) => (
        <Row key={line.label} line={line} className={clsx(line.state && `led-${line.state}`)} />
      ))}
      {total && <Row line={total} className="led-total" />}
    </dl>
  );
}

interface AfterNoteProps {
  readonly label: string;
  readonly note?: string;
  readonly cents: Cents;
}

/** The second reckoning that always stands beside a price with a deposit: "Cost after a grade A core". */
export function AfterNote({ label, note, cents }: AfterNoteProps) {
  return (
    <div className="after">
      <span>
        {label}
        {note && <span className="sm mute block">{note}</span>}
      </span>
      <Money cents={cents} />
    </div>
  );
}
