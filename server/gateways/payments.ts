// The only importer of the payment provider's SDK: the few calls the product makes, in the product's own words.
import Stripe from 'stripe';
import type { Cents } from '../../shared/kernel/money';

export interface CheckoutRequest {
  readonly orderId: string;
  readonly orderNumber: string;
  readonly lines: readonly { label: string; cents: Cents }[];
  /** On the provider's clock, the real one. */
  readonly expiresAt: Date;
  readonly successUrl: string;
  readonly cancelUrl: string;
  readonly customerEmail: string;
}

export interface CheckoutState {
  readonly sessionId: string;
  readonly url: string | null;
  readonly status: 'open' | 'complete' | 'expired';
  readonly paid: boolean;
  readonly amountCents: Cents;
  readonly currency: string;
  readonly paymentIntentId: string | null;
  readonly chargeId: string | null;
  readonly orderId: string | null;
}

export interface PaymentEvent {
  readonly id: string;
  readonly type: string;
  /** The object the event is about, by id; handlers re-read it instead of trusting the event's order. */
  readonly objectId: string;
  readonly raw: unknown;
}

export interface DisputeState {
  readonly disputeId: string;
  readonly paymentIntentId: string | null;
  readonly amountCents: Cents;
  readonly status: string;
}

export interface RefundState {
  readonly refundId: string;
  readonly status: string;
  readonly amountCents: Cents;
  readonly orderId: string | null;
  readonly key: string | null;
}

export interface BalanceMovement {
  readonly id: string;
  readonly amountCents: Cents;
  readonly feeCents: Cents;
  readonly kind: string;
  readonly sourceId: string | null;
  readonly at: Date;
}

/** Why the provider refused; `final` means that the same call will never go through. */
export class PaymentRefused extends Error {
  readonly code: string;
  readonly final: boolean;
  constructor(code: string, message: string, final: boolean) {
    super(message);
    this.name = 'PaymentRefused';
    this.code = code;
    this.final = final;
  }
}

export const isFinalRefusal = (error: unknown): error is PaymentRefused =>
  error instanceof PaymentRefused && error.final;

export interface PaymentsGateway {
  openCheckout(request: CheckoutRequest, key: string): Promise<{ sessionId: string; url: string }>;
  readCheckout(sessionId: string): Promise<CheckoutState>;
  expireCheckout(sessionId: string, key: string): Promise<void>;
  refund(
    request: { orderId: string; paymentIntentId: string; cents: Cents },
    key: string,
  ): Promise<RefundState>;
  readRefund(refundId: string): Promise<RefundState>;
  transfer(
    request: { orderId: string; accountId: string; cents: Cents },
    key: string,
  ): Promise<{ transferId: string }>;
  openAccount(request: { sellerId: string; email: string }, key: string): Promise<{ accountId: string }>;
  accountState(accountId: string): Promise<{ payoutsEnabled: boolean }>;
  onboardingLink(accountId: string, returnUrl: string): Promise<{ url: string }>;
  readDispute(disputeId: string): Promise<DisputeState>;
  /** Every movement of the platform's balance, oldest last, page by page. */
  movements(): AsyncIterable<BalanceMovement>;
  readEvent(payload: Buffer, signature: string): PaymentEvent | null;
  ready(): Promise<void>;
}

const text = (value: string | { id: string } | null | undefined): string | null =>
  typeof value === 'string' ? value : (value?.id ?? null);

async function explained<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    if (
      error instanceof Stripe.errors.StripeCardError ||
      error instanceof Stripe.errors.StripeInvalidRequestError
    ) {
      const code = error.code ?? error.type;
      // A thin balance fills up again; anything else about the request itself stays wrong.
      throw new PaymentRefused(code, error.message, code !== 'balance_insufficient');
    }
    throw error;
  }
}

const refundState = (refund: Stripe.Refund): RefundState => ({
  refundId: refund.id,
  status: refund.status ?? 'unknown',
  amountCents: refund.amount,
  orderId: refund.metadata?.['orderId'] ?? null,
  key: refund.metadata?.['key'] ?? null,
});

