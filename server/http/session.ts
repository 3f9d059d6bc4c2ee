// Sessions in PostgreSQL and the token that guards unsafe requests. A visitor without a cookie costs no look-up.
import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import connectPg from 'connect-pg-simple';
import type { CookieOptions, Request, RequestHandler, Response } from 'express';
import session from 'express-session';
import type { Deps } from '../deps';
import { sendProblem } from './problem';
import { refuse } from './refusal';
import type { SessionSeam } from './route';

declare module 'express-session' {
  interface SessionData {
    userId: string;
    /** When this sign-in ends whatever happens, in milliseconds. */
    endsAtMs: number;
    startedAtMs: number;
    agent: string;
  }
}

const IDLE_MS = 12 * 3_600_000;
const ABSOLUTE_MS = 14 * 86_400_000;
const TOUCH_EVERY_MS = 60_000;
const REMEMBERED_TOUCHES = 10_000;
const SAFE: ReadonlySet<string> = new Set(['GET', 'HEAD', 'OPTIONS']);
const NONCE = /^[A-Za-z0-9_-]{22,64}$/;

const production = (deps: Deps): boolean => deps.env.NODE_ENV === 'production';
const sessionCookie = (deps: Deps): string => (production(deps) ? '__Host-sid' : 'sid');
const nonceCookie = (deps: Deps): string => (production(deps) ? '__Host-visit' : 'visit');

const cookieOptions = (deps: Deps): CookieOptions => ({
  httpOnly: true,
  sameSite: 'lax',
  secure: production(deps),
  path: '/',
});

function cookieOf(req: Request, name: string): string | null {
  for (const part of (req.get('cookie') ?? '').split(';')) {
    const [key, ...value] = part.trim().split('=');
    if (key === name) return value.join('=') || null;
  }
  return null;
}

/**
 * The end of a session moves at most once a minute: a page of photos would otherwise write one row dozens of times.
 * It is only ever an update, so a session that was ended elsewhere meanwhile stays ended.
 */
function touchSeldom(store: session.Store): session.Store {
  const touch = store.touch?.bind(store);
  const touchedAtMs = new Map<string, number>();
  store.touch = (sid, data, done) => {
    const now = Date.now();
    if (!touch || now - (touchedAtMs.get(sid) ?? 0) < TOUCH_EVERY_MS) return done?.();
    if (touchedAtMs.size >= REMEMBERED_TOUCHES) touchedAtMs.clear();
    touchedAtMs.set(sid, now);
    touch(sid, data, done);
  };
  return store;
}

/** Whatever a shared cache may keep must not carry somebody's session cookie. Stands before the session itself. */
const keepCookiesOutOfCaches: RequestHandler = (_req, res, next) => {
  const writeHead = res.writeHead.bind(res) as (...args: unknown[]) => Response;
  res.writeHead = ((...args: unknown[]) => {
    if (/\bpublic\b/.test(String(res.getHeader('cache-control') ?? ''))) res.removeHeader('set-cookie');
    return writeHead(...args);
  }) as Response['writeHead'];
  next();
};

export function sessionLayer(deps: Deps): RequestHandler[] {
  const Store = connectPg(session);
  const name = sessionCookie(deps);
  const sessions = session({
    name,
    secret: deps.env.SESSION_SECRET,
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: 'lax', secure: production(deps), path: '/', maxAge: IDLE_MS },
    store: touchSeldom(
      new Store({
        pool: deps.pool,
        tableName: 'session',
        createTableIfMissing: false,
        pruneSessionInterval: false,
      }),
    ),
  });
  const endOld: RequestHandler = (req, _res, next) => {
    const endsAtMs = req.session?.endsAtMs;
    if (endsAtMs === undefined || endsAtMs > Date.now()) next();
    // An empty one in its place, so that this very request may sign in again.
    else req.session.regenerate(next);
  };
  return [keepCookiesOutOfCaches, sessions, endOld];
}

const sign = (deps: Deps, text: string): string =>
  createHmac('sha256', deps.env.SESSION_SECRET).update(`csrf:${text}`).digest('base64url');

/** Bound to the session, or for a visitor to a cookie of their own. */
function boundTo(deps: Deps, req: Request): string | null {
  if (req.session?.userId) return `session:${req.sessionID}`;
  const nonce = cookieOf(req, nonceCookie(deps));
  return nonce && NONCE.test(nonce) ? `visit:${nonce}` : null;
}

function csrfTokenOf(deps: Deps, req: Request, res: Response): string {
  const bound = boundTo(deps, req);
  if (bound) return sign(deps, bound);
  const nonce = randomBytes(18).toString('base64url');
  res.cookie(nonceCookie(deps), nonce, cookieOptions(deps));
  return sign(deps, `visit:${nonce}`);
}

const equal = (a: string, b: string): boolean => {
  const left = Buffer.from(a);
  const right = Buffer.from(b);
  return left.length === right.length && timingSafeEqual(left, right);
};

function isOurOrigin(deps: Deps, req: Request): boolean {
  const origin = req.get('origin');
  if (origin === undefined) return true;
  return (
    origin === new URL(deps.env.PUBLIC_URL).origin || origin === `${req.protocol}://${req.get('host') ?? ''}`
  );
}

/** Unsafe requests come from our own pages and carry the token of GET /api/auth/me. */
export const csrfGuard =
  (deps: Deps): RequestHandler =>
  (req, res, next) => {
    if (SAFE.has(req.method)) return next();
    if (!isOurOrigin(deps, req)) {
      return sendProblem(req, res, refuse('foreign_origin', 'Send this from Spragyard itself.'));
    }
    const bound = boundTo(deps, req);
    const token = req.get('x-csrf-token') ?? '';
    if (bound && equal(token, sign(deps, bound))) return next();
    sendProblem(
      req,
      res,
      refuse('bad_csrf', 'Send the csrfToken of GET /api/auth/me in the header x-csrf-token.'),
    );
  };

export const userIdOf = (req: Request): string | null => req.session?.userId ?? null;

const regenerate = (req: Request): Promise<void> =>
  new Promise((resolve, reject) => {
    req.session.regenerate((error: unknown) => (error instanceof Error ? reject(error) : resolve()));
  });

const save = (req: Request): Promise<void> =>
  new Promise((resolve, reject) => {
    req.session.save((error: unknown) => (error instanceof Error ? reject(error) : resolve()));
  });

const destroy = (req: Request): Promise<void> =>
  new Promise((resolve, reject) => {
    req.session.destroy((error: unknown) => (error instanceof Error ? reject(error) : resolve()));
  });

export function sessionSeam(deps: Deps, req: Request, res: Response): SessionSeam {
  return {
    id: () => (req.session?.userId ? req.sessionID : null),
    signIn: async (userId) => {
      await regenerate(req);
      req.session.userId = userId;
      req.session.startedAtMs = Date.now();
      req.session.endsAtMs = Date.now() + ABSOLUTE_MS;
      req.session.agent = (req.get('user-agent') ?? '').slice(0, 200);
      await save(req);
    },
    signOut: async () => {
      await destroy(req);
      res.clearCookie(sessionCookie(deps), cookieOptions(deps));
    },
    csrfToken: () => csrfTokenOf(deps, req, res),
  };
}
