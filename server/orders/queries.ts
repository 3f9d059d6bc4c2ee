// All reading of orders: one with everything the page needs, and lists by side.
import { and, asc, desc, eq, inArray, isNotNull, isNull, notInArray, or, sql, type SQL } from 'drizzle-orm';
import { CORE_FINAL, OUTBOUND_FINAL, type CoreState, type OutboundState } from '../../shared/orders/states';
import { sellers, users } from '../accounts/tables';
import { cases } from '../cases/tables';
import type { Tx } from '../db/client';
import { listingPhotos, listings } from '../listings/tables';
import { photoLinks, photos } from '../photos/tables';
import type { OrderRow } from './load';
import { deadlines, orders, timeline } from './tables';

export interface OrderHead {
  readonly order: OrderRow;
  readonly builderName: string;
  readonly sellerName: string;
  readonly coverPhotoId: string | null;
}

const headColumns = {
  order: orders,
  builderName: users.name,
  sellerName: sellers.name,
  coverPhotoId: listings.coverPhotoId,
};

const heads = (tx: Tx) =>
  tx
    .select(headColumns)
    .from(orders)
    .innerJoin(users, eq(users.id, orders.builderId))
    .innerJoin(sellers, eq(sellers.id, orders.sellerId))
    .innerJoin(listings, eq(listings.id, orders.listingId));

export async function findHead(tx: Tx, orderId: string): Promise<OrderHead | null> {
  const [row] = await heads(tx).where(eq(orders.id, orderId));
  return row ?? null;
}

export interface ListFilter {
  readonly builderId?: string;
  readonly sellerIds?: readonly string[];
  readonly outbound?: OutboundState | undefined;
  readonly core?: CoreState | undefined;
  readonly open?: boolean | undefined;
  readonly after?: { readonly createdAt: Date; readonly id: string } | undefined;
  readonly limit: number;
}

const finished: SQL | undefined = and(
  inArray(orders.outbound, [...OUTBOUND_FINAL]),
  or(isNull(orders.core), inArray(orders.core, [...CORE_FINAL])),
);

export async function listHeads(tx: Tx, filter: ListFilter): Promise<OrderHead[]> {
  const conditions: (SQL | undefined)[] = [
    filter.builderId ? eq(orders.builderId, filter.builderId) : undefined,
    filter.sellerIds ? inArray(orders.sellerId, [...filter.sellerIds]) : undefined,
    filter.outbound ? eq(orders.outbound, filter.outbound) : undefined,
    filter.core ? eq(orders.core, filter.core) : undefined,
    filter.open === false ? finished : undefined,
    filter.open === true
      ? or(
          notInArray(orders.outbound, [...OUTBOUND_FINAL]),
          and(isNotNull(orders.core), notInArray(orders.core, [...CORE_FINAL])),
        )
      : undefined,
    filter.after
      ? sql`(${orders.createdAt}, ${orders.id}) < (${filter.after.createdAt.toISOString()}::timestamptz, ${filter.after.id})`
      : undefined,
  ];
  return heads(tx)
    .where(and(...conditions))
    .orderBy(desc(orders.createdAt), desc(orders.id))
    .limit(filter.limit);
}

export async function clocksOf(tx: Tx, orderIds: readonly string[]) {
  if (orderIds.length === 0) return [];
  return tx
    .select({ orderId: deadlines.orderId, clock: deadlines.clock, at: deadlines.dueAt })
    .from(deadlines)
    .where(and(inArray(deadlines.orderId, [...orderIds]), eq(deadlines.state, 'open')))
    .orderBy(asc(deadlines.dueAt));
}

export async function openCasesOf(tx: Tx, orderIds: readonly string[]) {
  if (orderIds.length === 0) return [];
  return tx
    .select({ id: cases.id, orderId: cases.orderId, state: cases.state })
    .from(cases)
    .where(inArray(cases.orderId, [...orderIds]))
    .orderBy(asc(cases.openedAt));
}

export async function timelineOf(tx: Tx, orderId: string) {
  return tx
    .select({
      at: timeline.at,
      action: timeline.action,
      by: timeline.by,
      byName: users.name,
      note: timeline.note,
      log: timeline.log,
    })
    .from(timeline)
    .leftJoin(users, eq(users.id, timeline.actorUserId))
    .where(eq(timeline.orderId, orderId))
    .orderBy(asc(timeline.seq));
}

export async function orderPhotosOf(tx: Tx, orderId: string) {
  return tx
    .select({ photo: photos })
    .from(photoLinks)
    .innerJoin(photos, eq(photos.id, photoLinks.photoId))
    .where(
      and(eq(photoLinks.objectKind, 'order'), eq(photoLinks.objectId, orderId), isNull(photos.removedAt)),
    )
    .orderBy(asc(photos.createdAt), asc(photos.id));
}

export async function listingPhotosOf(tx: Tx, listingId: string) {
  return tx
    .select({ id: photos.id, shot: listingPhotos.shot })
    .from(listingPhotos)
    .innerJoin(photos, eq(photos.id, listingPhotos.photoId))
    .where(and(eq(listingPhotos.listingId, listingId), isNull(photos.removedAt)))
    .orderBy(asc(listingPhotos.position));
}
