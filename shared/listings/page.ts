// Everything the page of one unit shows.
import { z } from 'zod';
import { at, cents, id, zip } from '../kernel/fields';
import { photo } from '../photos/contract';
import { card, fitVerdict, unitState } from './card';
import { unitKind } from '../catalogue/kinds';
import { answer, GRADES } from './condition';
import { freightFigures } from './freight';
import { returnFreight, scheduleItem } from './terms';

export const listingStatus = z.enum(['draft', 'live', 'reserved', 'sold', 'withdrawn']);
export type ListingStatus = z.infer<typeof listingStatus>;

export const gradeResult = z.object({
  grade: z.enum(GRADES),
  rule: z.string(),
  because: z.array(z.object({ code: z.string(), label: z.string() })),
});

export const shotEntry = z.object({
  code: z.string(),
  number: z.number().int(),
  name: z.string(),
  instruction: z.string(),
  required: z.boolean(),
  photos: z.array(photo),
});

const checked = z.object({
  code: z.string(),
  label: z.string(),
  hint: z.string(),
  effect: z.enum(['none', 'small_part', 'case', 'not_core', 'refused']),
  fault: z.string(),
  mayBeUnknown: z.boolean(),
  /** Null where it wasn't answered. */
  answer: answer.nullable(),
});

export const conditionReport = z.object({
  checks: z.array(checked),
  ...gradeResult.shape,
  hazards: z.array(z.string()),
});

const gradeExample = z.object({
  grade: z.enum(GRADES),
  rule: z.string(),
  leastCents: cents,
  mostCents: cents,
  lines: z.array(scheduleItem),
});

export const shownTerms = z.object({
  priceCents: cents,
  exchange: z
    .object({
      depositCents: cents,
      windowDays: z.number().int(),
      schedule: z.array(scheduleItem),
      returnFreight,
      /** What comes back at each grade, worked from the schedule. */
      examples: z.array(gradeExample),
    })
    .nullable(),
  outrightCents: cents.nullable(),
  totalCents: cents,
});

export const shownFreight = z.object({
  figures: freightFigures,
  pickupCents: z.literal(0),
  /** Null without a ZIP code to ship to, or where that ZIP code's place isn't known. An estimate: the carrier measures. */
  quote: z
    .object({
      toZip: zip,
      cents,
      miles: z.number().int(),
      densityPcf: z.number(),
      freightClass: z.number(),
      daysLow: z.number().int(),
      daysHigh: z.number().int(),
    })
    .nullable(),
});

export const codeReading = z.object({
  text: z.string(),
  segments: z.array(z.object({ name: z.string(), value: z.string(), meaning: z.string() })),
  builtOn: z.string().nullable(),
});

const familySummary = z.object({
  id,
  maker: z.string(),
  designation: z.string(),
  name: z.string(),
  control: z.string().nullable(),
  forwardRatios: z.array(z.number()),
  reverseRatio: z.number().nullable(),
  lowRange: z.number().nullable(),
  weightLb: z.number().nullable(),
  fluid: z.string().nullable(),
});

export const trackRecord = z.object({
  sold: z.number().int(),
  depositsSettled: z.number().int(),
  depositsWhole: z.number().int(),
  cases: z.number().int(),
  daysToShip: z.number().nullable(),
});
export type TrackRecord = z.infer<typeof trackRecord>;

export const shownSeller = z.object({
  id,
  name: z.string(),
  kind: z.enum(['yard', 'rebuilder', 'private']),
  city: z.string(),
  region: z.string(),
  zip,
  timeZone: z.string(),
  verified: z.boolean(),
  /** Null where nothing was sold yet. */
  record: trackRecord.nullable(),
});

export const listingPage = z.object({
  id,
  title: z.string(),
  kind: unitKind,
  status: listingStatus,
  state: unitState,
  usedNotice: z.string(),
  rebuilt: z.boolean(),
  variantId: id,
  variantName: z.string(),
  family: familySummary,
  caseCode: z.string(),
  /** Null where the code can't be taken apart. */
  code: codeReading.nullable(),
  tagCode: z.string(),
  mileage: z.number().int().nullable(),
  donor: z.object({ description: z.string(), year: z.number().int().nullable() }).nullable(),
  notes: z.string(),
  condition: conditionReport,
  shots: z.array(shotEntry),
  terms: shownTerms,
  freight: shownFreight,
  shipDays: z.number().int(),
  seller: shownSeller,
  miles: z.number().int().nullable(),
  /** Null without a vehicle to check against. */
  fit: z.object({ verdict: fitVerdict }).nullable(),
  similar: z.array(card),
  publishedAt: at,
  listedAt: at,
});
export type ListingPage = z.infer<typeof listingPage>;
