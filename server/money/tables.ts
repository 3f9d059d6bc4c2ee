// The double-entry ledger, the provider's raw events, and what each of the provider's objects is to us.
import { sql } from 'drizzle-orm';
import {
  bigint,
  bigserial,
  check,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uniqueIndex,
} from 'drizzle-orm/pg-core';

const when = (name: string) => timestamp(name, { withTimezone: true });
const cents = (name: string) => bigint(name, { mode: 'number' });

/** One money event; append-only. `key` is made from its meaning, so the same event can never be entered twice. */
export const ledgerEntries = pgTable(
  'ledger_entries',
  {
    id: text('id').primaryKey(),
    key: text('key').notNull().unique(),
    event: text('event').notNull(),
    orderId: text('order_id').notNull(),
    at: when('at').notNull(),
  },
  (t) => [index('ledger_entries_order').on(t.orderId, t.at, t.id), index('ledger_entries_at').on(t.at, t.id)],
);

/** Debit positive, credit negative. A deferred trigger refuses an entry whose postings do not add up to 0. */
export const ledgerPostings = pgTable(
  'ledger_postings',
  {
    id: bigserial('id', { mode: 'number' }).primaryKey(),
    entryId: text('entry_id')
      .notNull()
      .references(() => ledgerEntries.id),
    account: text('account').notNull(),
    orderId: text('order_id').notNull(),
    leg: text('leg').$type<'unit' | 'core'>(),
    sellerId: text('seller_id'),
    cents: cents('cents').notNull(),
  },
  (t) => [
    index('ledger_postings_entry').on(t.entryId),
    index('ledger_postings_order').on(t.orderId, t.account),
    index('ledger_postings_account').on(t.account),
    index('ledger_postings_seller').on(t.sellerId, t.account),
    check('ledger_postings_not_zero', sql`cents <> 0`),
    check(
      'ledger_postings_account',
      sql`account in ('provider','hold','tax','fee','payable','refund','dispute','loss')`,
    ),
    check('ledger_postings_leg', sql`(account = 'hold') = (leg is not null)`),
    check('ledger_postings_seller_known', sql`account <> 'payable' or seller_id is not null`),
  ],
);

/** Running balance of what is owed or held per order; a trigger keeps it, and no balance may go below 0. */
export const ledgerBalances = pgTable(
  'ledger_balances',
  {
    orderId: text('order_id').notNull(),
    account: text('account').notNull(),
    /** '' where the account has no leg. */
    leg: text('leg').notNull(),
    /** As a credit balance for hold, tax, fee, payable, refund. */
    cents: cents('cents').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.orderId, t.account, t.leg] }),
    check(
      'ledger_balances_not_negative',
      sql`account not in ('hold','tax','payable','refund') or cents >= 0`,
    ),
  ],
);

/** The provider's events as they came, once each; a worker applies them. */
export const providerEvents = pgTable(
  'provider_events',
  {
    id: text('id').primaryKey(),
    type: text('type').notNull(),
    objectId: text('object_id').notNull(),
    raw: jsonb('raw').notNull(),
    receivedAt: when('received_at').notNull(),
    appliedAt: when('applied_at'),
    attempts: integer('attempts').notNull().default(0),
    lastError: text('last_error'),
  },
  (t) => [
    index('provider_events_waiting')
      .on(t.receivedAt)
      .where(sql`applied_at is null`),
  ],
);

/** What each provider object is to us: which refund or transfer paid which effect. */
export const providerObjects = pgTable(
  'provider_objects',
  {
    id: text('id').primaryKey(),
    kind: text('kind').$type<'refund' | 'transfer' | 'payment' | 'dispute'>().notNull(),
    orderId: text('order_id').notNull(),
    cents: cents('cents').notNull(),
    state: text('state').notNull(),
    outboxKey: text('outbox_key'),
    /** A payment moves the balance under its charge's id. */
    providerChargeId: text('provider_charge_id'),
    createdAt: when('created_at').notNull(),
  },
  (t) => [index('provider_objects_order').on(t.orderId), uniqueIndex('provider_objects_key').on(t.outboxKey)],
);
