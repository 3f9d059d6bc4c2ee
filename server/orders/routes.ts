// The routes of orders: a table of endpoint and function.
import { isMember, type Actor } from '../../shared/accounts/actor';
import { packCursor, timeCursor, unpackCursor } from '../../shared/kernel/cursor';
import {
  actionEndpoints,
  addOrderPhoto,
  findByTag,
  getOrder,
  listOrders,
  openCheckoutAgain,
  reserve,
} from '../../shared/orders/contract';
import type { Order } from '../../shared/orders/contract';
import type { Deps } from '../deps';
import { invalid, isRefusal, notFound, refuse, type Refusal } from '../http/refusal';
import { publicRoute, route, type Route } from '../http/route';
import * as addPhoto from './add-photo';
import { openCheckout } from './checkout';
import { findTag } from './find-tag';
import { presentHeads, presentOrder } from './present';
import { presentOrderPhoto } from './present-photo';
import { findHead, listHeads, orderPhotosOf } from './queries';
import { reserveUnit } from './reserve';
import { sideOf } from './roles';
import { takeAction, type PersonStep } from './take-action';

async function show(deps: Deps, actor: Actor, orderId: string): Promise<Order | Refusal> {
  const head = await findHead(deps.db, orderId);
  if (!head || sideOf(actor, head.order) === null) return notFound('order');
  return presentOrder(deps.db, head, actor);
}

async function act(deps: Deps, actor: Actor, orderId: string, step: PersonStep): Promise<Order | Refusal> {
  const result = await takeAction(deps, actor, orderId, step);
  return isRefusal(result) ? result : show(deps, actor, orderId);
}

type ListQuery = { as?: 'builder' | 'seller' | 'admin' | undefined; sellerId?: string | undefined };

/** Whose orders are asked for: one's own, those of one seller account or of all of one's own, or (admin) everybody's. */
function scopeOf(
  actor: Actor,
  query: ListQuery,
): { builderId?: string; sellerIds?: readonly string[] } | Refusal {
  if (query.sellerId !== undefined) {
    return isMember(actor, query.sellerId) || actor.isAdmin
      ? { sellerIds: [query.sellerId] }
      : notFound('seller');
  }
  if (query.as === 'admin') return actor.isAdmin ? {} : refuse('forbidden', 'This is for admins.');
  if (query.as === 'seller') return { sellerIds: actor.memberships.map((one) => one.sellerId) };
  if (query.as === 'builder') return { builderId: actor.userId };
  // Nothing said: a yard's people see the yard's orders, an admin all, everybody else their own.
  if (actor.memberships.length > 0) return { sellerIds: actor.memberships.map((one) => one.sellerId) };
  return actor.isAdmin ? {} : { builderId: actor.userId };
}

const reading: readonly Route[] = [
  route(listOrders, async (call, deps) => {
    const { query } = call;
    const scope = scopeOf(call.actor, query);
    if (isRefusal(scope)) return scope;
    const cursor = query.cursor ? unpackCursor(query.cursor, timeCursor) : null;
    if (query.cursor && !cursor) return invalid('cursor', 'Start from the first page');
    const rows = await listHeads(deps.db, {
      ...scope,
      outbound: query.state,
      core: query.core,
      open: query.open === undefined ? undefined : query.open === 'true',
      after: cursor ? { createdAt: new Date(cursor[0]), id: cursor[1] } : undefined,
      limit: query.limit + 1,
    });
    const shown = rows.slice(0, query.limit);
    const last = shown.at(-1)?.order;
    return {
      items: await presentHeads(deps.db, shown, call.actor),
      next: rows.length > query.limit && last ? packCursor([last.createdAt.toISOString(), last.id]) : null,
    };
  }),
  route(getOrder, (call, deps) => show(deps, call.actor, call.params.id)),
  publicRoute(findByTag, (call, deps) => findTag(deps, call.actor, call.params.code)),
];

const writing: readonly Route[] = [
  route(reserve, async (call, deps) => {
    const result = await reserveUnit(deps, call.actor, call.body);
    if (isRefusal(result)) return result;
    const order = await show(deps, call.actor, result.order.id);
    return isRefusal(order) ? order : { order, checkoutUrl: result.checkoutUrl };
  }),
  route(openCheckoutAgain, async (call, deps) => {
    const head = await findHead(deps.db, call.params.id);
    if (!head || sideOf(call.actor, head.order) === null) return notFound('order');
    if (sideOf(call.actor, head.order) !== 'builder') return refuse('forbidden', 'The builder pays.');
    if (head.order.outbound !== 'awaiting_payment')
      return refuse('wrong_state', 'This order is not waiting for payment.');
    const checkoutUrl = head.order.checkoutUrl ?? (await openCheckout(deps, head.order, call.actor.email));
    return checkoutUrl
      ? { checkoutUrl }
      : refuse('unavailable', 'The payment page does not answer now. Try again in a minute.');
  }),
  route(addOrderPhoto, async (call, deps) => {
    const photosNow = (await orderPhotosOf(deps.db, call.params.id)).length;
    const result = await addPhoto.addOrderPhoto(deps, call.actor, {
      orderId: call.params.id,
      purpose: call.body.purpose,
      shot: call.body.shot,
      file: call.file,
      photosNow,
    });
    if (isRefusal(result)) return result;
    return presentOrderPhoto(result.photo, result.order) ?? notFound('photo');
  }),
];

const E = actionEndpoints;

/** One route per action, so that each has its own body and its own line in the authorisation test. */
const actions: readonly Route[] = [
  route(E.abandon, (c, deps) => act(deps, c.actor, c.params.id, { action: 'abandon', input: c.body })),
  route(E.cancel, (c, deps) => act(deps, c.actor, c.params.id, { action: 'cancel', input: c.body })),
  route(E.pack, (c, deps) => act(deps, c.actor, c.params.id, { action: 'pack', input: c.body })),
  route(E.hand_over, (c, deps) => act(deps, c.actor, c.params.id, { action: 'hand_over', input: c.body })),
  route(E.deliver, (c, deps) => act(deps, c.actor, c.params.id, { action: 'deliver', input: c.body })),
  route(E.accept, (c, deps) => act(deps, c.actor, c.params.id, { action: 'accept', input: c.body })),
  route(E.refuse, (c, deps) => act(deps, c.actor, c.params.id, { action: 'refuse', input: c.body })),
  route(E.allow_other_core, (c, deps) =>
    act(deps, c.actor, c.params.id, { action: 'allow_other_core', input: c.body }),
  ),
  route(E.book_return, (c, deps) =>
    act(deps, c.actor, c.params.id, { action: 'book_return', input: c.body }),
  ),
  route(E.send, (c, deps) => act(deps, c.actor, c.params.id, { action: 'send', input: c.body })),
  route(E.extend, (c, deps) => act(deps, c.actor, c.params.id, { action: 'extend', input: c.body })),
  route(E.keep_unit, (c, deps) => act(deps, c.actor, c.params.id, { action: 'keep_unit', input: c.body })),
  route(E.receive, (c, deps) => act(deps, c.actor, c.params.id, { action: 'receive', input: c.body })),
  route(E.grade, (c, deps) => act(deps, c.actor, c.params.id, { action: 'grade', input: c.body })),
  route(E.agree, (c, deps) => act(deps, c.actor, c.params.id, { action: 'agree', input: c.body })),
  route(E.contest, (c, deps) => act(deps, c.actor, c.params.id, { action: 'contest', input: c.body })),
];

export const orderRoutes: readonly Route[] = [...reading, ...writing, ...actions];
