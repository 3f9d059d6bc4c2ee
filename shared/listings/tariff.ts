// The demo's freight tariff: invented rates as data; a carrier's own table would take its place.
import type { Cents } from '../kernel/money';

export interface Band {
  /** Straight-line miles up to and including this; the last band has no end. */
  readonly upToMiles: number;
  /** Pickup, lift gate and paperwork. */
  readonly baseCents: Cents;
  /** For each 100 lb at class 100. */
  readonly perCwtCents: Cents;
  readonly daysLow: number;
  readonly daysHigh: number;
}

export const BANDS: readonly Band[] = [
  { upToMiles: 100, baseCents: 7_900, perCwtCents: 1_450, daysLow: 1, daysHigh: 2 },
  { upToMiles: 250, baseCents: 8_600, perCwtCents: 2_100, daysLow: 1, daysHigh: 3 },
  { upToMiles: 500, baseCents: 9_400, perCwtCents: 2_950, daysLow: 2, daysHigh: 3 },
  { upToMiles: 1_000, baseCents: 10_600, perCwtCents: 4_100, daysLow: 2, daysHigh: 4 },
  { upToMiles: 1_500, baseCents: 11_800, perCwtCents: 5_200, daysLow: 3, daysHigh: 5 },
  { upToMiles: 2_000, baseCents: 12_900, perCwtCents: 6_150, daysLow: 4, daysHigh: 6 },
  { upToMiles: 3_000, baseCents: 14_200, perCwtCents: 7_300, daysLow: 5, daysHigh: 8 },
  { upToMiles: Number.POSITIVE_INFINITY, baseCents: 24_500, perCwtCents: 11_800, daysLow: 8, daysHigh: 16 },
];

/** Per cent of the class-100 rate. */
export const CLASS_PERCENT: Readonly<Record<string, number>> = {
  '50': 62,
  '55': 66,
  '60': 70,
  '65': 75,
  '70': 80,
  '85': 89,
  '92.5': 95,
  '100': 100,
  '125': 118,
  '175': 152,
  '250': 205,
  '300': 240,
  '400': 310,
};
