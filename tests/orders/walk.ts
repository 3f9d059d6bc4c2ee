// Walks the flow table from a reservation to every pair of states it can reach, and gives each as an order on the wire.
import type { Order } from '../../shared/orders/contract';
import { decide, isFault, type Decision } from '../../shared/orders/decide';
import type { OrderFacts, Step } from '../../shared/orders/facts';
import { rowsFrom, type FlowRow } from '../../shared/orders/flow';
import { isSettlementFault, settleCore } from '../../shared/orders/settlement';
import type { Who } from '../../shared/orders/states';
import { reserveLapsesAt } from '../../shared/orders/clocks';
import { PERSON_ACTIONS } from '../../shared/orders/actions';
import { AMOUNTS, facts, NOW, SCHEDULE } from './given';

export interface Place {
  readonly facts: OrderFacts;
  readonly order: Order;
}

export interface WalkKind {
  readonly terms: 'exchange' | 'outright';
  readonly method: 'freight' | 'pickup';
}

const PHOTOS: OrderFacts['photos'] = {
  pack: ['p1', 'p2', 'p3'],
  refuse: ['r1'],
  core: ['c1', 'c2', 'c3'],
  grade: ['g1'],
  contest: ['x1'],
  case: [],
};

const amountsOf = (kind: WalkKind): OrderFacts['amounts'] => ({
  ...AMOUNTS,
  depositCents: kind.terms === 'exchange' ? AMOUNTS.depositCents : 0,
  freightCents: kind.method === 'freight' ? AMOUNTS.freightCents : 0,
});

const total = (of: OrderFacts['amounts']): number =>
  of.priceCents + of.freightCents + of.depositCents + of.taxCents;

function startOrder(kind: WalkKind): Order {
  const amounts = amountsOf(kind);
  return {
    id: 'ord_walked',
    number: '4452',
    title: 'Keld 66A, 4x4',
    caseCode: 'K66A4XD90914703',
    photoUrl: null,
    listingId: 'lst_walked',
    builderName: 'Abara Driveline',
    sellerId: 'slr_quenby',
    sellerName: 'Quenby Dismantlers',
    terms: kind.terms,
    outboundState: 'awaiting_payment',
    coreState: kind.terms === 'exchange' ? 'held' : null,
    role: 'builder',
    heldCents: 0,
    totalCents: total(amounts),
    next: [],
    deadlineAt: null,
    caseId: null,
    createdAt: NOW.toISOString(),
    updatedAt: NOW.toISOString(),
    version: 0,
    outbound: {
      state: 'awaiting_payment',
      delivery: {
        method: kind.method,
        name: 'Ines Abara',
        line1: '1 Mill Lane',
        city: 'Boise',
        region: 'ID',
        zip: '83702',
      },
      carrier: null,
      tracking: null,
      pickupCode: kind.method === 'pickup' ? '482913' : null,
      tagCode: 'AB12CD34E',
      paidAt: null,
      shippedAt: null,
      deliveredAt: null,
      closedAt: null,
    },
    core:
      kind.terms === 'outright'
        ? null
        : {
            state: 'held',
            dueAt: null,
            windowDays: 45,
            caseCode: null,
            tagCode: null,
            method: null,
            carrier: null,
            tracking: null,
            otherCoreAllowed: false,
            sentAt: null,
            sentLate: false,
            receivedAt: null,
            gradedAt: null,
            grade: null,
            deductions: [],
            toBuilderCents: null,
            toSellerCents: null,
          },
    money: {
      priceCents: amounts.priceCents,
      depositCents: amounts.depositCents,
      freightCents: amounts.freightCents,
      taxCents: amounts.taxCents,
      totalCents: total(amounts),
      heldCents: 0,
      heldUnitCents: 0,
      heldCoreCents: 0,
      refundedCents: 0,
      paidOutCents: 0,
      feeCents: 0,
      onTheWayCents: 0,
    },
    schedule: SCHEDULE,
    returnFreight: 'seller',
    clocks: [{ clock: 'reserve_lapse', at: reserveLapsesAt(NOW).toISOString() }],
    zone: 'America/Chicago',
    frozen: false,
    checkoutUrl: 'https://pay.example/4452',
    photos: [],
    listingPhotos: [],
    timeline: [],
    documents: [],
  };
}

