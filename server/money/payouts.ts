// Paying sellers: signing up at the provider, what was paid, what is due, and the deposits that may have to go back.
import { and, desc, eq, inArray, sql } from 'drizzle-orm';
import { isMember, hasDuty, type Actor } from '../../shared/accounts/actor';
import { packCursor, timeCursor, unpackCursor } from '../../shared/kernel/cursor';
import type { readPayouts } from '../../shared/money/contract';
import type { z } from 'zod';
import { recordAudit } from '../accounts/for-others';
import { sellers } from '../accounts/tables';
import type { Deps } from '../deps';
import { invalid, isRefusal, notFound, refuse, type Refusal } from '../http/refusal';
import { outbox } from '../jobs/tables';
import { transaction } from '../db/transaction';
import { orders } from '../orders/tables';
import { unblockTransfers } from './effects';
import { ledgerBalances, ledgerEntries, ledgerPostings } from './tables';

type Payouts = z.input<typeof readPayouts.answer & {}>;

const WHY = ['accepted', 'deposit_to_seller', 'core_settled', 'case_settled'] as const;
type Why = (typeof WHY)[number];
const isWhy = (text: string): text is Why => WHY.some((one) => one === text);

type EffectState = 'waiting' | 'done' | 'dead' | 'blocked' | null;

function stateOf(effect: EffectState): Payouts['items'][number]['state'] {
  if (effect === 'done') return 'sent';
  if (effect === 'blocked') return 'waiting_for_sign_up';
  return effect === 'dead' ? 'stuck' : 'on_the_way';
}

/** Which meaning of the outbox key belongs to a ledger event. */
const meaningOf = sql`case ${ledgerEntries.event}
  when 'accepted' then 'accept' when 'core_settled' then 'agree'
  when 'deposit_to_seller' then 'keep' else 'settle' end`;

async function creditsOf(deps: Deps, sellerId: string, after: [string, string] | null, limit: number) {
  return deps.db
    .select({
      id: ledgerEntries.id,
      at: ledgerEntries.at,
      event: ledgerEntries.event,
      orderId: ledgerEntries.orderId,
      orderNumber: orders.number,
      title: orders.title,
      cents: sql<number>`-${ledgerPostings.cents}`,
      effect: sql<EffectState>`(select ${outbox.state} from ${outbox} where ${outbox.orderId} = ${ledgerEntries.orderId}
        and ${outbox.kind} = 'transfer' and split_part(${outbox.key}, ':', 3) like ${meaningOf} || '%'
        order by ${outbox.seq} desc limit 1)`,
    })
    .from(ledgerPostings)
    .innerJoin(ledgerEntries, eq(ledgerEntries.id, ledgerPostings.entryId))
    .innerJoin(orders, eq(orders.id, ledgerEntries.orderId))
    .where(
      and(
        eq(ledgerPostings.sellerId, sellerId),
        eq(ledgerPostings.account, 'payable'),
        inArray(ledgerEntries.event, [...WHY]),
        after
          ? sql`(${ledgerEntries.at}, ${ledgerEntries.id}) < (${after[0]}::timestamptz, ${after[1]})`
          : undefined,
      ),
    )
    .orderBy(desc(ledgerEntries.at), desc(ledgerEntries.id))
    .limit(limit);
}

async function sumsOf(deps: Deps, sellerId: string) {
  const [sums] = await deps.db
    .select({
      credited: sql<number>`coalesce(sum(-${ledgerPostings.cents}) filter (where ${ledgerPostings.cents} < 0), 0)::bigint`,
      due: sql<number>`coalesce(sum(-${ledgerPostings.cents}), 0)::bigint`,
    })
    .from(ledgerPostings)
    .where(and(eq(ledgerPostings.sellerId, sellerId), eq(ledgerPostings.account, 'payable')));
  const holds = await deps.db
    .select({
      orderId: orders.id,
      orderNumber: orders.number,
      title: orders.title,
      core: orders.core,
      dueAt: orders.dueAt,
      leg: ledgerBalances.leg,
      cents: ledgerBalances.cents,
    })
    .from(ledgerBalances)
    .innerJoin(orders, eq(orders.id, ledgerBalances.orderId))
    .where(
      and(
        eq(orders.sellerId, sellerId),
        eq(ledgerBalances.account, 'hold'),
        sql`${ledgerBalances.cents} > 0`,
      ),
    )
    .orderBy(orders.dueAt);
  return { credited: sums?.credited ?? 0, due: sums?.due ?? 0, holds };
}

