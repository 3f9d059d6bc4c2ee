// Units on offer. The partial indexes hold live rows only and follow the forms of search.ts, one index to a form.
import { sql, type SQL } from 'drizzle-orm';
import {
  bigint,
  boolean,
  check,
  customType,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uniqueIndex,
} from 'drizzle-orm/pg-core';
import type { Answers } from '../../shared/listings/condition';
import type { FreightFigures } from '../../shared/listings/freight';
import type { ScheduleItem } from '../../shared/listings/terms';
import { sellers } from '../accounts/tables';
import { families, variants } from '../catalogue/tables';
import { photos } from '../photos/tables';

// Milliseconds, as JavaScript has them: a cursor made from a row must compare equal to that row.
const instant = (name: string) => timestamp(name, { withTimezone: true, precision: 3 });

/** Byte order whatever the database's locale, so that a prefix is a range of the index. */
const byteText = customType<{ data: string }>({ dataType: () => 'text collate "C"' });
const tsvector = customType<{ data: string }>({ dataType: () => 'tsvector' });

/** The least a builder plans around: which vehicle the unit sits in or came out of. */
export const donorVehicles = pgTable(
  'donor_vehicles',
  {
    id: text('id').primaryKey(),
    sellerId: text('seller_id')
      .notNull()
      .references(() => sellers.id),
    vin: text('vin'),
    description: text('description').notNull(),
    year: integer('year'),
    createdAt: instant('created_at').notNull(),
  },
  (t) => [
    check('donor_vehicles_year', sql`${t.year} between 1900 and 2100`),
    index('donor_vehicles_seller').on(t.sellerId, t.id),
  ],
);

