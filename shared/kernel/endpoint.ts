// An endpoint is a value: both the Express route and the browser's call are made from it, so they cannot drift apart.
import type { z } from 'zod';

export type Method = 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE';

/**
 * Who may call at all; whose object it is gets decided where the object is loaded.
 * `member` = any duty in some seller account; `owner`, `lister`, `dock` = that duty in some seller account.
 */
export type Access =
  | 'public'
  | 'signed_in'
  | 'member'
  | 'owner'
  | 'lister'
  | 'dock'
  | 'admin'
  /** Anybody signed in who is a party to the object: the builder, the seller's members, or an admin. */
  | 'party';

export interface Endpoint<
  P extends z.ZodType = z.ZodType,
  Q extends z.ZodType = z.ZodType,
  B extends z.ZodType = z.ZodType,
  A extends z.ZodType = z.ZodType,
> {
  readonly method: Method;
  /** Express style, under /api: '/api/orders/:id'. */
  readonly path: string;
  /** One sentence for the OpenAPI document. */
  readonly summary: string;
  readonly access: Access;
  readonly params?: P;
  readonly query?: Q;
  readonly body?: B;
  /** Left out: the answer has no body (204). */
  readonly answer?: A;
  /** 200, or 204 without an answer, unless said otherwise. */
  readonly status?: number;
  /** The upload's field name, for multipart bodies. */
  readonly file?: string;
  /** A POST that makes something or moves money honours Idempotency-Key. */
  readonly idempotent?: boolean;
  /** Points per minute for each address (and account, when signed in); left out: the general limit. */
  readonly perMinute?: number;
}

/** Keeps the exact zod types of the definition. */
export function endpoint<
  P extends z.ZodType = z.ZodType<Record<string, never>>,
  Q extends z.ZodType = z.ZodType<Record<string, never>>,
  B extends z.ZodType = z.ZodType<undefined>,
  A extends z.ZodType = z.ZodType<undefined>,
>(definition: Endpoint<P, Q, B, A>): Endpoint<P, Q, B, A> {
  return definition;
}
