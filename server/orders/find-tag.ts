// What a scanned tag belongs to: the unit on its way out, or the core coming back.
import { desc, eq, or } from 'drizzle-orm';
import type { Actor } from '../../shared/accounts/actor';
import type { Deps } from '../deps';
import { notFound, type Refusal } from '../http/refusal';
import { listings } from '../listings/tables';
import { orders } from './tables';
import { sideOf, type Side } from './roles';

interface Found {
  readonly kind: 'unit' | 'core';
  readonly listingId: string | null;
  readonly orderId: string | null;
  readonly role: Side | null;
}

export async function findTag(deps: Deps, actor: Actor | null, text: string): Promise<Found | Refusal> {
  const code = text.toUpperCase().replaceAll(/[^A-Z0-9]/g, '');
  const [order] = await deps.db
    .select()
    .from(orders)
    .where(or(eq(orders.coreTagCode, code), eq(orders.tagCode, code)))
    .orderBy(desc(orders.createdAt))
    .limit(1);
  const side = order ? sideOf(actor, order) : null;
  if (order?.coreTagCode === code) {
    // A stranger who finds a tagged core learns that it is one, and nothing about whose.
    return { kind: 'core', listingId: null, orderId: side ? order.id : null, role: side };
  }
  const [listing] = await deps.db.select().from(listings).where(eq(listings.tagCode, code));
  if (!listing) return notFound('tag');
  const open = ['live', 'reserved', 'sold'].includes(listing.status);
  return {
    kind: 'unit',
    listingId: open || side ? listing.id : null,
    orderId: order && side ? order.id : null,
    role: side,
  };
}
