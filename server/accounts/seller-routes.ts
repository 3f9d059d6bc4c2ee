// The routes of seller accounts: opening one, its face, its terms, its team.
import { eq } from 'drizzle-orm';
import { hasDuty, isMember, type Actor, type Duty } from '../../shared/accounts/actor';
import * as c from '../../shared/accounts/seller-contract';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { locateZip } from '../geo/zip';
import { invalid, isRefusal, notFound, refuse, type Refusal } from '../http/refusal';
import { publicRoute, route, type Route } from '../http/route';
import { recordAudit } from './for-others';
import { insertSeller } from './open-account';
import { findSeller, presentSeller, type SellerRow } from './present';
import { sellers } from './tables';
import * as team from './team';

/** The seller account, for a member with one of the duties; 404 to strangers, 403 to members without it. */
async function sellerFor(
  deps: Deps,
  actor: Actor,
  sellerId: string,
  ...anyOf: Duty[]
): Promise<SellerRow | Refusal> {
  if (!isMember(actor, sellerId)) return notFound('seller');
  if (!hasDuty(actor, sellerId, ...anyOf)) return refuse('forbidden', 'This is for an owner of the account.');
  return (await findSeller(deps, sellerId)) ?? notFound('seller');
}

async function saveSeller(
  deps: Deps,
  actor: Actor,
  sellerId: string,
  change: Partial<typeof sellers.$inferInsert>,
  action: string,
): Promise<SellerRow | Refusal> {
  return transaction(deps.db, async (tx): Promise<SellerRow | Refusal> => {
    const [row] = await tx.update(sellers).set(change).where(eq(sellers.id, sellerId)).returning();
    if (!row) return notFound('seller');
    await recordAudit(tx, {
      at: deps.clock.now(),
      actorUserId: actor.userId,
      actorKind: 'owner',
      action,
      objectKind: 'seller',
      objectId: sellerId,
      detail: {},
    });
    return row;
  });
}

function placeOf(zip: string | undefined): Partial<typeof sellers.$inferInsert> | Refusal {
  if (zip === undefined) return {};
  const place = locateZip(zip);
  if (!place) return invalid('zip', 'We do not know this ZIP code. Check it');
  return {
    zip,
    city: place.city,
    region: place.state,
    lat: place.lat,
    lon: place.lon,
    timeZone: place.timeZone,
  };
}

export const sellerRoutes: readonly Route[] = [
  route(c.openSeller, async (call, deps) => {
    const row = await transaction(deps.db, (tx) =>
      insertSeller(tx, call.actor.userId, call.body, deps.clock.now(), 'zip'),
    );
    if (isRefusal(row)) return row;
    return { ...presentSeller(row, null), terms: row.terms, payoutsEnabled: row.payoutsEnabled };
  }),
  publicRoute(c.getSeller, async (call, deps) => {
    const row = await findSeller(deps, call.params.id);
    return row ? presentSeller(row, call.actor) : notFound('seller');
  }),
  route(c.updateSeller, async (call, deps) => {
    const seller = await sellerFor(deps, call.actor, call.params.id, 'owner');
    if (isRefusal(seller)) return seller;
    const place = placeOf(call.body.zip);
    if (isRefusal(place)) return place;
    const change = { ...place, ...(call.body.name ? { name: call.body.name } : {}) };
    if (Object.keys(change).length === 0) return presentSeller(seller, call.actor);
    const row = await saveSeller(deps, call.actor, seller.id, change, 'seller.update');
    return isRefusal(row) ? row : presentSeller(row, call.actor);
  }),
  route(c.getTerms, async (call, deps) => {
    const seller = await sellerFor(deps, call.actor, call.params.id);
    return isRefusal(seller) ? seller : seller.terms;
  }),
  route(c.putTerms, async (call, deps) => {
    const seller = await sellerFor(deps, call.actor, call.params.id, 'owner');
    if (isRefusal(seller)) return seller;
    const row = await saveSeller(deps, call.actor, seller.id, { terms: call.body }, 'seller.terms');
    return isRefusal(row) ? row : presentSeller(row, call.actor);
  }),
  route(c.getTeam, async (call, deps) => {
    const seller = await sellerFor(deps, call.actor, call.params.id);
    return isRefusal(seller) ? seller : team.teamOf(deps.db, seller.id, deps.clock.now());
  }),
  route(c.inviteMember, async (call, deps) => {
    const seller = await sellerFor(deps, call.actor, call.params.id, 'owner');
    return isRefusal(seller) ? seller : team.invite(deps, call.actor, seller, call.body);
  }),
  route(c.cancelInvite, async (call, deps) => {
    const { id, inviteId } = call.params;
    const seller = await sellerFor(deps, call.actor, id, 'owner');
    return isRefusal(seller) ? seller : team.cancelInvite(deps, call.actor, id, inviteId);
  }),
  route(c.acceptInvite, (call, deps) => team.accept(deps, call.actor, call.body.token)),
  route(c.setDuties, async (call, deps) => {
    const { id, userId } = call.params;
    const seller = await sellerFor(deps, call.actor, id, 'owner');
    return isRefusal(seller) ? seller : team.changeMember(deps, call.actor, id, userId, call.body.duties);
  }),
  route(c.removeMember, async (call, deps) => {
    const { id, userId } = call.params;
    const seller = await sellerFor(deps, call.actor, id, 'owner');
    return isRefusal(seller) ? seller : team.changeMember(deps, call.actor, id, userId, []);
  }),
];
