// Unsafe requests: only from our own pages, and only with the token that belongs to the session.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { at, text, type Client } from '../support/client';
import { startTestServer, type TestServer } from '../support/server';
import { PASSWORD, signUp } from './given';

let server: TestServer;
let client: Client;

beforeAll(async () => {
  server = await startTestServer({ background: false });
  client = (await signUp(server)).client;
});
afterAll(() => server.close());

const rename = (name: string, headers: Record<string, string> = {}) =>
  client.send('PATCH', '/api/account', { name }, headers);
const nameNow = async () => text((await client.get('/api/auth/me')).body, 'user', 'name');
const tokenOf = async (one: Client) => text((await one.get('/api/auth/me')).body, 'csrfToken');

describe('the token', () => {
  it('when it is the one of GET /api/auth/me, then the change is made', async () => {
    expect((await rename('Ines with a token')).status).toBe(200);
    expect(await nameNow()).toBe('Ines with a token');
  });

  it('when it is missing, empty, cut, or another session’s, then nothing changes', async () => {
    const other = await signUp(server);
    const own = await tokenOf(client);
    const visitor = await tokenOf(server.client());
    const wrong = [
      '',
      own.slice(0, -1),
      `${own}A`,
      await tokenOf(other.client),
      visitor,
      'é'.repeat(own.length),
    ];
    for (const token of wrong) {
      const answer = await rename('Somebody else', { 'x-csrf-token': encodeURIComponent(token) });
      expect(answer.status).toBe(403);
      expect(text(answer.body, 'code')).toBe('bad_csrf');
    }
    const bare = await fetch(`${server.baseUrl}/api/account`, {
      method: 'PATCH',
      headers: { 'content-type': 'application/json', cookie: `sid=${client.cookies().get('sid') ?? ''}` },
      body: JSON.stringify({ name: 'Somebody else' }),
    });
    expect(bare.status).toBe(403);
    expect(await nameNow()).toBe('Ines with a token');
  });

  it('when a visitor signs in, then the visitor’s token is worth nothing for the session', async () => {
    const { email } = await signUp(server);
    const visitor = server.client();
    const before = await tokenOf(visitor);
    await visitor.post('/api/auth/sign-in', { email, password: PASSWORD });
    const answer = await visitor.send('PATCH', '/api/account', { name: 'X' }, { 'x-csrf-token': before });
    expect(answer.status).toBe(403);
    expect(await tokenOf(visitor)).not.toBe(before);
  });

  it('when a visitor has no token, then even signing in is refused', async () => {
    const answer = await fetch(`${server.baseUrl}/api/auth/sign-in`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({ email: 'a@shop.example', password: PASSWORD }),
    });
    expect(answer.status).toBe(403);
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
    expect(at((await answer.json()) as never, 'code')).toBe('bad_csrf');
  });
});

describe('the origin', () => {
  it.each(['https://elsewhere.example', 'null', 'http://127.0.0.1:1', 'http://localhost.evil.example'])(
    'when the request comes from %s, then it is refused in spite of the token',
    async (origin) => {
      const answer = await rename('Somebody else', { origin });
      expect(answer.status).toBe(403);
      expect(text(answer.body, 'code')).toBe('foreign_origin');
    },
  );

  it('when the request comes from our own pages, then it is taken', async () => {
    expect((await rename('Ines at home', { origin: server.baseUrl })).status).toBe(200);
  });
});

describe('the provider’s webhook', () => {
  it('when it comes without token and origin, then its signature is asked for and nothing else', async () => {
    const answer = await fetch(`${server.baseUrl}/api/payments/webhook`, { method: 'POST', body: '{}' });
    expect(answer.status).toBe(400);
  });
});
