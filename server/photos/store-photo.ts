// Keeps one photo: quota, check and render, bytes to storage first, and only then the row that makes it visible.
import { createHash } from 'node:crypto';
import { newId } from '../../shared/kernel/ids';
import { PHOTO_SIZES, type PhotoSize } from '../../shared/photos/contract';
import type { Deps } from '../deps';
import { isRefusal, refuse, type Refusal } from '../http/refusal';
import { processPhoto, type ProcessedPhoto } from './pipeline';
import {
  countUploads,
  deletePut,
  findByHash,
  insertPhoto,
  insertPut,
  lockHash,
  type PhotoRow,
} from './queries';

export const PHOTO_PURPOSES = ['listing', 'pack', 'refuse', 'core', 'grade', 'contest', 'case'] as const;
export type PhotoPurpose = (typeof PHOTO_PURPOSES)[number];

/** A busy yard shoots about a hundred units a day, nine pictures each. */
export const UPLOADS_PER_DAY = 1_000;
export const PHOTOS_KEPT = 20_000;
const DAY_MS = 86_400_000;

export interface IncomingPhoto {
  readonly bytes: Buffer;
  readonly ownerUserId: string;
  readonly sellerId: string | null;
  readonly purpose: PhotoPurpose;
  readonly shot: string | null;
  readonly position?: number;
  /** For a capture time without an offset; UTC unless given. */
  readonly timeZone?: string | undefined;
  /** A stand-in made by our own code: labelled so, and outside the quota. */
  readonly drawn?: boolean;
}

export type PhotoDeps = Pick<Deps, 'db' | 'storage' | 'clock'>;

/** Where a size of these bytes stands in storage: named by content, so the same picture is stored once. */
export const objectKey = (sha256: string, size: PhotoSize): string =>
  `photos/v1/${sha256.slice(0, 2)}/${sha256}/${size}.webp`;

const sha256Of = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex');

async function overQuota(deps: PhotoDeps, incoming: IncomingPhoto, now: Date): Promise<Refusal | null> {
  if (incoming.drawn) return null;
  const { recent, kept } = await countUploads(
    deps.db,
    incoming.ownerUserId,
    new Date(now.getTime() - DAY_MS),
  );
  if (recent >= UPLOADS_PER_DAY) {
    return refuse('too_many', `At most ${UPLOADS_PER_DAY} photos in 24 hours. Go on tomorrow.`, {
      retryAfterSeconds: 3_600,
    });
  }
  if (kept >= PHOTOS_KEPT) {
    return refuse('too_many', `At most ${PHOTOS_KEPT} photos are kept. Remove some you no longer need.`, {
      retryAfterSeconds: 3_600,
    });
  }
  return null;
}

const putAll = async (deps: PhotoDeps, sha256: string, sizes: ProcessedPhoto['sizes']): Promise<void> => {
  await Promise.all(
    PHOTO_SIZES.map((size) => deps.storage.put(objectKey(sha256, size), sizes[size], 'image/webp')),
  );
};

type Facts = Pick<PhotoRow, 'storedSha256' | 'widthPx' | 'heightPx' | 'takenAt' | 'bytes'>;

/** The rendered facts of these bytes: of a photo already kept, or from rendering and storing them now. */
async function factsOf(deps: PhotoDeps, incoming: IncomingPhoto, sha256: string): Promise<Facts | Refusal> {
  const known = await findByHash(deps.db, sha256);
  if (known) {
    const { storedSha256, widthPx, heightPx, takenAt, bytes } = known;
    return { storedSha256, widthPx, heightPx, takenAt, bytes };
  }
  const made = await processPhoto(incoming.bytes, incoming.timeZone);
  if (isRefusal(made)) return made;
  await putAll(deps, sha256, made.sizes);
  return {
    storedSha256: sha256Of(made.sizes.large),
    widthPx: made.widthPx,
    heightPx: made.heightPx,
    takenAt: made.takenAt,
    bytes: PHOTO_SIZES.reduce((sum, size) => sum + made.sizes[size].byteLength, 0),
  };
}

/**
 * Checks, renders and keeps one photo.
 * @returns the stored row, or a refusal (413, 415, 422, 429)
 */
export async function storePhoto(deps: PhotoDeps, incoming: IncomingPhoto): Promise<PhotoRow | Refusal> {
  const now = deps.clock.now();
  const refused = await overQuota(deps, incoming, now);
  if (refused) return refused;
  const sha256 = sha256Of(incoming.bytes);
  const id = newId('pho', now.getTime());
  // Under the lock of the hash: a sweep that is removing these objects ends first, and a later one sees this upload.
  await deps.db.transaction(async (tx) => {
    await lockHash(tx, sha256);
    await insertPut(tx, id, sha256, now);
  });
  const facts = await factsOf(deps, incoming, sha256);
  if (isRefusal(facts)) {
    await deletePut(deps.db, id);
    return facts;
  }
  return deps.db.transaction(async (tx) => {
    await deletePut(tx, id);
    return insertPhoto(tx, {
      id,
      ownerUserId: incoming.ownerUserId,
      sellerId: incoming.sellerId,
      purpose: incoming.purpose,
      shot: incoming.shot,
      position: incoming.position ?? 0,
      sha256,
      ...facts,
      drawn: incoming.drawn ?? false,
      createdAt: now,
    });
  });
}
