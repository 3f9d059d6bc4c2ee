// The outbox: everything that must happen outside the database.
import { sql } from 'drizzle-orm';
import { bigserial, check, index, integer, jsonb, pgTable, text, timestamp } from 'drizzle-orm/pg-core';

const when = (name: string) => timestamp(name, { withTimezone: true });

/** Everything that must happen outside, each with an idempotency key made from its meaning. */
export const outbox = pgTable(
  'outbox',
  {
    seq: bigserial('seq', { mode: 'number' }).primaryKey(),
    key: text('key').notNull().unique(),
    kind: text('kind').$type<'refund' | 'transfer' | 'expire_checkout' | 'mail'>().notNull(),
    orderId: text('order_id'),
    payload: jsonb('payload').$type<Record<string, unknown>>().notNull(),
    state: text('state').$type<'waiting' | 'done' | 'dead' | 'blocked'>().notNull().default('waiting'),
    attempts: integer('attempts').notNull().default(0),
    notBefore: when('not_before').notNull(),
    claimedUntil: when('claimed_until'),
    lastError: text('last_error'),
    result: jsonb('result').$type<Record<string, unknown>>(),
    createdAt: when('created_at').notNull(),
    doneAt: when('done_at'),
  },
  (t) => [
    index('outbox_waiting')
      .on(t.notBefore, t.seq)
      .where(sql`state = 'waiting'`),
    index('outbox_order').on(t.orderId),
    index('outbox_not_done')
      .on(t.state)
      .where(sql`state in ('dead','blocked')`),
    check('outbox_state', sql`state in ('waiting','done','dead','blocked')`),
    check('outbox_kind', sql`kind in ('refund','transfer','expire_checkout','mail')`),
  ],
);
