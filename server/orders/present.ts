// What of an order leaves the server, field by field, and what the asking person may do now.
import type { Actor } from '../../shared/accounts/actor';
import type { Order, OrderMoney, OrderSummary } from '../../shared/orders/contract';
import { PERSON_ACTIONS, type PersonAction } from '../../shared/orders/actions';
import { STRIKES, type ClockName } from '../../shared/orders/clocks';
import { rowsFrom } from '../../shared/orders/flow';
import { isSettlementFault, settleCore } from '../../shared/orders/settlement';
import type { Action } from '../../shared/orders/states';
import type { Tx } from '../db/client';
import { moneyOf, type MoneyRow } from '../money/for-others';
import { photoUrls } from '../photos/for-others';
import type { OrderRow } from './load';
import * as queries from './queries';
import { documentsOf } from './papers';
import { presentOrderPhoto } from './present-photo';
import { rolesOf, sideOf, type Side } from './roles';

const iso = (date: Date | null): string | null => date?.toISOString() ?? null;
const isPersonAction = (action: Action): action is PersonAction =>
  PERSON_ACTIONS.some((one) => one === action);

interface Clock {
  readonly clock: ClockName;
  readonly at: Date;
}

/** The clock that would otherwise take this action, or its counterpart, on the same leg. */
const COUNTERPART: Partial<Record<Action, ClockName>> = {
  pack: 'ship_by',
  hand_over: 'ship_by',
  cancel: 'ship_by',
  abandon: 'reserve_lapse',
  accept: 'inspection',
  refuse: 'inspection',
  book_return: 'core_lapse',
  send: 'core_lapse',
  keep_unit: 'core_lapse',
  grade: 'grade_by',
  agree: 'agree_by',
  contest: 'agree_by',
};

function nextOf(order: OrderRow, actor: Actor, clocks: readonly Clock[]): OrderSummary['next'] {
  const roles = rolesOf(actor, order);
  const seen = new Set<Action>();
  const steps: OrderSummary['next'] = [];
  for (const row of rowsFrom(order)) {
    const by = row.by.find((who) => roles.includes(who));
    const otherWay =
      row.action === 'hand_over' && (row.to === 'collected') !== (order.deliveryMethod === 'pickup');
    const frozen = order.frozen && row.guards.includes('not_frozen');
    if (!by || otherWay || frozen || !isPersonAction(row.action) || seen.has(row.action)) continue;
    seen.add(row.action);
    const clock = clocks.find((one) => one.clock === COUNTERPART[row.action]);
    // The due date is what the builder is told, the grace after it is not.
    const at = clock?.clock === 'core_lapse' ? order.dueAt : (clock?.at ?? null);
    steps.push({ action: row.action, by, label: row.label, ...(at ? { deadlineAt: at.toISOString() } : {}) });
  }
  return steps;
}

export function presentMoney(order: OrderRow, money: MoneyRow): OrderMoney {
  return {
    priceCents: order.priceCents,
    depositCents: order.depositCents,
    freightCents: order.freightCents,
    taxCents: order.taxCents,
    totalCents: order.priceCents + order.depositCents + order.freightCents + order.taxCents,
    heldCents: money.heldUnitCents + money.heldCoreCents,
    heldUnitCents: money.heldUnitCents,
    heldCoreCents: money.heldCoreCents,
    refundedCents: money.refundedCents,
    paidOutCents: money.paidOutCents,
    feeCents: money.feeCents,
    onTheWayCents: money.onTheWayCents,
  };
}

interface Extras {
  readonly clocks: readonly Clock[];
  readonly money: MoneyRow;
  readonly caseId: string | null;
}

function presentHead(head: queries.OrderHead, actor: Actor, side: Side, extras: Extras): OrderSummary {
  const { order } = head;
  const next = nextOf(order, actor, extras.clocks);
  const striking = extras.clocks.filter((one) => STRIKES[one.clock].action !== null).map((one) => one.at);
  return {
    id: order.id,
    number: order.number,
    title: order.title,
    caseCode: order.caseCode,
    photoUrl: head.coverPhotoId ? photoUrls(head.coverPhotoId).small : null,
    listingId: order.listingId,
    builderName: head.builderName,
    sellerId: order.sellerId,
    sellerName: head.sellerName,
    terms: order.terms,
    outboundState: order.outbound,
    coreState: order.core,
    role: side,
    heldCents: extras.money.heldUnitCents + extras.money.heldCoreCents,
    totalCents: order.priceCents + order.depositCents + order.freightCents + order.taxCents,
    next,
    deadlineAt:
      next.map((step) => step.deadlineAt).find((at) => at !== undefined) ?? iso(striking[0] ?? null),
    zone: order.zone,
    caseId: extras.caseId,
    createdAt: order.createdAt.toISOString(),
    updatedAt: order.updatedAt.toISOString(),
  };
}