export async function payoutsOf(
  deps: Deps,
  actor: Actor,
  query: { sellerId: string; cursor?: string | undefined; limit: number },
): Promise<Payouts | Refusal> {
  if (!isMember(actor, query.sellerId)) return notFound('seller');
  const after = query.cursor ? unpackCursor(query.cursor, timeCursor) : null;
  if (query.cursor && !after) return invalid('cursor', 'Start from the first page');
  const [seller] = await deps.db.select().from(sellers).where(eq(sellers.id, query.sellerId));
  if (!seller) return notFound('seller');
  const [rows, sums] = await Promise.all([
    creditsOf(deps, seller.id, after, query.limit + 1),
    sumsOf(deps, seller.id),
  ]);
  const shown = rows.slice(0, query.limit);
  const last = shown.at(-1);
  return {
    items: shown.flatMap((row) =>
      isWhy(row.event)
        ? [
            {
              id: row.id,
              orderId: row.orderId,
              orderNumber: row.orderNumber,
              title: row.title,
              why: row.event,
              cents: Number(row.cents),
              state: stateOf(row.effect),
              at: row.at.toISOString(),
            },
          ]
        : [],
    ),
    next: rows.length > query.limit && last ? packCursor([last.at.toISOString(), last.id]) : null,
    payoutsEnabled: seller.payoutsEnabled,
    paidOutCents: sums.credited - sums.due,
    dueCents: sums.due,
    heldUnitCents: sums.holds.filter((one) => one.leg === 'unit').reduce((sum, one) => sum + one.cents, 0),
    deposits: sums.holds
      .filter((one) => one.leg === 'core')
      .map((one) => ({
        orderId: one.orderId,
        orderNumber: one.orderNumber,
        title: one.title,
        coreState: one.core ?? 'released',
        cents: one.cents,
        dueAt: one.dueAt?.toISOString() ?? null,
      })),
  };
}

/** The provider's page where the owner signs up; the account is made once per seller. */
export async function startSignUp(
  deps: Deps,
  actor: Actor,
  sellerId: string,
): Promise<{ url: string } | Refusal> {
  if (!isMember(actor, sellerId)) return notFound('seller');
  if (!hasDuty(actor, sellerId, 'owner'))
    return refuse('forbidden', 'Only an owner signs the account up for payouts.');
  const [seller] = await deps.db.select().from(sellers).where(eq(sellers.id, sellerId));
  if (!seller) return notFound('seller');
  let accountId = seller.payoutAccountId;
  if (!accountId) {
    const opened = await deps.payments.openAccount({ sellerId, email: actor.email }, `account:${sellerId}`);
    accountId = opened.accountId;
    const opening = { accountId };
    await transaction(deps.db, async (tx) => {
      await tx.update(sellers).set({ payoutAccountId: opening.accountId }).where(eq(sellers.id, sellerId));
      await recordAudit(tx, {
        at: deps.clock.now(),
        actorUserId: actor.userId,
        actorKind: 'owner',
        action: 'seller.payout_account',
        objectKind: 'seller',
        objectId: sellerId,
        detail: { accountId: opening.accountId },
      });
    });
  }
  return deps.payments.onboardingLink(accountId, `${deps.env.PUBLIC_URL}/yard/payouts`);
}

/** The provider says that an account changed: read it again, and pay what waited for it. */
export async function applyAccountChange(deps: Deps, accountId: string): Promise<void> {
  const state = await deps.payments.accountState(accountId);
  const changed = await transaction(deps.db, async (tx) => {
    const [seller] = await tx
      .update(sellers)
      .set({ payoutsEnabled: state.payoutsEnabled })
      .where(eq(sellers.payoutAccountId, accountId))
      .returning({ id: sellers.id });
    return seller ?? null;
  });
  if (changed === null || isRefusal(changed)) return;
  if (state.payoutsEnabled) await unblockTransfers(deps, changed.id);
}
