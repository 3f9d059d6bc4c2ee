// Reserving a unit: the terms are copied onto the order, exactly one of many wins, and the hosted checkout page opens.
import { randomInt } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { isMember, type Actor } from '../../shared/accounts/actor';
import { milesBetween } from '../../shared/kernel/geo';
import { newId } from '../../shared/kernel/ids';
import { newTagCode } from '../../shared/kernel/tag-code';
import { quoteFreight } from '../../shared/listings/freight';
import { feeOn } from '../../shared/money/fees';
import { RESERVE_MINUTES, reserveLapsesAt } from '../../shared/orders/clocks';
import { recordAudit } from '../accounts/for-others';
import { sellers } from '../accounts/tables';
import { isUniqueViolation } from '../db/transaction';
import { transaction } from '../db/transaction';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';
import { locateZip } from '../geo/zip';
import { invalid, isRefusal, notFound, refuse, type Refusal } from '../http/refusal';
import { keepShotsForOrder, listingForOrder, reserveListing, type ListingRow } from '../listings/for-others';
import { actOnLocked } from './act';
import { openCheckout } from './checkout';
import { startClocks } from './deadlines';
import type { OrderRow } from './load';
import { orders, timeline, type DeliveryRow } from './tables';

export interface ReserveInput {
  readonly listingId: string;
  readonly terms: 'exchange' | 'outright';
  readonly delivery: DeliveryRow;
}

/** The provider takes no card payment between 1 and 49 cents. */
const CARD_MINIMUM_CENTS = 50;
const GRACE_DAYS = 3;

interface Amounts {
  readonly priceCents: number;
  readonly depositCents: number;
  readonly freightCents: number;
}

function priceOf(
  listing: ListingRow,
  terms: 'exchange' | 'outright',
): Omit<Amounts, 'freightCents'> | Refusal {
  if (terms === 'exchange') {
    if (!listing.exchange || listing.priceCents === null || listing.depositCents === null) {
      return invalid('terms', 'This unit is sold outright only');
    }
    return { priceCents: listing.priceCents, depositCents: listing.depositCents };
  }
  if (!listing.outright || listing.outrightCents === null)
    return invalid('terms', 'This unit is sold in exchange only');
  return { priceCents: listing.outrightCents, depositCents: 0 };
}

function freightOf(listing: ListingRow, delivery: DeliveryRow): number | Refusal {
  if (delivery.method === 'pickup') return 0;
  const place = locateZip(delivery.zip);
  if (!place) return invalid('delivery.zip', 'We do not know this ZIP code. Check it');
  if (!listing.freight || listing.lat === null || listing.lon === null) {
    return invalid('delivery.method', 'This unit can only be picked up');
  }
  const miles = milesBetween({ lat: listing.lat, lon: listing.lon }, { lat: place.lat, lon: place.lon });
  return quoteFreight(listing.freight, miles).cents;
}

function amountsOf(listing: ListingRow, input: ReserveInput): Amounts | Refusal {
  const price = priceOf(listing, input.terms);
  if (isRefusal(price)) return price;
  const freightCents = freightOf(listing, input.delivery);
  if (typeof freightCents !== 'number') return freightCents;
  const total = price.priceCents + price.depositCents + freightCents;
  if (total > 0 && total < CARD_MINIMUM_CENTS) return invalid('terms', 'A card payment starts at $0.50');
  return { ...price, freightCents };
}

type SellerRow = typeof sellers.$inferSelect;