export const listings = pgTable(
  'listings',
  {
    id: text('id').primaryKey(),
    sellerId: text('seller_id')
      .notNull()
      .references(() => sellers.id),
    donorVehicleId: text('donor_vehicle_id').references(() => donorVehicles.id),
    variantId: text('variant_id').references(() => variants.id),
    familyId: text('family_id').references(() => families.id),
    kind: text('kind'),
    title: text('title').notNull().default(''),
    /** Words a person may search for that stand in no other column: kind, maker, town, seller. */
    words: text('words').notNull().default(''),
    /** As typed. */
    caseCode: text('case_code').notNull().default(''),
    /** Upper case, letters and digits only. */
    codeKey: byteText('code_key').notNull().default(''),
    tagCode: text('tag_code').notNull(),
    grade: text('grade'),
    /** Where the unit physically is: still in the donor, or pulled. */
    state: text('state').notNull(),
    status: text('status').notNull().default('draft'),
    mileage: integer('mileage'),
    /** The seller attests that it was rebuilt as 16 CFR 20 means the word. */
    rebuilt: boolean('rebuilt').notNull().default(false),
    condition: jsonb('condition').$type<Answers>().notNull().default({}),
    priceCents: bigint('price_cents', { mode: 'number' }),
    exchange: boolean('exchange').notNull().default(false),
    depositCents: bigint('deposit_cents', { mode: 'number' }),
    outright: boolean('outright').notNull().default(false),
    outrightCents: bigint('outright_cents', { mode: 'number' }),
    /** What is paid today before freight and tax: price and deposit, or the outright price. Sorting and caps use it. */
    totalCents: bigint('total_cents', { mode: 'number' }),
    windowDays: integer('window_days'),
    schedule: jsonb('schedule').$type<ScheduleItem[]>().notNull().default([]),
    returnFreight: text('return_freight'),
    freight: jsonb('freight').$type<FreightFigures>(),
    shipDays: integer('ship_days').notNull().default(3),
    notes: text('notes').notNull().default(''),
    zip: text('zip').notNull(),
    lat: doublePrecision('lat'),
    lon: doublePrecision('lon'),
    photoCount: integer('photo_count').notNull().default(0),
    coverPhotoId: text('cover_photo_id').references(() => photos.id),
    // 'simple' keeps codes, designations and short words as they are; English stems would break prefixes of them.
    search: tsvector('search').generatedAlwaysAs(
      (): SQL => sql`setweight(to_tsvector('simple', title), 'A') ||
        setweight(to_tsvector('simple', case_code || ' ' || code_key || ' ' || words), 'B') ||
        setweight(to_tsvector('simple', notes), 'C')`,
    ),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
    /** The first time. */
    publishedAt: instant('published_at'),
    /** The last time it went on offer. */
    listedAt: instant('listed_at'),
    soldAt: instant('sold_at'),
    version: integer('version').notNull().default(0),
  },
  (t) => {
    const live = sql`status = 'live'`;
    return [
      check('listings_kind', sql`${t.kind} in ('automatic', 'manual', 'transfer_case', 'axle')`),
      check('listings_grade', sql`${t.grade} in ('A', 'B', 'C', 'D')`),
      check('listings_state', sql`${t.state} in ('in_vehicle', 'pulled')`),
      check('listings_status', sql`${t.status} in ('draft', 'live', 'reserved', 'sold', 'withdrawn')`),
      check('listings_return_freight', sql`${t.returnFreight} in ('seller', 'builder')`),
      check(
        'listings_amounts',
        sql`${t.priceCents} >= 0 and ${t.depositCents} >= 0 and ${t.outrightCents} >= 0 and ${t.totalCents} >= 0`,
      ),
      check(
        'listings_counts',
        sql`${t.mileage} >= 0 and ${t.photoCount} >= 0 and ${t.shipDays} between 0 and 60 and ${t.version} >= 0`,
      ),
      check('listings_window', sql`${t.windowDays} between 7 and 180`),
      check(
        'listings_exchange_whole',
        sql`not ${t.exchange} or ${t.status} = 'draft' or
          (${t.depositCents} is not null and ${t.windowDays} is not null and ${t.returnFreight} is not null)`,
      ),
      check(
        'listings_offered_whole',
        sql`${t.status} not in ('live', 'reserved', 'sold') or (
          ${t.variantId} is not null and ${t.familyId} is not null and ${t.kind} is not null and ${t.grade} is not null
          and ${t.title} <> '' and ${t.codeKey} <> '' and ${t.priceCents} is not null and ${t.totalCents} is not null
          and (${t.exchange} or ${t.outright}) and (not ${t.outright} or ${t.outrightCents} is not null)
          and ${t.freight} is not null and ${t.listedAt} is not null and ${t.publishedAt} is not null
          and ${t.coverPhotoId} is not null and ${t.photoCount} > 0)`,
      ),
      uniqueIndex('listings_tag_code').on(t.tagCode),
      index('listings_live_total').on(t.totalCents, t.id).where(live),
      // Ascending, for newest first too: read backwards it gives "desc, nulls first", which is what ORDER BY desc means.
      index('listings_live_listed').on(t.listedAt, t.id).where(live),
      index('listings_live_family_total').on(t.familyId, t.totalCents, t.id).where(live),
      index('listings_live_family_listed').on(t.familyId, t.listedAt, t.id).where(live),
      index('listings_live_kind_total').on(t.kind, t.totalCents, t.id).where(live),
      index('listings_live_kind_listed').on(t.kind, t.listedAt, t.id).where(live),
      index('listings_live_variant_total').on(t.variantId, t.totalCents, t.id).where(live),
      index('listings_live_code').on(t.codeKey, t.totalCents, t.id).where(live),
      index('listings_live_seller_total').on(t.sellerId, t.totalCents, t.id).where(live),
      index('listings_live_seller_listed').on(t.sellerId, t.listedAt, t.id).where(live),
      index('listings_live_family_seller').on(t.familyId, t.sellerId, t.totalCents, t.id).where(live),
      index('listings_live_words').using('gin', t.familyId, t.search).with({ fastupdate: false }).where(live),
      index('listings_live_near')
        .using('gin', sql`(title || ' ' || words) gin_trgm_ops`)
        .where(live),
      index('listings_seller_status').on(t.sellerId, t.status, t.createdAt, t.id),
    ];
  },
);

export const listingPhotos = pgTable(
  'listing_photos',
  {
    listingId: text('listing_id')
      .notNull()
      .references(() => listings.id),
    photoId: text('photo_id')
      .notNull()
      .references(() => photos.id),
    shot: text('shot').notNull(),
    position: integer('position').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.listingId, t.photoId] }),
    check('listing_photos_position', sql`${t.position} >= 0`),
    index('listing_photos_photo').on(t.photoId),
  ],
);
