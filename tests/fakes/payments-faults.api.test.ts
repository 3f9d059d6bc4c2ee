// What can go wrong at the provider: idempotency, time-outs, refusals, and events that come twice, late, or out of order.
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { startPaymentsFake } from '../../fakes/payments/start';
import {
  clientFor,
  control,
  fault,
  givenPaid,
  givenPayments,
  refusal,
  SECRET_KEY,
  sessionParams,
  WEBHOOK_SECRET,
  type Given,
} from './payments-given';

let given: Given;
beforeEach(async () => {
  given = await givenPayments();
});
afterEach(() => given.close());

describe('when a call carries an idempotency key', () => {
  test('then the same call again gets the first answer and nothing is made twice', async () => {
    const { stripe } = given;
    const { intent } = await givenPaid(given);
    const once = { idempotencyKey: 'refund-1' };
    const first = await stripe.refunds.create({ payment_intent: intent, amount: 100 }, once);
    const again = await stripe.refunds.create({ payment_intent: intent, amount: 100 }, once);
    expect(again.id).toBe(first.id);
    expect(again.lastResponse.requestId).toBe(first.lastResponse.requestId);
    expect(again.lastResponse.headers['idempotent-replayed']).toBe('true');
    expect((await stripe.refunds.list()).data).toHaveLength(1);
  });

  test('then other parameters or another path under the same key are refused', async () => {
    const { stripe } = given;
    const { intent } = await givenPaid(given);
    const once = { idempotencyKey: 'refund-1' };
    await stripe.refunds.create({ payment_intent: intent, amount: 100 }, once);
    for (const call of [
      stripe.refunds.create({ payment_intent: intent, amount: 101 }, once),
      stripe.checkout.sessions.create(sessionParams(), once),
    ]) {
      const error = await refusal(call);
      expect([error.statusCode, error.rawType]).toEqual([400, 'idempotency_error']);
    }
  });

  test('then while the first call still runs a second gets 409', async () => {
    const { stripe, fake } = given;
    await fault(fake, { match: 'POST /v1/checkout/sessions', kind: 'slow', ms: 300 });
    const first = stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: 'open-1' });
    await new Promise((resolve) => setTimeout(resolve, 100));
    const error = await refusal(
      stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: 'open-1' }),
    );
    expect([error.statusCode, error.code]).toEqual([409, 'idempotency_key_in_use']);
    const { id } = await first;
    const third = await stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: 'open-1' });
    expect(third.id).toBe(id);
  });

  test('then a refusal after work began is remembered, one for a bad parameter is not', async () => {
    const { stripe } = given;
    const { intent } = await givenPaid(given);
    const tooMuch = { payment_intent: intent, amount: 65_001 };
    const first = await refusal(stripe.refunds.create(tooMuch, { idempotencyKey: 'a' }));
    const again = await refusal(stripe.refunds.create(tooMuch, { idempotencyKey: 'a' }));
    expect(again.requestId).toBe(first.requestId);
    await refusal(stripe.refunds.create({ amount: 5 }, { idempotencyKey: 'b' }));
    expect(
      (await stripe.refunds.create({ payment_intent: intent, amount: 5 }, { idempotencyKey: 'b' })).amount,
    ).toBe(5);
  });

  test('then it is forgotten after a day', async () => {
    let nowMs = Date.now();
    const timed = await givenPayments({ now: () => nowMs });
    try {
      const open = () => timed.stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: 'open-1' });
      const first = await open();
      nowMs += 24 * 3_600_000 - 1;
      expect((await open()).id).toBe(first.id);
      nowMs += 2;
      expect((await open()).id).not.toBe(first.id);
    } finally {
      await timed.close();
    }
  });
});