function newOrder(
  listing: ListingRow,
  seller: SellerRow,
  input: ReserveInput,
  amounts: Amounts,
  builderId: string,
  now: Date,
): typeof orders.$inferInsert {
  const exchange = input.terms === 'exchange';
  return {
    id: newId('ord', now.getTime()),
    listingId: listing.id,
    builderId,
    sellerId: seller.id,
    outbound: 'awaiting_payment',
    core: exchange ? 'held' : null,
    terms: input.terms,
    title: listing.title,
    caseCode: listing.caseCode,
    familyId: listing.familyId ?? '',
    delivery: input.delivery,
    deliveryMethod: input.delivery.method,
    ...amounts,
    taxCents: 0,
    feeCents: feeOn(amounts.priceCents),
    schedule: exchange ? listing.schedule : [],
    windowDays: exchange ? (listing.windowDays ?? 0) : 0,
    returnFreight: listing.returnFreight === 'seller' ? 'seller' : 'builder',
    shipDays: listing.shipDays,
    graceDays: GRACE_DAYS,
    zone: seller.timeZone,
    tagCode: listing.tagCode,
    pickupCode: String(randomInt(0, 1_000_000)).padStart(6, '0'),
    coreTagCode: newTagCode(),
    // The provider takes no less than 30 minutes when the request arrives, so a minute more.
    checkoutExpiresAt: new Date(Date.now() + (RESERVE_MINUTES + 1) * 60_000),
    createdAt: now,
    updatedAt: now,
  };
}

async function insertOrder(
  deps: Deps,
  tx: Tx,
  actor: Actor,
  input: ReserveInput,
): Promise<OrderRow | Refusal> {
  const now = deps.clock.now();
  const taken = await reserveListing(tx, input.listingId, now);
  if (!taken) return refuse('lost_race', 'Somebody else has just reserved this unit, or it is off sale.');
  const amounts = amountsOf(taken, input);
  if (isRefusal(amounts)) return amounts;
  const [seller] = await tx.select().from(sellers).where(eq(sellers.id, taken.sellerId));
  if (!seller) return notFound('listing');
  const [order] = await tx
    .insert(orders)
    .values(newOrder(taken, seller, input, amounts, actor.userId, now))
    .returning();
  if (!order) throw new Error('the new order was not returned');
  await keepShotsForOrder(tx, taken.id, order.id);
  await startClocks(deps, tx, order.id, [{ clock: 'reserve_lapse', at: reserveLapsesAt(now) }]);
  await tx.insert(timeline).values({
    orderId: order.id,
    at: now,
    action: 'reserve',
    by: 'builder',
    actorUserId: actor.userId,
    note: null,
    log: 'Reserved for 30 minutes',
    version: 0,
  });
  await recordAudit(tx, {
    at: now,
    actorUserId: actor.userId,
    actorKind: 'builder',
    action: 'order.reserve',
    objectKind: 'order',
    objectId: order.id,
    detail: { listingId: taken.id, terms: input.terms },
  });
  return payWhereNothingIsDue(deps, tx, order);
}

/** A free unit picked up without a deposit has nothing to pay: it is paid at once. */
async function payWhereNothingIsDue(deps: Deps, tx: Tx, order: OrderRow): Promise<OrderRow | Refusal> {
  if (order.priceCents + order.depositCents + order.freightCents + order.taxCents > 0) return order;
  return actOnLocked(deps, tx, order, {
    orderId: order.id,
    roles: ['provider'],
    step: { action: 'pay', amountCents: 0, currency: 'usd' },
    actorUserId: null,
  });
}

export async function reserveUnit(
  deps: Deps,
  actor: Actor,
  input: ReserveInput,
): Promise<{ order: OrderRow; checkoutUrl: string | null } | Refusal> {
  const listing = await listingForOrder(deps.db, input.listingId);
  if (!listing || listing.status === 'draft' || listing.status === 'withdrawn') return notFound('listing');
  if (isMember(actor, listing.sellerId))
    return refuse('forbidden', 'This unit is on sale by your own account.');
  try {
    const order = await transaction(deps.db, (tx) => insertOrder(deps, tx, actor, input));
    if (isRefusal(order)) return order;
    return {
      order,
      checkoutUrl:
        order.outbound === 'awaiting_payment' ? await openCheckout(deps, order, actor.email) : null,
    };
  } catch (error) {
    if (isUniqueViolation(error, 'orders_one_live_per_listing')) {
      return refuse('lost_race', 'Somebody else has just reserved this unit.');
    }
    throw error;
  }
}
