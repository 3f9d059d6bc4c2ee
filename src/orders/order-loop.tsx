// The order's one picture: both legs, the sums held and moved.
import type { Order } from '../../shared/orders/contract';
import { TwoLegRace } from '../ui/two-leg-race';
import { loopOf } from './view/loop';

export function OrderLoop({ order }: { readonly order: Order }) {
  return <TwoLegRace {...loopOf(order)} />;
}
