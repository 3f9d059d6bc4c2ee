// Rate limits in PostgreSQL, so that they hold across processes and restarts.
import { RateLimiterMemory, RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import type { Pool } from 'pg';
import { refuse, type Refusal } from './refusal';

export interface Limiter {
  /** Takes a point. @returns a refusal once there are none left */
  take(key: string): Promise<Refusal | null>;
  /** Is there a point left? Takes none. */
  check(key: string): Promise<Refusal | null>;
  forget(key: string): Promise<void>;
}

export interface LimitRule {
  readonly name: string;
  readonly points: number;
  readonly seconds: number;
}

const tooMany = (waitMs: number): Refusal =>
  refuse('too_many', `Wait ${Math.max(1, Math.ceil(waitMs / 60_000))} min and try again.`, {
    retryAfterSeconds: Math.max(1, waitMs / 1000),
  });

function limiterOf(limiter: RateLimiterPostgres | RateLimiterMemory, rule: LimitRule): Limiter {
  return {
    take: async (key) => {
      try {
        await limiter.consume(key);
        return null;
      } catch (error) {
        if (error instanceof RateLimiterRes) return tooMany(error.msBeforeNext);
        throw error;
      }
    },
    check: async (key) => {
      const state = await limiter.get(key);
      return state !== null && state.consumedPoints >= rule.points ? tooMany(state.msBeforeNext) : null;
    },
    forget: async (key) => {
      await limiter.delete(key);
    },
  };
}

/** Shared by all processes on one database. */
export const sharedLimiter = (pool: Pool, rule: LimitRule): Limiter =>
  limiterOf(
    new RateLimiterPostgres({
      storeClient: pool,
      storeType: 'pool',
      tableName: 'rate_limits',
      tableCreated: true,
      clearExpiredByTimeout: false,
      keyPrefix: rule.name,
      points: rule.points,
      duration: rule.seconds,
    }),
    rule,
  );

/** Of this process alone: for reads, where a look-up would cost more than the read. */
export const localLimiter = (rule: LimitRule): Limiter =>
  limiterOf(
    new RateLimiterMemory({ keyPrefix: rule.name, points: rule.points, duration: rule.seconds }),
    rule,
  );