describe('when a call is made to fail', () => {
  test.each([
    ['timeout_before', 0],
    ['timeout_after', 1],
  ])(
    'then with %s the caller gets no answer and %i refund is made, and a retry ends with one',
    async (kind, made) => {
      const { fake } = given;
      const { intent } = await givenPaid(given);
      const hasty = clientFor(fake, SECRET_KEY, 200);
      await fault(fake, { match: 'POST /v1/refunds', kind });
      const refund = () =>
        hasty.refunds.create({ payment_intent: intent, amount: 700 }, { idempotencyKey: 'r' });
      expect(await refusal(refund())).toBeInstanceOf(Stripe.errors.StripeConnectionError);
      expect((await hasty.refunds.list()).data).toHaveLength(made);
      await refund();
      expect((await hasty.refunds.list()).data).toHaveLength(1);
    },
  );

  test.each([
    [500, Stripe.errors.StripeAPIError],
    [429, Stripe.errors.StripeRateLimitError],
    [402, Stripe.errors.StripeCardError],
  ])(
    'then status %i arrives as the error the SDK has for it, nothing is made, and the next call works',
    async (code, kind) => {
      const { stripe, fake } = given;
      await fault(fake, { match: 'POST /v1/checkout/*', kind: 'status', code });
      expect(
        await refusal(stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: 'k' })),
      ).toBeInstanceOf(kind);
      expect((await stripe.checkout.sessions.list()).data).toEqual([]);
      expect((await stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: 'k' })).status).toBe(
        'open',
      );
    },
  );

  test('then a kept 500 is replayed under its key, and a new key goes through', async () => {
    const { stripe, fake } = given;
    await fault(fake, { match: 'POST /v1/checkout/sessions', kind: 'status', keep: true });
    const open = () => stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: 'k' });
    expect((await refusal(open())).statusCode).toBe(500);
    expect((await refusal(open())).statusCode).toBe(500);
    expect((await stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: 'k2' })).status).toBe(
      'open',
    );
  });

  test('then a malformed answer is an error although the work is done', async () => {
    const { stripe, fake } = given;
    await fault(fake, { match: 'POST /v1/checkout/sessions', kind: 'malformed' });
    await refusal(stripe.checkout.sessions.create(sessionParams()));
    expect((await stripe.checkout.sessions.list()).data).toHaveLength(1);
  });

  test('then faults are listed, counted down and cleared, and a bad one is refused', async () => {
    const { fake, stripe } = given;
    await fault(fake, { match: 'GET /v1/refunds/:id', kind: 'status', code: 500, times: 2 });
    await refusal(stripe.refunds.retrieve('re_1'));
    const listed: unknown = await (await fetch(`${fake.url}/_faults`)).json();
    expect(listed).toMatchObject({ items: [{ match: 'GET /v1/refunds/:id', times: 2, left: 1 }] });
    await fetch(`${fake.url}/_faults`, { method: 'DELETE' });
    expect((await refusal(stripe.refunds.retrieve('re_1'))).statusCode).toBe(404);
    expect((await control(fake, '/_faults', { match: 'x', kind: 'meteor' })).status).toBe(422);
  });

  test('then a refund that fails later first succeeds', async () => {
    const { stripe, fake, hooks } = given;
    const { intent } = await givenPaid(given);
    await fault(fake, { match: 'POST /v1/refunds', kind: 'fail_later', ms: 50 });
    const refund = await stripe.refunds.create({ payment_intent: intent, amount: 700 });
    expect(refund.status).toBe('succeeded');
    await hooks.until('refund.failed');
    expect((await stripe.refunds.retrieve(refund.id)).status).toBe('failed');
  });
});

