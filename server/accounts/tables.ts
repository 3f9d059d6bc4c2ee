// People, seller accounts with their members and duties, single-use links, and the append-only audit trail.
import { sql } from 'drizzle-orm';
import {
  bigserial,
  boolean,
  check,
  doublePrecision,
  index,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uniqueIndex,
} from 'drizzle-orm/pg-core';
import type { Duty, SellerKind } from '../../shared/accounts/actor';
import type { SellerTerms } from '../../shared/accounts/seller-contract';

const when = (name: string) => timestamp(name, { withTimezone: true, precision: 3 });

export const users = pgTable(
  'users',
  {
    id: text('id').primaryKey(),
    name: text('name').notNull(),
    email: text('email').notNull(),
    passwordHash: text('password_hash').notNull(),
    mailCheckedAt: when('mail_checked_at'),
    isAdmin: boolean('is_admin').notNull().default(false),
    createdAt: when('created_at').notNull(),
    closedAt: when('closed_at'),
  },
  (t) => [uniqueIndex('users_email').on(sql`lower(${t.email})`)],
);

export const sellers = pgTable(
  'sellers',
  {
    id: text('id').primaryKey(),
    name: text('name').notNull(),
    kind: text('kind').$type<SellerKind>().notNull(),
    zip: text('zip').notNull(),
    city: text('city').notNull(),
    region: text('region').notNull(),
    lat: doublePrecision('lat').notNull(),
    lon: doublePrecision('lon').notNull(),
    timeZone: text('time_zone').notNull(),
    verifiedAt: when('verified_at'),
    payoutAccountId: text('payout_account_id').unique(),
    payoutsEnabled: boolean('payouts_enabled').notNull().default(false),
    terms: jsonb('terms').$type<SellerTerms>().notNull(),
    createdAt: when('created_at').notNull(),
    closedAt: when('closed_at'),
  },
  (t) => [
    check('sellers_kind', sql`${t.kind} in ('yard', 'rebuilder', 'private')`),
    check('sellers_place', sql`${t.lat} between -90 and 90 and ${t.lon} between -180 and 180`),
    index('sellers_place_box').on(t.lat, t.lon),
  ],
);

export const sellerMembers = pgTable(
  'seller_members',
  {
    sellerId: text('seller_id')
      .notNull()
      .references(() => sellers.id),
    userId: text('user_id')
      .notNull()
      .references(() => users.id),
    duties: text('duties').array().$type<Duty[]>().notNull(),
    createdAt: when('created_at').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.sellerId, t.userId] }),
    index('seller_members_user').on(t.userId),
    check(
      'seller_members_duties',
      sql`cardinality(${t.duties}) > 0 and ${t.duties} <@ array['owner', 'lister', 'dock']::text[]`,
    ),
  ],
);

export const sellerInvites = pgTable(
  'seller_invites',
  {
    id: text('id').primaryKey(),
    sellerId: text('seller_id')
      .notNull()
      .references(() => sellers.id),
    email: text('email').notNull(),
    duties: text('duties').array().$type<Duty[]>().notNull(),
    tokenHash: text('token_hash').notNull().unique(),
    invitedBy: text('invited_by')
      .notNull()
      .references(() => users.id),
    expiresAt: when('expires_at').notNull(),
    acceptedAt: when('accepted_at'),
    createdAt: when('created_at').notNull(),
  },
  (t) => [index('seller_invites_seller').on(t.sellerId)],
);

/** Single-use links, hashed at rest. */
export const accountTokens = pgTable(
  'account_tokens',
  {
    tokenHash: text('token_hash').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id),
    purpose: text('purpose').$type<'check_mail' | 'reset'>().notNull(),
    expiresAt: when('expires_at').notNull(),
    usedAt: when('used_at'),
    createdAt: when('created_at').notNull(),
  },
  (t) => [
    index('account_tokens_user').on(t.userId, t.purpose),
    check('account_tokens_purpose', sql`${t.purpose} in ('check_mail', 'reset')`),
  ],
);

/** Who did what to what; a trigger refuses update, delete and truncate. */
export const audit = pgTable(
  'audit',
  {
    id: bigserial('id', { mode: 'number' }).primaryKey(),
    at: when('at').notNull(),
    actorUserId: text('actor_user_id').references(() => users.id),
    actorKind: text('actor_kind').notNull(),
    action: text('action').notNull(),
    objectKind: text('object_kind').notNull(),
    objectId: text('object_id').notNull(),
    detail: jsonb('detail').$type<Record<string, unknown>>().notNull().default({}),
  },
  (t) => [index('audit_object').on(t.objectId, t.id), index('audit_actor').on(t.actorUserId, t.id)],
);
