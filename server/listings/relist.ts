// Makes a withdrawn listing a draft again, with everything it had.
import type { Actor } from '../../shared/accounts/actor';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { isRefusal, notFound, type Refusal } from '../http/refusal';
import { lockForLister, notWhile } from './access';
import { loadStock, updateListing, type Stock } from './queries';

export async function relist(
  deps: Deps,
  actor: Actor,
  id: string,
  version: number | undefined,
): Promise<Stock | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx) => {
    const row = await lockForLister(tx, actor, id, version);
    if (isRefusal(row)) return row;
    if (row.status !== 'withdrawn') return notWhile(row, 'Only a withdrawn listing becomes a draft again.');
    await updateListing(tx, row, { status: 'draft' }, now);
    return (await loadStock(tx, id)) ?? notFound('listing');
  });
}
