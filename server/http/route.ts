// A route is an endpoint with the function that answers it; each feature exports a list of them.
import type { z } from 'zod';
import type { Actor } from '../../shared/accounts/actor';
import type { Endpoint } from '../../shared/kernel/endpoint';
import type { Deps } from '../deps';
import type { Refusal } from './refusal';

export interface UploadedFile {
  readonly bytes: Buffer;
  readonly name: string;
}

/** What a handler is given: parsed input, who asks, and the seams it may need. */
export interface Call<P, Q, B, Who extends Actor | null = Actor | null> {
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly file: UploadedFile | null;
  readonly actor: Who;
  readonly requestId: string;
  readonly address: string;
  /** For sign-in and sign-out only. */
  readonly session: SessionSeam;
  readonly headers: Readonly<Record<string, string | string[] | undefined>>;
}

export interface SessionSeam {
  /** The session's id, null for a visitor. */
  id(): string | null;
  /** A new session id for this person; the old one dies. */
  signIn(userId: string): Promise<void>;
  signOut(): Promise<void>;
  /** The token for unsafe requests, bound to the session (or to the visitor's own cookie). */
  csrfToken(): string;
}

/** An answer that isn't JSON. */
export interface Binary {
  readonly binary: Buffer;
  readonly contentType: string;
  readonly headers?: Readonly<Record<string, string>>;
}

export interface Redirect {
  readonly redirect: string;
}

export const isBinary = (value: unknown): value is Binary =>
  typeof value === 'object' && value !== null && 'binary' in value && Buffer.isBuffer(value.binary);

export const isRedirect = (value: unknown): value is Redirect =>
  typeof value === 'object' && value !== null && 'redirect' in value && typeof value.redirect === 'string';

export interface Route {
  readonly endpoint: Endpoint;
  readonly run: (call: Call<unknown, unknown, unknown>, deps: Deps) => Promise<unknown>;
}

type Answer<A extends z.ZodType> = z.input<A> | Refusal | Binary | Redirect;

/** For endpoints that need somebody signed in: the actor is never null. */
export function route<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, A extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, A>,
  run: (call: Call<z.output<P>, z.output<Q>, z.output<B>, Actor>, deps: Deps) => Promise<Answer<A>>,
): Route {
  if (endpoint.access === 'public')
    throw new Error(`${endpoint.path}: use publicRoute for a public endpoint`);
  return { endpoint: endpoint as Endpoint, run: run as Route['run'] };
}

/** For endpoints a visitor may call: the actor may be null. */
export function publicRoute<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  A extends z.ZodType,
>(
  endpoint: Endpoint<P, Q, B, A>,
  run: (call: Call<z.output<P>, z.output<Q>, z.output<B>>, deps: Deps) => Promise<Answer<A>>,
): Route {
  if (endpoint.access !== 'public') throw new Error(`${endpoint.path}: use route for a guarded endpoint`);
  return { endpoint: endpoint as Endpoint, run: run as Route['run'] };
}