describe('when an event is sent', () => {
  test('then its signature is the one the SDK checks, and a changed body is not accepted', async () => {
    const { stripe, hooks } = given;
    await givenPaid(given);
    const { payload, signature } = await hooks.until('checkout.session.completed');
    const event = stripe.webhooks.constructEvent(payload, signature, WEBHOOK_SECRET, 300);
    expect(event).toMatchObject({
      type: 'checkout.session.completed',
      data: { object: { payment_status: 'paid' } },
    });
    const forged = payload.replace('65000', '65001');
    expect(() => stripe.webhooks.constructEvent(forged, signature, WEBHOOK_SECRET, 300)).toThrow(
      Stripe.errors.StripeSignatureVerificationError,
    );
    expect((await stripe.events.retrieve(event.id)).type).toBe(event.type);
  });

  test('then it is sent again until it is taken', async () => {
    const { hooks } = given;
    hooks.answers.set('charge.succeeded', [500, 404, 302]);
    await givenPaid(given);
    const taken = await hooks.until('charge.succeeded', 4);
    const ids = hooks.received
      .filter((each) => each.event.type === 'charge.succeeded')
      .map((each) => each.event.id);
    expect(ids).toEqual(Array(4).fill(taken.event.id));
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect(hooks.types().filter((type) => type === 'charge.succeeded')).toHaveLength(4);
  });

  test('then a duplicate comes twice under one id', async () => {
    const { hooks, fake } = given;
    await fault(fake, { match: 'checkout.session.completed', kind: 'duplicate_webhook' });
    await givenPaid(given);
    const first = await hooks.until('checkout.session.completed');
    const second = await hooks.until('checkout.session.completed', 2);
    expect(second.event.id).toBe(first.event.id);
  });

  test('then a late one comes after its time', async () => {
    const { hooks, fake } = given;
    await fault(fake, { match: 'checkout.session.completed', kind: 'late_webhook', ms: 300 });
    const before = Date.now();
    await givenPaid(given);
    expect(hooks.types()).not.toContain('checkout.session.completed');
    await hooks.until('checkout.session.completed');
    expect(Date.now() - before).toBeGreaterThanOrEqual(300);
  });

  test('then a reordered one comes after the next, by the call that caused it too', async () => {
    const { hooks, fake, stripe } = given;
    const { intent } = await givenPaid(given);
    hooks.received.length = 0;
    await fault(fake, { match: 'POST /v1/refunds', kind: 'reorder_webhooks', ms: 60_000 });
    await stripe.refunds.create({ payment_intent: intent, amount: 5 });
    await hooks.until('refund.created');
    expect(hooks.types()).toEqual(['charge.refunded', 'refund.created']);
  });

  test('then it waits for an address, and reaches one given later', async () => {
    const silent = await startPaymentsFake({ secretKey: SECRET_KEY, webhookSecret: WEBHOOK_SECRET });
    try {
      await givenPaid({ ...given, fake: silent, stripe: clientFor(silent) });
      silent.setWebhookUrl(given.hooks.url);
      await given.hooks.until('checkout.session.completed');
    } finally {
      await silent.close();
    }
  });
});

test('when the stand-in is started again, then nothing is lost, not even a key or an event that is still to be sent', async () => {
  const dataDir = mkdtempSync(join(tmpdir(), 'fakes-test-'));
  try {
    const first = await startPaymentsFake({ secretKey: SECRET_KEY, webhookSecret: WEBHOOK_SECRET, dataDir });
    const before = { ...given, fake: first, stripe: clientFor(first) };
    const { intent } = await givenPaid(before);
    const refund = await before.stripe.refunds.create(
      { payment_intent: intent, amount: 5 },
      { idempotencyKey: 'r' },
    );
    const state: unknown = await (await fetch(`${first.url}/_state`)).json();
    await first.close();

    const second = await startPaymentsFake({ secretKey: SECRET_KEY, webhookSecret: WEBHOOK_SECRET, dataDir });
    const stripe = clientFor(second);
    expect(await (await fetch(`${second.url}/_state`)).json()).toEqual(state);
    expect(
      (await stripe.refunds.create({ payment_intent: intent, amount: 5 }, { idempotencyKey: 'r' })).id,
    ).toBe(refund.id);
    second.setWebhookUrl(given.hooks.url);
    await given.hooks.until('refund.created');
    await second.close();
  } finally {
    rmSync(dataDir, { recursive: true });
  }
});