export async function presentHeads(
  tx: Tx,
  list: readonly queries.OrderHead[],
  actor: Actor,
): Promise<OrderSummary[]> {
  const ids = list.map((head) => head.order.id);
  const [clocks, moneyFor, cases] = await Promise.all([
    queries.clocksOf(tx, ids),
    moneyOf(tx, ids),
    queries.openCasesOf(tx, ids),
  ]);
  return list.map((head) =>
    presentHead(head, actor, sideOf(actor, head.order) ?? 'admin', {
      clocks: clocks.filter((one) => one.orderId === head.order.id),
      money: moneyFor(head.order.id),
      caseId: cases.findLast((one) => one.orderId === head.order.id)?.id ?? null,
    }),
  );
}

function presentCore(order: OrderRow, side: Side): Order['core'] {
  if (order.core === null) return null;
  const graded =
    order.deductions === null ? null : settleCore(order.depositCents, order.schedule, order.deductions);
  const split = graded && !isSettlementFault(graded) ? graded : null;
  const booked = order.coreCaseCode !== null;
  return {
    state: order.core,
    dueAt: iso(order.dueAt),
    windowDays: order.windowDays,
    caseCode: order.coreCaseCode,
    tagCode: booked || side === 'admin' ? order.coreTagCode : null,
    method: order.coreMethod,
    carrier: order.coreCarrier,
    tracking: order.coreTracking,
    otherCoreAllowed: order.otherCoreAllowed,
    sentAt: iso(order.coreSentAt),
    sentLate: order.coreSentAt !== null && order.dueAt !== null && order.coreSentAt > order.dueAt,
    receivedAt: iso(order.coreReceivedAt),
    gradedAt: iso(order.coreGradedAt),
    grade: order.grade,
    deductions: (order.deductions ?? []).map((one) => {
      const item = order.schedule.find((line) => line.code === one.code);
      return {
        code: one.code,
        label: item?.label ?? one.code,
        cents: item?.cents ?? 0,
        photoId: one.photoId,
        photoUrl: photoUrls(one.photoId).medium,
        note: one.note ?? null,
      };
    }),
    toBuilderCents: split?.toBuilderCents ?? null,
    toSellerCents: split?.toSellerCents ?? null,
  };
}

function presentOutbound(order: OrderRow, side: Side): Order['outbound'] {
  return {
    state: order.outbound,
    delivery: order.delivery,
    carrier: order.carrier,
    tracking: order.tracking,
    pickupCode: side === 'builder' && order.deliveryMethod === 'pickup' ? order.pickupCode : null,
    tagCode: side === 'builder' ? null : order.tagCode,
    paidAt: iso(order.paidAt),
    shippedAt: iso(order.shippedAt),
    deliveredAt: iso(order.deliveredAt),
    closedAt: iso(order.closedAt),
  };
}

export async function presentOrder(tx: Tx, head: queries.OrderHead, actor: Actor): Promise<Order> {
  const { order } = head;
  const side = sideOf(actor, order) ?? 'admin';
  const [clocks, moneyFor, cases, log, photos, listingPhotos] = await Promise.all([
    queries.clocksOf(tx, [order.id]),
    moneyOf(tx, [order.id]),
    queries.openCasesOf(tx, [order.id]),
    queries.timelineOf(tx, order.id),
    queries.orderPhotosOf(tx, order.id),
    queries.listingPhotosOf(tx, order.listingId),
  ]);
  const money = moneyFor(order.id);
  const caseId = cases.at(-1)?.id ?? null;
  return {
    ...presentHead(head, actor, side, { clocks, money, caseId }),
    version: order.version,
    outbound: presentOutbound(order, side),
    core: presentCore(order, side),
    money: presentMoney(order, money),
    schedule: order.schedule,
    returnFreight: order.returnFreight,
    clocks: clocks.map((one) => ({ clock: one.clock, at: one.at.toISOString() })),
    frozen: order.frozen,
    checkoutUrl: side === 'builder' && order.outbound === 'awaiting_payment' ? order.checkoutUrl : null,
    photos: photos.flatMap(({ photo }) => presentOrderPhoto(photo, order) ?? []),
    listingPhotos: listingPhotos.map((one) => ({
      shot: one.shot,
      url: photoUrls(one.id).large,
      thumbUrl: photoUrls(one.id).small,
    })),
    timeline: log.map((one) => ({ ...one, at: one.at.toISOString() })),
    documents: documentsOf(order, caseId !== null),
  };
}
