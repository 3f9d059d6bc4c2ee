// Where each dollar is: one row for each sum that was paid, who holds it now, what moves it, and the proof of it.
import { formatCents, type Cents } from '../../../shared/kernel/money';
import type { Order } from '../../../shared/orders/contract';
import { coreSplitOf } from './core-split';
import { dayIn, lastOf } from './moments';
import { builderAs, builderTo, sellerAs, sellerTo } from './sides';

export interface DollarRow {
  readonly key: 'unit' | 'freight' | 'tax' | 'deposit';
  readonly sum: string;
  readonly cents: Cents;
  readonly where: string;
  readonly state: 'held' | 'moved' | 'waiting';
  readonly moves: string;
  /** A link to the proof on the page, or null where there is none yet. */
  readonly proof: { readonly label: string; readonly href: string } | null;
}

export interface Dollars {
  readonly rows: readonly DollarRow[];
  readonly totalCents: Cents;
  readonly summary: string;
}

type Place = Pick<DollarRow, 'where' | 'state' | 'moves' | 'proof'>;

const day = (order: Order, at: string | null): string => {
  const words = dayIn(order, at);
  return words ? `, ${words}` : '';
};

const LOG = { label: 'The log', href: '#log' } as const;

const photos = (order: Order, purpose: Order['photos'][number]['purpose']): DollarRow['proof'] => {
  const count = order.photos.filter((one) => one.purpose === purpose).length;
  return count === 0 ? null : { label: `${count} ${count === 1 ? 'photo' : 'photos'}`, href: '#photos' };
};

const caseProof = (order: Order): DollarRow['proof'] =>
  order.caseId ? { label: 'The case', href: `/cases/${order.caseId}` } : LOG;

/** What holds for the unit, its freight and its tax alike. */
function commonPlace(order: Order): Place | null {
  const { state, paidAt } = order.outbound;
  if (state === 'awaiting_payment') {
    return {
      where: 'Not paid yet',
      state: 'waiting',
      moves: `${builderAs(order)} ${order.role === 'builder' ? 'pay' : 'pays'}`,
      proof: null,
    };
  }
  if (state !== 'cancelled') return null;
  const when = lastOf(order, 'cancel', 'expire', 'abandon');
  return paidAt === null
    ? { where: 'Never taken', state: 'waiting', moves: 'Nothing', proof: null }
    : {
        where: `Back to ${builderTo(order)}${day(order, when)}`,
        state: 'moved',
        moves: 'Cancelled',
        proof: LOG,
      };
}

function unitPlace(order: Order): Place {
  const { money } = order;
  switch (order.outbound.state) {
    case 'refused':
      return {
        where: 'Held still by Spragyard',
        state: 'held',
        moves: 'Both agree, or an admin settles',
        proof: caseProof(order),
      };
    case 'settled':
      return {
        where: `Settled: ${formatCents(money.refundedCents)} back to ${builderTo(order)}, ${formatCents(money.paidOutCents)} to ${sellerTo(order)}`,
        state: 'moved',
        moves: 'The settlement',
        proof: LOG,
      };
    case 'accepted': {
      const fee =
        order.role === 'builder' || money.feeCents === 0
          ? ''
          : `, less the ${formatCents(money.feeCents)} fee`;
      return {
        where: `Released to ${sellerTo(order)}${fee}${day(order, lastOf(order, 'accept'))}`,
        state: 'moved',
        moves: `${builderAs(order)} accepted the unit`,
        proof: LOG,
      };
    }
    default:
      return {
        where: order.frozen ? 'Held still, bank dispute' : 'Held by Spragyard',
        state: 'held',
        moves: order.role === 'builder' ? 'You accept the unit' : 'The builder accepts the unit',
        proof: photos(order, 'pack'),
      };
  }
}

function taxPlace(order: Order): Place {
  const set = `Set aside${day(order, order.outbound.paidAt)}`;
  return {
    where: order.outbound.state === 'settled' ? 'Set aside; the share of what went back went back too' : set,
    state: 'moved',
    moves: 'Paid with the order',
    proof: null,
  };
}

function closedDeposit(order: Order): Place | null {
  const split = coreSplitOf(order);
  if (!split) return null;
  const when = day(order, lastOf(order, 'agree', 'release', 'settle', 'keep_unit', 'lapse'));
  const parts = [
    ...(split.toBuilderCents > 0 ? [`${formatCents(split.toBuilderCents)} back to ${builderTo(order)}`] : []),
    ...(split.toSellerCents > 0
      ? [`${formatCents(split.toSellerCents)} released to ${sellerTo(order)}`]
      : []),
  ];
  const why =
    order.core?.state === 'kept'
      ? 'The old unit was kept'
      : order.core?.state === 'lapsed'
        ? 'Not sent back in time'
        : `Core ${order.core?.grade ? `graded ${order.core.grade}` : 'returned'}`;
  return {
    where: `${parts.join(', ')}${when}`,
    state: 'moved',
    moves: why,
    proof: photos(order, 'grade') ?? LOG,
  };
}

function depositPlace(order: Order): Place {
  const { state } = order.outbound;
  if (state === 'settled')
    return { where: `In the settlement`, state: 'moved', moves: 'The settlement', proof: LOG };
  const still = state === 'refused' || order.core?.state === 'contested' || order.frozen;
  const grader = order.role === 'seller' ? 'You grade the core' : `${sellerAs(order)} grades the core`;
  return (
    closedDeposit(order) ?? {
      where: still ? 'Held still by Spragyard' : 'Held by Spragyard',
      state: 'held',
      moves: still ? 'Both agree, or an admin settles' : grader,
      proof: order.core?.state === 'contested' ? caseProof(order) : photos(order, 'core'),
    }
  );
}

function summaryOf(order: Order): string {
  const { money } = order;
  if (order.outbound.paidAt === null) return 'Nothing is held yet';
  const onTheWay =
    money.onTheWayCents > 0 ? `. ${formatCents(money.onTheWayCents)} is on its way through the bank` : '';
  const movedCents = money.totalCents - money.heldCents;
  return `${formatCents(movedCents)} moved on, ${formatCents(money.heldCents)} held${onTheWay}`;
}

export function dollarsOf(order: Order): Dollars {
  const { money } = order;
  const common = commonPlace(order);
  const unit = common ?? unitPlace(order);
  const rows: DollarRow[] = [
    {
      key: 'unit',
      sum: order.terms === 'exchange' ? 'Unit, exchange price' : 'Unit, outright',
      cents: money.priceCents,
      ...unit,
    },
    {
      key: 'freight',
      sum: order.role === 'builder' ? 'Freight to you' : 'Freight to the builder',
      cents: money.freightCents,
      ...unit,
    },
    { key: 'tax', sum: 'Sales tax', cents: money.taxCents, ...(common ?? taxPlace(order)) },
    { key: 'deposit', sum: 'Core deposit', cents: money.depositCents, ...(common ?? depositPlace(order)) },
  ];
  return {
    rows: rows.filter((row) => row.cents > 0 || row.key === 'unit'),
    totalCents: money.totalCents,
    summary: summaryOf(order),
  };
}
