// An order as the race draws it: which steps are proved, which one is live, when each was or falls due, and what it moved.
import { formatCents } from '../../../shared/kernel/money';
import type { Order } from '../../../shared/orders/contract';
import type { CoreState } from '../../../shared/orders/states';
import { formatTime } from '../../ui/dates';
import type { LegStep, RaceShop, RaceSum } from '../../ui/race-steps';
import { coreSplitOf } from './core-split';
import { byDayIn, dayIn, lastOf, strikesAt } from './moments';
import { builderTo, sellerTo } from './sides';
import { sumsOf } from './sums';

export interface OrderLoop {
  readonly out: readonly LegStep[];
  readonly back: readonly LegStep[] | null;
  readonly shop: RaceShop;
  readonly yard: string;
  readonly sums: readonly RaceSum[];
}

/** A step before its state is known: what it says once proved, and what it says while it is still ahead. */
interface PlannedStep {
  readonly key: string;
  readonly label: string;
  readonly on?: string | undefined;
  readonly by?: string | undefined;
  readonly moved?: string | undefined;
}

/** The step a leg has come to: live, stopped for good or for now, or none where the leg is closed or not begun. */
interface Reached {
  readonly state: 'now' | 'stopped';
  readonly label?: string;
  readonly when?: string | undefined;
  readonly money?: string | undefined;
}

function step(planned: PlannedStep, state: LegStep['state'], over: Partial<Reached> = {}): LegStep {
  const when = over.when ?? (state === 'proved' ? planned.on : planned.by);
  const money = over.money ?? (state === 'proved' ? planned.moved : undefined);
  return {
    key: planned.key,
    label: over.label ?? planned.label,
    state,
    ...(when ? { when } : {}),
    ...(money ? { money } : {}),
  };
}

function leg(planned: readonly PlannedStep[], proved: number, reached: Reached | null): LegStep[] {
  return planned.map((one, index) => {
    if (index < proved) return step(one, 'proved');
    if (index > proved || !reached) return step(one, 'todo');
    return step(one, reached.state, reached);
  });
}

const back = (order: Order, cents: number): string => `${formatCents(cents)} back to ${builderTo(order)}`;

function plannedOut(order: Order): PlannedStep[] {
  const { money, outbound } = order;
  const pickup = outbound.delivery.method === 'pickup';
  const paidOut = money.priceCents + money.freightCents - money.feeCents;
  const shipBy = byDayIn(order, strikesAt(order, 'ship_by'));
  const arrived = { on: dayIn(order, outbound.deliveredAt) };
  return [
    {
      key: 'pay',
      label: 'Paid',
      on: dayIn(order, outbound.paidAt),
      moved: `${formatCents(money.totalCents)} in`,
    },
    { key: 'pack', label: 'Packed', on: dayIn(order, lastOf(order, 'pack')), by: shipBy },
    ...(pickup
      ? [{ key: 'collect', label: 'Collected', by: shipBy, ...arrived }]
      : [
          { key: 'hand_over', label: 'Picked up', on: dayIn(order, outbound.shippedAt), by: shipBy },
          { key: 'deliver', label: 'Delivered', ...arrived },
        ]),
    {
      key: 'accept',
      label: 'Checked',
      on: dayIn(order, lastOf(order, 'accept')),
      by: byDayIn(order, strikesAt(order, 'inspection')),
      moved: `${formatCents(paidOut)} to ${sellerTo(order)}`,
    },
  ];
}

const held = (order: Order): Reached =>
  order.frozen ? { state: 'stopped', when: 'Held still, bank dispute' } : { state: 'now' };

function reserved(order: Order): Reached {
  const until = strikesAt(order, 'reserve_lapse');
  return { state: 'now', label: 'Pay', when: until ? `by ${formatTime(until)}` : 'Now' };
}

function outLeg(order: Order): LegStep[] {
  const planned = plannedOut(order);
  const last = planned.length - 1;
  switch (order.outbound.state) {
    case 'awaiting_payment':
      return leg(planned, 0, reserved(order));
    case 'paid':
      return leg(planned, 1, held(order));
    case 'packed':
      return leg(planned, 2, held(order));
    case 'in_transit':
      return leg(planned, 3, held(order));
    case 'collected':
    case 'delivered':
      return leg(planned, last, held(order));
    case 'accepted':
      return leg(planned, planned.length, null);
    case 'refused':
      return leg(planned, last, { state: 'stopped', label: 'Refused', when: 'Case open' });
    case 'settled':
      return leg(
        planned.map((one, index) => (index === last ? settledStep(order) : one)),
        planned.length,
        null,
      );
    case 'cancelled':
      return leg(planned, order.outbound.paidAt ? 1 : 0, cancelledStep(order));
  }
}

