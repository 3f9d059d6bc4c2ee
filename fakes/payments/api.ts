// Answers one call of the provider's API: key, faults, idempotency, the resource, expansion, and what it set off.
import { createHash, timingSafeEqual } from 'node:crypto';
import type { ServerResponse } from 'node:http';
import { dropLater, faultMs, pause, TIMEOUT_MS, type Asked } from '../http';
import type { Fault, FaultKind } from '../faults';
import { errorForStatus, ProviderError, type ErrorBody } from './errors';
import { createLookup, expand } from './expand';
import { decodeForm } from './form-decode';
import { createIdempotency, fingerprintOf, type Answer, type Idempotency } from './idempotency';
import { accountRoutes } from './resources/accounts';
import { balanceRoutes } from './resources/balance';
import { checkoutSessionRoutes } from './resources/checkout-sessions';
import { disputeRoutes } from './resources/disputes';
import { eventRoutes } from './resources/events';
import { paymentRoutes } from './resources/payments';
import { refundRoutes } from './resources/refunds';
import { taxRoutes } from './resources/tax-calculations';
import { transferRoutes } from './resources/transfers';
import { createRouter, type Found } from './router';
import type { Webhooks } from './webhooks';
import { API_VERSION, newId, type Cause, type World } from './world';

const CALL_FAULTS: readonly FaultKind[] = [
  'timeout_before',
  'timeout_after',
  'status',
  'slow',
  'late_answer',
  'malformed',
  'hang',
];

const SLOW_MS = 5_000;

const header = (asked: Asked, name: string): string | null => {
  const value = asked.headers[name];
  return typeof value === 'string' ? value : null;
};

const sameText = (left: string, right: string): boolean =>
  timingSafeEqual(createHash('sha256').update(left).digest(), createHash('sha256').update(right).digest());

function checkKey(asked: Asked, secretKey: string): void {
  const given = header(asked, 'authorization') ?? '';
  const basic = /^Basic (.+)$/i.exec(given)?.[1];
  const key =
    /^Bearer (.+)$/i.exec(given)?.[1] ??
    (basic === undefined ? '' : (Buffer.from(basic, 'base64').toString('utf8').split(':')[0] ?? ''));
  if (key !== '' && sameText(key, secretKey)) return;
  throw new ProviderError(401, {
    type: 'invalid_request_error',
    message:
      key === '' ? 'You did not provide an API key.' : `Invalid API Key provided: ${key.slice(0, 8)}****`,
  });
}

const errorAnswer = (status: number, error: ErrorBody, requestId: string): Answer => ({
  status,
  body: JSON.stringify({ error }, null, 2),
  requestId,
});

function send(response: ServerResponse, answer: Answer, cause: Cause, replayed: boolean): void {
  if (response.destroyed) return;
  response.writeHead(answer.status, {
    'content-type': 'application/json',
    'request-id': answer.requestId,
    'stripe-version': cause.apiVersion,
    ...(cause.idempotencyKey ? { 'idempotency-key': cause.idempotencyKey } : {}),
    ...(replayed ? { 'idempotent-replayed': 'true', 'original-request': answer.requestId } : {}),
  });
  response.end(answer.body);
}

interface Api {
  readonly world: World;
  readonly webhooks: Webhooks;
  readonly idempotency: Idempotency;
}

const route = createRouter({
  ...checkoutSessionRoutes,
  ...paymentRoutes,
  ...refundRoutes,
  ...accountRoutes,
  ...transferRoutes,
  ...balanceRoutes,
  ...disputeRoutes,
  ...eventRoutes,
  ...taxRoutes,
});

