// Adds a photo of one shot to a draft; the same bytes sent twice for one shot (a retry) stay one photo.
import { createHash } from 'node:crypto';
import type { Actor } from '../../shared/accounts/actor';
import { SHOT_CODES } from '../../shared/listings/shots';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { invalid, isRefusal, notFound, refuse, type Refusal } from '../http/refusal';
import { linkPhoto, storePhoto } from '../photos/for-others';
import { lockForLister, notWhile } from './access';
import { coverOf } from './cover';
import { insertListingPhoto, loadStock, shotsOf, updateListing, type Stock } from './queries';

type ShotCode = (typeof SHOT_CODES)[number];
const PHOTOS_MAX = 40;

export async function addPhoto(
  deps: Deps,
  actor: Actor,
  id: string,
  shot: ShotCode,
  bytes: Buffer | null,
): Promise<Stock | Refusal> {
  if (!bytes) return invalid('file', 'Choose a photo');
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  // Asked before the picture is worked on: another's draft costs nothing, and a retry nothing twice.
  const before = await transaction(deps.db, async (tx) => {
    const row = await lockForLister(tx, actor, id, undefined);
    if (isRefusal(row)) return row;
    if (row.status !== 'draft') return notWhile(row, 'Photos change only while it is a draft.');
    const stock = await loadStock(tx, id);
    if (!stock) return notFound('listing');
    return stock.shots.length >= PHOTOS_MAX
      ? refuse('invalid', `At most ${PHOTOS_MAX} photos. Take one off first.`)
      : stock;
  });
  if (isRefusal(before)) return before;
  if (before.shots.some((taken) => taken.shot === shot && taken.photo.sha256 === sha256)) return before;
  const photo = await storePhoto(deps, {
    bytes,
    ownerUserId: actor.userId,
    sellerId: before.row.sellerId,
    purpose: 'listing',
    shot,
    position: SHOT_CODES.indexOf(shot) + 1,
    timeZone: before.seller.timeZone,
  });
  if (isRefusal(photo)) return photo;
  const now = deps.clock.now();
  return transaction(deps.db, async (tx) => {
    const row = await lockForLister(tx, actor, id, undefined);
    if (isRefusal(row)) return row;
    if (row.status !== 'draft') return notWhile(row, 'Photos change only while it is a draft.');
    await insertListingPhoto(tx, { listingId: id, photoId: photo.id, shot, position: photo.position });
    await linkPhoto(tx, photo.id, 'listing', id);
    await updateListing(tx, row, coverOf(await shotsOf(tx, id)), now);
    return (await loadStock(tx, id)) ?? notFound('listing');
  });
}
