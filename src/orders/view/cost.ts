// What a unit costs today and in the end, for each way to buy it: nothing hidden, the deposit told apart.
import type { Cents } from '../../../shared/kernel/money';
import type { MoneyLine } from '../../ui/money-lines';

export interface CostInput {
  readonly terms: 'exchange' | 'outright';
  readonly method: 'freight' | 'pickup';
  /** Of the way chosen: exchange or outright price. */
  readonly priceCents: Cents;
  readonly depositCents: Cents;
  /** Null while no quote is known. */
  readonly freightCents: Cents | null;
  readonly windowDays: number;
}

export interface Cost {
  readonly lines: readonly MoneyLine[];
  /** Before sales tax, which the payment page adds; without freight while that is not known. */
  readonly todayCents: Cents;
  /** Null where there is no deposit to come back. */
  readonly afterGradeACents: Cents | null;
}

export function costOf(input: CostInput): Cost {
  const { terms, method, priceCents, freightCents } = input;
  const exchange = terms === 'exchange';
  const depositCents = exchange ? input.depositCents : 0;
  const freight = method === 'pickup' ? 0 : (freightCents ?? 0);
  const lines: MoneyLine[] = [
    { label: exchange ? 'Unit, exchange price' : 'Unit, outright', cents: priceCents },
    ...(exchange
      ? [
          {
            label: 'Core deposit',
            cents: depositCents,
            note: `Held by Spragyard until your old unit is graded. ${input.windowDays} days to send it`,
            state: 'held' as const,
          },
        ]
      : []),
    ...(method === 'freight' && freightCents !== null ? [{ label: 'Freight', cents: freight }] : []),
  ];
  const todayCents = priceCents + depositCents + freight;
  return { lines, todayCents, afterGradeACents: exchange ? todayCents - depositCents : null };
}
