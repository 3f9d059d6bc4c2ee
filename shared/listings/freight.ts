// Freight: from weight and size on the pallet to density, class and a quote from the tariff; picking up costs nothing.
import { z } from 'zod';
import type { Cents } from '../kernel/money';
import { BANDS, CLASS_PERCENT } from './tariff';

const inches = z.number().positive().max(120, 'Use at most 120 inches');

/** As it will ship: pallet, packing and overhang included. */
export const freightFigures = z.strictObject({
  weightLb: z.number().int().min(1).max(2_000, 'Use at most 2,000 lb'),
  lengthIn: inches,
  widthIn: inches,
  heightIn: inches,
});
export type FreightFigures = z.infer<typeof freightFigures>;

/**
 * Freight class by density: [least lb per cubic foot, class]; the lower bound belongs to the class, the upper one to the
 * next. The 13-step scale in force since 19 July 2025; steps 11 to 13 as in the classification body's own FAQ
 * (help.nmfta.org, article 32790591446427), steps 1 to 10 as printed on vmeasure.ai and cargotools.online.
 */
const CLASSES: readonly (readonly [minPcf: number, freightClass: number])[] = [
  [50, 50],
  [35, 55],
  [30, 60],
  [22.5, 65],
  [15, 70],
  [12, 85],
  [10, 92.5],
  [8, 100],
  [6, 125],
  [4, 175],
  [2, 250],
  [1, 300],
  [0, 400],
];

/** Pounds per cubic foot: lb / (length x width x height in inches / 1728). */
export function densityPcf(figures: FreightFigures): number {
  // Multiplied before dividing: 1000 lb on 48 x 40 x 30 in is exactly 30, on the edge of a class.
  return (figures.weightLb * 1_728) / (figures.lengthIn * figures.widthIn * figures.heightIn);
}

/** The freight class of a density in lb/ft3. An estimate: carriers measure again, and some goods keep an item class. */
export function classOf(pcf: number): number {
  return CLASSES.find(([minPcf]) => pcf >= minPcf)?.[1] ?? 400;
}

export interface FreightQuote {
  readonly cents: Cents;
  readonly miles: number;
  readonly densityPcf: number;
  readonly freightClass: number;
  readonly daysLow: number;
  readonly daysHigh: number;
}

/**
 * Quote from the tariff: the band's base, plus its rate for each 100 lb times the class's share, rounded up to a cent.
 * @param miles straight-line miles between the two ZIP codes, 0 or more
 * @throws RangeError for a distance that is negative or not a number
 */
export function quoteFreight(figures: FreightFigures, miles: number): FreightQuote {
  if (!(miles >= 0)) throw new RangeError(`miles must be 0 or more, got ${miles}`);
  const band = BANDS.find((candidate) => miles <= candidate.upToMiles);
  const pcf = densityPcf(figures);
  const freightClass = classOf(pcf);
  const percent = CLASS_PERCENT[String(freightClass)];
  if (!band || percent === undefined) throw new RangeError('the tariff has a gap');
  const weightCents = Math.ceil((figures.weightLb * band.perCwtCents * percent) / 10_000);
  return {
    cents: band.baseCents + weightCents,
    miles: Math.round(miles),
    densityPcf: Math.round(pcf * 100) / 100,
    freightClass,
    daysLow: band.daysLow,
    daysHigh: band.daysHigh,
  };
}
