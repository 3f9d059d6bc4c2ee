// Control routes for tests and demos: pay, expire, onboard, dispute and fail without a browser, and show everything held.
import { z } from 'zod';
import { sendJson, type Asked } from '../http';
import { GOOD_CARD } from './cards';
import { missing, ProviderError } from './errors';
import { payWithCard } from './pay';
import { completeOnboarding, findAccount, restrictAccount } from './resources/accounts';
import { currentSession, expireSession } from './resources/checkout-sessions';
import { closeDispute, openDispute } from './resources/disputes';
import { failRefund } from './resources/refunds';
import type { Webhooks } from './webhooks';
import { pageCause, platformBalance, type Cause, type World } from './world';

const SETTLE_MS = 2_000;

const completeBody = z.strictObject({ card: z.string().default(GOOD_CARD) });
const onboardBody = z.strictObject({ restricted: z.boolean().default(false) });
const disputeBody = z.strictObject({
  amount: z.number().int().min(1).optional(),
  reason: z.string().optional(),
});
const closeBody = z.strictObject({ status: z.enum(['won', 'lost']) });

type Control = (world: World, id: string, body: unknown, cause: Cause) => object;

const CONTROLS: Readonly<Record<string, Control>> = {
  'POST /_complete/:id': (world, id, body, cause) => {
    const number = completeBody.parse(body).card.replaceAll(/\s/g, '');
    const expYear = new Date(world.settings.now()).getUTCFullYear() + 3;
    const result = payWithCard(world, id, { number, expMonth: 12, expYear, cvc: '123' }, cause);
    if (result.kind === 'unknown') throw missing('checkout.session', id);
    if (result.kind === 'declined') {
      const { code, declineCode, message } = result.decline;
      throw new ProviderError(402, { type: 'card_error', code, decline_code: declineCode, message });
    }
    if (result.kind === 'closed') {
      throw new ProviderError(409, {
        type: 'invalid_request_error',
        message: `This session is ${result.session.status}.`,
      });
    }
    return result.session;
  },
  'POST /_expire/:id': (world, id, _body, cause) => {
    const session = currentSession(world, id, cause);
    if (session === undefined) throw missing('checkout.session', id);
    return session.status === 'open' ? expireSession(world, session, cause) : session;
  },
  'POST /_onboard/:id': (world, id, body, cause) => {
    const { restricted } = onboardBody.parse(body);
    const account = findAccount(world, id, 'account');
    return restricted ? restrictAccount(world, account, cause) : completeOnboarding(world, account, cause);
  },
  'POST /_dispute/:id': (world, id, body, cause) => openDispute(world, id, disputeBody.parse(body), cause),
  'POST /_dispute/:id/close': (world, id, body, cause) =>
    closeDispute(world, id, closeBody.parse(body).status, cause),
  'POST /_fail_refund/:id': (world, id, _body, cause) => {
    const refund = failRefund(world, id, cause);
    if (refund === null) throw missing('refund that has not failed', id);
    return refund;
  },
};

const stateOf = (world: World): object => {
  const { journal, ...tables } = world.state;
  journal.flush();
  return {
    balance: platformBalance(world, 'usd'),
    faults: world.faults.list(),
    ...Object.fromEntries(Object.entries(tables).map(([name, table]) => [name, table.all()])),
  };
};

/** True when the path was one of the control routes. */
export async function answerControl(world: World, webhooks: Webhooks, asked: Asked): Promise<boolean> {
  const { response } = asked;
  if (asked.method === 'GET' && asked.url.pathname === '/_state') {
    sendJson(response, 200, stateOf(world));
    return true;
  }
  const [, name, id = '', rest] = /^\/(_[a-z_]+)\/([^/]+)(\/close)?$/.exec(asked.url.pathname) ?? [];
  const route = `${asked.method} /${name ?? ''}/:id${rest ?? ''}`;
  const control = CONTROLS[route];
  if (control === undefined) return false;
  try {
    const body: unknown = JSON.parse(asked.body.toString('utf8') || '{}');
    const result = control(world, id, body, pageCause(route));
    world.state.journal.flush();
    await webhooks.settled(SETTLE_MS);
    sendJson(response, 200, result);
  } catch (error) {
    world.state.journal.flush();
    webhooks.kick();
    if (error instanceof ProviderError) sendJson(response, error.status, { error: error.body });
    else if (error instanceof z.ZodError)
      sendJson(response, 422, { error: { message: z.prettifyError(error) } });
    else if (error instanceof SyntaxError) sendJson(response, 422, { error: { message: 'not JSON' } });
    else throw error;
  }
  return true;
}
