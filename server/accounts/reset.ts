// Mail check, and setting a new password with a link or with the old one.
import { and, eq, isNull, sql } from 'drizzle-orm';
import { transaction } from '../db/transaction';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';
import { invalid, type Refusal } from '../http/refusal';
import { queueMail } from '../notices/for-others';
import { recordAudit } from './for-others';
import { mailCheckLink } from './open-account';
import { checkPassword, hashPassword } from './password';
import { users } from './tables';
import { issueToken, useToken } from './tokens';

const STALE_LINK = 'This link was used or is older than 30 minutes. Ask for a new one';

export async function checkMailLink(deps: Deps, token: string): Promise<{ email: string } | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx): Promise<{ email: string } | Refusal> => {
    const userId = await useToken(tx, token, 'check_mail', now);
    if (!userId) return invalid('token', STALE_LINK);
    const [user] = await tx
      .update(users)
      .set({ mailCheckedAt: now })
      .where(eq(users.id, userId))
      .returning({ email: users.email });
    return user ? { email: user.email } : invalid('token', STALE_LINK);
  });
}

export async function resendCheckLink(deps: Deps, userId: string): Promise<void> {
  await transaction(deps.db, async (tx) => {
    const [user] = await tx.select().from(users).where(eq(users.id, userId));
    if (user && user.mailCheckedAt === null) await mailCheckLink(deps, tx, user, deps.clock.now());
  });
}

/** Nothing in the answer or its time says whether there is such an account: the mail goes out later, from the outbox. */
export async function mailResetLink(deps: Deps, email: string): Promise<void> {
  const now = deps.clock.now();
  await transaction(deps.db, async (tx) => {
    const [user] = await tx
      .select()
      .from(users)
      .where(and(sql`lower(${users.email}) = lower(${email})`, isNull(users.closedAt)));
    if (!user) return;
    const token = await issueToken(tx, user.id, 'reset', now);
    await queueMail(tx, {
      to: user.email,
      mail: {
        template: 'reset_password',
        data: { name: user.name, link: `${deps.env.PUBLIC_URL}/reset/${token}` },
      },
      key: `mail:reset:${user.id}:${now.getTime()}`,
      now,
    });
  });
}

/** Every session of the person ends, or every other one where one is to stay. */
async function endSessions(tx: Tx, userId: string, except: string | null): Promise<void> {
  await tx.execute(
    sql`delete from session where sess->>'userId' = ${userId} and sid is distinct from ${except}`,
  );
}

async function storePassword(
  deps: Deps,
  tx: Tx,
  userId: string,
  passwordHash: string,
  keepSid: string | null,
) {
  const now = deps.clock.now();
  const [user] = await tx.update(users).set({ passwordHash }).where(eq(users.id, userId)).returning();
  if (!user) return;
  await endSessions(tx, userId, keepSid);
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

export async function resetWithLink(deps: Deps, token: string, password: string): Promise<void | Refusal> {
  const passwordHash = await hashPassword(password);
  return transaction(deps.db, async (tx): Promise<void | Refusal> => {
    const userId = await useToken(tx, token, 'reset', deps.clock.now());
    if (!userId) return invalid('token', STALE_LINK);
    // Whoever holds the mailbox has proved the address too.
    await tx
      .update(users)
      .set({ mailCheckedAt: deps.clock.now() })
      .where(and(eq(users.id, userId), isNull(users.mailCheckedAt)));
    await storePassword(deps, tx, userId, passwordHash, null);
  });
}

export async function changeOwnPassword(
  deps: Deps,
  input: { userId: string; email: string; current: string; password: string; sid: string | null },
): Promise<void | Refusal> {
  const matches = await checkPassword(deps, input.email, input.current);
  if (matches !== input.userId) return invalid('current', 'This is not your password');
  const passwordHash = await hashPassword(input.password);
  await transaction(deps.db, (tx) => storePassword(deps, tx, input.userId, passwordHash, input.sid));
}
