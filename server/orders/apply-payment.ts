// What the provider's events mean for an order: a payment, an expired checkout, a failed refund, a chargeback.
import { eq } from 'drizzle-orm';
import {
  capturedLate,
  disputeLost,
  disputeOpened,
  disputeWon,
  refundFailed,
} from '../../shared/money/ledger';
import { recordAudit } from '../accounts/for-others';
import { openCase, closeCase } from '../cases/for-others';
import type { Tx } from '../db/client';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import type { CheckoutState } from '../gateways/payments';
import { isRefusal, notFound, type Refusal } from '../http/refusal';
import { queueEffect } from '../jobs/outbox';
import { outbox } from '../jobs/tables';
import { holdsOf, postEntry } from '../money/for-others';
import { providerObjects } from '../money/tables';
import { actOnLocked } from './act';
import { lockOrder, type OrderRow } from './load';
import { orders } from './tables';

async function rememberPayment(
  deps: Deps,
  tx: Tx,
  order: OrderRow,
  checkout: CheckoutState,
): Promise<boolean> {
  const [row] = await tx
    .insert(providerObjects)
    .values({
      id: checkout.paymentIntentId ?? checkout.sessionId,
      kind: 'payment',
      orderId: order.id,
      cents: checkout.amountCents,
      state: 'captured',
      providerChargeId: checkout.chargeId,
      createdAt: deps.clock.now(),
    })
    .onConflictDoNothing()
    .returning({ id: providerObjects.id });
  return row !== undefined;
}

/** A payment nobody waits for any more: entered as owed back, and sent back whole. */
async function refundLate(deps: Deps, tx: Tx, order: OrderRow, checkout: CheckoutState): Promise<void> {
  const now = deps.clock.now();
  const paymentIntentId = checkout.paymentIntentId ?? checkout.sessionId;
  await postEntry(tx, {
    orderId: order.id,
    sellerId: order.sellerId,
    key: `late:${paymentIntentId}`,
    entry: capturedLate(checkout.amountCents),
    now,
  });
  await queueEffect(tx, {
    key: `refund:${order.id}:late:${paymentIntentId}`,
    kind: 'refund',
    orderId: order.id,
    payload: { cents: checkout.amountCents, sellerId: order.sellerId, paymentIntentId },
    now,
  });
  await recordAudit(tx, {
    at: now,
    actorUserId: null,
    actorKind: 'provider',
    action: 'payment.returned',
    objectKind: 'order',
    objectId: order.id,
    detail: { cents: checkout.amountCents, paymentIntentId },
  });
}

export async function applyPayment(deps: Deps, sessionId: string): Promise<void> {
  const checkout = await deps.payments.readCheckout(sessionId);
  const { orderId, paymentIntentId } = checkout;
  if (!checkout.paid || !orderId || !paymentIntentId) return;
  // The order moves in a savepoint of its own: where it can't, the payment is still entered, as owed back.
  const result = await transaction(deps.db, async (tx): Promise<'done' | Refusal> => {
    const order = await lockOrder(tx, orderId);
    if (!order) return notFound('order');
    if (!(await rememberPayment(deps, tx, order, checkout))) return 'done';
    return isRefusal(await payInSavepoint(deps, tx, order, checkout))
      ? refundLate(deps, tx, order, checkout).then(() => 'done' as const)
      : 'done';
  });
  if (isRefusal(result)) deps.log.error({ sessionId }, 'a payment came in for an order that is not here');
}

async function payInSavepoint(
  deps: Deps,
  tx: Tx,
  order: OrderRow,
  checkout: CheckoutState,
): Promise<OrderRow | Refusal> {
  return transaction(tx, (inner) =>
    actOnLocked(deps, inner, order, {
      orderId: order.id,
      roles: ['provider'],
      step: { action: 'pay', amountCents: checkout.amountCents, currency: checkout.currency },
      actorUserId: null,
      ...(checkout.paymentIntentId ? { paymentIntentId: checkout.paymentIntentId } : {}),
    }),
  );
}

/** The hosted page expired or was given up: the same as our own clock, whichever comes first. */
export async function applyExpiredCheckout(deps: Deps, sessionId: string): Promise<void> {
  const checkout = await deps.payments.readCheckout(sessionId);
  if (checkout.paid || checkout.status !== 'expired' || !checkout.orderId) return;
  const orderId = checkout.orderId;
  await transaction(deps.db, async (tx) => {
    const order = await lockOrder(tx, orderId);
    if (!order || order.outbound !== 'awaiting_payment' || order.checkoutSessionId !== sessionId)
      return 'nothing';
    return actOnLocked(deps, tx, order, {
      orderId,
      roles: ['provider'],
      step: { action: 'abandon', input: { version: order.version } },
      actorUserId: null,
    });
  });
}

