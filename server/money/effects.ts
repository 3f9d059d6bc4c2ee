// What each outbox row does at the provider, and how its success is entered in the ledger.
import { and, eq, sql } from 'drizzle-orm';
import { z } from 'zod';
import { refundSent, transferSent, type Entry } from '../../shared/money/ledger';
import { sellers } from '../accounts/tables';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { PaymentRefused } from '../gateways/payments';
import type { EffectHandlers, EffectOutcome, OutboxRow } from '../jobs/outbox';
import { outbox } from '../jobs/tables';
import { postEntry } from './post';
import { providerObjects } from './tables';

const money = z.object({
  cents: z.number().int().positive(),
  sellerId: z.string(),
  paymentIntentId: z.string().nullable(),
});
const checkout = z.object({ checkoutSessionId: z.string() });
const mail = z.object({ to: z.string(), subject: z.string(), text: z.string(), html: z.string() });

const DONE: EffectOutcome = { outcome: 'done' };
const dead = (why: string): EffectOutcome => ({ outcome: 'dead', why });

/** A refusal that no later try can change is for a person to look at; everything else is tried again. */
async function orDead(work: () => Promise<EffectOutcome>): Promise<EffectOutcome> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof PaymentRefused && error.final) return dead(`${error.code}: ${error.message}`);
    throw error;
  }
}

interface Recorded {
  readonly objectId: string;
  readonly kind: 'refund' | 'transfer';
  readonly orderId: string;
  readonly sellerId: string;
  readonly cents: number;
  readonly entry: Entry;
}

/** The provider's answer, the ledger entry and the end of the effect are one transaction. */
async function record(deps: Deps, row: OutboxRow, done: Recorded): Promise<void> {
  const now = deps.clock.now();
  await transaction(deps.db, async (tx) => {
    await tx
      .insert(providerObjects)
      .values({
        id: done.objectId,
        kind: done.kind,
        orderId: done.orderId,
        cents: done.cents,
        state: 'sent',
        outboxKey: row.key,
        createdAt: now,
      })
      .onConflictDoNothing();
    await postEntry(tx, {
      orderId: done.orderId,
      sellerId: done.sellerId,
      key: `${done.kind}:${done.objectId}`,
      entry: done.entry,
      now,
    });
    await tx
      .update(outbox)
      .set({
        state: 'done',
        doneAt: now,
        claimedUntil: null,
        lastError: null,
        result: { objectId: done.objectId },
      })
      .where(eq(outbox.seq, row.seq));
  });
}

async function refund(deps: Deps, row: OutboxRow): Promise<EffectOutcome> {
  const { cents, sellerId, paymentIntentId } = money.parse(row.payload);
  const orderId = row.orderId;
  if (!orderId || !paymentIntentId) return dead('there is no payment to refund');
  return orDead(async () => {
    const state = await deps.payments.refund({ orderId, paymentIntentId, cents }, row.key);
    await record(deps, row, {
      objectId: state.refundId,
      kind: 'refund',
      orderId,
      sellerId,
      cents,
      entry: refundSent(cents),
    });
    return DONE;
  });
}

async function transfer(deps: Deps, row: OutboxRow): Promise<EffectOutcome> {
  const { cents, sellerId } = money.parse(row.payload);
  const orderId = row.orderId;
  if (!orderId) return dead('there is no order to pay for');
  const [seller] = await deps.db.select().from(sellers).where(eq(sellers.id, sellerId));
  if (!seller) return dead('there is no such seller');
  const accountId = seller.payoutAccountId;
  if (!accountId || !seller.payoutsEnabled) {
    return { outcome: 'blocked', why: 'the seller has not signed up for payouts yet' };
  }
  return orDead(async () => {
    const sent = await deps.payments.transfer({ orderId, accountId, cents }, row.key);
    await record(deps, row, {
      objectId: sent.transferId,
      kind: 'transfer',
      orderId,
      sellerId,
      cents,
      entry: transferSent(cents),
    });
    return DONE;
  });
}

export const effectHandlers: EffectHandlers = {
  refund,
  transfer,
  expire_checkout: (deps, row) =>
    orDead(async () => {
      await deps.payments.expireCheckout(checkout.parse(row.payload).checkoutSessionId, row.key);
      return DONE;
    }),
  mail: async (deps, row) => {
    await deps.mail.send({ ...mail.parse(row.payload), key: row.key.replaceAll(/[^A-Za-z0-9.]+/g, '.') });
    return DONE;
  },
};

/** The seller can be paid now: everything that waited for it goes out. */
export async function unblockTransfers(deps: Deps, sellerId: string): Promise<void> {
  await deps.db
    .update(outbox)
    .set({ state: 'waiting', notBefore: new Date(), lastError: null })
    .where(
      and(
        eq(outbox.state, 'blocked'),
        eq(outbox.kind, 'transfer'),
        sql`${outbox.payload}->>'sellerId' = ${sellerId}`,
      ),
    );
}
