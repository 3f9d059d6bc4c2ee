// Closing an account: only when nothing of an order, a seller account or money hangs on it any more.
import { and, eq, inArray, isNull, notInArray, or, sql } from 'drizzle-orm';
import type { Actor } from '../../shared/accounts/actor';
import { CORE_FINAL, OUTBOUND_FINAL } from '../../shared/orders/states';
import { transaction } from '../db/transaction';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';
import { refuse, type Refusal } from '../http/refusal';
import { listings } from '../listings/tables';
import { ledgerPostings } from '../money/tables';
import { queueLetter } from '../notices/for-others';
import { orders } from '../orders/tables';
import { auditSelf, proveSelf } from './own-account';
import { endResetLinks, endSessions } from './store-password';
import { sellerInvites, sellerMembers, sellers, users } from './tables';

const openOrder = or(
  notInArray(orders.outbound, [...OUTBOUND_FINAL]),
  notInArray(orders.core, [...CORE_FINAL]),
);

/** Locked: nobody can leave, or be made an owner, while it is decided who is left. */
async function soleOwnedSellers(tx: Tx, userId: string): Promise<{ alone: string[]; shared: string[] }> {
  const mine = await tx
    .select({ sellerId: sellerMembers.sellerId })
    .from(sellerMembers)
    .where(eq(sellerMembers.userId, userId));
  const ids = mine.map((one) => one.sellerId);
  if (ids.length === 0) return { alone: [], shared: [] };
  const members = await tx
    .select()
    .from(sellerMembers)
    .where(inArray(sellerMembers.sellerId, ids))
    .orderBy(sellerMembers.sellerId, sellerMembers.userId)
    .for('update');
  const others = (sellerId: string) =>
    members.filter((one) => one.sellerId === sellerId && one.userId !== userId);
  return {
    alone: ids.filter((id) => others(id).length === 0),
    shared: ids.filter((id) => others(id).length > 0 && !others(id).some((o) => o.duties.includes('owner'))),
  };
}

type Verdict = { readonly why: string } | { readonly closes: readonly string[] };

/** Why an account has to stay open, in words, or the seller accounts that close with it. */
async function verdictOn(tx: Tx, userId: string): Promise<Verdict> {
  const bought = await tx.$count(orders, and(eq(orders.builderId, userId), openOrder));
  if (bought > 0) return { why: 'You have an open order. Finish it first.' };
  const { alone, shared } = await soleOwnedSellers(tx, userId);
  if (shared.length > 0) {
    return { why: 'A seller account would be left without an owner. Make somebody else an owner first.' };
  }
  if (alone.length === 0) return { closes: [] };
  const sold = await tx.$count(orders, and(inArray(orders.sellerId, alone), openOrder));
  const shown = await tx.$count(
    listings,
    and(inArray(listings.sellerId, alone), inArray(listings.status, ['live', 'reserved'])),
  );
  if (sold > 0 || shown > 0) {
    return { why: 'Your seller account still has units on offer or open orders.' };
  }
  const [owed] = await tx
    .select({ cents: sql<number>`coalesce(sum(${ledgerPostings.cents}), 0)::bigint` })
    .from(ledgerPostings)
    .where(and(inArray(ledgerPostings.sellerId, alone), eq(ledgerPostings.account, 'payable')));
  if (Number(owed?.cents ?? 0) !== 0) return { why: 'Money for your seller account is still on its way.' };
  return { closes: alone };
}

async function close(tx: Tx, actor: Actor, sellerIds: readonly string[], now: Date): Promise<void> {
  const { userId } = actor;
  if (sellerIds.length > 0) {
    await tx
      .update(sellers)
      .set({ closedAt: now })
      .where(inArray(sellers.id, [...sellerIds]));
    await tx.delete(sellerInvites).where(inArray(sellerInvites.sellerId, [...sellerIds]));
  }
  await tx.delete(sellerMembers).where(eq(sellerMembers.userId, userId));
  await endSessions(tx, userId, null);
  await endResetLinks(tx, userId, now);
  await tx
    .update(users)
    // The address is free again for a new account; the name stays on the papers of past orders.
    .set({ closedAt: now, email: `${userId}@closed.invalid`, passwordHash: 'closed' })
    .where(and(eq(users.id, userId), isNull(users.closedAt)));
  await queueLetter(tx, {
    to: actor.email,
    letter: {
      subject: 'Your account is closed',
      lines: [
        `${actor.name}, your Spragyard account was closed at your wish. Nobody can sign in to it any more.`,
        'Papers and the log of past orders are kept as long as the law asks for.',
      ],
    },
    key: `mail:closed:${userId}`,
    now,
  });
  await auditSelf(tx, actor, 'account.close', now);
}

export async function closeAccount(
  deps: Deps,
  actor: Actor,
  given: { password: string; address: string },
): Promise<void | Refusal> {
  if (actor.isAdmin) return refuse('wrong_state', 'An admin account is not closed here.');
  const refused = await proveSelf(deps, actor, { ...given, field: 'password' });
  if (refused) return refused;
  return transaction(deps.db, async (tx): Promise<void | Refusal> => {
    const verdict = await verdictOn(tx, actor.userId);
    if ('why' in verdict) return refuse('wrong_state', verdict.why);
    await close(tx, actor, verdict.closes, deps.clock.now());
  });
}
