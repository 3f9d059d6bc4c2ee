// Small zod pieces that every contract shares: money, times, ZIP codes, pages of a list.
import { z } from 'zod';

export const cents = z.number().int().min(0).max(100_000_000);
export const id = z.string().min(3).max(64);
export const at = z.iso.datetime();
export const zip = z.string().regex(/^\d{5}$/, 'Type five digits, such as 83702');
export const idParams = z.strictObject({ id });
export const version = z.number().int().min(0);

/** A line a person types: trimmed, no control characters, with a sensible limit. */
export const line = (max: number) =>
  z
    .string()
    .trim()
    .min(1, 'Type something here')
    .max(max, `Use at most ${max} characters`)
    .regex(/^\P{Cc}*$/u, 'Leave out control characters');

/** Several lines a person types. */
export const paragraph = (max: number) =>
  z
    .string()
    .trim()
    .max(max, `Use at most ${max} characters`)
    .regex(/^[\P{Cc}\n\r\t]*$/u, 'Leave out control characters');

export const pageQuery = {
  cursor: z.string().max(500).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(24),
};

/** `{ items, next }`: keyset pagination. */
export const page = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), next: z.string().nullable() });
