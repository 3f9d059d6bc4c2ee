// What other features may do with listings: hold, free, sell and withdraw one inside their own transaction, and copy its terms.
import { and, eq, inArray, sql } from 'drizzle-orm';
import type { Tx } from '../db/client';
import { linkPhoto, type PhotoParty } from '../photos/for-others';
import { isMember } from '../../shared/accounts/actor';
import type { ListingStatus } from '../../shared/listings/page';
import { shotsOf, type ShotPhoto } from './queries';
import { listings } from './tables';

export type ListingRow = typeof listings.$inferSelect;

/** One conditional update: of many at once exactly one gets the row back, the others null. */
async function move(
  tx: Tx,
  id: string,
  from: readonly ListingStatus[],
  to: ListingStatus,
  now: Date,
): Promise<ListingRow | null> {
  const [row] = await tx
    .update(listings)
    .set({
      status: to,
      version: sql`${listings.version} + 1`,
      updatedAt: now,
      ...(to === 'sold' ? { soldAt: now } : {}),
    })
    .where(and(eq(listings.id, id), inArray(listings.status, [...from])))
    .returning();
  return row ?? null;
}

/** live -> reserved; null where it isn't on offer (any more). */
export const reserveListing = (tx: Tx, id: string, now = new Date()): Promise<ListingRow | null> =>
  move(tx, id, ['live'], 'reserved', now);

/** For a payment that lands after its reservation ran out: takes the listing again if nobody else has. */
export const retakeListing = reserveListing;

/** reserved -> live, with its place in the newest-first order as before. */
export const releaseListing = (tx: Tx, id: string, now = new Date()): Promise<ListingRow | null> =>
  move(tx, id, ['reserved'], 'live', now);

/** reserved -> sold. */
export const sellListing = (tx: Tx, id: string, now = new Date()): Promise<ListingRow | null> =>
  move(tx, id, ['reserved'], 'sold', now);

/** reserved (or live) -> withdrawn, when the seller can't supply it after all. */
export const withdrawListing = (tx: Tx, id: string, now = new Date()): Promise<ListingRow | null> =>
  move(tx, id, ['reserved', 'live'], 'withdrawn', now);

/** The row whatever its status: an order copies the terms it is made under from here. */
export async function listingForOrder(tx: Tx, id: string): Promise<ListingRow | null> {
  const [row] = await tx.select().from(listings).where(eq(listings.id, id));
  return row ?? null;
}

/** The photos of a unit by shot, in the order they are shown: "as listed" beside what arrives. */
export const listingShots = (tx: Tx, id: string): Promise<ShotPhoto[]> => shotsOf(tx, id);

/** Ties the photos of a unit to an order, so that they stay with it whatever becomes of the listing. */
export async function keepShotsForOrder(tx: Tx, id: string, orderId: string): Promise<void> {
  for (const taken of await shotsOf(tx, id)) await linkPhoto(tx, taken.photo.id, 'order', orderId);
}

const OPEN_TO_ALL: readonly string[] = ['live', 'reserved', 'sold'];

/** Pictures of a unit that is or was on offer are open to all; those of a draft or a withdrawn unit to its seller. */
export const listingPhotoParty: PhotoParty = {
  kind: 'listing',
  sight: async (deps, objectId, actor) => {
    const [row] = await deps.db
      .select({ status: listings.status, sellerId: listings.sellerId })
      .from(listings)
      .where(eq(listings.id, objectId));
    if (!row) return 'no';
    if (OPEN_TO_ALL.includes(row.status)) return 'public';
    return actor && isMember(actor, row.sellerId) ? 'party' : 'no';
  },
};
