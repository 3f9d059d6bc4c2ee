// When things happened on an order, and when they fall due, in the seller's zone: all its deadlines are counted there.
import type { ClockName } from '../../../shared/orders/clocks';
import type { Order } from '../../../shared/orders/contract';
import type { Action } from '../../../shared/orders/states';
import { formatShortDay, type Instant } from '../../ui/dates';

/** The last time one of these actions was taken; null where none was. */
export function lastOf(order: Pick<Order, 'timeline'>, ...actions: readonly Action[]): Instant | null {
  const times = order.timeline.filter((one) => actions.some((action) => action === one.action));
  return (
    times
      .map((one) => one.at)
      .sort()
      .at(-1) ?? null
  );
}

/** When an open clock strikes; null where it doesn't run. */
export const strikesAt = (order: Pick<Order, 'clocks'>, clock: ClockName): Instant | null =>
  order.clocks.find((one) => one.clock === clock)?.at ?? null;

/** "Wed 25 Mar", or nothing. */
export const dayIn = (order: Pick<Order, 'zone'>, at: Instant | null): string | undefined =>
  at === null ? undefined : formatShortDay(at, order.zone);

/** "by Wed 25 Mar", or nothing. */
export function byDayIn(order: Pick<Order, 'zone'>, at: Instant | null): string | undefined {
  const day = dayIn(order, at);
  return day === undefined ? undefined : `by ${day}`;
}
