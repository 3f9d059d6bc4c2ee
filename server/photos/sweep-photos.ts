// Tidies storage: uploads that broke off, photos that belong to nothing, and the bytes of photos removed a week ago.
import { PHOTO_SIZES } from '../../shared/photos/contract';
import type { Tx } from '../db/client';
import {
  deletePhotoRow,
  deletePut,
  hashInUse,
  lockHash,
  removedBefore,
  removeUnlinked,
  stalePuts,
} from './queries';
import { objectKey, type PhotoDeps } from './store-photo';

const HOUR_MS = 3_600_000;

async function removeObjects(deps: PhotoDeps, sha256: string): Promise<void> {
  for (const size of PHOTO_SIZES) await deps.storage.remove(objectKey(sha256, size));
}

async function forget(
  deps: PhotoDeps,
  sha256: string,
  exceptPutId: string | undefined,
  drop: (tx: Tx) => Promise<void>,
): Promise<void> {
  await deps.db.transaction(async (tx) => {
    await lockHash(tx, sha256);
    await drop(tx);
    // Objects go while the lock is held: an upload of the same bytes waits, then finds them gone and puts them again.
    if (!(await hashInUse(tx, sha256, exceptPutId))) await removeObjects(deps, sha256);
  });
}

/** @returns how many photos were found to belong to nothing, and how many were deleted for good */
export async function sweepPhotos(deps: PhotoDeps): Promise<{ unlinked: number; deleted: number }> {
  const now = deps.clock.now();
  const before = (hours: number): Date => new Date(now.getTime() - hours * HOUR_MS);
  for (const put of await stalePuts(deps.db, before(1))) {
    await forget(deps, put.sha256, put.id, (tx) => deletePut(tx, put.id));
  }
  const unlinked = await removeUnlinked(deps.db, before(24), now);
  const gone = await removedBefore(deps.db, before(7 * 24));
  for (const photo of gone) {
    await forget(deps, photo.sha256, undefined, (tx) => deletePhotoRow(tx, photo.id));
  }
  return { unlinked, deleted: gone.length };
}