const startFacts = (kind: WalkKind): OrderFacts =>
  facts({
    outbound: 'awaiting_payment',
    core: kind.terms === 'exchange' ? 'held' : null,
    version: 0,
    delivery: kind.method,
    amounts: amountsOf(kind),
    holds: { unitCents: 0, coreCents: 0, taxCents: 0 },
    photos: PHOTOS,
    coreMatch: 'same',
    listingLive: true,
  });

/** A step that satisfies the guards of its row. */
function stepOf(row: FlowRow, at: OrderFacts): Step {
  const version = at.version;
  switch (row.action) {
    case 'pay':
      return { action: 'pay', amountCents: total(at.amounts), currency: 'usd' };
    case 'expire':
    case 'lapse':
    case 'release':
      return { action: row.action };
    case 'settle': {
      const covered = at.holds.coreCents + (row.leg === 'outbound' ? at.holds.unitCents : 0);
      return { action: 'settle', toBuyerCents: covered - 2_500, toSellerCents: 2_500 };
    }
    case 'cancel':
      return { action: 'cancel', input: { version, reason: 'Sold at the counter' } };
    case 'pack':
      return { action: 'pack', input: { version, tagCode: at.tagCode, drained: true, plugged: true } };
    case 'hand_over':
      return {
        action: 'hand_over',
        input: { version, carrier: 'Ridge', tracking: '1', pickupCode: at.pickupCode },
      };
    case 'refuse':
    case 'contest':
      return { action: row.action, input: { version, reason: 'An ear is broken' } };
    case 'book_return':
      return { action: 'book_return', input: { version, caseCode: 'K66A' } };
    case 'send':
      return { action: 'send', input: { version, method: 'drop_off' } };
    case 'extend':
      return { action: 'extend', input: { version, days: 7 } };
    case 'grade':
      return {
        action: 'grade',
        input: { version, grade: 'B', deductions: [{ code: 'pan', photoId: 'g1' }] },
      };
    default:
      return { action: row.action, input: { version } };
  }
}

function holdsAfter(at: OrderFacts, decision: Decision): OrderFacts['holds'] {
  const sum = (account: 'hold' | 'tax', leg: 'unit' | 'core' | null): number =>
    -decision.entries
      .flatMap((entry) => entry.postings)
      .filter((one) => one.account === account && one.leg === leg)
      .reduce((total, one) => total + one.cents, 0);
  return {
    unitCents: at.holds.unitCents + sum('hold', 'unit'),
    coreCents: at.holds.coreCents + sum('hold', 'core'),
    taxCents: at.holds.taxCents + sum('tax', null),
  };
}

const owed = (decision: Decision, account: 'refund' | 'payable' | 'fee'): number =>
  -decision.entries
    .flatMap((entry) => entry.postings)
    .filter((one) => one.account === account)
    .reduce((sum, one) => sum + one.cents, 0);

function moneyAfter(before: Order['money'], holds: OrderFacts['holds'], decision: Decision): Order['money'] {
  return {
    ...before,
    heldUnitCents: holds.unitCents,
    heldCoreCents: holds.coreCents,
    heldCents: holds.unitCents + holds.coreCents,
    refundedCents: before.refundedCents + owed(decision, 'refund'),
    paidOutCents: before.paidOutCents + owed(decision, 'payable'),
    feeCents: before.feeCents + owed(decision, 'fee'),
  };
}

function coreAfter(before: Order, decision: Decision, at: string): Order['core'] {
  const { core } = before;
  if (!core || decision.core === null) return null;
  const { action } = decision.row;
  const { deductions } = decision.changes;
  const split = deductions ? settleCore(before.money.depositCents, SCHEDULE, deductions) : null;
  return {
    ...core,
    state: decision.core,
    dueAt: decision.changes.dueAt?.toISOString() ?? core.dueAt,
    ...(action === 'book_return' ? { caseCode: 'K66A', tagCode: 'XY98ZW76V' } : {}),
    ...(action === 'send' ? { sentAt: at, method: 'drop_off' as const } : {}),
    ...(action === 'receive' ? { receivedAt: at } : {}),
    ...(split && !isSettlementFault(split)
      ? {
          gradedAt: at,
          grade: 'B' as const,
          toBuilderCents: split.toBuilderCents,
          toSellerCents: split.toSellerCents,
        }
      : {}),
  };
}

