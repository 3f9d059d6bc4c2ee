// An amount of money: always two decimals, a true minus sign, figures of one width.
import clsx from 'clsx';
import { formatCents, type Cents } from '../../shared/kernel/money';

interface MoneyProps {
  readonly cents: Cents;
  /** Pixels of the design's money sizes; in running text when left out. */
  readonly size?: 16 | 22 | 26 | 28;
  readonly tone?: 'held' | 'released' | 'attention';
  readonly className?: string;
}

const TONES = { held: 'held', released: 'ok', attention: 'warn' } as const;

export function Money({ cents, size, tone, className }: MoneyProps) {
  return (
    <span className={clsx('money', size && `money-${size}`, tone && TONES[tone], className)}>
      {formatCents(cents)}
    </span>
  );
}
