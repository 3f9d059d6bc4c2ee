// All SQL of the photos feature.
import { and, asc, count, eq, gt, inArray, isNotNull, isNull, lt, notExists, sql } from 'drizzle-orm';
import type { Tx } from '../db/client';
import { photoLinks, photoPuts, photos } from './tables';

export type PhotoRow = typeof photos.$inferSelect;
export type NewPhoto = typeof photos.$inferInsert;
export type LinkKind = 'listing' | 'order' | 'case' | 'message';

export async function findPhoto(tx: Tx, id: string): Promise<PhotoRow | null> {
  const [row] = await tx
    .select()
    .from(photos)
    .where(and(eq(photos.id, id), isNull(photos.removedAt)));
  return row ?? null;
}

export async function linksOf(tx: Tx, photoId: string): Promise<{ kind: string; id: string }[]> {
  return tx
    .select({ kind: photoLinks.objectKind, id: photoLinks.objectId })
    .from(photoLinks)
    .where(eq(photoLinks.photoId, photoId));
}

/** The photos of one object, in the order they were put in. */
export async function photosOf(tx: Tx, kind: LinkKind, objectId: string): Promise<PhotoRow[]> {
  const rows = await tx
    .select({ photo: photos })
    .from(photoLinks)
    .innerJoin(photos, eq(photos.id, photoLinks.photoId))
    .where(and(eq(photoLinks.objectKind, kind), eq(photoLinks.objectId, objectId), isNull(photos.removedAt)))
    .orderBy(asc(photos.position), asc(photos.id));
  return rows.map((row) => row.photo);
}

export async function photosByIds(tx: Tx, ids: readonly string[]): Promise<PhotoRow[]> {
  if (ids.length === 0) return [];
  return tx
    .select()
    .from(photos)
    .where(and(inArray(photos.id, [...ids]), isNull(photos.removedAt)));
}

export async function linkPhoto(tx: Tx, photoId: string, kind: LinkKind, objectId: string): Promise<void> {
  await tx.insert(photoLinks).values({ photoId, objectKind: kind, objectId }).onConflictDoNothing();
}

/** Takes the photo off one object; when nothing else shows it, it counts as removed. */
export async function unlinkPhoto(
  tx: Tx,
  photoId: string,
  kind: LinkKind,
  objectId: string,
  now: Date,
): Promise<void> {
  await tx
    .delete(photoLinks)
    .where(
      and(
        eq(photoLinks.photoId, photoId),
        eq(photoLinks.objectKind, kind),
        eq(photoLinks.objectId, objectId),
      ),
    );
  await tx
    .update(photos)
    .set({ removedAt: now })
    .where(and(eq(photos.id, photoId), notExists(linked(tx))));
}

const linked = (tx: Tx) =>
  tx
    .select({ one: sql`1` })
    .from(photoLinks)
    .where(eq(photoLinks.photoId, photos.id));

export async function countUploads(
  tx: Tx,
  ownerUserId: string,
  since: Date,
): Promise<{ recent: number; kept: number }> {
  const mine = eq(photos.ownerUserId, ownerUserId);
  const [recent] = await tx
    .select({ n: count() })
    .from(photos)
    .where(and(mine, gt(photos.createdAt, since)));
  const [kept] = await tx
    .select({ n: count() })
    .from(photos)
    .where(and(mine, isNull(photos.removedAt)));
  return { recent: recent?.n ?? 0, kept: kept?.n ?? 0 };
}

export async function findByHash(tx: Tx, sha256: string): Promise<PhotoRow | null> {
  const [row] = await tx
    .select()
    .from(photos)
    .where(and(eq(photos.sha256, sha256), isNull(photos.removedAt)))
    .limit(1);
  return row ?? null;
}

/** Holds off the sweep (or another upload) of the same bytes until the transaction ends. */
export async function lockHash(tx: Tx, sha256: string): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${sha256}, 7731))`);
}

export async function insertPut(tx: Tx, id: string, sha256: string, startedAt: Date): Promise<void> {
  await tx.insert(photoPuts).values({ id, sha256, startedAt });
}

export async function deletePut(tx: Tx, id: string): Promise<void> {
  await tx.delete(photoPuts).where(eq(photoPuts.id, id));
}

export async function stalePuts(tx: Tx, before: Date): Promise<{ id: string; sha256: string }[]> {
  return tx
    .select({ id: photoPuts.id, sha256: photoPuts.sha256 })
    .from(photoPuts)
    .where(lt(photoPuts.startedAt, before))
    .limit(500);
}

export async function insertPhoto(tx: Tx, row: NewPhoto): Promise<PhotoRow> {
  const [stored] = await tx.insert(photos).values(row).returning();
  if (!stored) throw new Error('the photo was not stored');
  return stored;
}

/** Marks photos that belong to nothing as removed. */
export async function removeUnlinked(tx: Tx, before: Date, now: Date): Promise<number> {
  const gone = await tx
    .update(photos)
    .set({ removedAt: now })
    .where(and(isNull(photos.removedAt), lt(photos.createdAt, before), notExists(linked(tx))))
    .returning({ id: photos.id });
  return gone.length;
}

export async function removedBefore(tx: Tx, before: Date): Promise<{ id: string; sha256: string }[]> {
  return tx
    .select({ id: photos.id, sha256: photos.sha256 })
    .from(photos)
    .where(and(isNotNull(photos.removedAt), lt(photos.removedAt, before)))
    .limit(500);
}

export async function deletePhotoRow(tx: Tx, id: string): Promise<void> {
  await tx.delete(photos).where(and(eq(photos.id, id), isNotNull(photos.removedAt)));
}

/** Does any row, kept or removed, or any upload under way still speak of these bytes? */
export async function hashInUse(tx: Tx, sha256: string, exceptPutId?: string): Promise<boolean> {
  const [row] = await tx.select({ id: photos.id }).from(photos).where(eq(photos.sha256, sha256)).limit(1);
  if (row) return true;
  const puts = await tx
    .select({ id: photoPuts.id })
    .from(photoPuts)
    .where(eq(photoPuts.sha256, sha256))
    .limit(2);
  return puts.some((put) => put.id !== exceptPutId);
}
