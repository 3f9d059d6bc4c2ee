// The sums inside the race: what is held stands in a red chamber, what has moved says where to.
import type { Order } from '../../../shared/orders/contract';
import type { RaceSum } from '../../ui/race-steps';
import { coreSplitOf } from './core-split';
import { builderTo, sellerTo } from './sides';

const shown = (sums: readonly RaceSum[]): RaceSum[] => sums.filter((sum) => sum.cents > 0);

function depositSums(order: Order): RaceSum[] {
  if (!order.core) return [];
  const split = coreSplitOf(order);
  if (!split) {
    return [
      {
        label: 'Deposit',
        cents: order.money.heldCoreCents,
        where: order.role === 'builder' ? 'Held for you' : 'Held by Spragyard',
        state: 'held',
      },
    ];
  }
  const whole = split.toBuilderCents === 0 || split.toSellerCents === 0;
  return shown([
    {
      label: whole ? 'Deposit' : 'Deposit back',
      cents: split.toBuilderCents,
      where: `Back to ${builderTo(order)}`,
      state: 'moved',
    },
    {
      label: whole ? 'Deposit' : 'Deposit kept',
      cents: split.toSellerCents,
      where: `Released to ${sellerTo(order)}`,
      state: 'moved',
    },
  ]);
}

function undoneSums(order: Order): RaceSum[] {
  const { money } = order;
  return shown([
    { label: 'Back', cents: money.refundedCents, where: `Back to ${builderTo(order)}`, state: 'moved' },
    { label: 'Paid out', cents: money.paidOutCents, where: `Released to ${sellerTo(order)}`, state: 'moved' },
  ]);
}

/** At most three; none before anything was paid. */
export function sumsOf(order: Order): RaceSum[] {
  const { money, outbound } = order;
  if (outbound.paidAt === null) return [];
  if (outbound.state === 'cancelled' || outbound.state === 'settled') return undoneSums(order);
  const deposit = depositSums(order);
  const unit: RaceSum =
    money.heldUnitCents > 0
      ? { label: 'Unit and freight', cents: money.heldUnitCents, where: 'Held by Spragyard', state: 'held' }
      : {
          label: 'Unit and freight',
          cents: money.priceCents + money.freightCents,
          where: `Released to ${sellerTo(order)}`,
          state: 'moved',
        };
  const tax: RaceSum = { label: 'Sales tax', cents: money.taxCents, where: 'Set aside', state: 'moved' };
  // Three have room; the tax also stands in the table under the picture.
  return shown(deposit.length > 1 ? [unit, ...deposit] : [unit, ...deposit, tax]);
}
