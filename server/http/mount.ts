// Turns routes into Express: the guards of every request stand here in one fixed order — limit, who, input, work, answer.
import type { Express, NextFunction, Request, RequestHandler, Response } from 'express';
import multer from 'multer';
// Brings `req.id` and `req.log` into Express's types.
import type {} from 'pino-http';
import type { z } from 'zod';
import { mayCall, type Actor } from '../../shared/accounts/actor';
import type { Endpoint } from '../../shared/kernel/endpoint';
import type { FieldError } from '../../shared/kernel/problem';
import type { Deps } from '../deps';
import { withIdempotency } from './idempotency';
import { sendProblem } from './problem';
import { isRefusal, refuse, type Refusal } from './refusal';
import { isBinary, isRedirect, type Call, type Route, type SessionSeam, type UploadedFile } from './route';

/** What the HTTP layer needs from the features: it never imports one. */
export interface MountSeams {
  actorOf(req: Request): Promise<Actor | null>;
  sessionOf(req: Request, res: Response): SessionSeam;
  limit(req: Request, endpoint: Endpoint, actor: Actor | null): Promise<Refusal | null>;
}

export const MAX_UPLOAD_BYTES = 20 * 1024 * 1024;

function uploadOf(field: string): RequestHandler {
  return multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: MAX_UPLOAD_BYTES, files: 1, fields: 12, fieldSize: 4096 },
    // Without it a name such as "Fotó.jpg" arrives as mojibake.
    defParamCharset: 'utf8',
  }).single(field);
}

const runHandler = (handler: RequestHandler, req: Request, res: Response): Promise<void> =>
  new Promise((resolve, reject) => {
    handler(req, res, (error?: unknown) => {
      if (error === undefined || error === null) resolve();
      else reject(error instanceof Error ? error : new Error('upload failed'));
    });
  });

export function fieldErrors(error: z.ZodError, prefix = ''): FieldError[] {
  return error.issues.map((issue) => ({
    path: [prefix, ...issue.path.map(String)].filter(Boolean).join('.'),
    message: issue.message,
  }));
}

type Parsed = { ok: true; params: unknown; query: unknown; body: unknown } | { ok: false; refusal: Refusal };

function parseInput(endpoint: Endpoint, req: Request): Parsed {
  const params = endpoint.params?.safeParse(req.params);
  // An id of the wrong form names nothing that exists.
  if (params && !params.success)
    return { ok: false, refusal: refuse('not_found', 'There is nothing at this address.') };
  const query = endpoint.query?.safeParse(req.query);
  const body = endpoint.body?.safeParse(req.body ?? {});
  const errors = [
    ...(query && !query.success ? fieldErrors(query.error) : []),
    ...(body && !body.success ? fieldErrors(body.error) : []),
  ];
  if (errors.length > 0) {
    return {
      ok: false,
      refusal: refuse('invalid', errors[0]?.message ?? 'Check what you entered.', { errors }),
    };
  }
  return { ok: true, params: params?.data ?? {}, query: query?.data ?? {}, body: body?.data };
}

function sendAnswer(endpoint: Endpoint, answer: unknown, res: Response, checkAnswers: boolean): void {
  if (isBinary(answer)) {
    res.set({ 'Content-Type': answer.contentType, 'X-Content-Type-Options': 'nosniff', ...answer.headers });
    res.send(answer.binary);
    return;
  }
  if (isRedirect(answer)) {
    res.redirect(302, answer.redirect);
    return;
  }
  if (!endpoint.answer) {
    res.status(endpoint.status ?? 204).end();
    return;
  }
  const body = checkAnswers ? endpoint.answer.parse(answer) : answer;
  if (!res.hasHeader('Cache-Control')) res.set('Cache-Control', 'no-store');
  res.status(endpoint.status ?? 200).json(body);
}

async function handle(
  route: Route,
  deps: Deps,
  seams: MountSeams,
  req: Request,
  res: Response,
): Promise<void> {
  const { endpoint } = route;
  const actor = await seams.actorOf(req);
  const limited = await seams.limit(req, endpoint, actor);
  if (limited) return sendProblem(req, res, limited);
  const verdict = mayCall(endpoint.access, actor);
  if (verdict === 'signed_out') return sendProblem(req, res, refuse('signed_out', 'Sign in and try again.'));
  if (verdict === 'forbidden')
    return sendProblem(req, res, refuse('forbidden', 'Your role does not allow this.'));
  if (endpoint.file) await runHandler(uploadOf(endpoint.file), req, res);
  const input = parseInput(endpoint, req);
  if (!input.ok) return sendProblem(req, res, input.refusal);
  const file: UploadedFile | null = req.file ? { bytes: req.file.buffer, name: req.file.originalname } : null;
  const call: Call<unknown, unknown, unknown> = {
    params: input.params,
    query: input.query,
    body: input.body,
    file,
    actor,
    requestId: String(req.id),
    address: req.ip ?? 'unknown',
    session: seams.sessionOf(req, res),
    headers: req.headers,
  };
  const work = (): Promise<unknown> => route.run(call, deps);
  const answer = endpoint.idempotent
    ? await withIdempotency(deps, req, endpoint, actor, call, work)
    : await work();
  if (isRefusal(answer)) return sendProblem(req, res, answer);
  sendAnswer(endpoint, answer, res, deps.env.NODE_ENV !== 'production');
}

export function mount(app: Express, routes: readonly Route[], deps: Deps, seams: MountSeams): void {
  for (const route of routes) {
    const { endpoint } = route;
    const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'patch' | 'put' | 'delete';
    app[method](endpoint.path, (req: Request, res: Response, next: NextFunction) => {
      handle(route, deps, seams, req, res).catch(next);
    });
  }
}
