// Rate limits in PostgreSQL, so that they hold across processes and restarts.
import { RateLimiterMemory, RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import type { Pool } from 'pg';
import { refuse, type Refusal } from './refusal';

export interface Limiter {
  /** Takes a point. @returns a refusal once there are none left */
  take(key: string): Promise<Refusal | null>;
  /** Returns one point: the try turned out well. */
  giveBack(key: string): Promise<void>;
  /** All points are there again. */
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

function limiterOf(limiter: RateLimiterPostgres | RateLimiterMemory): Limiter {
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
    giveBack: async (key) => {
      await limiter.reward(key, 1);
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
  );

/** Of this process alone: for reads, where a look-up would cost more than the read. */
export const localLimiter = (rule: LimitRule): Limiter =>
  limiterOf(new RateLimiterMemory({ keyPrefix: rule.name, points: rule.points, duration: rule.seconds }));