const settledStep = (order: Order): PlannedStep => ({
  key: 'settle',
  label: 'Settled',
  on: dayIn(order, lastOf(order, 'settle')),
  moved: back(order, order.money.refundedCents),
});

function cancelledStep(order: Order): Reached {
  const paid = order.outbound.paidAt !== null;
  return {
    state: 'stopped',
    label: paid ? 'Cancelled' : 'Not paid',
    when: dayIn(order, lastOf(order, 'cancel', 'expire', 'abandon')),
    money: paid ? back(order, order.money.refundedCents) : undefined,
  };
}

type Core = NonNullable<Order['core']>;

function plannedBack(order: Order, core: Core): PlannedStep[] {
  const due = byDayIn(order, core.dueAt);
  const split = coreSplitOf(order);
  return [
    { key: 'book', label: 'Tag and book', on: dayIn(order, lastOf(order, 'book_return')), by: due },
    { key: 'send', label: 'Sent back', on: dayIn(order, core.sentAt), by: due },
    { key: 'receive', label: 'Received', on: dayIn(order, core.receivedAt) },
    {
      key: 'grade',
      label: core.grade ? `Graded ${core.grade}` : 'Graded',
      on: dayIn(order, core.gradedAt),
      by: byDayIn(order, strikesAt(order, 'grade_by')) ?? 'within 5 business days',
    },
    {
      key: 'settle',
      label: 'Settled',
      on: dayIn(order, lastOf(order, 'agree', 'release', 'settle')),
      by: byDayIn(order, strikesAt(order, 'agree_by')),
      moved: split ? `${formatCents(split.toBuilderCents)} to ${builderTo(order)}` : undefined,
    },
  ];
}

/** How many steps of the core leg are proved in each state; where it ended early, the history tells. */
const PROVED: Readonly<Record<CoreState, number>> = {
  held: 0,
  due: 0,
  booked: 1,
  coming_back: 2,
  at_dock: 3,
  graded: 4,
  contested: 4,
  settled: 5,
  kept: 0,
  lapsed: 0,
  released: 0,
};

function reachedBack(order: Order, core: Core): Reached | null {
  const toSeller = `${formatCents(order.money.depositCents)} to ${sellerTo(order)}`;
  switch (core.state) {
    case 'held':
    case 'settled':
      return null;
    case 'released':
      return null;
    case 'due':
      // While the unit itself is still being checked, that is the live step.
      return order.outbound.state === 'accepted' ? held(order) : null;
    case 'contested':
      return { state: 'stopped', label: 'Contested', when: 'Case open' };
    case 'kept':
      return {
        state: 'stopped',
        label: 'Unit kept',
        when: dayIn(order, lastOf(order, 'keep_unit')),
        money: toSeller,
      };
    case 'lapsed':
      return {
        state: 'stopped',
        label: 'Lapsed',
        when: dayIn(order, lastOf(order, 'lapse')),
        money: toSeller,
      };
    default:
      return held(order);
  }
}

function backLeg(order: Order, core: Core): LegStep[] {
  const planned = plannedBack(order, core);
  const wasBooked = lastOf(order, 'book_return') !== null;
  const endedEarly = core.state === 'kept' || core.state === 'lapsed';
  // Not graded in time: the money moved without that step, so the step may not look proved.
  const ungraded = core.state === 'settled' && core.gradedAt === null;
  const steps = ungraded
    ? planned.map((one) => (one.key === 'grade' ? { ...one, label: 'Not graded', on: 'in time' } : one))
    : planned;
  const legSteps = leg(steps, endedEarly && wasBooked ? 1 : PROVED[core.state], reachedBack(order, core));
  if (core.state !== 'released') return legSteps;
  return legSteps.map((one, index) => (index === 0 ? { ...one, when: 'Nothing to send back' } : one));
}

function shopOf(order: Order): RaceShop {
  const place = order.role === 'builder' ? 'Your shop' : 'Builder’s shop';
  const { deliveredAt, state } = order.outbound;
  if (state === 'refused' || state === 'settled') {
    return { place, label: state === 'refused' ? 'Refused' : 'Settled', state: 'stopped' };
  }
  if (deliveredAt === null)
    return { place, label: state === 'cancelled' ? 'Not sent' : 'Not there yet', state: 'todo' };
  const day = dayIn(order, deliveredAt);
  return { place, label: 'Arrived', state: 'proved', ...(day ? { when: day } : {}) };
}

/** The picture of an order to whoever asks: both legs, the turn at the shop, and where the sums are. */
export const loopOf = (order: Order): OrderLoop => ({
  out: outLeg(order),
  back: order.core ? backLeg(order, order.core) : null,
  shop: shopOf(order),
  yard: order.sellerName,
  sums: sumsOf(order),
});
