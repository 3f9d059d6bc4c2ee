// The routes of a person's account: a table of endpoint and function.
import * as c from '../../shared/accounts/contract';
import { isRefusal } from '../http/refusal';
import { publicRoute, route, type Route } from '../http/route';
import { adminRoutes } from './admin-routes';
import { closeAccount } from './close-account';
import { openAccount } from './open-account';
import { changeOwnPassword, rename } from './own-account';
import { presentMe } from './present';
import * as reset from './reset';
import { sellerRoutes } from './seller-routes';
import { endOneSession, presentSessions } from './sessions';
import { signInWithPassword } from './sign-in';

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
    const done = await reset.resendCheckLink(deps, call.actor.userId);
    if (isRefusal(done)) return done;
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
    const done = await changeOwnPassword(deps, actor, {
      ...call.body,
      address: call.address,
      sid: session.id(),
    });
    if (isRefusal(done)) return done;
    await session.signIn(actor.userId);
    return presentMe(deps, actor.userId, session);
  }),
  route(c.renameAccount, async (call, deps) => {
    const done = await rename(deps, call.actor, call.body.name);
    return isRefusal(done) ? done : presentMe(deps, call.actor.userId, call.session);
  }),
  route(c.closeAccount, async (call, deps) => {
    const done = await closeAccount(deps, call.actor, { ...call.body, address: call.address });
    if (isRefusal(done)) return done;
    await call.session.signOut();
  }),
  route(c.listSessions, (call, deps) => presentSessions(deps, call.actor.userId, call.session.id())),
  route(c.endSession, async (call, deps) => {
    const done = await endOneSession(deps, call.actor.userId, call.params.id);
    if (isRefusal(done)) return done;
  }),
];

export const accountRoutes: readonly Route[] = [...signing, ...own, ...sellerRoutes, ...adminRoutes];
