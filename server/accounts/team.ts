// The members of a seller account, what each may do, and invitations. There is always an owner.
import { and, asc, eq, gt, isNull, sql, type SQL } from 'drizzle-orm';
import type { Actor, Duty } from '../../shared/accounts/actor';
import { newId } from '../../shared/kernel/ids';
import { transaction } from '../db/transaction';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';
import { invalid, notFound, refuse, type Refusal } from '../http/refusal';
import { queueMail } from '../notices/for-others';
import { recordAudit } from './for-others';
import type { SellerRow } from './present';
import { sellerInvites, sellerMembers, sellers, users } from './tables';
import { hashToken, newToken } from './tokens';

const INVITE_DAYS = 7;

export async function teamOf(tx: Tx, sellerId: string, now: Date) {
  const members = await tx
    .select({
      userId: users.id,
      name: users.name,
      email: users.email,
      duties: sellerMembers.duties,
      since: sellerMembers.createdAt,
    })
    .from(sellerMembers)
    .innerJoin(users, eq(users.id, sellerMembers.userId))
    .where(eq(sellerMembers.sellerId, sellerId))
    .orderBy(asc(sellerMembers.createdAt));
  const invites = await tx
    .select()
    .from(sellerInvites)
    .where(
      and(
        eq(sellerInvites.sellerId, sellerId),
        isNull(sellerInvites.acceptedAt),
        gt(sellerInvites.expiresAt, now),
      ),
    )
    .orderBy(asc(sellerInvites.createdAt));
  return {
    members: members.map((one) => ({ ...one, since: one.since.toISOString() })),
    invites: invites.map((one) => ({
      id: one.id,
      email: one.email,
      duties: one.duties,
      expiresAt: one.expiresAt.toISOString(),
    })),
  };
}

export type Team = Awaited<ReturnType<typeof teamOf>>;

const audit = (
  tx: Tx,
  actor: Actor,
  action: string,
  sellerId: string,
  now: Date,
  detail: Record<string, unknown>,
) =>
  recordAudit(tx, {
    at: now,
    actorUserId: actor.userId,
    actorKind: 'owner',
    action,
    objectKind: 'seller',
    objectId: sellerId,
    detail,
  });

export async function invite(
  deps: Deps,
  actor: Actor,
  seller: SellerRow,
  input: { email: string; duties: Duty[] },
): Promise<Team | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx): Promise<Team | Refusal> => {
    const team = await teamOf(tx, seller.id, now);
    const address = input.email.toLowerCase();
    if (team.members.some((one) => one.email.toLowerCase() === address)) {
      return invalid('email', 'This person is a member already');
    }
    const token = newToken();
    const id = newId('inv', now.getTime());
    await tx.insert(sellerInvites).values({
      id,
      sellerId: seller.id,
      email: input.email,
      duties: input.duties,
      tokenHash: hashToken(token),
      invitedBy: actor.userId,
      expiresAt: new Date(now.getTime() + INVITE_DAYS * 86_400_000),
      createdAt: now,
    });
    await queueMail(tx, {
      to: input.email,
      mail: {
        template: 'team_invite',
        data: {
          sellerName: seller.name,
          inviterName: actor.name,
          link: `${deps.env.PUBLIC_URL}/invite/${token}`,
        },
      },
      key: `mail:invite:${id}`,
      now,
    });
    await audit(tx, actor, 'team.invite', seller.id, now, { duties: input.duties });
    return teamOf(tx, seller.id, now);
  });
}

export async function cancelInvite(
  deps: Deps,
  actor: Actor,
  sellerId: string,
  inviteId: string,
): Promise<Team | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx): Promise<Team | Refusal> => {
    const gone = await tx
      .delete(sellerInvites)
      .where(
        and(
          eq(sellerInvites.id, inviteId),
          eq(sellerInvites.sellerId, sellerId),
          isNull(sellerInvites.acceptedAt),
        ),
      )
      .returning({ id: sellerInvites.id });
    if (gone.length === 0) return notFound('invitation');
    await audit(tx, actor, 'team.invite_cancel', sellerId, now, {});
    return teamOf(tx, sellerId, now);
  });
}

export async function accept(
  deps: Deps,
  actor: Actor,
  token: string,
): Promise<{ sellerId: string; sellerName: string } | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx): Promise<{ sellerId: string; sellerName: string } | Refusal> => {
    const [found] = await tx
      .select()
      .from(sellerInvites)
      .where(
        and(
          eq(sellerInvites.tokenHash, hashToken(token)),
          isNull(sellerInvites.acceptedAt),
          gt(sellerInvites.expiresAt, now),
        ),
      )
      .for('update');
    if (!found) return invalid('token', 'This invitation was used or is too old. Ask for a new one');
    if (found.email.toLowerCase() !== actor.email.toLowerCase()) {
      return refuse('forbidden', 'This invitation went to another mail address. Sign in with that one.');
    }
    const [seller] = await tx.select().from(sellers).where(eq(sellers.id, found.sellerId));
    if (!seller || seller.closedAt) return notFound('seller');
    await tx.update(sellerInvites).set({ acceptedAt: now }).where(eq(sellerInvites.id, found.id));
    await tx
      .insert(sellerMembers)
      .values({ sellerId: seller.id, userId: actor.userId, duties: found.duties, createdAt: now })
      // An older invitation only ever adds: it must not take the last owner's duty away.
      .onConflictDoUpdate({
        target: [sellerMembers.sellerId, sellerMembers.userId],
        set: {
          duties: sql`(select array_agg(distinct duty) from unnest(seller_members.duties || excluded.duties) duty)`,
        },
      });
    // The link went to this address, so whoever opened it holds the mailbox.
    await tx
      .update(users)
      .set({ mailCheckedAt: now })
      .where(and(eq(users.id, actor.userId), isNull(users.mailCheckedAt)));
    await audit(tx, actor, 'team.join', seller.id, now, { duties: found.duties });
    return { sellerId: seller.id, sellerName: seller.name };
  });
}

/** Locks the account's members, so that two owners can't remove each other at once. */
async function otherOwners(tx: Tx, sellerId: string, userId: string): Promise<number> {
  const rows = await tx
    .select({ userId: sellerMembers.userId, duties: sellerMembers.duties })
    .from(sellerMembers)
    .where(eq(sellerMembers.sellerId, sellerId))
    .for('update');
  return rows.filter((one) => one.userId !== userId && one.duties.includes('owner')).length;
}

/** Sets a member's duties, or removes the member with an empty list. */
export async function changeMember(
  deps: Deps,
  actor: Actor,
  sellerId: string,
  userId: string,
  duties: Duty[],
): Promise<Team | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx): Promise<Team | Refusal> => {
    if (!duties.includes('owner') && (await otherOwners(tx, sellerId, userId)) === 0) {
      return invalid('duties', 'An account needs an owner. Make somebody else an owner first');
    }
    const mine = and(eq(sellerMembers.sellerId, sellerId), eq(sellerMembers.userId, userId));
    const changed =
      duties.length > 0
        ? await tx
            .update(sellerMembers)
            .set({ duties })
            .where(mine)
            .returning({ userId: sellerMembers.userId })
        : await tx.delete(sellerMembers).where(mine).returning({ userId: sellerMembers.userId });
    if (changed.length === 0) return notFound('member');
    await audit(tx, actor, duties.length > 0 ? 'team.duties' : 'team.remove', sellerId, now, {
      userId,
      duties,
    });
    return teamOf(tx, sellerId, now);
  });
}

export const memberCount = (sellerId: SQL) =>
  sql<number>`(select count(*)::int from seller_members m where m.seller_id = ${sellerId})`;
