// Starting points for the tests of the payments stand-in, all through the provider's own SDK.
import Stripe from 'stripe';
import { expect } from 'vitest';
import { startPaymentsFake, type PaymentsFake, type PaymentsFakeOptions } from '../../fakes/payments/start';
import { startReceiver, type Receiver } from './receiver';

export const SECRET_KEY = 'sk_test_for_the_tests';
export const WEBHOOK_SECRET = 'whsec_for_the_tests';

export interface Given {
  readonly fake: PaymentsFake;
  readonly stripe: Stripe;
  readonly hooks: Receiver;
  close(): Promise<void>;
}

export const clientFor = (fake: Pick<PaymentsFake, 'port'>, key = SECRET_KEY, timeout = 5_000): Stripe =>
  new Stripe(key, {
    host: '127.0.0.1',
    port: fake.port,
    protocol: 'http',
    maxNetworkRetries: 0,
    timeout,
    telemetry: false,
  });

export async function givenPayments(options: PaymentsFakeOptions = {}): Promise<Given> {
  const hooks = await startReceiver();
  const fake = await startPaymentsFake({
    secretKey: SECRET_KEY,
    webhookSecret: WEBHOOK_SECRET,
    webhookUrl: hooks.url,
    retryBaseMs: 20,
    ...options,
  });
  return {
    fake,
    stripe: clientFor(fake),
    hooks,
    close: async () => {
      await fake.close();
      await hooks.close();
    },
  };
}

export const control = async (fake: PaymentsFake, path: string, body: object = {}): Promise<Response> =>
  fetch(`${fake.url}${path}`, { method: 'POST', body: JSON.stringify(body) });

export const fault = async (fake: PaymentsFake, body: object): Promise<void> => {
  expect((await control(fake, '/_faults', body)).status).toBe(201);
};

export const sessionParams = (cents = 65_000): Stripe.Checkout.SessionCreateParams => ({
  mode: 'payment',
  client_reference_id: 'order-1',
  customer_email: 'ana@example.com',
  success_url: 'http://127.0.0.1:9/done?session={CHECKOUT_SESSION_ID}',
  cancel_url: 'http://127.0.0.1:9/back',
  metadata: { orderId: 'order-1' },
  payment_intent_data: { transfer_group: 'order-1', metadata: { orderId: 'order-1' } },
  line_items: [
    {
      quantity: 1,
      price_data: { currency: 'usd', unit_amount: cents - 15_000, product_data: { name: 'Unit' } },
    },
    {
      quantity: 1,
      price_data: { currency: 'usd', unit_amount: 15_000, product_data: { name: 'Core deposit' } },
    },
  ],
});

/** A paid session and the id of its payment. */
export async function givenPaid(
  { fake, stripe }: Given,
  cents = 65_000,
): Promise<{ intent: string; session: string }> {
  const session = await stripe.checkout.sessions.create(sessionParams(cents));
  expect((await control(fake, `/_complete/${session.id}`)).status).toBe(200);
  const paid = await stripe.checkout.sessions.retrieve(session.id);
  if (typeof paid.payment_intent !== 'string') throw new Error('the session has no payment');
  return { intent: paid.payment_intent, session: session.id };
}

export async function givenOpenAccount({ fake, stripe }: Given): Promise<string> {
  const account = await stripe.accounts.create({ type: 'express', country: 'US', email: 'yard@example.com' });
  expect((await control(fake, `/_onboard/${account.id}`)).status).toBe(200);
  return account.id;
}

/** What a call was refused with. */
export async function refusal(call: Promise<unknown>): Promise<Stripe.errors.StripeError> {
  try {
    await call;
  } catch (error) {
    if (error instanceof Stripe.errors.StripeError) return error;
    throw error;
  }
  throw new Error('the call went through');
}
