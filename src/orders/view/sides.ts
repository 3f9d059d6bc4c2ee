// Who is who to the reader: "you" on one's own side, the name on the other.
import type { Order } from '../../../shared/orders/contract';

type Sides = Pick<Order, 'role' | 'builderName' | 'sellerName'>;

/** "you", or the builder's name. */
export const builderTo = (order: Sides): string => (order.role === 'builder' ? 'you' : order.builderName);

/** "you", or the seller's name. */
export const sellerTo = (order: Sides): string => (order.role === 'seller' ? 'you' : order.sellerName);

/** Begins a sentence: "You" or the name. */
export const builderAs = (order: Sides): string => (order.role === 'builder' ? 'You' : order.builderName);
export const sellerAs = (order: Sides): string => (order.role === 'seller' ? 'You' : order.sellerName);

/** The other side, to write to: "the yard" or the builder. */
export const otherSide = (order: Sides): string => {
  if (order.role === 'builder') return order.sellerName;
  return order.role === 'seller' ? order.builderName : 'both sides';
};
