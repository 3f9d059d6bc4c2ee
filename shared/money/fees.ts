// What Spragyard takes: a share of the unit's price, nothing of freight, deposit or tax. The schedule is data.
import { shareOf, type Cents } from '../kernel/money';

export interface FeeSchedule {
  readonly priceBps: number;
  readonly minimumCents: Cents;
}

export const FEES: FeeSchedule = { priceBps: 600, minimumCents: 0 };

/** Fee on a price in cents, rounded half to even, never more than the price. */
export const feeOn = (priceCents: Cents, schedule: FeeSchedule = FEES): Cents =>
  Math.min(priceCents, Math.max(schedule.minimumCents, shareOf(priceCents, schedule.priceBps)));
