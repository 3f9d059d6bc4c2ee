// Gathers everything the page of one unit shows.
import { isMember, type Actor } from '../../shared/accounts/actor';
import { milesBetween } from '../../shared/kernel/geo';
import { searchQuery, type Card } from '../../shared/listings/card';
import { quoteFreight } from '../../shared/listings/freight';
import { listingStatus, type ListingPage, type TrackRecord } from '../../shared/listings/page';
import { usedNotice } from '../../shared/listings/publish';
import type { Deps } from '../deps';
import { locateZip } from '../geo/zip';
import { notFound, type Refusal } from '../http/refusal';
import { kindOf, stateOf } from './facts';
import { presentCard, presentCondition, presentShots, presentTerms } from './present';
import { findDonor, loadStock, type Stock } from './queries';
import { pageStatement, run, type CardRow } from './search';
import type { Point } from './search-parts';
import { readCodeOf, unitOf } from './unit';

/** What is known of a seller's orders; null where nothing was sold yet. */
export type RecordOf = (deps: Deps, sellerId: string) => Promise<TrackRecord | null>;

const SIMILAR = 6;
const OPEN_TO_ALL: readonly string[] = ['live', 'reserved', 'sold'];

const maySee = ({ row }: Stock, actor: Actor | null): boolean =>
  OPEN_TO_ALL.includes(row.status) ||
  (row.publishedAt !== null && actor !== null && (actor.isAdmin || isMember(actor, row.sellerId)));

async function similarTo(deps: Deps, { row }: Stock, from: Point | null): Promise<Card[]> {
  const query = searchQuery.parse({ familyId: row.familyId, sort: 'price', limit: SIMILAR + 1 });
  const statement = pageStatement({ query, mode: 'none', from: null }, 'total', []);
  const rows = await run<CardRow>(deps.pool, 'none', statement);
  return rows
    .filter((other) => other.id !== row.id)
    .slice(0, SIMILAR)
    .map((other) => presentCard(other, from));
}

function freightOf(
  { row, seller }: Stock,
  toZip: string | null,
  to: Point | null,
): ListingPage['freight'] | null {
  if (!row.freight) return null;
  const miles = to ? milesBetween(to, { lat: seller.lat, lon: seller.lon }) : null;
  return {
    figures: row.freight,
    pickupCents: 0,
    quote: toZip && miles !== null ? { toZip, ...quoteFreight(row.freight, miles) } : null,
  };
}

const presentSeller = ({ seller }: Stock, record: TrackRecord | null): ListingPage['seller'] => ({
  id: seller.id,
  name: seller.name,
  kind: seller.kind,
  city: seller.city,
  region: seller.region,
  zip: seller.zip,
  timeZone: seller.timeZone,
  verified: seller.verifiedAt !== null,
  record,
});

export async function getListingPage(
  deps: Deps,
  recordOf: RecordOf,
  id: string,
  toZip: string | null,
  actor: Actor | null,
): Promise<ListingPage | Refusal> {
  const stock = await loadStock(deps.db, id);
  if (!stock || !maySee(stock, actor)) return notFound('listing');
  const { row, seller, shots } = stock;
  const to = toZip ? locateZip(toZip) : null;
  const kind = kindOf(row);
  const freight = freightOf(stock, toZip, to);
  const unit = row.variantId ? await unitOf(deps.db, row.variantId) : null;
  // A withdrawn listing may have lost what only an offer must have; then there is no page of it to show.
  if (!kind || !freight || !unit || !row.publishedAt || !row.listedAt) return notFound('listing');
  const donor = row.donorVehicleId ? await findDonor(deps.db, row.donorVehicleId) : null;
  return {
    id: row.id,
    title: row.title,
    kind,
    status: listingStatus.parse(row.status),
    state: stateOf(row),
    usedNotice: usedNotice(row.rebuilt),
    rebuilt: row.rebuilt,
    variantId: unit.variantId,
    variantName: unit.variantName,
    family: unit.family,
    caseCode: row.caseCode,
    code: await readCodeOf(deps.db, row.caseCode, unit.variantId),
    tagCode: row.tagCode,
    mileage: row.mileage,
    // The vehicle's own number stays private: it is nobody's business but the yard's.
    donor: donor ? { description: donor.description, year: donor.year } : null,
    notes: row.notes,
    condition: presentCondition(kind, stateOf(row), row.condition),
    shots: presentShots(row, shots),
    terms: presentTerms(row, kind),
    freight,
    shipDays: row.shipDays,
    seller: presentSeller(stock, await recordOf(deps, seller.id)),
    miles: to ? Math.round(milesBetween(to, { lat: seller.lat, lon: seller.lon })) : null,
    fit: null,
    similar: await similarTo(deps, stock, to),
    publishedAt: row.publishedAt.toISOString(),
    listedAt: row.listedAt.toISOString(),
  };
}
