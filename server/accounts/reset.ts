// Links by mail: proving an address, and setting a new password.
import { setTimeout as wait } from 'node:timers/promises';
import { and, eq, isNull, sql } from 'drizzle-orm';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { sharedLimiter, type Limiter } from '../http/limits';
import { invalid, isRefusal, type Refusal } from '../http/refusal';
import { queueMail } from '../notices/for-others';
import { recordAudit } from './for-others';
import { mailCheckLink } from './open-account';
import { hashPassword } from './password';
import { accountKey } from './sign-in';
import { storePassword } from './store-password';
import { users } from './tables';
import { issueToken, useToken } from './tokens';

const STALE_LINK = 'This link was used or is older than 30 minutes. Ask for a new one';
const MAILS_PER_HOUR = 6;
/** Longer than the work for a known address takes, so that the wait is the same for an unknown one. */
const FORGOT_ANSWER_MS = 250;

const limiters = new WeakMap<Deps, Limiter>();

/** So that nobody fills a stranger's mailbox with our links. */
function mailLimiter(deps: Deps): Limiter {
  const known = limiters.get(deps);
  const made =
    known ?? sharedLimiter(deps.pool, { name: 'account_mail', points: MAILS_PER_HOUR, seconds: 3600 });
  limiters.set(deps, made);
  return made;
}

export async function checkMailLink(deps: Deps, token: string): Promise<{ email: string } | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx): Promise<{ email: string } | Refusal> => {
    const userId = await useToken(tx, token, 'check_mail', now);
    if (!userId) return invalid('token', STALE_LINK);
    const [user] = await tx
      .update(users)
      .set({ mailCheckedAt: now })
      .where(and(eq(users.id, userId), isNull(users.closedAt)))
      .returning({ email: users.email });
    if (!user) return invalid('token', STALE_LINK);
    await recordAudit(tx, {
      at: now,
      actorUserId: userId,
      actorKind: 'user',
      action: 'account.mail_checked',
      objectKind: 'user',
      objectId: userId,
      detail: {},
    });
    return { email: user.email };
  });
}

export async function resendCheckLink(deps: Deps, userId: string): Promise<void | Refusal> {
  return transaction(deps.db, async (tx): Promise<void | Refusal> => {
    const [user] = await tx.select().from(users).where(eq(users.id, userId));
    if (!user || user.mailCheckedAt !== null) return;
    const braked = await mailLimiter(deps).take(`check:${accountKey(user.email)}`);
    if (braked) return braked;
    await mailCheckLink(deps, tx, user, deps.clock.now());
  });
}

async function queueResetMail(deps: Deps, email: string): Promise<void> {
  const now = deps.clock.now();
  // Counted for unknown addresses too. Refused or not, the answer says the same.
  if (isRefusal(await mailLimiter(deps).take(`reset:${accountKey(email)}`))) return;
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

/** Neither the answer nor its time says whether there is such an account: the mail itself goes out later. */
export async function mailResetLink(deps: Deps, email: string): Promise<void> {
  await Promise.all([queueResetMail(deps, email), wait(FORGOT_ANSWER_MS)]);
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
