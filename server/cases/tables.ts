// Cases: what two sides cannot agree on, their proposals, and the finding that settles it.
import { sql } from 'drizzle-orm';
import { bigint, check, index, pgTable, text, timestamp, uniqueIndex } from 'drizzle-orm/pg-core';
import { users } from '../accounts/tables';
import { orders } from '../orders/tables';

const when = (name: string) => timestamp(name, { withTimezone: true });
const cents = (name: string) => bigint(name, { mode: 'number' });

export const cases = pgTable(
  'cases',
  {
    id: text('id').primaryKey(),
    orderId: text('order_id')
      .notNull()
      .references(() => orders.id),
    kind: text('kind').$type<'refusal' | 'contest' | 'chargeback'>().notNull(),
    state: text('state').$type<'open' | 'settled'>().notNull().default('open'),
    reason: text('reason').notNull(),
    openedBy: text('opened_by').references(() => users.id),
    openedAt: when('opened_at').notNull(),
    toBuyerCents: cents('to_buyer_cents'),
    toSellerCents: cents('to_seller_cents'),
    finding: text('finding'),
    settledBy: text('settled_by').$type<'both' | 'admin' | 'provider'>(),
    settledByUserId: text('settled_by_user_id').references(() => users.id),
    settledAt: when('settled_at'),
    disputeId: text('dispute_id').unique(),
  },
  (t) => [
    uniqueIndex('cases_one_open')
      .on(t.orderId, t.kind)
      .where(sql`state = 'open'`),
    index('cases_open')
      .on(t.openedAt)
      .where(sql`state = 'open'`),
    check('cases_kind', sql`kind in ('refusal','contest','chargeback')`),
    check('cases_amounts', sql`coalesce(to_buyer_cents,0) >= 0 and coalesce(to_seller_cents,0) >= 0`),
    check('cases_settled', sql`(state = 'settled') = (settled_at is not null)`),
  ],
);

export const proposals = pgTable(
  'case_proposals',
  {
    id: text('id').primaryKey(),
    caseId: text('case_id')
      .notNull()
      .references(() => cases.id),
    by: text('by').$type<'builder' | 'seller'>().notNull(),
    byUserId: text('by_user_id')
      .notNull()
      .references(() => users.id),
    toBuyerCents: cents('to_buyer_cents').notNull(),
    toSellerCents: cents('to_seller_cents').notNull(),
    note: text('note'),
    state: text('state')
      .$type<'open' | 'accepted' | 'withdrawn' | 'declined' | 'replaced'>()
      .notNull()
      .default('open'),
    createdAt: when('created_at').notNull(),
    endedAt: when('ended_at'),
  },
  (t) => [
    uniqueIndex('case_proposals_one_open')
      .on(t.caseId, t.by)
      .where(sql`state = 'open'`),
    check('case_proposals_amounts', sql`to_buyer_cents >= 0 and to_seller_cents >= 0`),
  ],
);
