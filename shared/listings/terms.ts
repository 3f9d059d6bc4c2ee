// What a seller offers: exchange with a core deposit and a published deduction schedule, outright, or both.
import { z } from 'zod';
import { cents } from '../kernel/fields';
import type { Cents } from '../kernel/money';
import type { FieldError } from '../kernel/problem';
import { type UnitKind } from '../catalogue/kinds';
import { effectOf, type FaultEffect, type Grade } from './condition';

export const WINDOW_DAYS_MIN = 7;
export const WINDOW_DAYS_MAX = 180;

export const scheduleItem = z.strictObject({
  /** A code of the condition checklist, or the seller's own. Every deduction needs a photo when it's taken. */
  code: z.string().regex(/^[a-z][a-z0-9_]{1,39}$/, 'Use small letters, digits and _'),
  label: z.string().trim().min(2).max(80),
  cents,
});
export type ScheduleItem = z.infer<typeof scheduleItem>;

export const returnFreight = z.enum(['seller', 'builder']);
export type ReturnFreight = z.infer<typeof returnFreight>;

export const exchangeTerms = z.strictObject({
  depositCents: cents,
  windowDays: z.number().int().min(WINDOW_DAYS_MIN).max(WINDOW_DAYS_MAX),
  schedule: z.array(scheduleItem).max(40),
  /** Who pays for the old unit's way back; the seller unless said otherwise. */
  returnFreight: returnFreight.default('seller'),
});
export type ExchangeTerms = z.infer<typeof exchangeTerms>;

export const terms = z.strictObject({
  exchange: exchangeTerms.nullable(),
  outright: z.boolean(),
  /** What a buyer pays who keeps the old unit; left out: price and deposit together. */
  outrightCents: cents.optional(),
});
export type Terms = z.infer<typeof terms>;

/**
 * The faults of a deduction schedule: a deposit of nothing, a code named twice, an item above the deposit.
 * Items may add up to more than the deposit; what is taken never does (see the settlement of a core).
 */
export function scheduleErrors(offer: ExchangeTerms, at = 'terms.exchange'): FieldError[] {
  const errors: FieldError[] = [];
  if (offer.depositCents === 0) {
    errors.push({ path: `${at}.depositCents`, message: 'Set a deposit, or sell outright only' });
  }
  const seen = new Set<string>();
  for (const [index, item] of offer.schedule.entries()) {
    if (seen.has(item.code)) {
      errors.push({ path: `${at}.schedule.${index}.code`, message: `“${item.label}” is listed twice` });
    }
    seen.add(item.code);
    if (item.cents > offer.depositCents) {
      errors.push({ path: `${at}.schedule.${index}.cents`, message: 'Make it at most the deposit' });
    }
    if (item.cents === 0) {
      errors.push({ path: `${at}.schedule.${index}.cents`, message: 'Set an amount, or leave the line out' });
    }
  }
  return errors;
}

/** What the buyer pays today for the unit, before freight and tax: price and deposit, or the outright price alone. */
export function totalCents(offer: {
  readonly priceCents: Cents;
  readonly depositCents: Cents | null;
  readonly outrightCents: Cents | null;
  readonly exchange: boolean;
}): Cents {
  return offer.exchange
    ? offer.priceCents + (offer.depositCents ?? 0)
    : (offer.outrightCents ?? offer.priceCents);
}

export interface GradeExample {
  readonly grade: Grade;
  /** The least that comes back at this grade when every line of that grade applies, and the most. */
  readonly leastCents: Cents;
  readonly mostCents: Cents;
  /** The lines that may be taken at this grade. */
  readonly lines: readonly ScheduleItem[];
}

/** Lines that stand for any kind of unit, as new seller accounts start with. */
const GENERAL: Readonly<Record<string, FaultEffect>> = {
  case_damage: 'case',
  taken_apart: 'not_core',
  not_a_core: 'not_core',
};

/** What the fault of a schedule line does to the grade; a line of the seller's own counts as a small part. */
export const lineEffect = (kind: UnitKind, code: string): FaultEffect =>
  effectOf(kind, code) ?? GENERAL[code] ?? 'small_part';

const LEVELS: readonly { grade: Grade; effect: FaultEffect }[] = [
  { grade: 'B', effect: 'small_part' },
  { grade: 'C', effect: 'case' },
  { grade: 'D', effect: 'not_core' },
];

/**
 * What comes back of the deposit at each grade, worked from the schedule: at least one line of the grade's own kind is
 * taken (the cheapest gives the most), and at worst all lines of that kind and of the lighter ones. A grade without a
 * line of its own leaves the deposit whole at best.
 */
export function returnByGrade(kind: UnitKind, offer: ExchangeTerms): GradeExample[] {
  const { depositCents, schedule } = offer;
  const back = (lines: readonly ScheduleItem[]): Cents =>
    Math.max(0, depositCents - lines.reduce((sum, line) => sum + line.cents, 0));
  const examples: GradeExample[] = [
    { grade: 'A', leastCents: depositCents, mostCents: depositCents, lines: [] },
  ];
  const lighter: ScheduleItem[] = [];
  for (const { grade, effect } of LEVELS) {
    const own = schedule.filter((item) => lineEffect(kind, item.code) === effect);
    const cheapest = [...own].sort((a, b) => a.cents - b.cents).slice(0, 1);
    lighter.push(...own);
    examples.push({ grade, leastCents: back(lighter), mostCents: back(cheapest), lines: own });
  }
  return examples;
}
