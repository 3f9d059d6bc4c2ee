// Puts the photos of a draft in a new order: the list must name each of them once.
import type { Actor } from '../../shared/accounts/actor';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { invalid, isRefusal, notFound, type Refusal } from '../http/refusal';
import { lockForLister, notWhile } from './access';
import { coverOf } from './cover';
import { loadStock, placePhotos, shotsOf, updateListing, type Stock } from './queries';

export async function reorderPhotos(
  deps: Deps,
  actor: Actor,
  id: string,
  photoIds: readonly string[],
): Promise<Stock | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx) => {
    const row = await lockForLister(tx, actor, id, undefined);
    if (isRefusal(row)) return row;
    if (row.status !== 'draft') return notWhile(row, 'Photos change only while it is a draft.');
    const have = (await shotsOf(tx, id)).map((taken) => taken.photo.id);
    const same = have.length === photoIds.length && new Set([...have, ...photoIds]).size === have.length;
    if (!same) return invalid('photoIds', 'Name each photo of this listing once');
    await placePhotos(tx, id, photoIds);
    await updateListing(tx, row, coverOf(await shotsOf(tx, id)), now);
    return (await loadStock(tx, id)) ?? notFound('listing');
  });
}
