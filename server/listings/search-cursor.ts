// The place a page of results ends at, as an opaque text that is checked before any of it reaches a statement.
import { z } from 'zod';

const MODES = ['none', 'code', 'words', 'near'] as const;
export type Mode = (typeof MODES)[number];

/** The columns a page is ordered by; each form has one fixed list of keys, compared as a row. */
export type Order = 'total' | 'newest' | 'code' | 'distance';

const whole = z.number().int().min(0).max(Number.MAX_SAFE_INTEGER);
const rowId = z.string().min(3).max(64);

const KEYS = {
  total: z.tuple([whole, rowId]),
  newest: z.tuple([z.iso.datetime(), rowId]),
  code: z.tuple([z.string().max(60), whole, rowId]),
  distance: z.tuple([z.number().min(0).max(30_000), rowId, whole, rowId]),
} as const;

export interface Place {
  readonly mode: Mode;
  readonly order: Order;
  readonly keys: readonly (string | number)[];
}

const envelope = z.strictObject({
  m: z.enum(MODES),
  o: z.enum(['total', 'newest', 'code', 'distance']),
  k: z.array(z.union([z.string(), z.number()])).max(4),
});

export const writeCursor = (place: Place): string =>
  Buffer.from(JSON.stringify({ m: place.mode, o: place.order, k: place.keys })).toString('base64url');

/** Null for a text that no page of ours ended with. */
export function readCursor(text: string): Place | null {
  try {
    const parsed = envelope.parse(JSON.parse(Buffer.from(text, 'base64url').toString('utf8')));
    const keys = KEYS[parsed.o].parse(parsed.k);
    return { mode: parsed.m, order: parsed.o, keys };
  } catch {
    return null;
  }
}
