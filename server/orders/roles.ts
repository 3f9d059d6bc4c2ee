// What somebody is on an order; nobody else sees it at all.
import { hasDuty, isMember, type Actor } from '../../shared/accounts/actor';
import type { Who } from '../../shared/orders/states';
import type { OrderRow } from './load';

export type Side = 'builder' | 'seller' | 'admin';

/** The side of the order somebody stands on; null for a stranger. */
export function sideOf(actor: Actor | null, order: Pick<OrderRow, 'builderId' | 'sellerId'>): Side | null {
  if (!actor) return null;
  if (actor.userId === order.builderId) return 'builder';
  if (isMember(actor, order.sellerId)) return 'seller';
  return actor.isAdmin ? 'admin' : null;
}

/** The roles of the flow table that somebody holds on an order. */
export function rolesOf(actor: Actor, order: Pick<OrderRow, 'builderId' | 'sellerId'>): Who[] {
  switch (sideOf(actor, order)) {
    case 'builder':
      return ['builder'];
    case 'seller': {
      const dock = hasDuty(actor, order.sellerId, 'dock');
      const seller = dock || hasDuty(actor, order.sellerId, 'owner');
      return [...(dock ? (['dock'] as const) : []), ...(seller ? (['seller'] as const) : [])];
    }
    // An admin enters a carrier's proof of delivery; everything else goes through a recorded settlement.
    case 'admin':
      return ['carrier'];
    case null:
      return [];
  }
}
