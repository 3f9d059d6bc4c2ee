// The routes of listings: each endpoint with the function that answers it.
import { timeCursor, packCursor, unpackCursor } from '../../shared/kernel/cursor';
import { isMember, type Actor } from '../../shared/accounts/actor';
import * as contract from '../../shared/listings/contract';
import type { Deps } from '../deps';
import { invalid, isRefusal, notFound, type Refusal } from '../http/refusal';
import { publicRoute, route, type Route } from '../http/route';
import { stockForMember } from './access';
import { addPhoto } from './add-photo';
import { createDraft } from './create-draft';
import { missingOf } from './facts';
import { getListingPage, type RecordOf } from './listing-page';
import { presentStock, presentStockItem } from './present';
import { publishDraft } from './publish';
import { findSeller, listStock, shotCodesOf, type Stock } from './queries';
import { relist } from './relist';
import { removePhoto } from './remove-photo';
import { reorderPhotos } from './reorder-photos';
import { runSearch } from './run-search';
import { updateDraft } from './update-draft';
import { withdraw } from './withdraw';

function shown(result: Stock | Refusal, actor: Actor) {
  if (isRefusal(result)) return result;
  const shots = result.shots.map((taken) => taken.shot);
  const missing = result.row.status === 'draft' ? missingOf(result, shots, actor.mailChecked) : [];
  return presentStock(result, missing);
}

interface StockQuery {
  readonly sellerId: string;
  readonly status?: string | undefined;
  readonly q?: string | undefined;
  readonly cursor?: string | undefined;
  readonly limit: number;
}

async function stockPage(deps: Deps, actor: Actor, query: StockQuery) {
  if (!isMember(actor, query.sellerId)) return notFound('seller account');
  const place = query.cursor === undefined ? null : unpackCursor(query.cursor, timeCursor);
  if (query.cursor !== undefined && !place) return invalid('cursor', 'Start again from the first page');
  const seller = await findSeller(deps.db, query.sellerId);
  if (!seller) return notFound('seller account');
  const rows = await listStock(deps.db, {
    sellerId: query.sellerId,
    status: query.status,
    q: query.q,
    after: place ? { createdAt: new Date(place[0]), id: place[1] } : null,
    limit: query.limit + 1,
  });
  const items = rows.slice(0, query.limit);
  const drafts = items.filter((row) => row.status === 'draft');
  const shots = await shotCodesOf(
    deps.db,
    drafts.map((row) => row.id),
  );
  const last = items.at(-1);
  return {
    items: items.map((row) =>
      presentStockItem(
        row,
        row.status === 'draft' ? missingOf({ row, seller }, shots.get(row.id) ?? [], actor.mailChecked) : [],
      ),
    ),
    next: rows.length > items.length && last ? packCursor([last.createdAt.toISOString(), last.id]) : null,
  };
}

/** @param recordOf a seller's track record, from the feature that knows the orders */
export const listingRoutes = (recordOf: RecordOf): readonly Route[] => [
  publicRoute(contract.searchListings, ({ query }, deps) => runSearch(deps, query)),
  publicRoute(contract.getListing, ({ params, query, actor }, deps) =>
    getListingPage(deps, recordOf, params.id, query.zip ?? null, actor),
  ),
  route(contract.listStock, ({ query, actor }, deps) => stockPage(deps, actor, query)),
  route(contract.getStock, async ({ params, actor }, deps) =>
    shown(await stockForMember(deps.db, actor, params.id), actor),
  ),
  route(contract.createDraft, async ({ body, actor }, deps) =>
    shown(await createDraft(deps, actor, body), actor),
  ),
  route(contract.changeListing, async ({ params, body, actor }, deps) =>
    shown(await updateDraft(deps, actor, params.id, body), actor),
  ),
  route(contract.addListingPhoto, async ({ params, body, file, actor }, deps) =>
    shown(await addPhoto(deps, actor, params.id, body.shot, file?.bytes ?? null), actor),
  ),
  route(contract.removeListingPhoto, async ({ params, actor }, deps) =>
    shown(await removePhoto(deps, actor, params.id, params.photoId), actor),
  ),
  route(contract.reorderListingPhotos, async ({ params, body, actor }, deps) =>
    shown(await reorderPhotos(deps, actor, params.id, body.photoIds), actor),
  ),
  route(contract.publishListing, async ({ params, body, actor }, deps) =>
    shown(await publishDraft(deps, actor, params.id, body.version), actor),
  ),
  route(contract.withdrawListing, async ({ params, body, actor }, deps) =>
    shown(await withdraw(deps, actor, params.id, body.version), actor),
  ),
  route(contract.relistListing, async ({ params, body, actor }, deps) =>
    shown(await relist(deps, actor, params.id, body.version), actor),
  ),
];
