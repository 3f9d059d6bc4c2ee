// Sessions over HTTP: their cookie, their ends, and that nobody can plant one.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isRefusal } from '../../server/http/refusal';
import { linkPhoto, storePhoto } from '../../server/photos/for-others';
import { at, list, text, type Client } from '../support/client';
import { givenCatalogue, givenJpeg, givenListing, givenYard } from '../support/given';
import { startTestServer, type TestServer } from '../support/server';
import { OTHER_PASSWORD, PASSWORD, signUp, startSecond } from './given';

let server: TestServer;

beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const userOf = async (client: Client) => at((await client.get('/api/auth/me')).body, 'user');

/** What a server says to a request with exactly these cookies. */
async function meWith(cookie: string): Promise<Response> {
  return fetch(`${server.baseUrl}/api/auth/me`, { headers: { cookie } });
}

const cookieOf = (client: Client): string => `sid=${client.cookies().get('sid') ?? ''}`;

const rows = async (userId: string): Promise<number> => {
  const { rows: found } = await server.database.pool.query<{ n: number }>(
    `select count(*)::int as n from session where sess->>'userId' = $1`,
    [userId],
  );
  return found[0]?.n ?? 0;
};

describe('the session cookie', () => {
  it('when somebody signs in, then the cookie is closed to scripts and other sites and ends after 12 idle hours', async () => {
    const { email } = await signUp(server);
    const client = server.client();
    const answer = await client.post('/api/auth/sign-in', { email, password: PASSWORD });
    const cookie = answer.headers.getSetCookie().find((line) => line.startsWith('sid=')) ?? '';
    expect(cookie).toMatch(/; HttpOnly/);
    expect(cookie).toMatch(/; SameSite=Lax/);
    expect(cookie).toMatch(/; Path=\//);
    expect(cookie).not.toMatch(/; Secure|; Domain/);
    const endsMs = Date.parse(/Expires=([^;]+)/.exec(cookie)?.[1] ?? '');
    expect((endsMs - Date.now()) / 3_600_000).toBeCloseTo(12, 1);
  });

  it('when the server runs in production, then the cookies are bound to the host and sent over TLS only', async () => {
    const production = await startSecond(server, { NODE_ENV: 'production', TRUST_PROXY: 1 });
    try {
      const { email } = await signUp(server);
      const overTls = { 'x-forwarded-proto': 'https', 'content-type': 'application/json' };
      const me = await fetch(`${production.baseUrl}/api/auth/me`, { headers: overTls });
      const visit = me.headers.getSetCookie()[0] ?? '';
      expect(visit).toMatch(/^__Host-visit=.*; HttpOnly; Secure; SameSite=Lax$/);
      const { csrfToken } = (await me.json()) as { csrfToken: string };
      const answer = await fetch(`${production.baseUrl}/api/auth/sign-in`, {
        method: 'POST',
        headers: { ...overTls, 'x-csrf-token': csrfToken, cookie: visit.split(';')[0] ?? '' },
        body: JSON.stringify({ email, password: PASSWORD }),
      });
      expect(answer.status).toBe(200);
      const sid = answer.headers.getSetCookie().find((line) => line.startsWith('__Host-sid=')) ?? '';
      expect(sid).toMatch(/; HttpOnly; Secure; SameSite=Lax$/);
      expect(sid).not.toMatch(/Domain/);
    } finally {
      await production.close();
    }
  });

  it('when a visitor only looks, then there is no session cookie and no row', async () => {
    const count = async () => (await server.database.pool.query('select 1 from session')).rowCount;
    const before = await count();
    const client = server.client();
    await client.get('/api/listings');
    await client.get('/api/auth/me');
    expect([...client.cookies().keys()]).toEqual(['visit']);
    expect(await count()).toBe(before);
  });

  it('when an answer may lie in a shared cache, then it carries no session cookie', async () => {
    const yard = await givenYard(server);
    await givenCatalogue(server);
    const listing = await givenListing(server, yard);
    const photo = await storePhoto(server.deps, {
      bytes: await givenJpeg(),
      ownerUserId: yard.lister.id,
      sellerId: yard.id,
      purpose: 'listing',
      shot: 'left',
    });
    if (isRefusal(photo)) throw new Error(photo.detail);
    await linkPhoto(server.deps.db, photo.id, 'listing', listing.id);
    const { client } = await signUp(server);
    const answer = await client.get(`/api/photos/${photo.id}/small`);
    expect(answer.status).toBe(200);
    expect(answer.headers.get('cache-control')).toMatch(/^public/);
    expect(answer.headers.getSetCookie()).toEqual([]);
    const own = await client.get('/api/auth/me');
    expect(own.headers.get('cache-control')).toBe('no-store');
    expect(own.headers.getSetCookie().some((line) => line.startsWith('sid='))).toBe(true);
  });
});

describe('signing in and out', () => {
  it('when somebody signs in over a session that was there before, then the id is new and the old one is dead', async () => {
    const attacker = await signUp(server);
    const planted = cookieOf(attacker.client);
    const victim = await signUp(server);
    const { csrfToken } = (await (await meWith(planted)).json()) as { csrfToken: string };
    const answer = await fetch(`${server.baseUrl}/api/auth/sign-in`, {
      method: 'POST',
      headers: { cookie: planted, 'x-csrf-token': csrfToken, 'content-type': 'application/json' },
      body: JSON.stringify({ email: victim.email, password: PASSWORD }),
    });
    expect(answer.status).toBe(200);
    const fresh = answer.headers.getSetCookie().find((line) => line.startsWith('sid=')) ?? '';
    expect(fresh.split(';')[0]).not.toBe(planted);
    const after = (await (await meWith(planted)).json()) as { user: unknown };
    expect(after.user).toBeNull();
  });

  it('when a made-up session id is planted, then it is not taken', async () => {
    const response = await meWith('sid=s%3Aplanted-by-somebody-else.c2lnbmF0dXJl');
    expect(((await response.json()) as { user: unknown }).user).toBeNull();
    const { rows: found } = await server.database.pool.query(
      `select 1 from session where sid like 'planted%'`,
    );
    expect(found).toEqual([]);
  });

  it('when somebody signs out, then a copy of the cookie is worth nothing', async () => {
    const { client, id } = await signUp(server);
    const copy = cookieOf(client);
    expect(await rows(id)).toBe(1);
    expect((await client.post('/api/auth/sign-out')).status).toBe(204);
    expect(await rows(id)).toBe(0);
    expect(((await (await meWith(copy)).json()) as { user: unknown }).user).toBeNull();
  });
});

describe('the end of a session', () => {
  it('when 12 hours passed without a request, then it is over', async () => {
    const { client, id } = await signUp(server);
    await server.database.pool.query(
      `update session set expire = now() - interval '1 second' where sess->>'userId' = $1`,
      [id],
    );
    expect(await userOf(client)).toBeNull();
  });

  it('when 14 days passed since signing in, then it is over in spite of use, and the same browser can sign in again', async () => {
    const { client, id, email } = await signUp(server);
    await server.database.pool.query(
      `update session set sess = (jsonb_set(sess::jsonb, '{endsAtMs}', to_jsonb($2::bigint)))::json
       where sess->>'userId' = $1`,
      [id, Date.now() - 1000],
    );
    expect(await userOf(client)).toBeNull();
    expect(await rows(id)).toBe(0);
    expect((await client.post('/api/auth/sign-in', { email, password: PASSWORD })).status).toBe(200);
    const { rows: found } = await server.database.pool.query<{ ends: string }>(
      `select sess->>'endsAtMs' as ends from session where sess->>'userId' = $1`,
      [id],
    );
    expect((Number(found[0]?.ends) - Date.now()) / 86_400_000).toBeCloseTo(14, 2);
  });

  it('when a signed-in person is closed, then the next request is a visitor’s', async () => {
    const { client, id } = await signUp(server);
    await server.database.pool.query('update users set closed_at = now() where id = $1', [id]);
    expect(await userOf(client)).toBeNull();
    expect((await client.get('/api/account/sessions')).status).toBe(401);
  });
});

describe('sessions of an account', () => {
  it('when one of two is signed out from the other, then only that one is over', async () => {
    const { client: desk, email } = await signUp(server);
    const phone = server.client();
    await phone.post('/api/auth/sign-in', { email, password: PASSWORD }, { 'user-agent': 'A phone' });
    const sessions = await desk.get('/api/account/sessions');
    const items = list(sessions.body, 'items');
    expect(items).toHaveLength(2);
    expect(items.filter((one) => at(one, 'current') === true)).toHaveLength(1);
    const other = items.find((one) => at(one, 'current') === false) ?? null;
    expect(text(other, 'agent')).toBe('A phone');
    expect((await desk.send('DELETE', `/api/account/sessions/${text(other, 'id')}`)).status).toBe(204);
    expect(await userOf(phone)).toBeNull();
    expect(await userOf(desk)).not.toBeNull();
    // The id that is shown is not the one in the cookie.
    expect(JSON.stringify(sessions.body)).not.toContain(
      decodeURIComponent(desk.cookies().get('sid') ?? '-').slice(2, 30),
    );
  });

  it('when the session belongs to somebody else, then there is no such session', async () => {
    const { client: one } = await signUp(server);
    const { client: two } = await signUp(server);
    const id = text((await one.get('/api/account/sessions')).body, 'items', 0, 'id');
    expect((await two.send('DELETE', `/api/account/sessions/${id}`)).status).toBe(404);
    expect(await userOf(one)).not.toBeNull();
  });

  it('when the password is changed, then every other session ends and this one gets a new id', async () => {
    const { client: desk, email, id } = await signUp(server);
    const phone = server.client();
    await phone.post('/api/auth/sign-in', { email, password: PASSWORD });
    const before = cookieOf(desk);
    const wrong = await desk.post('/api/account/password', {
      current: 'not this one at all',
      password: OTHER_PASSWORD,
    });
    expect(wrong.status).toBe(422);
    expect(text(wrong.body, 'errors', 0, 'path')).toBe('current');
    expect(await userOf(phone)).not.toBeNull();
    const answer = await desk.post('/api/account/password', { current: PASSWORD, password: OTHER_PASSWORD });
    expect(answer.status).toBe(200);
    expect(await userOf(phone)).toBeNull();
    expect(await userOf(desk)).not.toBeNull();
    expect(cookieOf(desk)).not.toBe(before);
    expect(((await (await meWith(before)).json()) as { user: unknown }).user).toBeNull();
    expect(await rows(id)).toBe(1);
    const old = await server.client().post('/api/auth/sign-in', { email, password: PASSWORD });
    expect(old.status).toBe(401);
  });
});