export function createPaymentsGateway(settings: {
  secretKey: string;
  webhookSecret: string;
  host: string | undefined;
}): PaymentsGateway {
  const host = settings.host ? new URL(settings.host) : null;
  const stripe = new Stripe(settings.secretKey, {
    maxNetworkRetries: 1,
    timeout: 15_000,
    telemetry: false,
    ...(host
      ? {
          host: host.hostname,
          port: host.port || (host.protocol === 'https:' ? '443' : '80'),
          protocol: host.protocol === 'https:' ? ('https' as const) : ('http' as const),
        }
      : {}),
  });
  return {
    openCheckout: (request, key) => explained(openCheckout(stripe, request, key)),
    readCheckout: async (sessionId) => {
      const session = await stripe.checkout.sessions.retrieve(sessionId, { expand: ['payment_intent'] });
      const intent = typeof session.payment_intent === 'object' ? session.payment_intent : null;
      return {
        sessionId: session.id,
        url: session.url,
        status:
          session.status === 'complete' ? 'complete' : session.status === 'expired' ? 'expired' : 'open',
        paid: session.payment_status === 'paid',
        amountCents: session.amount_total ?? 0,
        currency: session.currency ?? 'usd',
        paymentIntentId: text(session.payment_intent),
        chargeId: text(intent?.latest_charge),
        orderId: session.metadata?.['orderId'] ?? null,
      };
    },
    expireCheckout: async (sessionId, key) => {
      const session = await stripe.checkout.sessions.retrieve(sessionId);
      if (session.status === 'open')
        await explained(stripe.checkout.sessions.expire(sessionId, {}, { idempotencyKey: key }));
    },
    refund: async (request, key) =>
      refundState(
        await explained(
          stripe.refunds.create(
            {
              payment_intent: request.paymentIntentId,
              amount: request.cents,
              metadata: { orderId: request.orderId, key },
            },
            { idempotencyKey: key },
          ),
        ),
      ),
    readRefund: async (refundId) => refundState(await stripe.refunds.retrieve(refundId)),
    transfer: async (request, key) => {
      const transfer = await explained(
        stripe.transfers.create(
          {
            amount: request.cents,
            currency: 'usd',
            destination: request.accountId,
            transfer_group: request.orderId,
            metadata: { orderId: request.orderId, key },
          },
          { idempotencyKey: key },
        ),
      );
      return { transferId: transfer.id };
    },
    openAccount: async (request, key) => {
      const account = await explained(
        stripe.accounts.create(
          { type: 'express', country: 'US', email: request.email, metadata: { sellerId: request.sellerId } },
          { idempotencyKey: key },
        ),
      );
      return { accountId: account.id };
    },
    accountState: async (accountId) => {
      const account = await stripe.accounts.retrieve(accountId);
      return { payoutsEnabled: account.payouts_enabled };
    },
    onboardingLink: async (accountId, returnUrl) => {
      const link = await explained(
        stripe.accountLinks.create({
          account: accountId,
          type: 'account_onboarding',
          return_url: returnUrl,
          refresh_url: returnUrl,
        }),
      );
      return { url: link.url };
    },
    readDispute: async (disputeId) => {
      const dispute = await stripe.disputes.retrieve(disputeId);
      return {
        disputeId: dispute.id,
        paymentIntentId: text(dispute.payment_intent),
        amountCents: dispute.amount,
        status: dispute.status,
      };
    },
    movements: () => movements(stripe),
    readEvent: (payload, signature) => readEvent(stripe, payload, signature, settings.webhookSecret),
    ready: async () => {
      await stripe.balance.retrieve();
    },
  };
}

async function openCheckout(
  stripe: Stripe,
  request: CheckoutRequest,
  key: string,
): Promise<{ sessionId: string; url: string }> {
  const session = await stripe.checkout.sessions.create(
    {
      mode: 'payment',
      client_reference_id: request.orderId,
      customer_email: request.customerEmail,
      success_url: request.successUrl,
      cancel_url: request.cancelUrl,
      expires_at: Math.ceil(request.expiresAt.getTime() / 1000),
      metadata: { orderId: request.orderId },
      payment_intent_data: { transfer_group: request.orderId, metadata: { orderId: request.orderId } },
      line_items: request.lines.map((line) => ({
        quantity: 1,
        price_data: { currency: 'usd', unit_amount: line.cents, product_data: { name: line.label } },
      })),
    },
    { idempotencyKey: key },
  );
  if (!session.url) throw new PaymentRefused('no_url', 'The checkout page has no address', true);
  return { sessionId: session.id, url: session.url };
}

async function* movements(stripe: Stripe): AsyncGenerator<BalanceMovement> {
  for await (const entry of stripe.balanceTransactions.list({ limit: 100 })) {
    yield {
      id: entry.id,
      amountCents: entry.amount,
      feeCents: entry.fee,
      kind: entry.type,
      sourceId: text(entry.source),
      at: new Date(entry.created * 1000),
    };
  }
}

function readEvent(stripe: Stripe, payload: Buffer, signature: string, secret: string): PaymentEvent | null {
  try {
    const event = stripe.webhooks.constructEvent(payload, signature, secret, 300);
    const object: object = event.data.object;
    const objectId = 'id' in object && typeof object.id === 'string' ? object.id : '';
    return { id: event.id, type: event.type, objectId, raw: event };
  } catch (error) {
    if (error instanceof Stripe.errors.StripeSignatureVerificationError || error instanceof SyntaxError)
      return null;
    throw error;
  }
}
