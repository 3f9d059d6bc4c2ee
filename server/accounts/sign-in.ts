// Signing in, with a brake per account and per address that holds across processes.
import { createHash } from 'node:crypto';
import type { Deps } from '../deps';
import { sharedLimiter, type Limiter } from '../http/limits';
import { refuse, type Refusal } from '../http/refusal';
import { recordAudit } from './for-others';
import { checkPassword } from './password';

const ACCOUNT_FAILURES = 10;
const ADDRESS_FAILURES = 100;
const WINDOW_SECONDS = 15 * 60;

const limiters = new WeakMap<Deps, { account: Limiter; address: Limiter }>();

function limitersOf(deps: Deps): { account: Limiter; address: Limiter } {
  const known = limiters.get(deps);
  if (known) return known;
  const factor = deps.env.RATE_LIMIT_FACTOR;
  const made = {
    account: sharedLimiter(deps.pool, {
      name: 'sign_in_account',
      points: ACCOUNT_FAILURES,
      seconds: WINDOW_SECONDS,
    }),
    address: sharedLimiter(deps.pool, {
      name: 'sign_in_address',
      points: ADDRESS_FAILURES * factor,
      seconds: WINDOW_SECONDS,
    }),
  };
  limiters.set(deps, made);
  return made;
}

/** The address itself does not stand in the limits table. */
const accountKey = (email: string): string =>
  createHash('sha256').update(email.trim().toLowerCase()).digest('hex');

/** @returns the user's id; the same refusal for an unknown address and a wrong password */
export async function signInWithPassword(
  deps: Deps,
  input: { email: string; password: string; address: string },
): Promise<string | Refusal> {
  const { account, address } = limitersOf(deps);
  const key = accountKey(input.email);
  const braked = (await account.check(key)) ?? (await address.check(input.address));
  if (braked) return braked;
  const userId = await checkPassword(deps, input.email, input.password);
  if (userId === null) {
    await account.take(key);
    await address.take(input.address);
    return refuse('signed_out', 'Mail address or password is wrong.');
  }
  await account.forget(key);
  await recordAudit(deps.db, {
    at: deps.clock.now(),
    actorUserId: userId,
    actorKind: 'user',
    action: 'account.sign_in',
    objectKind: 'user',
    objectId: userId,
    detail: {},
  });
  return userId;
}
