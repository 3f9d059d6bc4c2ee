// The place a page of results ends at: how the words were meant, the order, and the last row's values in that order.
import { z } from 'zod';
import { packCursor, unpackCursor } from '../../shared/kernel/cursor';

const mode = z.enum(['none', 'code', 'words', 'near']);
export type Mode = z.infer<typeof mode>;

/** The columns a page is ordered by; each form has one fixed list of keys, compared as a row. */
export type Order = 'total' | 'newest' | 'code' | 'distance';

const whole = z.number().int().min(0).max(Number.MAX_SAFE_INTEGER);
const rowId = z.string().min(3).max(64);
const miles = z.number().min(0).max(30_000);

const place = z.union([
  z.tuple([mode, z.literal('total'), whole, rowId]),
  z.tuple([mode, z.literal('newest'), z.iso.datetime(), rowId]),
  z.tuple([mode, z.literal('code'), z.string().max(60), whole, rowId]),
  z.tuple([mode, z.literal('distance'), miles, rowId, whole, rowId]),
]);

export interface Place {
  readonly mode: Mode;
  readonly order: Order;
  readonly keys: readonly (string | number)[];
}

export const writeCursor = ({ mode: meant, order, keys }: Place): string =>
  packCursor([meant, order, ...keys]);

/** Null for a text that no page of ours ended with. */
export function readCursor(text: string): Place | null {
  const values = unpackCursor(text, place);
  if (!values) return null;
  const [meant, order, ...keys] = values;
  return { mode: meant, order, keys };
}
