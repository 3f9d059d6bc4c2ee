// What the HTTP layer needs of accounts: who is asking, their session, and whether they ask too often.
import type { Request } from 'express';
import type { Actor } from '../../shared/accounts/actor';
import type { Endpoint } from '../../shared/kernel/endpoint';
import type { Deps } from '../deps';
import { localLimiter, sharedLimiter, type Limiter } from '../http/limits';
import type { MountSeams } from '../http/mount';
import type { Refusal } from '../http/refusal';
import { sessionSeam, userIdOf } from '../http/session';
import { loadActor } from './load-actor';

const READS_PER_MINUTE = 3_000;
const WRITES_PER_MINUTE = 600;

type Limit = (req: Request, endpoint: Endpoint, actor: Actor | null) => Promise<Refusal | null>;

/** Reads are counted in the process; writes in the database, by address and by account. */
function limitOf(deps: Deps): Limit {
  const factor = deps.env.RATE_LIMIT_FACTOR;
  const reads = localLimiter({ name: 'read', points: READS_PER_MINUTE * factor, seconds: 60 });
  const writes = sharedLimiter(deps.pool, { name: 'write', points: WRITES_PER_MINUTE * factor, seconds: 60 });
  const own = new Map<string, Limiter>();
  const ownOf = (endpoint: Endpoint, perMinute: number): Limiter => {
    const name = `${endpoint.method} ${endpoint.path}`;
    const found =
      own.get(name) ?? sharedLimiter(deps.pool, { name, points: perMinute * factor, seconds: 60 });
    own.set(name, found);
    return found;
  };
  return async (req, endpoint, actor) => {
    const address = req.ip ?? 'unknown';
    if (endpoint.perMinute !== undefined) {
      const limiter = ownOf(endpoint, endpoint.perMinute);
      return (await limiter.take(address)) ?? (actor ? limiter.take(actor.userId) : null);
    }
    return endpoint.method === 'GET' ? reads.take(address) : writes.take(address);
  };
}

export const createSeams = (deps: Deps): MountSeams => ({
  actorOf: async (req) => {
    const userId = userIdOf(req);
    return userId ? loadActor(deps, userId) : null;
  },
  sessionOf: (req, res) => sessionSeam(deps, req, res),
  limit: limitOf(deps),
});
