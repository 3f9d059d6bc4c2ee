// The one shape of an error answer (RFC 9457) and the one table from code to status.
import { z } from 'zod';

export const fieldError = z.object({ path: z.string(), message: z.string() });
export type FieldError = z.infer<typeof fieldError>;

export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string().optional(),
  code: z.string().optional(),
  requestId: z.string().optional(),
  errors: z.array(fieldError).optional(),
});
export type Problem = z.infer<typeof problemSchema>;

const TABLE = {
  bad_request: [400, 'The request cannot be read'],
  signed_out: [401, 'Sign in first'],
  forbidden: [403, 'Not allowed for this role'],
  bad_csrf: [403, 'The form is out of date'],
  foreign_origin: [403, 'This came from another site'],
  not_found: [404, 'Not found'],
  wrong_state: [409, 'The state has moved on'],
  lost_race: [409, 'Somebody was faster'],
  stale_version: [409, 'Changed since you loaded it'],
  key_reused: [409, 'Idempotency-Key used with another request'],
  too_large: [413, 'Too large'],
  unsupported_media: [415, 'This kind of file is not taken'],
  invalid: [422, 'Check what you entered'],
  too_many: [429, 'Too many tries'],
  internal: [500, 'Something went wrong'],
  unavailable: [503, 'A service we need does not answer'],
} as const;

export type ProblemCode = keyof typeof TABLE;

export const statusOf = (code: ProblemCode): number => TABLE[code][0];
export const titleOf = (code: ProblemCode): string => TABLE[code][1];
