// A refusal by the rules is a value; the HTTP layer turns it into a problem answer.
import type { FieldError, ProblemCode } from '../../shared/kernel/problem';

export interface Refusal {
  readonly refusal: ProblemCode;
  /** What the person can do about it, in words. */
  readonly detail: string;
  readonly errors?: readonly FieldError[];
  /** Seconds, for too_many. */
  readonly retryAfterSeconds?: number;
}

export const refuse = (
  code: ProblemCode,
  detail: string,
  extra: Pick<Refusal, 'errors' | 'retryAfterSeconds'> = {},
): Refusal => ({ refusal: code, detail, ...extra });

/** 422 for one field. */
export const invalid = (path: string, message: string): Refusal =>
  refuse('invalid', message, { errors: [{ path, message }] });

export const notFound = (what: string): Refusal =>
  refuse('not_found', `There is no such ${what}, or it isn't yours.`);

export const isRefusal = (value: unknown): value is Refusal =>
  typeof value === 'object' && value !== null && 'refusal' in value && typeof value.refusal === 'string';
