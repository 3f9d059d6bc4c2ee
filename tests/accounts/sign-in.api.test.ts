// Signing up and in over HTTP: what is taken, what is refused, and the brake on guessing.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { at, list, text } from '../support/client';
import { startTestServer, type TestServer } from '../support/server';
import { freshEmail, linksTo, PASSWORD, signUp, startSecond, type SecondServer } from './given';

let server: TestServer;
let second: SecondServer;

beforeAll(async () => {
  server = await startTestServer();
  second = await startSecond(server);
});
afterAll(async () => {
  await second.close();
  await server.close();
});

describe('sign-up', () => {
  it('when somebody signs up, then they are signed in and can prove their address once with the mailed link', async () => {
    const { client, email } = await signUp(server);
    const me = await client.get('/api/auth/me');
    expect(at(me.body, 'user', 'email')).toBe(email);
    expect(at(me.body, 'user', 'roles')).toEqual(['builder']);
    expect(at(me.body, 'user', 'mailChecked')).toBe(false);
    const [token = ''] = await linksTo(server, email, 'verify');
    expect((await client.post('/api/auth/check-mail', { token })).status).toBe(200);
    expect(at((await client.get('/api/auth/me')).body, 'user', 'mailChecked')).toBe(true);
    const again = await client.post('/api/auth/check-mail', { token });
    expect(again.status).toBe(422);
    expect(text(again.body, 'errors', 0, 'path')).toBe('token');
  });

  it('when a yard signs up, then the person owns it and its place and time zone follow from the ZIP code', async () => {
    const { client } = await signUp(server, {
      seller: { name: 'Tern Salvage', kind: 'yard', zip: '83702' },
    });
    const me = await client.get('/api/auth/me');
    expect(at(me.body, 'user', 'roles')).toEqual(['builder', 'seller']);
    expect(at(me.body, 'user', 'sellers', 0, 'duties')).toEqual(['owner', 'lister', 'dock']);
    const seller = await client.get(`/api/sellers/${text(me.body, 'user', 'sellers', 0, 'id')}`);
    expect(seller.body).toMatchObject({
      city: 'Boise',
      region: 'ID',
      timeZone: 'America/Boise',
      verified: false,
    });
  });

  it.each([
    ['a short password', { password: 'eleven char' }, 'password'],
    ['a password everybody tries first', { password: 'Password1234!' }, 'password'],
    [
      'the mail address as the password',
      { email: 'long.enough@shop.example', password: 'Long.Enough@shop.example' },
      'password',
    ],
    ['no mail address', { email: 'not an address' }, 'email'],
    ['a mail address with a NUL', { email: 'a\u0000b@shop.example' }, 'email'],
    ['an empty name', { name: '   ' }, 'name'],
    ['a name with control characters', { name: 'Ines\u0007' }, 'name'],
    [
      'a ZIP code that does not exist',
      { seller: { name: 'Tern', kind: 'yard', zip: '00000' } },
      'seller.zip',
    ],
    ['a kind that does not exist', { seller: { name: 'Tern', kind: 'bank', zip: '83702' } }, 'seller.kind'],
    ['a field of its own', { isAdmin: true }, ''],
    [
      'a field of its own for the seller',
      { seller: { name: 'Tern', kind: 'yard', zip: '83702', verifiedAt: 'now' } },
      'seller',
    ],
  ])('when sign-up has %s, then it is refused with the field named', async (_, over, path) => {
    const client = server.client();
    const answer = await client.post('/api/auth/sign-up', {
      name: 'Ines Abara',
      email: freshEmail(),
      password: PASSWORD,
      ...over,
    });
    expect(answer.status).toBe(422);
    expect(list(answer.body, 'errors').map((one) => text(one, 'path'))).toContain(path);
    expect(at((await client.get('/api/auth/me')).body, 'user')).toBeNull();
  });

  it('when the address has an account already in other letters, then sign-up says so', async () => {
    const { email } = await signUp(server);
    const answer = await server.client().post('/api/auth/sign-up', {
      name: 'Somebody',
      email: email.toUpperCase(),
      password: PASSWORD,
    });
    expect(answer.status).toBe(422);
    expect(text(answer.body, 'errors', 0, 'path')).toBe('email');
  });

  it('when one address signs up twice at the same moment, then exactly one account comes of it', async () => {
    const email = freshEmail();
    const body = { name: 'Ines Abara', email, password: PASSWORD };
    const answers = await Promise.all(
      [1, 2, 3, 4].map(() => server.client().post('/api/auth/sign-up', body)),
    );
    expect(answers.map((one) => one.status).sort()).toEqual([201, 422, 422, 422]);
  });
});

