// Whose listing it is: a lister or member of its seller account, or nobody that the answer should tell about it.
import { hasDuty, isMember, type Actor } from '../../shared/accounts/actor';
import type { Tx } from '../db/client';
import { notFound, refuse, type Refusal } from '../http/refusal';
import type { ListingRow } from './for-others';
import { loadStock, lockListing, type Stock } from './queries';

/** Locked until the transaction ends. 404 for another's, 409 where the version asked for is not the one stored. */
export async function lockForLister(
  tx: Tx,
  actor: Actor,
  id: string,
  version: number | undefined,
): Promise<ListingRow | Refusal> {
  const row = await lockListing(tx, id);
  if (!row || !isMember(actor, row.sellerId)) return notFound('listing');
  if (!hasDuty(actor, row.sellerId, 'lister'))
    return refuse('forbidden', 'Only somebody with the lister duty changes listings.');
  if (version !== undefined && version !== row.version)
    return refuse('stale_version', 'Somebody changed this listing meanwhile. Look at it again.');
  return row;
}

export async function stockForMember(tx: Tx, actor: Actor, id: string): Promise<Stock | Refusal> {
  const stock = await loadStock(tx, id);
  return stock && isMember(actor, stock.row.sellerId) ? stock : notFound('listing');
}

const STATE_WORDS: Readonly<Record<string, string>> = {
  draft: 'a draft',
  live: 'on offer',
  reserved: 'held for a buyer',
  sold: 'sold',
  withdrawn: 'withdrawn',
};

/** 409 that says what the listing is and what would have to be done. */
export const notWhile = (row: ListingRow, what: string): Refusal =>
  refuse('wrong_state', `This listing is ${STATE_WORDS[row.status] ?? row.status}. ${what}`);
