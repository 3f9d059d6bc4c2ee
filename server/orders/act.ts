// The only way an order changes: lock, gather the facts, decide, and write everything that follows in one transaction.
import { and, eq } from 'drizzle-orm';
import type { Decision, Effect } from '../../shared/orders/decide';
import { decide, isFault } from '../../shared/orders/decide';
import type { CoreMatch, Step } from '../../shared/orders/facts';
import type { Leg, Who } from '../../shared/orders/states';
import { CORE_FINAL, OUTBOUND_FINAL } from '../../shared/orders/states';
import { recordAudit } from '../accounts/for-others';
import { closeCase, openCase } from '../cases/for-others';
import type { Tx } from '../db/client';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { notFound, refuse, type Refusal } from '../http/refusal';
import { queueEffect } from '../jobs/outbox';
import { releaseListing, retakeListing, sellListing, withdrawListing } from '../listings/for-others';
import { postEntry } from '../money/for-others';
import { queueOrderMails } from '../notices/for-others';
import { startClocks, stopClocks } from './deadlines';
import { factsOf, lockOrder, type OrderRow } from './load';
import { columnsOf, noteOf } from './step-columns';
import { orders, timeline } from './tables';

export interface ActInput {
  readonly orderId: string;
  readonly roles: readonly Who[];
  readonly step: Step;
  /** Only for `settle`. */
  readonly leg?: Leg;
  readonly actorUserId: string | null;
  /** Only when a return is booked. */
  readonly coreMatch?: CoreMatch;
  /** Why an admin or both sides settled it so. */
  readonly finding?: string;
  /** The provider's payment, with `pay`. */
  readonly paymentIntentId?: string;
}

/** One provider effect per order, step and payment: whatever is tried again, the key stays. */
const effectKey = (order: OrderRow, effect: Effect, paymentId: string | null): string =>
  `${effect.kind}:${order.id}:${effect.meaning}:${paymentId ?? 'unpaid'}`;

async function writeMoney(tx: Tx, order: OrderRow, decision: Decision, now: Date): Promise<void> {
  for (const entry of decision.entries) {
    const key = `${order.id}:v${order.version}:${entry.event}`;
    await postEntry(tx, { orderId: order.id, sellerId: order.sellerId, key, entry, now });
  }
  for (const effect of decision.effects) {
    if (effect.kind === 'expire_checkout' && !order.checkoutSessionId) continue;
    await queueEffect(tx, {
      key: effectKey(order, effect, order.paymentIntentId),
      kind: effect.kind,
      orderId: order.id,
      payload: {
        cents: effect.cents,
        sellerId: order.sellerId,
        paymentIntentId: order.paymentIntentId,
        checkoutSessionId: order.checkoutSessionId,
      },
      now,
    });
  }
}

/** @returns false where the listing could not be taken again */
async function writeListing(tx: Tx, order: OrderRow, decision: Decision, now: Date): Promise<boolean> {
  switch (decision.listing) {
    case 'release':
      await releaseListing(tx, order.listingId, now);
      return true;
    case 'withdraw':
      await withdrawListing(tx, order.listingId, now);
      return true;
    case 'sell':
      await sellListing(tx, order.listingId, now);
      return true;
    case 'retake':
      return (await retakeListing(tx, order.listingId, now)) !== null;
    case null:
      return true;
  }
}

async function writeCase(
  tx: Tx,
  order: OrderRow,
  decision: Decision,
  input: ActInput,
  now: Date,
): Promise<void> {
  if (decision.opensCase) {
    const reason =
      'input' in input.step && 'reason' in input.step.input ? (input.step.input.reason ?? '') : '';
    await openCase(tx, { order, kind: decision.opensCase, reason, openedBy: input.actorUserId, now });
  }
  if (decision.closesCase && input.step.action === 'settle') {
    await closeCase(tx, {
      orderId: order.id,
      kind: decision.row.leg === 'outbound' ? 'refusal' : 'contest',
      toBuyerCents: input.step.toBuyerCents,
      toSellerCents: input.step.toSellerCents,
      finding: input.finding ?? null,
      settledBy: decision.actedBy === 'both' ? 'both' : 'admin',
      settledByUserId: input.actorUserId,
      now,
    });
  }
}

const isClosed = (decision: Decision): boolean =>
  OUTBOUND_FINAL.includes(decision.outbound) &&
  (decision.core === null || CORE_FINAL.includes(decision.core));

async function writeOrder(
  tx: Tx,
  before: OrderRow,
  decision: Decision,
  input: ActInput,
  now: Date,
): Promise<OrderRow | null> {
  const [row] = await tx
    .update(orders)
    .set({
      outbound: decision.outbound,
      core: decision.core,
      version: before.version + 1,
      updatedAt: now,
      closedAt: isClosed(decision) ? now : null,
      ...(decision.changes.dueAt ? { dueAt: decision.changes.dueAt } : {}),
      ...(decision.changes.otherCoreAllowed ? { otherCoreAllowed: true } : {}),
      ...(input.paymentIntentId ? { paymentIntentId: input.paymentIntentId } : {}),
      ...columnsOf(input.step, decision, now),
    })
    .where(and(eq(orders.id, before.id), eq(orders.version, before.version)))
    .returning();
  return row ?? null;
}

/** Everything of one step, inside a transaction that already holds the order's lock. */
export async function actOnLocked(
  deps: Deps,
  tx: Tx,
  before: OrderRow,
  input: ActInput,
): Promise<OrderRow | Refusal> {
  const now = deps.clock.now();
  const facts = await factsOf(tx, before, input.coreMatch ?? null);
  const decision = decide(facts, input.roles, input.step, now, input.leg);
  if (isFault(decision)) {
    return refuse(decision.code, decision.detail, decision.errors ? { errors: decision.errors } : {});
  }
  const order = await writeOrder(tx, before, decision, input, now);
  if (!order) return refuse('stale_version', 'Somebody changed this order meanwhile. Look at it again.');
  if (!(await writeListing(tx, order, decision, now)))
    return refuse('lost_race', 'The unit is no longer on sale.');
  await writeMoney(tx, order, decision, now);
  await stopClocks(tx, order.id, decision.stops, now);
  await startClocks(deps, tx, order.id, decision.starts);
  await writeCase(tx, order, decision, input, now);
  await tx.insert(timeline).values({
    orderId: order.id,
    at: now,
    action: decision.row.action,
    by: decision.actedBy,
    actorUserId: input.actorUserId,
    note: noteOf(input.step, input.finding),
    log: decision.row.log,
    version: order.version,
  });
  await recordAudit(tx, {
    at: now,
    actorUserId: input.actorUserId,
    actorKind: decision.actedBy,
    action: `order.${decision.row.action}`,
    objectKind: 'order',
    objectId: order.id,
    detail: { outbound: order.outbound, core: order.core, version: order.version },
  });
  await queueOrderMails(tx, {
    order,
    mails: decision.mails,
    version: order.version,
    now,
    publicUrl: deps.env.PUBLIC_URL,
  });
  return order;
}

export async function actOnOrder(deps: Deps, input: ActInput): Promise<OrderRow | Refusal> {
  return transaction(deps.db, async (tx) => {
    const before = await lockOrder(tx, input.orderId);
    return before ? actOnLocked(deps, tx, before, input) : notFound('order');
  });
}