describe('sign-in', () => {
  it('when the password is right, in whatever letters the address is typed, then it answers like me', async () => {
    const { email } = await signUp(server);
    const client = server.client();
    const answer = await client.post('/api/auth/sign-in', {
      email: ` ${email.toUpperCase()} `,
      password: PASSWORD,
    });
    expect(answer.status).toBe(200);
    expect(answer.body).toEqual((await client.get('/api/auth/me')).body);
  });

  it('when a second factor is given that the account does not have, then sign-in goes on', async () => {
    const { email } = await signUp(server);
    const answer = await server
      .client()
      .post('/api/auth/sign-in', { email, password: PASSWORD, code: '123456' });
    expect(answer.status).toBe(200);
  });

  it('when the address is unknown, then the answer is the one of a wrong password', async () => {
    const { email } = await signUp(server);
    const wrong = await server.client().post('/api/auth/sign-in', { email, password: 'not this one at all' });
    const unknown = await server
      .client()
      .post('/api/auth/sign-in', { email: freshEmail('nobody'), password: 'not this one at all' });
    const plain = ({ body }: typeof wrong) => ({ ...(body as object), requestId: '' });
    expect(wrong.status).toBe(401);
    expect(unknown.status).toBe(wrong.status);
    expect(plain(unknown)).toEqual(plain(wrong));
    // An unknown address must cost a password check too, or its answer comes sooner by the whole of argon2.
    const timed = async (email_: string): Promise<number> => {
      const started = performance.now();
      await server.client().post('/api/auth/sign-in', { email: email_, password: 'not this one at all' });
      return performance.now() - started;
    };
    const known = [await timed(email), await timed(email), await timed(email)].sort((a, b) => a - b);
    const not = [
      await timed(freshEmail('nobody')),
      await timed(freshEmail('nobody')),
      await timed(freshEmail('nobody')),
    ].sort((a, b) => a - b);
    expect(not[1] ?? 0).toBeGreaterThan((known[1] ?? 0) / 2);
  });

  it('when ten tries failed on two processes, then both ask to wait and say how long, also for the right password', async () => {
    const { email } = await signUp(server);
    for (let round = 0; round < 5; round += 1) {
      for (const one of [server, second]) {
        const answer = await one
          .client()
          .post('/api/auth/sign-in', { email, password: `guess number ${round}` });
        expect(answer.status).toBe(401);
      }
    }
    for (const one of [server, second]) {
      const answer = await one.client().post('/api/auth/sign-in', { email, password: PASSWORD });
      expect(answer.status).toBe(429);
      const waitSeconds = Number(answer.headers.get('retry-after'));
      expect(waitSeconds).toBeGreaterThan(14 * 60);
      expect(waitSeconds).toBeLessThanOrEqual(15 * 60);
    }
    const other = await signUp(server);
    const free = await server.client().post('/api/auth/sign-in', { email: other.email, password: PASSWORD });
    expect(free.status).toBe(200);
  });

  it('when many guesses come at the same moment, then no more than ten are looked at', async () => {
    const { email } = await signUp(server);
    const answers = await Promise.all(
      Array.from({ length: 40 }, (_, index) =>
        (index % 2 ? server : second)
          .client()
          .post('/api/auth/sign-in', { email, password: `parallel guess ${index}` }),
      ),
    );
    expect(answers.filter((one) => one.status === 401)).toHaveLength(10);
    expect(answers.filter((one) => one.status === 429)).toHaveLength(30);
  });

  it('when a right password follows a few wrong ones, then counting starts anew', async () => {
    const { email } = await signUp(server);
    for (let round = 0; round < 3; round += 1) {
      for (let wrong = 0; wrong < 7; wrong += 1) {
        await server.client().post('/api/auth/sign-in', { email, password: 'not this one at all' });
      }
      const answer = await server.client().post('/api/auth/sign-in', { email, password: PASSWORD });
      expect(answer.status).toBe(200);
    }
  });

  it('when an endpoint has a limit of its own, then it holds across processes', async () => {
    // One point a minute for each of the default settings' points: no factor here.
    const strict = [
      await startSecond(server, { RATE_LIMIT_FACTOR: 1 }),
      await startSecond(server, { RATE_LIMIT_FACTOR: 1 }),
    ];
    try {
      const statuses: number[] = [];
      for (let round = 0; round < 11; round += 1) {
        const one = strict[round % 2];
        if (!one) throw new Error('no server');
        const answer = await one.client().post('/api/auth/forgot', { email: freshEmail('limit') });
        statuses.push(answer.status);
        if (answer.status === 429) expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(0);
      }
      expect(statuses.slice(0, 10).every((status) => status === 204)).toBe(true);
      expect(statuses[10]).toBe(429);
    } finally {
      await Promise.all(strict.map((one) => one.close()));
    }
  });
});
