// Checkout sessions through the provider's SDK: made, paid, declined, expired, and the page a person fills in.
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { hasCheckDigit, judgeCard } from '../../fakes/payments/cards';
import { clientFor, control, givenPayments, refusal, sessionParams, type Given } from './payments-given';

let given: Given;
beforeAll(async () => {
  given = await givenPayments();
});
afterAll(() => given.close());

const payOnPage = async (url: string, number: string, expiry = '12/40', cvc = '123'): Promise<Response> =>
  fetch(url, { method: 'POST', body: new URLSearchParams({ number, expiry, cvc }), redirect: 'manual' });

describe('when a session is made', () => {
  test('then it is open, adds up its lines and has a page of its own', async () => {
    const session = await given.stripe.checkout.sessions.create(sessionParams(65_000));
    expect(session).toMatchObject({
      object: 'checkout.session',
      status: 'open',
      payment_status: 'unpaid',
      amount_total: 65_000,
      currency: 'usd',
      metadata: { orderId: 'order-1' },
      payment_intent: null,
    });
    expect(session.url).toBe(`${given.fake.url}/pay/${session.id}`);
    const lines = await given.stripe.checkout.sessions.listLineItems(session.id);
    expect(lines.data.map((line) => [line.description, line.amount_total])).toEqual([
      ['Unit', 50_000],
      ['Core deposit', 15_000],
    ]);
  });

  test('then a key that is not ours is refused with 401', async () => {
    const error = await refusal(
      clientFor(given.fake, 'sk_test_wrong').checkout.sessions.create(sessionParams()),
    );
    expect([error.statusCode, error.rawType]).toEqual([401, 'invalid_request_error']);
    expect(error.requestId).toMatch(/^req_/);
  });

  test('then an unknown parameter, a missing one and a total under 50 cents are named', async () => {
    const { stripe } = given;
    const unknown = await refusal(
      stripe.rawRequest('POST', '/v1/checkout/sessions', { ...sessionParams(), colour: 'red' }),
    );
    expect([unknown.code, unknown.param]).toEqual(['parameter_unknown', 'colour']);
    const missing = await refusal(stripe.rawRequest('POST', '/v1/refunds', { amount: 'many' }));
    expect(missing.param).toBe('amount');
    const line = { price_data: { currency: 'usd', unit_amount: 49, product_data: { name: 'Bolt' } } };
    const small = await refusal(stripe.checkout.sessions.create({ ...sessionParams(), line_items: [line] }));
    expect(small.code).toBe('amount_too_small');
  });
});

describe('when a person fills in the page', () => {
  test('then a good card pays, the event is out, and the person is sent on', async () => {
    const { stripe, hooks } = given;
    const session = await stripe.checkout.sessions.create(sessionParams());
    const page = await (await fetch(session.url ?? '')).text();
    expect(page).toContain('Payments stand-in: no real card is charged');
    expect(page).toContain('$650.00');
    const answer = await payOnPage(session.url ?? '', '4242 4242 4242 4242');
    expect(answer.status).toBe(303);
    expect(answer.headers.get('location')).toBe(`http://127.0.0.1:9/done?session=${session.id}`);
    expect(hooks.types().slice(-3)).toEqual([
      'charge.succeeded',
      'payment_intent.succeeded',
      'checkout.session.completed',
    ]);
    const paid = await stripe.checkout.sessions.retrieve(session.id, {
      expand: ['payment_intent.latest_charge.balance_transaction'],
    });
    expect(paid).toMatchObject({
      status: 'complete',
      payment_status: 'paid',
      url: null,
      payment_intent: {
        status: 'succeeded',
        transfer_group: 'order-1',
        metadata: { orderId: 'order-1' },
        latest_charge: {
          paid: true,
          amount: 65_000,
          balance_transaction: { net: 65_000, type: 'charge', fee: 0 },
        },
      },
    });
    expect(await (await fetch(`${given.fake.url}/pay/${session.id}`)).text()).toContain('Already paid');
    expect((await payOnPage(`${given.fake.url}/pay/${session.id}`, '4242424242424242')).status).toBe(409);
  });

  test.each([
    ['4000000000000002', '12/40', '123', 'Your card was declined.'],
    ['4000000000009995', '12/40', '123', 'Your card has insufficient funds.'],
    ['4242424242424242', '01/20', '123', 'Your card has expired.'],
    ['4242424242424241', '12/40', '123', 'Your card number is not valid.'],
    ['4242424242424242', '12/40', '', 'security code is not valid.'],
    ['4242424242424242', '13/40', '123', 'expiration month is not valid.'],
  ])(
    'then card %s %s %s is refused on the page, and the session stays open',
    async (number, expiry, cvc, text) => {
      const { stripe, hooks } = given;
      const session = await stripe.checkout.sessions.create(sessionParams());
      const answer = await payOnPage(session.url ?? '', number, expiry, cvc);
      expect(answer.status).toBe(402);
      const page = await answer.text();
      expect(page).toContain(text.replace("'", '&#39;'));
      expect(page).toContain('aria-invalid="true"');
      expect(hooks.types().slice(-2)).toEqual(['charge.failed', 'payment_intent.payment_failed']);
      const open = await stripe.checkout.sessions.retrieve(session.id);
      expect([open.status, open.payment_status]).toEqual(['open', 'unpaid']);
      expect((await payOnPage(session.url ?? '', '4242424242424242')).status).toBe(303);
    },
  );

  test('then what a product wrote into a line is shown as text', async () => {
    const session = await given.stripe.checkout.sessions.create({
      ...sessionParams(),
      line_items: [
        {
          quantity: 2,
          price_data: {
            currency: 'usd',
            unit_amount: 500,
            product_data: { name: '<b onclick="x">Bolt</b>' },
          },
        },
      ],
    });
    const page = await (await fetch(session.url ?? '')).text();
    expect(page).not.toContain('<b onclick');
    expect(page).toContain('&lt;b onclick');
  });
});