function outboundAfter(before: Order, decision: Decision, at: string): Order['outbound'] {
  const { row } = decision;
  return {
    ...before.outbound,
    state: decision.outbound,
    ...(row.action === 'pay' ? { paidAt: at } : {}),
    ...(row.action === 'hand_over' ? { shippedAt: at } : {}),
    ...(row.to === 'delivered' || row.to === 'collected' ? { deliveredAt: at } : {}),
  };
}

function after(place: Place, decision: Decision, at: Date): Place {
  const { order } = place;
  const iso = at.toISOString();
  const holds = holdsAfter(place.facts, decision);
  const clocks = [
    ...order.clocks.filter((one) => !decision.stops.includes(one.clock)),
    ...decision.starts.map((one) => ({ clock: one.clock, at: one.at.toISOString() })),
  ];
  const caseId = decision.opensCase ? 'cas_walked' : decision.closesCase ? null : order.caseId;
  return {
    facts: {
      ...place.facts,
      outbound: decision.outbound,
      core: decision.core,
      version: place.facts.version + 1,
      holds,
      dueAt: decision.changes.dueAt ?? place.facts.dueAt,
      deductions: decision.changes.deductions ?? place.facts.deductions,
    },
    order: {
      ...order,
      outboundState: decision.outbound,
      coreState: decision.core,
      version: order.version + 1,
      caseId,
      heldCents: holds.unitCents + holds.coreCents,
      outbound: outboundAfter(order, decision, iso),
      core: coreAfter(order, decision, iso),
      money: moneyAfter(order.money, holds, decision),
      clocks,
      timeline: [
        ...order.timeline,
        {
          at: iso,
          action: decision.row.action,
          by: decision.actedBy,
          byName: null,
          note: null,
          log: decision.row.log,
        },
      ],
    },
  };
}

/** How it came there, where the picture differs by it. */
function wayOf(order: Order): string {
  const took = (action: string): boolean => order.timeline.some((one) => one.action === action);
  if (order.outbound.state === 'cancelled') return order.outbound.paidAt ? ' paid' : '';
  switch (order.core?.state) {
    case 'kept':
    case 'lapsed':
      return took('book_return') ? ' booked' : '';
    case 'settled':
      return took('release') ? ' ungraded' : took('contest') ? ' contested' : '';
    default:
      return '';
  }
}

const keyOf = ({ facts: at, order }: Place): string => `${at.outbound}/${at.core ?? 'none'}${wayOf(order)}`;

/** Every reachable pair of states, each by its shortest way there. */
export function walk(kind: WalkKind): Map<string, Place> {
  const start: Place = { facts: startFacts(kind), order: startOrder(kind) };
  const found = new Map([[keyOf(start), start]]);
  const queue = [start];
  for (let place = queue.shift(); place; place = queue.shift()) {
    const at = new Date(NOW.getTime() + (place.facts.version + 1) * 86_400_000);
    for (const row of rowsFrom(place.facts)) {
      const decision = decide(place.facts, row.by, stepOf(row, place.facts), at, row.leg);
      if (isFault(decision)) {
        // A hand-over has one row for each way of delivery, and only one of them fits.
        if (row.action === 'hand_over') continue;
        throw new Error(`${keyOf(place)} ${row.action}: ${decision.detail}`);
      }
      const next = after(place, decision, at);
      if (found.has(keyOf(next))) continue;
      found.set(keyOf(next), next);
      queue.push(next);
    }
  }
  return found;
}

const ROLES: Readonly<Record<Order['role'], readonly Who[]>> = {
  builder: ['builder'],
  seller: ['dock', 'seller'],
  admin: ['carrier'],
};

/** The order as that side sees it, with what that side may do now. */
export function seenBy(order: Order, role: Order['role']): Order {
  const places = { outbound: order.outbound.state, core: order.core?.state ?? null };
  const seen = new Set<string>();
  const next = rowsFrom(places).flatMap((row): Order['next'] => {
    const by = row.by.find((who) => ROLES[role].includes(who));
    if (!by || seen.has(row.action) || !PERSON_ACTIONS.some((one) => one === row.action)) return [];
    seen.add(row.action);
    return [{ action: row.action, by, label: row.label }];
  });
  return { ...order, role, next };
}
