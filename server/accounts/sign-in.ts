// Checking a password, with a brake per account and per address that holds across processes.
import { createHash } from 'node:crypto';
import type { Deps } from '../deps';
import { sharedLimiter, type Limiter } from '../http/limits';
import { isRefusal, refuse, type Refusal } from '../http/refusal';
import { recordAudit } from './for-others';
import { checkPassword } from './password';

const ACCOUNT_FAILURES = 10;
const ADDRESS_FAILURES = 100;
const WINDOW_SECONDS = 15 * 60;

interface Brakes {
  readonly account: Limiter;
  readonly address: Limiter;
}

const brakesByDeps = new WeakMap<Deps, Brakes>();

function brakesOf(deps: Deps): Brakes {
  const known = brakesByDeps.get(deps);
  if (known) return known;
  const made = {
    account: sharedLimiter(deps.pool, {
      name: 'sign_in_account',
      points: ACCOUNT_FAILURES,
      seconds: WINDOW_SECONDS,
    }),
    address: sharedLimiter(deps.pool, {
      name: 'sign_in_address',
      points: ADDRESS_FAILURES * deps.env.RATE_LIMIT_FACTOR,
      seconds: WINDOW_SECONDS,
    }),
  };
  brakesByDeps.set(deps, made);
  return made;
}

/** The mail address itself does not stand in the limits table. */
export const accountKey = (email: string): string =>
  createHash('sha256').update(email.trim().toLowerCase()).digest('hex');

export interface Credentials {
  readonly email: string;
  readonly password: string;
  /** The network address that asks. */
  readonly address: string;
}

/**
 * A point is taken before the password is looked at and given back when it was right, so that many tries at the same
 * moment get no further than as many one after the other.
 * @returns the user's id, null for a wrong address or password, or the refusal of a brake
 */
export async function provePassword(deps: Deps, given: Credentials): Promise<string | null | Refusal> {
  const { account, address } = brakesOf(deps);
  const key = accountKey(given.email);
  const braked = (await address.take(given.address)) ?? (await account.take(key));
  if (braked) return braked;
  const userId = await checkPassword(deps, given.email, given.password);
  if (userId === null) return null;
  await account.forget(key);
  await address.giveBack(given.address);
  return userId;
}

/** @returns the user's id; the same refusal for an unknown address and a wrong password */
export async function signInWithPassword(deps: Deps, given: Credentials): Promise<string | Refusal> {
  const userId = await provePassword(deps, given);
  if (isRefusal(userId)) return userId;
  if (userId === null) return refuse('signed_out', 'Mail address or password is wrong.');
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
