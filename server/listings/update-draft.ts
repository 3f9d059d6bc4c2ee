// Changes a draft; on a unit that is on offer only its price and notes, and only from the version the lister has seen.
import type { Actor } from '../../shared/accounts/actor';
import type { ChangeBody } from '../../shared/listings/contract';
import { claimsIn } from '../../shared/listings/claims';
import type { Tx } from '../db/client';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { invalid, isRefusal, notFound, refuse, type Refusal } from '../http/refusal';
import { lockForLister, notWhile } from './access';
import { changeErrors, columnsOf, derivedOf } from './facts';
import type { ListingRow } from './for-others';
import { loadStock, updateListing, type NewListing, type Stock } from './queries';
import { settleUnit } from './unit';

const WHILE_LIVE: readonly string[] = ['version', 'priceCents', 'notes'];

/** The same price twice as terms; an outright price that was only price and deposit follows the price. */
function livePrice(row: ListingRow, priceCents: number): Partial<NewListing> {
  const follows = row.exchange && row.outrightCents === (row.priceCents ?? 0) + (row.depositCents ?? 0);
  const alone = !row.exchange && row.outrightCents === row.priceCents;
  if (alone) return { priceCents, outrightCents: priceCents };
  return follows ? { priceCents, outrightCents: priceCents + (row.depositCents ?? 0) } : { priceCents };
}

function liveChanges(row: ListingRow, body: ChangeBody): Partial<NewListing> | Refusal {
  const other = Object.entries(body).find(([key, value]) => value !== undefined && !WHILE_LIVE.includes(key));
  if (other)
    return notWhile(row, 'Withdraw it and make it a draft again to change more than price and notes.');
  if (body.version === undefined) return invalid('version', 'Send the version you have seen');
  if (body.priceCents === null || body.priceCents === 0)
    return invalid('priceCents', 'Type a price, such as 1450.00');
  const [claim] = row.rebuilt || body.notes === undefined ? [] : claimsIn(body.notes);
  if (claim) {
    return invalid(
      'notes',
      `“${claim.word}” is said of the unit, but it is sold used. Leave it out (16 CFR 20)`,
    );
  }
  return {
    ...(body.notes === undefined ? {} : { notes: body.notes }),
    ...(body.priceCents === undefined ? {} : livePrice(row, body.priceCents)),
  };
}

async function draftChanges(
  tx: Tx,
  row: ListingRow,
  body: ChangeBody,
): Promise<Partial<NewListing> | Refusal> {
  const errors = changeErrors(body);
  if (errors.length > 0) return refuse('invalid', errors[0]?.message ?? '', { errors });
  const unit = await settleUnit(tx, row.sellerId, body, row);
  return isRefusal(unit) ? unit : { ...columnsOf(body), ...unit.columns };
}

export async function updateDraft(
  deps: Deps,
  actor: Actor,
  id: string,
  body: ChangeBody,
): Promise<Stock | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx) => {
    const row = await lockForLister(tx, actor, id, body.version);
    if (isRefusal(row)) return row;
    if (row.status !== 'draft' && row.status !== 'live') return notWhile(row, 'It cannot be changed now.');
    const changes = row.status === 'live' ? liveChanges(row, body) : await draftChanges(tx, row, body);
    if (isRefusal(changes)) return changes;
    const derived = derivedOf({ ...row, ...withoutUndefined(changes) });
    await updateListing(tx, row, { ...changes, ...derived }, now);
    return (await loadStock(tx, id)) ?? notFound('listing');
  });
}

const withoutUndefined = (changes: Partial<NewListing>): Partial<ListingRow> =>
  Object.fromEntries(Object.entries(changes).filter(([, value]) => value !== undefined));
