// Loads an order under lock and gathers what the rules need to know of it.
import { and, eq, isNull } from 'drizzle-orm';
import type { CoreMatch, OrderFacts } from '../../shared/orders/facts';
import { PHOTO_PURPOSES, type PhotoPurpose } from '../../shared/orders/states';
import type { Tx } from '../db/client';
import { listings } from '../listings/tables';
import { holdsOf } from '../money/for-others';
import { photoLinks, photos } from '../photos/tables';
import { orders } from './tables';

export type OrderRow = typeof orders.$inferSelect;

export async function lockOrder(tx: Tx, orderId: string): Promise<OrderRow | null> {
  const [row] = await tx.select().from(orders).where(eq(orders.id, orderId)).for('update');
  return row ?? null;
}

const isPurpose = (text: string): text is PhotoPurpose => PHOTO_PURPOSES.some((purpose) => purpose === text);

async function photoIdsOf(tx: Tx, orderId: string): Promise<Record<PhotoPurpose, string[]>> {
  const rows = await tx
    .select({ id: photos.id, purpose: photos.purpose })
    .from(photoLinks)
    .innerJoin(photos, eq(photos.id, photoLinks.photoId))
    .where(
      and(eq(photoLinks.objectKind, 'order'), eq(photoLinks.objectId, orderId), isNull(photos.removedAt)),
    );
  const found: Record<PhotoPurpose, string[]> = {
    pack: [],
    refuse: [],
    core: [],
    grade: [],
    contest: [],
    case: [],
  };
  for (const row of rows) if (isPurpose(row.purpose)) found[row.purpose].push(row.id);
  return found;
}

export async function factsOf(tx: Tx, order: OrderRow, coreMatch: CoreMatch | null): Promise<OrderFacts> {
  const holds = await holdsOf(tx, order.id);
  const photoIds = await photoIdsOf(tx, order.id);
  const [listing] = await tx
    .select({ status: listings.status })
    .from(listings)
    .where(eq(listings.id, order.listingId));
  return {
    outbound: order.outbound,
    core: order.core,
    version: order.version,
    delivery: order.deliveryMethod,
    amounts: {
      priceCents: order.priceCents,
      freightCents: order.freightCents,
      depositCents: order.depositCents,
      taxCents: order.taxCents,
      feeCents: order.feeCents,
    },
    holds,
    schedule: order.schedule,
    windowDays: order.windowDays,
    zone: order.zone,
    shipDays: order.shipDays,
    graceDays: order.graceDays,
    tagCode: order.tagCode,
    pickupCode: order.pickupCode,
    dueAt: order.dueAt,
    otherCoreAllowed: order.otherCoreAllowed,
    deductions: order.deductions,
    listingLive: listing?.status === 'live',
    frozen: order.frozen,
    photos: photoIds,
    coreMatch,
  };
}