/** The money is back on our balance: owed to the builder again, and shown to an admin until it is dealt with. */
export async function applyRefundChange(deps: Deps, refundId: string): Promise<void> {
  const refund = await deps.payments.readRefund(refundId);
  if (refund.status !== 'failed' && refund.status !== 'canceled') return;
  const now = deps.clock.now();
  await transaction(deps.db, async (tx) => {
    const [known] = await tx
      .select()
      .from(providerObjects)
      .where(eq(providerObjects.id, refundId))
      .for('update');
    if (!known) throw new Error(`refund ${refundId} is not recorded yet`);
    if (known.state === 'failed') return;
    const order = await lockOrder(tx, known.orderId);
    if (!order) return;
    await tx.update(providerObjects).set({ state: 'failed' }).where(eq(providerObjects.id, refundId));
    await postEntry(tx, {
      orderId: order.id,
      sellerId: order.sellerId,
      key: `refund_failed:${refundId}`,
      entry: refundFailed(known.cents),
      now,
    });
    if (known.outboxKey) {
      await tx
        .update(outbox)
        .set({
          state: 'dead',
          lastError: 'the refund failed after it was sent; find another way to the builder',
        })
        .where(eq(outbox.key, known.outboxKey));
    }
    await recordAudit(tx, {
      at: now,
      actorUserId: null,
      actorKind: 'provider',
      action: 'refund.failed',
      objectKind: 'order',
      objectId: order.id,
      detail: { refundId, cents: known.cents },
    });
  });
}

async function orderOfPayment(tx: Tx, paymentIntentId: string | null): Promise<OrderRow | null> {
  if (!paymentIntentId) return null;
  const [row] = await tx
    .select({ id: orders.id })
    .from(orders)
    .where(eq(orders.paymentIntentId, paymentIntentId));
  return row ? lockOrder(tx, row.id) : null;
}

/** A chargeback: the card network takes the money at once; what is held freezes and a case opens. */
export async function applyDispute(deps: Deps, disputeId: string): Promise<void> {
  const dispute = await deps.payments.readDispute(disputeId);
  const now = deps.clock.now();
  await transaction(deps.db, async (tx) => {
    const order = await orderOfPayment(tx, dispute.paymentIntentId);
    if (!order) throw new Error(`dispute ${disputeId} is about a payment that is not recorded yet`);
    const post = (key: string, entry: ReturnType<typeof disputeOpened>): Promise<boolean> =>
      postEntry(tx, { orderId: order.id, sellerId: order.sellerId, key: `${key}:${disputeId}`, entry, now });
    if (await post('dispute_opened', disputeOpened(dispute.amountCents))) {
      await tx
        .insert(providerObjects)
        .values({
          id: disputeId,
          kind: 'dispute',
          orderId: order.id,
          cents: dispute.amountCents,
          state: 'open',
          createdAt: now,
        })
        .onConflictDoNothing();
      await tx.update(orders).set({ frozen: true, updatedAt: now }).where(eq(orders.id, order.id));
      await openCase(tx, {
        order,
        kind: 'chargeback',
        reason: 'The card payment is disputed at the bank.',
        openedBy: null,
        now,
        disputeId,
      });
    }
    const over = dispute.status === 'won' ? 'won' : dispute.status === 'lost' ? 'lost' : null;
    if (!over) return;
    const entry =
      over === 'won'
        ? disputeWon(dispute.amountCents)
        : disputeLost(dispute.amountCents, await holdsOf(tx, order.id));
    if (!(await post(`dispute_${over}`, entry))) return;
    await tx.update(providerObjects).set({ state: over }).where(eq(providerObjects.id, disputeId));
    await tx.update(orders).set({ frozen: false, updatedAt: now }).where(eq(orders.id, order.id));
    await closeCase(tx, {
      orderId: order.id,
      kind: 'chargeback',
      toBuyerCents: over === 'lost' ? dispute.amountCents : 0,
      toSellerCents: 0,
      finding:
        over === 'lost'
          ? 'The bank gave the money back to the card holder.'
          : 'The bank turned the dispute down.',
      settledBy: 'provider',
      settledByUserId: null,
      now,
    });
  });
}
