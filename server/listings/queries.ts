// The SQL of listings besides search: rows with their photos and seller, drafts, stock lists.
import { and, asc, desc, eq, inArray, isNull, lt, or, sql } from 'drizzle-orm';
import { sellers } from '../accounts/tables';
import type { Tx } from '../db/client';
import { photos } from '../photos/tables';
import type { ListingRow } from './for-others';
import { donorVehicles, listingPhotos, listings } from './tables';

export type NewListing = typeof listings.$inferInsert;
export type SellerRow = typeof sellers.$inferSelect;
export type DonorRow = typeof donorVehicles.$inferSelect;
type PhotoRow = typeof photos.$inferSelect;

export interface ShotPhoto {
  readonly shot: string;
  readonly photo: PhotoRow;
}

export interface Stock {
  readonly row: ListingRow;
  readonly seller: SellerRow;
  readonly shots: readonly ShotPhoto[];
}

export async function findListing(tx: Tx, id: string): Promise<ListingRow | null> {
  const [row] = await tx.select().from(listings).where(eq(listings.id, id));
  return row ?? null;
}

/** Holds the row until the transaction ends, so that two changes of one draft follow each other. */
export async function lockListing(tx: Tx, id: string): Promise<ListingRow | null> {
  const [row] = await tx.select().from(listings).where(eq(listings.id, id)).for('update');
  return row ?? null;
}

export async function findSeller(tx: Tx, id: string): Promise<SellerRow | null> {
  const [row] = await tx.select().from(sellers).where(eq(sellers.id, id));
  return row ?? null;
}

export async function findDonor(tx: Tx, id: string): Promise<DonorRow | null> {
  const [row] = await tx.select().from(donorVehicles).where(eq(donorVehicles.id, id));
  return row ?? null;
}

/** In the order they are shown; the first is the cover. */
export async function shotsOf(tx: Tx, listingId: string): Promise<ShotPhoto[]> {
  return tx
    .select({ shot: listingPhotos.shot, photo: photos })
    .from(listingPhotos)
    .innerJoin(photos, eq(photos.id, listingPhotos.photoId))
    .where(and(eq(listingPhotos.listingId, listingId), isNull(photos.removedAt)))
    .orderBy(asc(listingPhotos.position), asc(listingPhotos.photoId));
}

export async function loadStock(tx: Tx, id: string): Promise<Stock | null> {
  const row = await findListing(tx, id);
  if (!row) return null;
  const seller = await findSeller(tx, row.sellerId);
  if (!seller) return null;
  return { row, seller, shots: await shotsOf(tx, id) };
}

export async function insertListing(tx: Tx, row: NewListing): Promise<ListingRow> {
  const [stored] = await tx.insert(listings).values(row).returning();
  if (!stored) throw new Error('the draft was not stored');
  return stored;
}

export async function updateListing(
  tx: Tx,
  before: ListingRow,
  changes: Partial<NewListing>,
  now: Date,
): Promise<ListingRow> {
  const [stored] = await tx
    .update(listings)
    .set({ ...changes, updatedAt: now, version: before.version + 1 })
    .where(and(eq(listings.id, before.id), eq(listings.version, before.version)))
    .returning();
  // The caller holds the row's lock, so its version can't have moved.
  if (!stored) throw new Error(`listing ${before.id} moved under its lock`);
  return stored;
}

export async function insertListingPhoto(
  tx: Tx,
  row: { listingId: string; photoId: string; shot: string; position: number },
): Promise<void> {
  await tx.insert(listingPhotos).values(row);
}

/** @returns whether the photo was on the listing */
export async function deleteListingPhoto(tx: Tx, listingId: string, photoId: string): Promise<boolean> {
  const gone = await tx
    .delete(listingPhotos)
    .where(and(eq(listingPhotos.listingId, listingId), eq(listingPhotos.photoId, photoId)))
    .returning({ photoId: listingPhotos.photoId });
  return gone.length > 0;
}

export async function placePhotos(tx: Tx, listingId: string, photoIds: readonly string[]): Promise<void> {
  for (const [position, photoId] of photoIds.entries()) {
    await tx
      .update(listingPhotos)
      .set({ position })
      .where(and(eq(listingPhotos.listingId, listingId), eq(listingPhotos.photoId, photoId)));
  }
}

export interface StockPage {
  readonly sellerId: string;
  readonly status: string | undefined;
  readonly q: string | undefined;
  readonly after: { readonly createdAt: Date; readonly id: string } | null;
  readonly limit: number;
}

const escaped = (text: string): string => text.replace(/[\\%_]/g, (character) => `\\${character}`);

/** A seller's own listings, newest first; a handful of thousands at most, so a plain filter on the words will do. */
export async function listStock(tx: Tx, page: StockPage): Promise<ListingRow[]> {
  const like = page.q ? `%${escaped(page.q)}%` : null;
  return tx
    .select()
    .from(listings)
    .where(
      and(
        eq(listings.sellerId, page.sellerId),
        page.status ? eq(listings.status, page.status) : undefined,
        like
          ? or(
              sql`${listings.title} ilike ${like}`,
              sql`${listings.caseCode} ilike ${like}`,
              sql`${listings.tagCode} ilike ${like}`,
            )
          : undefined,
        page.after
          ? or(
              lt(listings.createdAt, page.after.createdAt),
              and(eq(listings.createdAt, page.after.createdAt), lt(listings.id, page.after.id)),
            )
          : undefined,
      ),
    )
    .orderBy(desc(listings.createdAt), desc(listings.id))
    .limit(page.limit);
}

/** Which shots each of these listings has. */
export async function shotCodesOf(tx: Tx, ids: readonly string[]): Promise<Map<string, string[]>> {
  const found = new Map<string, string[]>();
  if (ids.length === 0) return found;
  const rows = await tx
    .select({ listingId: listingPhotos.listingId, shot: listingPhotos.shot })
    .from(listingPhotos)
    .where(inArray(listingPhotos.listingId, [...ids]));
  for (const row of rows) found.set(row.listingId, [...(found.get(row.listingId) ?? []), row.shot]);
  return found;
}
