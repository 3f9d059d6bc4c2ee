// What people change about their own account: their name and their password.
import { eq } from 'drizzle-orm';
import type { Actor } from '../../shared/accounts/actor';
import { transaction } from '../db/transaction';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';
import { invalid, isRefusal, type Refusal } from '../http/refusal';
import { recordAudit } from './for-others';
import { hashPassword } from './password';
import { provePassword } from './sign-in';
import { storePassword } from './store-password';
import { users } from './tables';

const NOT_YOURS = 'This is not your password';

/** Asked again before what cannot be undone: an open browser is not proof of who sits there. */
export async function proveSelf(
  deps: Deps,
  actor: Actor,
  given: { password: string; address: string; field: string },
): Promise<null | Refusal> {
  const userId = await provePassword(deps, { ...given, email: actor.email });
  if (isRefusal(userId)) return userId;
  return userId === actor.userId ? null : invalid(given.field, NOT_YOURS);
}

export async function changeOwnPassword(
  deps: Deps,
  actor: Actor,
  input: { current: string; password: string; address: string; sid: string | null },
): Promise<void | Refusal> {
  const refused = await proveSelf(deps, actor, {
    password: input.current,
    address: input.address,
    field: 'current',
  });
  if (refused) return refused;
  const passwordHash = await hashPassword(input.password);
  return transaction(deps.db, (tx) => storePassword(deps, tx, actor.userId, passwordHash, input.sid));
}

export async function rename(deps: Deps, actor: Actor, name: string): Promise<void | Refusal> {
  return transaction(deps.db, async (tx) => {
    await tx.update(users).set({ name }).where(eq(users.id, actor.userId));
    await auditSelf(tx, actor, 'account.rename', deps.clock.now());
  });
}

export const auditSelf = (tx: Tx, actor: Actor, action: string, now: Date): Promise<void> =>
  recordAudit(tx, {
    at: now,
    actorUserId: actor.userId,
    actorKind: 'user',
    action,
    objectKind: 'user',
    objectId: actor.userId,
    detail: {},
  });
