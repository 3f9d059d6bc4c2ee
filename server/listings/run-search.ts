// One search request: place of the ZIP code, cursor, page, counts.
import type { SearchAnswer, SearchQuery } from '../../shared/listings/card';
import type { Deps } from '../deps';
import { invalid, type Refusal } from '../http/refusal';
import { locateZip } from '../geo/zip';
import { countListings } from './facets';
import { presentCard } from './present';
import { findListings } from './search';
import { readCursor } from './search-cursor';
import type { Point } from './search-parts';

function placeOf(query: SearchQuery): Point | null | Refusal {
  const needed = query.withinMiles !== undefined || query.sort === 'distance';
  if (query.zip === undefined)
    return needed ? invalid('zip', 'Type a ZIP code to measure from, such as 83702') : null;
  const place = locateZip(query.zip);
  if (!place && needed) return invalid('zip', 'This ZIP code’s place is not known. Try one near it');
  return place;
}

export async function runSearch(
  deps: Pick<Deps, 'pool'>,
  query: SearchQuery,
): Promise<SearchAnswer | Refusal> {
  const from = placeOf(query);
  if (from && 'refusal' in from) return from;
  const place = query.cursor === undefined ? null : readCursor(query.cursor);
  const strayed = place?.order === 'distance' && !from;
  if (query.cursor !== undefined && (!place || strayed || (place.mode !== 'none' && !query.q)))
    return invalid('cursor', 'Start again from the first page');
  // Without words there is nothing to find out first, so page and counts can be read side by side.
  const plain = query.q ? null : countListings(deps.pool, { query, mode: 'none', from });
  const [found, counted] = await Promise.all([findListings(deps.pool, query, from, place), plain]);
  const { facets, total } = counted ?? (await countListings(deps.pool, found.ask));
  return {
    items: found.rows.map((row) => presentCard(row, from)),
    next: found.next,
    facets,
    total,
    matched: found.ask.mode === 'none' ? null : found.ask.mode,
  };
}
