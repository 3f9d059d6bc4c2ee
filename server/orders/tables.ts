// Orders, their deadlines and their log. The database itself refuses a second live order on a listing and a bad amount.
import { sql } from 'drizzle-orm';
import {
  bigint,
  bigserial,
  boolean,
  check,
  index,
  integer,
  jsonb,
  pgSequence,
  pgTable,
  text,
  timestamp,
  uniqueIndex,
} from 'drizzle-orm/pg-core';
import type { ClockName } from '../../shared/orders/clocks';
import type { CoreState, OutboundState, Who } from '../../shared/orders/states';
import type { Deduction, ScheduleItem } from '../../shared/orders/settlement';
import { sellers, users } from '../accounts/tables';
import { listings } from '../listings/tables';

const when = (name: string) => timestamp(name, { withTimezone: true });
const cents = (name: string) => bigint(name, { mode: 'number' });

export const orderNumbers = pgSequence('order_numbers', { startWith: 4001 });

export interface DeliveryRow {
  readonly method: 'freight' | 'pickup';
  readonly name: string;
  readonly line1: string;
  readonly city: string;
  readonly region: string;
  readonly zip: string;
}

export const orders = pgTable(
  'orders',
  {
    id: text('id').primaryKey(),
    number: text('number')
      .notNull()
      .unique()
      .default(sql`nextval('order_numbers')::text`),
    listingId: text('listing_id')
      .notNull()
      .references(() => listings.id),
    builderId: text('builder_id')
      .notNull()
      .references(() => users.id),
    sellerId: text('seller_id')
      .notNull()
      .references(() => sellers.id),
    version: integer('version').notNull().default(0),
    outbound: text('outbound').$type<OutboundState>().notNull(),
    core: text('core').$type<CoreState>(),
    terms: text('terms').$type<'exchange' | 'outright'>().notNull(),
    title: text('title').notNull(),
    caseCode: text('case_code').notNull(),
    familyId: text('family_id').notNull(),
    delivery: jsonb('delivery').$type<DeliveryRow>().notNull(),
    deliveryMethod: text('delivery_method').$type<'freight' | 'pickup'>().notNull(),
    priceCents: cents('price_cents').notNull(),
    depositCents: cents('deposit_cents').notNull(),
    freightCents: cents('freight_cents').notNull(),
    taxCents: cents('tax_cents').notNull(),
    feeCents: cents('fee_cents').notNull(),
    schedule: jsonb('schedule').$type<ScheduleItem[]>().notNull(),
    windowDays: integer('window_days').notNull(),
    returnFreight: text('return_freight').$type<'seller' | 'builder'>().notNull(),
    shipDays: integer('ship_days').notNull(),
    graceDays: integer('grace_days').notNull(),
    zone: text('zone').notNull(),
    tagCode: text('tag_code').notNull(),
    pickupCode: text('pickup_code').notNull(),
    checkoutSessionId: text('checkout_session_id').unique(),
    checkoutUrl: text('checkout_url'),
    /** Real time, whatever the demo's clock says; kept so that a repeated call is the same call. */
    checkoutExpiresAt: when('checkout_expires_at').notNull(),
    paymentIntentId: text('payment_intent_id').unique(),
    carrier: text('carrier'),
    tracking: text('tracking'),
    dueAt: when('due_at'),
    otherCoreAllowed: boolean('other_core_allowed').notNull().default(false),
    coreTagCode: text('core_tag_code').notNull().unique(),
    coreCaseCode: text('core_case_code'),
    coreMethod: text('core_method').$type<'carrier' | 'drop_off'>(),
    coreCarrier: text('core_carrier'),
    coreTracking: text('core_tracking'),
    coreSentAt: when('core_sent_at'),
    coreReceivedAt: when('core_received_at'),
    coreGradedAt: when('core_graded_at'),
    grade: text('grade').$type<'A' | 'B' | 'C' | 'D'>(),
    deductions: jsonb('deductions').$type<Deduction[]>(),
    frozen: boolean('frozen').notNull().default(false),
    createdAt: when('created_at').notNull(),
    updatedAt: when('updated_at').notNull(),
    paidAt: when('paid_at'),
    shippedAt: when('shipped_at'),
    deliveredAt: when('delivered_at'),
    closedAt: when('closed_at'),
  },
  (t) => [
    uniqueIndex('orders_one_live_per_listing')
      .on(t.listingId)
      .where(
        sql`outbound in ('awaiting_payment','paid','packed','in_transit','collected','delivered','refused')`,
      ),
    index('orders_builder').on(t.builderId, t.createdAt, t.id),
    index('orders_seller').on(t.sellerId, t.createdAt, t.id),
    index('orders_newest').on(t.createdAt, t.id),
    index('orders_tag').on(t.tagCode),
    check(
      'orders_amounts',
      sql`price_cents >= 0 and deposit_cents >= 0 and freight_cents >= 0 and tax_cents >= 0`,
    ),
    check('orders_fee', sql`fee_cents >= 0 and fee_cents <= price_cents`),
    check(
      'orders_outbound_state',
      sql`outbound in ('awaiting_payment','paid','packed','in_transit','collected','delivered','accepted','refused','settled','cancelled')`,
    ),
    check(
      'orders_core_state',
      sql`core is null or core in ('held','due','booked','coming_back','at_dock','graded','contested','kept','lapsed','settled','released')`,
    ),
    check('orders_core_with_exchange', sql`(core is not null) = (terms = 'exchange')`),
    check('orders_due_once_delivered', sql`core not in ('due','booked') or due_at is not null`),
    check('orders_graded', sql`core <> 'graded' or (grade is not null and deductions is not null)`),
    check('orders_window', sql`window_days between 0 and 400 and ship_days between 0 and 60`),
  ],
);

/** Every clock of an order: at most one open clock of a kind per order. */
export const deadlines = pgTable(
  'deadlines',
  {
    id: text('id').primaryKey(),
    orderId: text('order_id')
      .notNull()
      .references(() => orders.id),
    clock: text('clock').$type<ClockName>().notNull(),
    dueAt: when('due_at').notNull(),
    state: text('state').$type<'open' | 'fired' | 'stopped'>().notNull().default('open'),
    createdAt: when('created_at').notNull(),
    endedAt: when('ended_at'),
  },
  (t) => [
    uniqueIndex('deadlines_one_open')
      .on(t.orderId, t.clock)
      .where(sql`state = 'open'`),
    index('deadlines_due')
      .on(t.dueAt)
      .where(sql`state = 'open'`),
    check('deadlines_state', sql`state in ('open','fired','stopped')`),
  ],
);

/** Append-only log of an order: one row per state change. */
export const timeline = pgTable(
  'order_timeline',
  {
    seq: bigserial('seq', { mode: 'number' }).primaryKey(),
    orderId: text('order_id')
      .notNull()
      .references(() => orders.id),
    at: when('at').notNull(),
    action: text('action').notNull(),
    by: text('by').$type<Who>().notNull(),
    actorUserId: text('actor_user_id').references(() => users.id),
    note: text('note'),
    log: text('log').notNull(),
    /** The version the order had after this step: exactly one row per version. */
    version: integer('version').notNull(),
  },
  (t) => [uniqueIndex('order_timeline_version').on(t.orderId, t.version)],
);
