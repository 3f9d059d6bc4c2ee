// Takes a listing off sale; while somebody holds it, it stays.
import type { Actor } from '../../shared/accounts/actor';
import { recordAudit } from '../accounts/for-others';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { isRefusal, notFound, type Refusal } from '../http/refusal';
import { lockForLister, notWhile } from './access';
import { loadStock, updateListing, type Stock } from './queries';

export async function withdraw(
  deps: Deps,
  actor: Actor,
  id: string,
  version: number | undefined,
): Promise<Stock | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx) => {
    const row = await lockForLister(tx, actor, id, version);
    if (isRefusal(row)) return row;
    if (row.status === 'reserved') return notWhile(row, 'Cancel the order instead, with a reason.');
    if (row.status !== 'live' && row.status !== 'draft')
      return notWhile(row, 'There is nothing to withdraw.');
    await updateListing(tx, row, { status: 'withdrawn' }, now);
    await recordAudit(tx, {
      at: now,
      actorUserId: actor.userId,
      actorKind: 'lister',
      action: 'listing_withdrawn',
      objectKind: 'listing',
      objectId: id,
      detail: {},
    });
    return (await loadStock(tx, id)) ?? notFound('listing');
  });
}
