// The orders on the wire: what a builder, a yard and an outside client see and send.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { at, cents, id, idParams, line, page, pageQuery, zip } from '../kernel/fields';
import { ACTION_INPUT, GRADES, PERSON_ACTIONS, type PersonAction } from './actions';
import { CLOCKS } from './clocks';
import { ACTIONS, CORE_STATES, OUTBOUND_STATES, PHOTO_PURPOSES, WHO } from './states';

export const scheduleItem = z.object({ code: z.string(), label: z.string(), cents });

export const delivery = z.strictObject({
  method: z.enum(['freight', 'pickup']),
  name: line(120),
  line1: line(200),
  city: line(100),
  region: line(60),
  zip,
});

export const orderMoney = z.object({
  priceCents: cents,
  depositCents: cents,
  freightCents: cents,
  taxCents: cents,
  totalCents: cents,
  heldCents: cents,
  heldUnitCents: cents,
  heldCoreCents: cents,
  refundedCents: cents,
  paidOutCents: cents,
  feeCents: cents,
  /** Decided, but not yet confirmed by the payment provider. */
  onTheWayCents: cents,
});

export const orderPhoto = z.object({
  id,
  purpose: z.enum(PHOTO_PURPOSES),
  shot: z.string().nullable(),
  url: z.string(),
  thumbUrl: z.string(),
  takenAt: at.nullable(),
  addedAt: at,
  by: z.enum(['builder', 'seller']),
});

export const nextStep = z.object({
  action: z.enum(ACTIONS),
  by: z.enum(WHO),
  label: z.string(),
  deadlineAt: at.optional(),
});

export const openClock = z.object({ clock: z.enum(CLOCKS), at });

export const orderSummary = z.object({
  id,
  number: z.string(),
  title: z.string(),
  caseCode: z.string(),
  photoUrl: z.string().nullable(),
  listingId: id,
  builderName: z.string(),
  sellerId: id,
  sellerName: z.string(),
  terms: z.enum(['exchange', 'outright']),
  outboundState: z.enum(OUTBOUND_STATES),
  coreState: z.enum(CORE_STATES).nullable(),
  /** What the asking user is on this order. */
  role: z.enum(['builder', 'seller', 'admin']),
  heldCents: cents,
  totalCents: cents,
  next: z.array(nextStep),
  deadlineAt: at.nullable(),
  /** IANA zone of the seller, in which every deadline of the order is counted. */
  zone: z.string(),
  caseId: id.nullable(),
  createdAt: at,
  updatedAt: at,
});

export const order = orderSummary.extend({
  version: z.number().int(),
  outbound: z.object({
    state: z.enum(OUTBOUND_STATES),
    delivery,
    carrier: z.string().nullable(),
    tracking: z.string().nullable(),
    /** Only the builder sees it, and only where they collect the unit. */
    pickupCode: z.string().nullable(),
    /** Only the seller sees it: it is on the tag wired to the unit. */
    tagCode: z.string().nullable(),
    paidAt: at.nullable(),
    shippedAt: at.nullable(),
    deliveredAt: at.nullable(),
    closedAt: at.nullable(),
  }),
  core: z
    .object({
      state: z.enum(CORE_STATES),
      dueAt: at.nullable(),
      windowDays: z.number().int(),
      caseCode: z.string().nullable(),
      tagCode: z.string().nullable(),
      method: z.enum(['carrier', 'drop_off']).nullable(),
      carrier: z.string().nullable(),
      tracking: z.string().nullable(),
      otherCoreAllowed: z.boolean(),
      sentAt: at.nullable(),
      sentLate: z.boolean(),
      receivedAt: at.nullable(),
      gradedAt: at.nullable(),
      grade: z.enum(GRADES).nullable(),
      deductions: z.array(
        scheduleItem.extend({ photoId: id, photoUrl: z.string(), note: z.string().nullable() }),
      ),
      /** Known once graded: what agreeing would do. */
      toBuilderCents: cents.nullable(),
      toSellerCents: cents.nullable(),
    })
    .nullable(),
  money: orderMoney,
  schedule: z.array(scheduleItem),
  returnFreight: z.enum(['seller', 'builder']),
  clocks: z.array(openClock),
  frozen: z.boolean(),
  checkoutUrl: z.string().nullable(),
  photos: z.array(orderPhoto),
  listingPhotos: z.array(z.object({ shot: z.string().nullable(), url: z.string(), thumbUrl: z.string() })),
  timeline: z.array(
    z.object({
      at,
      action: z.string(),
      by: z.enum(WHO),
      byName: z.string().nullable(),
      note: z.string().nullable(),
      log: z.string(),
    }),
  ),
  documents: z.array(z.object({ name: z.string(), label: z.string(), url: z.string() })),
});

