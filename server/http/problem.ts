// Errors as RFC 9457 answers: a refusal is told in full, a bug is logged in full and shown as "something went wrong".
import type { ErrorRequestHandler, Request, Response } from 'express';
import multer from 'multer';
// Brings `req.id` and `req.log` into Express's types.
import type {} from 'pino-http';
import { statusOf, titleOf, type Problem } from '../../shared/kernel/problem';
import { refuse, type Refusal } from './refusal';

export function sendProblem(req: Request, res: Response, refusal: Refusal): void {
  const problem: Problem = {
    type: `about:blank#${refusal.refusal}`,
    title: titleOf(refusal.refusal),
    status: statusOf(refusal.refusal),
    detail: refusal.detail,
    code: refusal.refusal,
    requestId: String(req.id),
    ...(refusal.errors ? { errors: [...refusal.errors] } : {}),
  };
  if (refusal.retryAfterSeconds !== undefined)
    res.set('Retry-After', String(Math.ceil(refusal.retryAfterSeconds)));
  res.set('Cache-Control', 'no-store');
  res.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
}

const statusField = (error: unknown, key: 'status' | 'statusCode'): number | null => {
  if (typeof error !== 'object' || error === null || !(key in error)) return null;
  const value = (error as Record<string, unknown>)[key];
  return typeof value === 'number' ? value : null;
};

/** Errors that libraries throw for what a client sent. */
function clientError(error: unknown): Refusal | null {
  if (error instanceof multer.MulterError) {
    return error.code === 'LIMIT_FILE_SIZE'
      ? refuse('too_large', 'Send a photo of at most 20 MB.')
      : refuse('invalid', 'Send one file in the field the route names.', {
          errors: [{ path: error.field ?? 'file', message: error.message }],
        });
  }
  const status = statusField(error, 'status') ?? statusField(error, 'statusCode');
  if (status === 413) return refuse('too_large', 'Send at most 256 kB of JSON.');
  if (status === 415) return refuse('unsupported_media', 'Send JSON in UTF-8.');
  if (status !== null && status >= 400 && status < 500)
    return refuse('bad_request', 'The request cannot be read.');
  if (error instanceof URIError) return refuse('bad_request', 'The address cannot be read.');
  if (error instanceof Error && /Multipart|Unexpected end of form|Malformed part/i.test(error.message)) {
    return refuse('bad_request', 'The upload broke off. Send it again.');
  }
  return null;
}

export const errorHandler: ErrorRequestHandler = (error: unknown, req, res, next) => {
  if (res.headersSent) {
    next(error);
    return;
  }
  const refusal = clientError(error);
  if (refusal) {
    sendProblem(req, res, refusal);
    return;
  }
  req.log.error({ err: error }, 'request failed');
  sendProblem(
    req,
    res,
    refuse('internal', 'It is logged. Try again, and tell us the request id if it stays.'),
  );
};
