// Takes a photo off a draft; where an order still shows the same photo, it stays for that order.
import type { Actor } from '../../shared/accounts/actor';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { isRefusal, notFound, type Refusal } from '../http/refusal';
import { unlinkPhoto } from '../photos/for-others';
import { lockForLister, notWhile } from './access';
import { coverOf } from './cover';
import { deleteListingPhoto, loadStock, shotsOf, updateListing, type Stock } from './queries';

export async function removePhoto(
  deps: Deps,
  actor: Actor,
  id: string,
  photoId: string,
): Promise<Stock | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx) => {
    const row = await lockForLister(tx, actor, id, undefined);
    if (isRefusal(row)) return row;
    if (row.status !== 'draft') return notWhile(row, 'Photos change only while it is a draft.');
    if (!(await deleteListingPhoto(tx, id, photoId))) return notFound('photo');
    // The cover must point elsewhere before the photo may go.
    await updateListing(tx, row, coverOf(await shotsOf(tx, id)), now);
    await unlinkPhoto(tx, photoId, 'listing', id, now);
    return (await loadStock(tx, id)) ?? notFound('listing');
  });
}