/** Runs the resource; `keep` says whether the answer is one to remember. */
function run(world: World, asked: Asked, found: Found, cause: Cause): { answer: Answer; keep: boolean } {
  const requestId = cause.requestId ?? '';
  let worked = false;
  try {
    const encoded = asked.method === 'GET' ? asked.url.search.slice(1) : asked.body.toString('utf8');
    const form = decodeForm(encoded);
    const account = header(asked, 'stripe-account');
    const result = found.handler({ world, ids: found.ids, form, path: asked.url.pathname, account, cause });
    worked = true;
    const paths = Array.isArray(form['expand']) ? form['expand'].map(String) : [];
    const body = JSON.stringify(expand(result, paths, createLookup(world.state)), null, 2);
    return { answer: { status: 200, body, requestId }, keep: true };
  } catch (error) {
    if (error instanceof ProviderError)
      return { answer: errorAnswer(error.status, error.body, requestId), keep: error.began || worked };
    const message = error instanceof Error ? (error.stack ?? error.message) : String(error);
    process.stderr.write(`payments stand-in: ${asked.method} ${asked.url.pathname}: ${message}\n`);
    return { answer: errorAnswer(500, errorForStatus(500), requestId), keep: true };
  }
}

/** The answer under its key: replayed, or made and remembered. */
async function answerOnce(
  { world, webhooks, idempotency }: Api,
  asked: Asked,
  found: Found,
  cause: Cause,
  fault: Fault | null,
): Promise<{ answer: Answer; replayed: boolean }> {
  const key = asked.method === 'POST' ? cause.idempotencyKey : null;
  const account = header(asked, 'stripe-account') ?? '';
  const print = fingerprintOf(asked.method, asked.url.pathname, account, asked.body.toString('utf8'));
  const saved = key === null ? null : idempotency.begin(key, print);
  if (saved !== null) return { answer: saved, replayed: true };
  let kept: Answer | null = null;
  try {
    if (fault?.kind === 'slow') await pause(faultMs(fault, SLOW_MS));
    const status = fault?.kind === 'status' ? (fault.code ?? 500) : null;
    const { answer, keep } =
      status === null
        ? run(world, asked, found, cause)
        : {
            answer: errorAnswer(status, errorForStatus(status), cause.requestId ?? ''),
            keep: fault?.keep === true,
          };
    kept = keep ? answer : null;
    return { answer, replayed: false };
  } finally {
    if (key !== null) idempotency.finish(key, print, kept);
    world.state.journal.flush();
    webhooks.kick();
  }
}

async function answerCall(api: Api, asked: Asked, cause: Cause): Promise<void> {
  const { response } = asked;
  checkKey(asked, api.world.settings.secretKey);
  const found = route(asked.method, asked.url.pathname);
  if (found === null) {
    throw new ProviderError(404, {
      type: 'invalid_request_error',
      message: `Unrecognized request URL (${asked.method}: ${asked.url.pathname}).`,
    });
  }
  const fault = api.world.faults.take([cause.subject], CALL_FAULTS);
  if (fault?.kind === 'timeout_before' || fault?.kind === 'hang')
    return dropLater(response, faultMs(fault, TIMEOUT_MS));
  const { answer, replayed } = await answerOnce(api, asked, found, cause, fault);
  if (fault?.kind === 'timeout_after') return dropLater(response, faultMs(fault, TIMEOUT_MS));
  if (fault?.kind === 'late_answer') await pause(faultMs(fault, SLOW_MS));
  const body = fault?.kind === 'malformed' ? answer.body.slice(0, answer.body.length / 2) : answer.body;
  send(response, { ...answer, body }, cause, replayed);
}

/** Handles every call under `/v1/`. */
export function createApi(world: World, webhooks: Webhooks): (asked: Asked) => Promise<void> {
  const api = { world, webhooks, idempotency: createIdempotency(world.state, () => world.settings.now()) };
  return async (asked) => {
    const cause: Cause = {
      subject: `${asked.method} ${asked.url.pathname}`,
      requestId: newId('req', 14),
      idempotencyKey: header(asked, 'idempotency-key'),
      apiVersion: header(asked, 'stripe-version') ?? API_VERSION,
    };
    try {
      await answerCall(api, asked, cause);
    } catch (error) {
      if (!(error instanceof ProviderError)) throw error;
      send(asked.response, errorAnswer(error.status, error.body, cause.requestId ?? ''), cause, false);
    }
  };
}