describe('when the time of a session runs out', () => {
  test('then it expires by itself, says so on its page and takes no card', async () => {
    let nowMs = Date.now();
    const timed = await givenPayments({ now: () => nowMs });
    try {
      const expires = Math.floor(nowMs / 1000) + 1_800;
      const session = await timed.stripe.checkout.sessions.create({
        ...sessionParams(),
        expires_at: expires,
      });
      nowMs += 1_799_000;
      expect((await timed.stripe.checkout.sessions.retrieve(session.id)).status).toBe('open');
      nowMs += 2_000;
      await timed.hooks.until('checkout.session.expired');
      expect((await timed.stripe.checkout.sessions.retrieve(session.id)).status).toBe('expired');
      expect(await (await fetch(session.url ?? '')).text()).toContain('This page has expired');
      const late = await payOnPage(session.url ?? '', '4242424242424242');
      expect(late.status).toBe(409);
      expect(await late.text()).toContain('nothing was charged');
      expect((await timed.stripe.charges.list()).data).toEqual([]);
    } finally {
      await timed.close();
    }
  });

  test('then an end in the past is refused, and a strict stand-in wants 30 minutes to 24 hours', async () => {
    const strict = await givenPayments({ strictExpiry: true });
    try {
      const inMinutes = (minutes: number) => ({
        ...sessionParams(),
        expires_at: Math.floor(Date.now() / 1000) + minutes * 60,
      });
      const past = await refusal(given.stripe.checkout.sessions.create(inMinutes(-1)));
      expect(past.param).toBe('expires_at');
      for (const minutes of [29, 24 * 60 + 2])
        expect((await refusal(strict.stripe.checkout.sessions.create(inMinutes(minutes)))).param).toBe(
          'expires_at',
        );
      expect((await strict.stripe.checkout.sessions.create(inMinutes(31))).status).toBe('open');
    } finally {
      await strict.close();
    }
  });

  test('then the product can end it early, once', async () => {
    const { stripe } = given;
    const session = await stripe.checkout.sessions.create(sessionParams());
    expect((await stripe.checkout.sessions.expire(session.id)).status).toBe('expired');
    expect((await refusal(stripe.checkout.sessions.expire(session.id))).statusCode).toBe(400);
    expect((await control(given.fake, `/_complete/${session.id}`)).status).toBe(409);
  });
});

test('when a total is zero, then the session completes without a card or a payment', async () => {
  const { stripe, fake } = given;
  const session = await stripe.checkout.sessions.create({
    ...sessionParams(),
    line_items: [
      { quantity: 1, price_data: { currency: 'usd', unit_amount: 0, product_data: { name: 'Free core' } } },
    ],
  });
  expect((await control(fake, `/_complete/${session.id}`)).status).toBe(200);
  const done = await stripe.checkout.sessions.retrieve(session.id);
  expect([done.status, done.payment_status, done.payment_intent]).toEqual([
    'complete',
    'no_payment_required',
    null,
  ]);
});

// ISO/IEC 7812-1 Annex B; 79927398713 is the worked example of the Luhn formula in its encyclopaedia article.
test('when a number is checked, then only the right check digit passes', () => {
  const passing = Array.from({ length: 10 }, (_, digit) => `7992739871${digit}`).filter(hasCheckDigit);
  expect(passing).toEqual(['79927398713']);
});

test('when a card expires this month, then it still pays, and the month after it does not', () => {
  const card = { number: '4242424242424242', expMonth: 6, expYear: 2026, cvc: '123' };
  expect(judgeCard(card, new Date('2026-06-30T23:59:59Z'))).toBeNull();
  expect(judgeCard(card, new Date('2026-07-01T00:00:00Z'))?.code).toBe('expired_card');
});
