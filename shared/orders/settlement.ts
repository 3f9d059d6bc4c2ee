// What a returned core is worth to each side: the schedule both saw decides, item by item, to the cent.
import type { Cents } from '../kernel/money';

/** One line of the seller's published deduction schedule. */
export interface ScheduleItem {
  readonly code: string;
  readonly label: string;
  readonly cents: Cents;
}

export interface Deduction {
  readonly code: string;
  readonly photoId: string;
  readonly note?: string | undefined;
}

export interface CoreSettlement {
  readonly lines: readonly ScheduleItem[];
  /** The sum of the lines before the cap. */
  readonly deductedCents: Cents;
  readonly toBuilderCents: Cents;
  readonly toSellerCents: Cents;
  /** True where the lines came to more than the deposit. */
  readonly capped: boolean;
}

export type SettlementFault =
  | { readonly fault: 'not_in_schedule'; readonly code: string; readonly index: number }
  | { readonly fault: 'twice'; readonly code: string; readonly index: number };

/**
 * The split of a deposit by the deductions found: each from the order's own schedule, each at most once, together at
 * most the deposit. `toBuilderCents + toSellerCents` is always exactly the deposit.
 * @param depositCents whole cents
 * @returns the split, or the first deduction that may not be taken
 */
export function settleCore(
  depositCents: Cents,
  schedule: readonly ScheduleItem[],
  deductions: readonly Pick<Deduction, 'code'>[],
): CoreSettlement | SettlementFault {
  const lines: ScheduleItem[] = [];
  for (const [index, deduction] of deductions.entries()) {
    const item = schedule.find((candidate) => candidate.code === deduction.code);
    if (!item) return { fault: 'not_in_schedule', code: deduction.code, index };
    if (lines.includes(item)) return { fault: 'twice', code: deduction.code, index };
    lines.push(item);
  }
  const deductedCents = lines.reduce((sum, line) => sum + line.cents, 0);
  const toSellerCents = Math.min(deductedCents, depositCents);
  return {
    lines,
    deductedCents,
    toSellerCents,
    toBuilderCents: depositCents - toSellerCents,
    capped: deductedCents > depositCents,
  };
}

export const isSettlementFault = (value: CoreSettlement | SettlementFault): value is SettlementFault =>
  'fault' in value;
