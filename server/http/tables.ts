// Tables of the HTTP layer: stored answers for Idempotency-Key, sessions, rate limits.
import { sql } from 'drizzle-orm';
import {
  bigint,
  index,
  integer,
  json,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  varchar,
} from 'drizzle-orm/pg-core';

export const idempotencyKeys = pgTable(
  'idempotency_keys',
  {
    owner: text('owner').notNull(),
    key: text('key').notNull(),
    fingerprint: text('fingerprint').notNull(),
    /** Null while the first request still runs. */
    answer: jsonb('answer'),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [primaryKey({ columns: [t.owner, t.key] }), index('idempotency_keys_age').on(t.createdAt)],
);

/** The shape connect-pg-simple expects. */
export const sessions = pgTable(
  'session',
  {
    sid: varchar('sid').primaryKey(),
    sess: json('sess').notNull(),
    expire: timestamp('expire', { precision: 6 }).notNull(),
  },
  (t) => [index('session_expire').on(t.expire), index('session_user').on(sql`(${t.sess} ->> 'userId')`)],
);

/** The shape rate-limiter-flexible expects. */
export const rateLimits = pgTable('rate_limits', {
  key: varchar('key', { length: 255 }).primaryKey(),
  points: integer('points').notNull().default(0),
  expire: bigint('expire', { mode: 'number' }),
});
