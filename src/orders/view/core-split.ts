// What has become of a deposit whose leg is closed: how much went back, how much to the seller.
import type { Cents } from '../../../shared/kernel/money';
import type { Order } from '../../../shared/orders/contract';

export interface CoreSplit {
  readonly toBuilderCents: Cents;
  readonly toSellerCents: Cents;
}

/** Null while the deposit is held, and where the purchase itself was undone. */
export function coreSplitOf(order: Order): CoreSplit | null {
  const { depositCents, heldCoreCents, refundedCents } = order.money;
  switch (order.core?.state) {
    case 'kept':
    case 'lapsed':
      return { toBuilderCents: 0, toSellerCents: depositCents };
    case 'settled': {
      // The unit's own money went to the seller when it was accepted, so all that went back is of the deposit.
      const toBuilderCents = Math.min(refundedCents, depositCents - heldCoreCents);
      return { toBuilderCents, toSellerCents: depositCents - heldCoreCents - toBuilderCents };
    }
    default:
      return null;
  }
}
