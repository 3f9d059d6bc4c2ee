// The routes of accounts: a table of endpoint and function.
import { eq } from 'drizzle-orm';
import { hasDuty, isMember, type Actor } from '../../shared/accounts/actor';
import * as c from '../../shared/accounts/contract';
import { invalid, isRefusal, notFound, refuse, type Refusal } from '../http/refusal';
import { publicRoute, route, type Route } from '../http/route';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { adminRoutes } from './admin-routes';
import { recordAudit } from './for-others';
import { insertSeller, openAccount } from './open-account';
import { findSeller, presentMe, presentSeller, type SellerRow } from './present';
import * as reset from './reset';
import { endOneSession, presentSessions } from './sessions';
import { signInWithPassword } from './sign-in';
import { sellers, type SellerTerms } from './tables';
import * as team from './team';
import { locateZip } from '../geo/zip';

const signing: readonly Route[] = [
  publicRoute(c.getMe, (call, deps) => presentMe(deps, call.actor?.userId ?? null, call.session)),
  publicRoute(c.signUp, async (call, deps) => {
    const userId = await openAccount(deps, call.body);
    if (isRefusal(userId)) return userId;
    await call.session.signIn(userId);
    return presentMe(deps, userId, call.session);
  }),
  publicRoute(c.signIn, async (call, deps) => {
    const userId = await signInWithPassword(deps, { ...call.body, address: call.address });
    if (isRefusal(userId)) return userId;
    await call.session.signIn(userId);
    return presentMe(deps, userId, call.session);
  }),
  publicRoute(c.signOut, async (call) => {
    await call.session.signOut();
  }),
  publicRoute(c.checkMail, (call, deps) => reset.checkMailLink(deps, call.body.token)),
  route(c.resendCheck, async (call, deps) => {
    await reset.resendCheckLink(deps, call.actor.userId);
  }),
  publicRoute(c.forgot, async (call, deps) => {
    await reset.mailResetLink(deps, call.body.email);
  }),
  publicRoute(c.resetPassword, async (call, deps) => {
    const done = await reset.resetWithLink(deps, call.body.token, call.body.password);
    if (isRefusal(done)) return done;
  }),
];

const own: readonly Route[] = [
  route(c.changePassword, async (call, deps) => {
    const { actor, session } = call;
    const done = await reset.changeOwnPassword(deps, {
      userId: actor.userId,
      email: actor.email,
      current: call.body.current,
      password: call.body.password,
      sid: session.id(),
    });
    if (isRefusal(done)) return done;
    await session.signIn(actor.userId);
    return presentMe(deps, actor.userId, session);
  }),
  route(c.listSessions, (call, deps) => presentSessions(deps, call.actor.userId, call.session.id())),
  route(c.endSession, async (call, deps) => {
    const done = await endOneSession(deps, call.actor.userId, call.params.id);
    if (isRefusal(done)) return done;
  }),
];

/** The seller account, for a member with one of the duties; 404 to strangers, 403 to members without it. */
async function sellerFor(
  deps: Deps,
  actor: Actor,
  sellerId: string,
  ...anyOf: Parameters<typeof hasDuty>[2][]
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

const selling: readonly Route[] = [
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
  route(c.putTerms, async (call, deps) => {
    const seller = await sellerFor(deps, call.actor, call.params.id, 'owner');
    if (isRefusal(seller)) return seller;
    const terms: SellerTerms = call.body;
    const row = await saveSeller(deps, call.actor, seller.id, { terms }, 'seller.terms');
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

export const accountRoutes: readonly Route[] = [...signing, ...own, ...selling, ...adminRoutes];
