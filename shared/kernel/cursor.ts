// Opaque keyset cursors: the sort values of the last row, packed so that a client can only hand them back.
import { z } from 'zod';

/** Packs sort values (ASCII text or numbers) into a URL-safe string. */
export const packCursor = (values: readonly (string | number)[]): string =>
  btoa(JSON.stringify(values)).replaceAll('+', '-').replaceAll('/', '_').replaceAll('=', '');

/** Unpacks a cursor that fits the schema; null for anything a client made up. */
export function unpackCursor<T>(cursor: string, schema: z.ZodType<T>): T | null {
  try {
    const parsed = schema.safeParse(JSON.parse(atob(cursor.replaceAll('-', '+').replaceAll('_', '/'))));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** `[instant, id]`, for lists sorted by time and id. */
export const timeCursor = z.tuple([z.iso.datetime(), z.string().max(64)]);
