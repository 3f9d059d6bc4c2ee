// Takes the payment of a session: payment intent, charge, balance and events, for a card that pays or one that is refused.
import { judgeCard, type Card, type Decline } from './cards';
import type { Charge, PaymentIntent, Session } from './model/payments';
import { currentSession } from './resources/checkout-sessions';
import { move, newId, type Cause, type World } from './world';

type Paid =
  | { readonly kind: 'paid'; readonly session: Session }
  | { readonly kind: 'declined'; readonly session: Session; readonly decline: Decline }
  | { readonly kind: 'closed'; readonly session: Session }
  | { readonly kind: 'unknown' };

function newIntent(world: World, session: Session): PaymentIntent {
  const plan = world.state.sessionPlans.get(session.id)?.intent;
  const id = newId('pi');
  return {
    id,
    object: 'payment_intent',
    amount: session.amount_total,
    amount_capturable: 0,
    amount_received: 0,
    canceled_at: null,
    cancellation_reason: null,
    capture_method: 'automatic',
    client_secret: newId(`${id}_secret`),
    confirmation_method: 'automatic',
    created: world.seconds(),
    currency: session.currency,
    customer: null,
    description: plan?.description ?? null,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    metadata: plan?.metadata ?? {},
    payment_method: null,
    payment_method_types: ['card'],
    receipt_email: plan?.receipt_email ?? null,
    status: 'requires_payment_method',
    transfer_group: plan?.transfer_group ?? null,
  };
}

function newCharge(world: World, intent: PaymentIntent, card: Card, decline: Decline | null): Charge {
  const paid = decline === null;
  return {
    id: newId('ch'),
    object: 'charge',
    amount: intent.amount,
    amount_captured: paid ? intent.amount : 0,
    amount_refunded: 0,
    balance_transaction: null,
    captured: paid,
    created: world.seconds(),
    currency: intent.currency,
    customer: null,
    description: intent.description,
    disputed: false,
    failure_code: decline?.code ?? null,
    failure_message: decline?.message ?? null,
    livemode: false,
    metadata: intent.metadata,
    outcome: {
      network_status: paid ? 'approved_by_network' : 'declined_by_network',
      reason: decline?.declineCode ?? decline?.code ?? null,
      seller_message: paid ? 'Payment complete.' : 'The bank did not accept the card.',
      type: paid ? 'authorized' : 'issuer_declined',
    },
    paid,
    payment_intent: intent.id,
    payment_method: newId('pm'),
    payment_method_details: {
      type: 'card',
      card: {
        brand: 'visa',
        country: 'US',
        exp_month: card.expMonth,
        exp_year: card.expYear,
        last4: card.number.slice(-4),
      },
    },
    receipt_email: intent.receipt_email,
    refunded: false,
    status: paid ? 'succeeded' : 'failed',
    transfer_group: intent.transfer_group,
  };
}

function settleIntent(
  world: World,
  intent: PaymentIntent,
  charge: Charge,
  decline: Decline | null,
): PaymentIntent {
  return world.state.paymentIntents.put(intent.id, {
    ...intent,
    amount_received: decline === null ? intent.amount : 0,
    last_payment_error:
      decline === null
        ? null
        : {
            type: 'card_error',
            code: decline.code,
            decline_code: decline.declineCode,
            message: decline.message,
            charge: charge.id,
          },
    latest_charge: charge.id,
    payment_method: decline === null ? charge.payment_method : null,
    status: decline === null ? 'succeeded' : 'requires_payment_method',
  });
}

function bookCharge(world: World, charge: Charge): Charge {
  const { feeBps, availableDelayMs } = world.settings;
  const transaction = move(world, {
    type: 'charge',
    amount: charge.amount,
    fee: Math.round((charge.amount * feeBps) / 10_000),
    currency: charge.currency,
    source: charge.id,
    description: charge.description,
    availableOn: world.seconds() + Math.ceil(availableDelayMs / 1000),
  });
  return world.state.charges.put(charge.id, { ...charge, balance_transaction: transaction.id });
}

function complete(world: World, session: Session, intent: string | null): Session {
  return world.state.sessions.put(session.id, {
    ...session,
    payment_intent: intent,
    payment_status: intent === null ? 'no_payment_required' : 'paid',
    status: 'complete',
    url: null,
  });
}

/** One attempt to pay a session with a card. Nothing is charged unless the session is open. */
export function payWithCard(world: World, sessionId: string, card: Card, cause: Cause): Paid {
  const session = currentSession(world, sessionId, cause);
  if (session === undefined) return { kind: 'unknown' };
  if (session.status !== 'open') return { kind: 'closed', session };
  if (session.amount_total === 0) return finish(world, complete(world, session, null), cause);
  const decline = judgeCard(card, new Date(world.settings.now()));
  const before = session.payment_intent ? world.state.paymentIntents.get(session.payment_intent) : undefined;
  const intent = before ?? newIntent(world, session);
  const attempted = newCharge(world, intent, card, decline);
  if (decline !== null) {
    const charge = world.state.charges.put(attempted.id, attempted);
    const failed = settleIntent(world, intent, charge, decline);
    const open = world.state.sessions.put(session.id, { ...session, payment_intent: intent.id });
    world.emit('charge.failed', charge, cause);
    world.emit('payment_intent.payment_failed', failed, cause);
    return { kind: 'declined', session: open, decline };
  }
  const charge = bookCharge(world, attempted);
  const succeeded = settleIntent(world, intent, charge, null);
  const done = complete(world, session, intent.id);
  world.emit('charge.succeeded', charge, cause);
  world.emit('payment_intent.succeeded', succeeded, cause);
  return finish(world, done, cause);
}

function finish(world: World, session: Session, cause: Cause): Paid {
  world.emit('checkout.session.completed', session, cause);
  return { kind: 'paid', session };
}

/** Where the person goes after paying. */
export const successUrl = (session: Session): string =>
  session.success_url.replaceAll('{CHECKOUT_SESSION_ID}', session.id);
