// Photos as stored: one row per picture, its links to what it shows, and uploads whose bytes are on their way to storage.
import { sql } from 'drizzle-orm';
import { boolean, check, index, integer, pgTable, primaryKey, text, timestamp } from 'drizzle-orm/pg-core';
import { sellers, users } from '../accounts/tables';

const instant = (name: string) => timestamp(name, { withTimezone: true, precision: 3 });

export const photos = pgTable(
  'photos',
  {
    id: text('id').primaryKey(),
    ownerUserId: text('owner_user_id')
      .notNull()
      .references(() => users.id),
    sellerId: text('seller_id').references(() => sellers.id),
    purpose: text('purpose').notNull(),
    /** The shot of the list it was taken for; null where there is no list. */
    shot: text('shot'),
    position: integer('position').notNull().default(0),
    /** Of the bytes that came in; the objects in storage are named by it. */
    sha256: text('sha256').notNull(),
    /** Of the large picture as stored, to prove later that it is still the same. */
    storedSha256: text('stored_sha256').notNull(),
    /** Of the large picture, upright. */
    widthPx: integer('width_px').notNull(),
    heightPx: integer('height_px').notNull(),
    takenAt: instant('taken_at'),
    /** All stored sizes together. */
    bytes: integer('bytes').notNull(),
    /** A stand-in drawn by code, never shown as a real unit. */
    drawn: boolean('drawn').notNull().default(false),
    createdAt: instant('created_at').notNull(),
    removedAt: instant('removed_at'),
  },
  (t) => [
    check(
      'photos_purpose',
      sql`${t.purpose} in ('listing', 'pack', 'refuse', 'core', 'grade', 'contest', 'case')`,
    ),
    check('photos_sizes', sql`${t.widthPx} > 0 and ${t.heightPx} > 0 and ${t.bytes} > 0`),
    check('photos_hash', sql`${t.sha256} ~ '^[0-9a-f]{64}$' and ${t.storedSha256} ~ '^[0-9a-f]{64}$'`),
    index('photos_owner_age').on(t.ownerUserId, t.createdAt),
    index('photos_hash_live').on(t.sha256),
    index('photos_removed')
      .on(t.removedAt)
      .where(sql`${t.removedAt} is not null`),
  ],
);

/** What a photo belongs to: whoever may see that object may see the photo. */
export const photoLinks = pgTable(
  'photo_links',
  {
    photoId: text('photo_id')
      .notNull()
      .references(() => photos.id),
    objectKind: text('object_kind').notNull(),
    objectId: text('object_id').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.photoId, t.objectKind, t.objectId] }),
    check('photo_links_kind', sql`${t.objectKind} in ('listing', 'order', 'case', 'message')`),
    index('photo_links_object').on(t.objectKind, t.objectId),
  ],
);

/** Written before bytes go to storage and deleted with the photo's row, so that a crash between the two leaves a trace. */
export const photoPuts = pgTable(
  'photo_puts',
  {
    id: text('id').primaryKey(),
    sha256: text('sha256').notNull(),
    startedAt: instant('started_at').notNull(),
  },
  (t) => [index('photo_puts_age').on(t.startedAt)],
);
