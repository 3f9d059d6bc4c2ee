// A unit as search shows it, and the question that search takes; the page's address holds the whole question.
import { z } from 'zod';
import { at, cents, id, pageQuery, zip } from '../kernel/fields';
import { unitKind } from '../catalogue/kinds';
import { GRADES } from './condition';

export const unitState = z.enum(['in_vehicle', 'pulled']);
export type UnitState = z.infer<typeof unitState>;
export const fitVerdict = z.enum(['bolts_in', 'fits_with_parts', 'does_not_fit', 'cannot_tell']);

export const SORTS = ['best', 'price', 'distance', 'newest'] as const;
export type Sort = (typeof SORTS)[number];

/** `?kind=axle`, `?kind=axle,manual` and `?kind=axle&kind=manual` all mean the same; an empty value means no filter. */
const several = <T extends z.ZodType>(item: T) =>
  z
    .preprocess((given: unknown) => {
      const list = Array.isArray(given) ? given : [given];
      const parts = list.flatMap((part: unknown) => (typeof part === 'string' ? part.split(',') : [part]));
      const kept = [...new Set(parts.filter((part) => part !== undefined && part !== ''))];
      return kept.length === 0 ? undefined : kept;
    }, z.array(item).max(20).optional())
    .meta({ description: 'One value or several; commas between them are understood too' });

const blank = <T extends z.ZodType>(inner: T) =>
  z.preprocess((given: unknown) => (given === '' ? undefined : given), inner.optional());

export const searchQuery = z.object({
  /** A case code or its beginning, or words. */
  q: z
    .string()
    .max(200)
    .transform((text) => text.trim())
    .optional(),
  kind: several(unitKind),
  familyId: several(id),
  variantId: several(id),
  sellerId: several(id),
  grade: several(z.enum(GRADES)),
  terms: several(z.enum(['exchange', 'outright'])),
  state: several(unitState),
  /** Of what is paid today for the unit: price and deposit together. */
  minCents: blank(z.coerce.number().int().min(0).max(100_000_000)),
  maxCents: blank(z.coerce.number().int().min(0).max(100_000_000)),
  zip: blank(zip),
  withinMiles: blank(z.coerce.number().int().min(1).max(5_000)),
  rigId: blank(id),
  sort: blank(z.enum(SORTS)),
  ...pageQuery,
});
export type SearchQuery = z.output<typeof searchQuery>;

export const card = z.object({
  id,
  title: z.string(),
  kind: unitKind,
  familyId: id,
  variantId: id,
  caseCode: z.string(),
  grade: z.enum(GRADES),
  state: unitState,
  priceCents: cents,
  /** Null where it isn't offered for exchange. */
  depositCents: cents.nullable(),
  /** Null where it isn't sold outright. */
  outrightCents: cents.nullable(),
  /** Paid today before freight and tax; sorting by price and the price caps go by it. */
  totalCents: cents,
  sellerId: id,
  sellerName: z.string(),
  city: z.string(),
  region: z.string(),
  zip,
  /** Straight line, rounded; null without a ZIP code to measure from. */
  miles: z.number().int().nullable(),
  /** Null without a vehicle to check against. */
  fit: fitVerdict.nullable(),
  photoUrl: z.string().nullable(),
  photoCount: z.number().int(),
  listedAt: at,
});
export type Card = z.infer<typeof card>;

export const facetValue = z.object({
  value: z.string(),
  count: z.number().int(),
  label: z.string().optional(),
});
export const facets = z.object({
  kind: z.array(facetValue),
  grade: z.array(facetValue),
  terms: z.array(facetValue),
  state: z.array(facetValue),
  familyId: z.array(facetValue),
});
export type Facets = z.infer<typeof facets>;

/** Counting stops here: beyond it a total is "1000+" and each facet count "at least". */
export const COUNT_CAP = 1_000;

export const searchAnswer = z.object({
  items: z.array(card),
  next: z.string().nullable(),
  facets,
  total: z.object({ value: z.number().int(), exact: z.boolean() }),
  /** How `q` was understood: as a case code, as words, or as nearly these words because none matched. */
  matched: z.enum(['code', 'words', 'near']).nullable(),
});
export type SearchAnswer = z.infer<typeof searchAnswer>;
