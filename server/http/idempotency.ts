// Idempotency-Key on POST: the first answer is stored and played back; the same key with another request is refused.
import { createHash } from 'node:crypto';
import { and, eq, isNull } from 'drizzle-orm';
import type { Request } from 'express';
import type { Actor } from '../../shared/accounts/actor';
import type { Endpoint } from '../../shared/kernel/endpoint';
import type { Deps } from '../deps';
import { isRefusal, refuse } from './refusal';
import type { Call } from './route';
import { idempotencyKeys } from './tables';

function fingerprintOf(req: Request, endpoint: Endpoint, call: Call<unknown, unknown, unknown>): string {
  const hash = createHash('sha256');
  hash.update(`${endpoint.method} ${req.path}\n${JSON.stringify(call.body ?? null)}`);
  if (call.file) hash.update(call.file.bytes);
  return hash.digest('hex');
}

export async function withIdempotency(
  deps: Deps,
  req: Request,
  endpoint: Endpoint,
  actor: Actor | null,
  call: Call<unknown, unknown, unknown>,
  work: () => Promise<unknown>,
): Promise<unknown> {
  const key = req.get('idempotency-key');
  if (key === undefined || !actor) return work();
  if (!/^[\x21-\x7e]{1,255}$/.test(key)) {
    return refuse('bad_request', 'Idempotency-Key takes 1 to 255 visible ASCII characters.');
  }
  const owner = actor.userId;
  const fingerprint = fingerprintOf(req, endpoint, call);
  const mine = and(eq(idempotencyKeys.owner, owner), eq(idempotencyKeys.key, key));
  const claimed = await deps.db
    .insert(idempotencyKeys)
    .values({ owner, key, fingerprint })
    .onConflictDoNothing()
    .returning({ key: idempotencyKeys.key });
  if (claimed.length === 0) {
    const [stored] = await deps.db.select().from(idempotencyKeys).where(mine);
    if (stored?.fingerprint !== fingerprint) {
      return refuse('key_reused', 'This Idempotency-Key came with another request before. Use a new one.');
    }
    if (stored.answer === null)
      return refuse('wrong_state', 'The first request with this key still runs. Try again.');
    return stored.answer;
  }
  const release = async (): Promise<void> => {
    await deps.db.delete(idempotencyKeys).where(and(mine, isNull(idempotencyKeys.answer)));
  };
  try {
    const answer = await work();
    // A refusal changed nothing, so the same key may be tried again once the cause is mended.
    if (isRefusal(answer)) await release();
    else await deps.db.update(idempotencyKeys).set({ answer }).where(mine);
    return answer;
  } catch (error) {
    await release();
    throw error;
  }
}
