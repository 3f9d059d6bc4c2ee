// A new password takes effect: sessions and links that came before it end, and the person is told by mail.
import { and, eq, isNull, sql } from 'drizzle-orm';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';
import { queueMail } from '../notices/for-others';
import { recordAudit } from './for-others';
import { accountTokens, users } from './tables';

/** Every session of the person ends, or every other one where one is to stay. */
export async function endSessions(tx: Tx, userId: string, exceptSid: string | null): Promise<void> {
  await tx.execute(
    sql`delete from session where sess->>'userId' = ${userId} and sid is distinct from ${exceptSid}`,
  );
}

export async function endResetLinks(tx: Tx, userId: string, now: Date): Promise<void> {
  await tx
    .update(accountTokens)
    .set({ usedAt: now })
    .where(
      and(eq(accountTokens.userId, userId), eq(accountTokens.purpose, 'reset'), isNull(accountTokens.usedAt)),
    );
}

export async function storePassword(
  deps: Deps,
  tx: Tx,
  userId: string,
  passwordHash: string,
  keepSid: string | null,
): Promise<void> {
  const now = deps.clock.now();
  const [user] = await tx.update(users).set({ passwordHash }).where(eq(users.id, userId)).returning();
  if (!user) throw new Error(`no user ${userId} to store a password for`);
  await endSessions(tx, userId, keepSid);
  await endResetLinks(tx, userId, now);
  await queueMail(tx, {
    to: user.email,
    mail: { template: 'password_changed', data: { name: user.name } },
    key: `mail:password:${userId}:${now.getTime()}`,
    now,
  });
  await recordAudit(tx, {
    at: now,
    actorUserId: userId,
    actorKind: 'user',
    action: 'account.password',
    objectKind: 'user',
    objectId: userId,
    detail: {},
  });
}
