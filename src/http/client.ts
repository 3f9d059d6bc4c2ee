// The one way the page talks to the server: an endpoint value in, its parsed answer out, a ProblemError when refused.
import type { z } from 'zod';
import type { Endpoint } from '../../shared/kernel/endpoint';
import { problemSchema, type Problem } from '../../shared/kernel/problem';

export class ProblemError extends Error {
  readonly problem: Problem;
  constructor(problem: Problem) {
    super(problem.detail ?? problem.title);
    this.name = 'ProblemError';
    this.problem = problem;
  }
}

/** No answer came at all: the network, or the server is down. */
export class OfflineError extends Error {
  constructor() {
    super('No answer from Spragyard. Check the connection; nothing was changed.');
    this.name = 'OfflineError';
  }
}

export interface CallInput<P, Q, B> {
  readonly params?: P;
  readonly query?: Q;
  readonly body?: B;
  readonly signal?: AbortSignal;
  /** For a POST that makes something: the same key never does it twice. */
  readonly idempotencyKey?: string;
}

let csrfToken: string | null = null;

/** Called with each answer that carries a token, so that the next unsafe request is accepted. */
export function rememberCsrfToken(token: string): void {
  csrfToken = token;
}

/** The current token, fetched once where none is known. */
export async function currentCsrfToken(): Promise<string> {
  if (csrfToken !== null) return csrfToken;
  const response = await send('/api/auth/me', { method: 'GET' });
  const body: unknown = await response.json();
  if (
    typeof body === 'object' &&
    body !== null &&
    'csrfToken' in body &&
    typeof body.csrfToken === 'string'
  ) {
    csrfToken = body.csrfToken;
    return body.csrfToken;
  }
  throw new OfflineError();
}

async function send(url: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(url, { credentials: 'same-origin', ...init });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new OfflineError();
  }
}

/** Path and query of a call; a query value that is undefined or empty is left out. */
export function addressOf(
  endpoint: Pick<Endpoint, 'path'>,
  params: Readonly<Record<string, unknown>> = {},
  query: Readonly<Record<string, unknown>> = {},
): string {
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) =>
    encodeURIComponent(String(params[name])),
  );
  const search = new URLSearchParams();
  for (const [key, value] of Object.entries(query)) {
    if (value === undefined || value === null || value === '') continue;
    if (Array.isArray(value)) for (const one of value) search.append(key, String(one));
    else search.set(key, String(value));
  }
  const text = search.toString();
  return text ? `${path}?${text}` : path;
}

export async function problemOf(response: Response): Promise<ProblemError> {
  const body: unknown = await response.json().catch(() => null);
  const parsed = problemSchema.safeParse(body);
  return new ProblemError(
    parsed.success
      ? parsed.data
      : {
          type: 'about:blank',
          title: 'Something went wrong',
          status: response.status,
          detail: 'Try again in a moment.',
        },
  );
}

const record = (value: unknown): Record<string, unknown> =>
  typeof value === 'object' && value !== null ? { ...value } : {};

async function request<P, Q, B>(endpoint: Endpoint, input: CallInput<P, Q, B>): Promise<Response> {
  const headers: Record<string, string> = { accept: 'application/json' };
  if (endpoint.method !== 'GET') headers['x-csrf-token'] = await currentCsrfToken();
  if (input.body !== undefined) headers['content-type'] = 'application/json';
  if (input.idempotencyKey) headers['idempotency-key'] = input.idempotencyKey;
  return send(addressOf(endpoint, record(input.params), record(input.query)), {
    method: endpoint.method,
    headers,
    ...(input.body === undefined ? {} : { body: JSON.stringify(input.body) }),
    ...(input.signal ? { signal: input.signal } : {}),
  });
}

/**
 * Calls an endpoint.
 * @throws ProblemError when the server refuses, OfflineError when it doesn't answer
 */
export async function call<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  A extends z.ZodType,
>(
  endpoint: Endpoint<P, Q, B, A>,
  input: CallInput<z.input<P>, z.input<Q>, z.input<B>> = {},
): Promise<z.output<A>> {
  const plain: Endpoint = endpoint;
  let response = await request(plain, input);
  if (response.status === 403 && endpoint.method !== 'GET') {
    const problem = await problemOf(response.clone());
    // Signing in or out in another tab changes the token: fetch the new one and try once more.
    if (problem.problem.code === 'bad_csrf') {
      csrfToken = null;
      response = await request(plain, input);
    }
  }
  if (!response.ok) throw await problemOf(response);
  const body: unknown = response.status === 204 ? undefined : await response.json();
  const answer: z.output<A> = endpoint.answer ? endpoint.answer.parse(body) : plainUndefined();
  return answer;
}

/** An endpoint without an answer schema is typed as undefined. */
function plainUndefined<T>(): T {
  const nothing: { value?: T } = {};
  return nothing.value as T;
}

export interface UploadInput {
  readonly params: Readonly<Record<string, string>>;
  readonly fields: Readonly<Record<string, string>>;
  readonly file: Blob;
  readonly fileName: string;
  /** 0 to 1. */
  readonly onProgress?: (share: number) => void;
  readonly signal?: AbortSignal;
  readonly idempotencyKey?: string;
}

/** Uploads one file with progress (fetch can't tell it, so this is XMLHttpRequest). */
export async function upload<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  A extends z.ZodType,
>(endpoint: Endpoint<P, Q, B, A>, input: UploadInput): Promise<z.output<A>> {
  const token = await currentCsrfToken();
  const form = new FormData();
  for (const [key, value] of Object.entries(input.fields)) form.append(key, value);
  form.append(endpoint.file ?? 'file', input.file, input.fileName);
  const text = await new Promise<string>((resolve, reject) => {
    const xhr = new XMLHttpRequest();
    xhr.open(endpoint.method, addressOf(endpoint, input.params));
    xhr.setRequestHeader('x-csrf-token', token);
    if (input.idempotencyKey) xhr.setRequestHeader('idempotency-key', input.idempotencyKey);
    xhr.upload.onprogress = (event) => {
      if (event.lengthComputable) input.onProgress?.(event.loaded / event.total);
    };
    xhr.onerror = () => reject(new OfflineError());
    xhr.onabort = () => reject(new DOMException('Aborted', 'AbortError'));
    xhr.onload = () => {
      if (xhr.status >= 200 && xhr.status < 300) resolve(xhr.responseText);
      else void problemOf(new Response(xhr.responseText, { status: Math.max(xhr.status, 400) })).then(reject);
    };
    input.signal?.addEventListener('abort', () => xhr.abort());
    xhr.send(form);
  });
  const body: unknown = text ? JSON.parse(text) : undefined;
  return endpoint.answer ? endpoint.answer.parse(body) : plainUndefined();
}
