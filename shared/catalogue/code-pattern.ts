// How a case code is built: where it stands, how it was marked, and its segments in order.
import { z } from 'zod';

export const ALPHABETS = {
  digits: '0123456789',
  letters: 'ABCDEFGHIJKLMNOPQRSTUVWXYZ',
  /** Without the letters that look like figures. */
  plain_letters: 'ABCDEFGHJKLMNPRSTUVWXYZ',
  alphanumeric: '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ',
} as const;
export type Alphabet = keyof typeof ALPHABETS;

export const SEGMENT_KINDS = [
  /** One fixed text: what makes the code this family's. */
  'literal',
  /** One of a table of texts, of which a variant has its own few. */
  'option',
  'plant',
  /** Last figure of the year. */
  'year_digit',
  /** Last two figures of the year. */
  'year_two',
  /** 001 to 366. */
  'day_of_year',
  'shift',
  'serial',
  /** Engineering change level. */
  'change',
  'suffix',
  /** Figure that follows from all before it. */
  'check',
] as const;
export type SegmentKind = (typeof SEGMENT_KINDS)[number];

export const segment = z.object({
  name: z.string().min(1).max(24),
  kind: z.enum(SEGMENT_KINDS),
  length: z.number().int().min(1).max(12),
  alphabet: z.enum(['digits', 'letters', 'plain_letters', 'alphanumeric']),
  /** The texts that may stand here and what each means; left out where any text of the alphabet may. */
  values: z.record(z.string().regex(/^[A-Z0-9]+$/), z.string().min(1)).optional(),
  /** A gap stands before it on the plate. */
  gap: z.boolean(),
});
export type Segment = z.infer<typeof segment>;

export const PATTERN_PLACES = ['rail', 'cast', 'tag'] as const;
export const PATTERN_MARKS = ['stamped', 'cast', 'printed'] as const;

export const PLACE_WORDS: Readonly<Record<(typeof PATTERN_PLACES)[number], string>> = {
  rail: 'On the machined rail of the case',
  cast: 'Cast into the case',
  tag: 'On the tag under a bolt',
};

export const codePattern = z.object({
  where: z.enum(PATTERN_PLACES),
  mark: z.enum(PATTERN_MARKS),
  segments: z.array(segment).min(1).max(10),
});
export type CodePattern = z.infer<typeof codePattern>;

export const patternLength = (pattern: CodePattern): number =>
  pattern.segments.reduce((sum, one) => sum + one.length, 0);