export type Order = z.output<typeof order>;
export type OrderSummary = z.output<typeof orderSummary>;
export type OrderMoney = z.output<typeof orderMoney>;

export const reserve = endpoint({
  method: 'POST',
  path: '/api/orders',
  summary: 'Reserve a listing for 30 minutes and open the hosted checkout page',
  access: 'signed_in',
  idempotent: true,
  perMinute: 120,
  body: z.strictObject({ listingId: id, terms: z.enum(['exchange', 'outright']), delivery }),
  answer: z.object({ order, checkoutUrl: z.string().nullable() }),
  status: 201,
});

export const openCheckoutAgain = endpoint({
  method: 'POST',
  path: '/api/orders/:id/checkout',
  summary: 'The address of the hosted checkout page of a reserved order',
  access: 'party',
  params: idParams,
  answer: z.object({ checkoutUrl: z.string() }),
});

export const listOrders = endpoint({
  method: 'GET',
  path: '/api/orders',
  summary: 'Orders of the asking builder, or of a seller account with ?sellerId=',
  access: 'signed_in',
  query: z.object({
    ...pageQuery,
    as: z.enum(['builder', 'seller', 'admin']).optional(),
    sellerId: id.optional(),
    state: z.enum(OUTBOUND_STATES).optional(),
    core: z.enum(CORE_STATES).optional(),
    open: z.enum(['true', 'false']).optional(),
  }),
  answer: page(orderSummary),
});

export const getOrder = endpoint({
  method: 'GET',
  path: '/api/orders/:id',
  summary: 'One order with both legs, the money, what the asking user may do now, and its log',
  access: 'party',
  params: idParams,
  answer: order,
});

export const findByTag = endpoint({
  method: 'GET',
  path: '/api/tags/:code',
  summary: 'What a scanned tag belongs to, for whoever scans it',
  access: 'public',
  params: z.strictObject({ code: z.string().min(4).max(40) }),
  answer: z.object({
    kind: z.enum(['unit', 'core']),
    listingId: id.nullable(),
    /** Only for a party to the order. */
    orderId: id.nullable(),
    role: z.enum(['builder', 'seller', 'admin']).nullable(),
  }),
});

export const addOrderPhoto = endpoint({
  method: 'POST',
  path: '/api/orders/:id/photos',
  summary: 'Add a photo that proves something on this order',
  access: 'party',
  params: idParams,
  body: z.strictObject({ purpose: z.enum(PHOTO_PURPOSES), shot: z.string().max(60).optional() }),
  file: 'file',
  idempotent: true,
  answer: orderPhoto,
  status: 201,
});

export const orderDocument = endpoint({
  method: 'GET',
  path: '/api/orders/:id/documents/:name',
  summary: 'packing-tag.pdf, return-tag.pdf, bill-of-sale.pdf or case-pack.pdf',
  access: 'party',
  params: z.strictObject({
    id,
    name: z.enum(['packing-tag.pdf', 'return-tag.pdf', 'bill-of-sale.pdf', 'case-pack.pdf']),
  }),
});

const actionEndpoint = <B extends z.ZodType>(action: PersonAction, body: B) =>
  endpoint({
    method: 'POST',
    path: `/api/orders/:id/actions/${action}`,
    summary: `Take the action ${action} on an order`,
    access: 'party',
    idempotent: true,
    params: idParams,
    body,
    answer: order,
  });

/** One endpoint per action a person may take, so that each has its own body in the OpenAPI document. */
export const actionEndpoints = {
  abandon: actionEndpoint('abandon', ACTION_INPUT.abandon),
  cancel: actionEndpoint('cancel', ACTION_INPUT.cancel),
  pack: actionEndpoint('pack', ACTION_INPUT.pack),
  hand_over: actionEndpoint('hand_over', ACTION_INPUT.hand_over),
  deliver: actionEndpoint('deliver', ACTION_INPUT.deliver),
  accept: actionEndpoint('accept', ACTION_INPUT.accept),
  refuse: actionEndpoint('refuse', ACTION_INPUT.refuse),
  allow_other_core: actionEndpoint('allow_other_core', ACTION_INPUT.allow_other_core),
  book_return: actionEndpoint('book_return', ACTION_INPUT.book_return),
  send: actionEndpoint('send', ACTION_INPUT.send),
  extend: actionEndpoint('extend', ACTION_INPUT.extend),
  keep_unit: actionEndpoint('keep_unit', ACTION_INPUT.keep_unit),
  receive: actionEndpoint('receive', ACTION_INPUT.receive),
  grade: actionEndpoint('grade', ACTION_INPUT.grade),
  agree: actionEndpoint('agree', ACTION_INPUT.agree),
  contest: actionEndpoint('contest', ACTION_INPUT.contest),
} as const satisfies Record<PersonAction, unknown>;

export { PERSON_ACTIONS };
