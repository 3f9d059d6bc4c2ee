// Links by mail: they work once, for 30 minutes, and asking for one says nothing about who has an account.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { at, text } from '../support/client';
import { startTestServer, type TestServer } from '../support/server';
import { freshEmail, linksTo, OTHER_PASSWORD, PASSWORD, signUp } from './given';

let server: TestServer;

beforeAll(async () => {
  server = await startTestServer({ background: false });
});
afterAll(() => server.close());

const forgot = (email: string) => server.client().post('/api/auth/forgot', { email });
const reset = (token: string, password = OTHER_PASSWORD) =>
  server.client().post('/api/auth/reset', { token, password });
const signIn = (email: string, password: string) =>
  server.client().post('/api/auth/sign-in', { email, password });

async function linkFor(email: string): Promise<string> {
  await forgot(email);
  const [token = ''] = await linksTo(server, email, 'reset');
  return token;
}

describe('setting a new password with a link', () => {
  it('when the link is used, then the new password counts, every session is over and the person is told', async () => {
    const { client, email } = await signUp(server);
    const token = await linkFor(email);
    expect((await reset(token)).status).toBe(204);
    expect(at((await client.get('/api/auth/me')).body, 'user')).toBeNull();
    expect((await signIn(email, PASSWORD)).status).toBe(401);
    const back = await signIn(email, OTHER_PASSWORD);
    expect(back.status).toBe(200);
    expect(at(back.body, 'user', 'mailChecked')).toBe(true);
    await server.settle();
    expect(server.mail.messages(email).map((one) => one.subject)).toContain('Your password was changed');
  });

  it('when the link is used a second time, also at the same moment, then only the first counts', async () => {
    const { email } = await signUp(server);
    const token = await linkFor(email);
    const answers = await Promise.all([1, 2, 3].map((one) => reset(token, `${OTHER_PASSWORD} ${one}`)));
    expect(answers.map((one) => one.status).sort()).toEqual([204, 422, 422]);
    const late = await reset(token);
    expect(late.status).toBe(422);
    expect(text(late.body, 'errors', 0, 'path')).toBe('token');
  });

  it('when the link is older than 30 minutes, then it is refused; a minute before, it is taken', async () => {
    const early = await signUp(server);
    const inTime = await linkFor(early.email);
    server.clock.advance(29 * 60_000);
    expect((await reset(inTime)).status).toBe(204);
    const late = await signUp(server);
    const tooLate = await linkFor(late.email);
    server.clock.advance(30 * 60_000 + 1);
    expect((await reset(tooLate)).status).toBe(422);
    expect((await signIn(late.email, PASSWORD)).status).toBe(200);
  });

  it('when a newer link was asked for, then the older one is worth nothing', async () => {
    const { email } = await signUp(server);
    const older = await linkFor(email);
    server.clock.advance(1000);
    const newer = await linkFor(email);
    expect(newer).not.toBe(older);
    expect((await reset(older)).status).toBe(422);
    expect((await reset(newer)).status).toBe(204);
  });

  it('when the password was changed meanwhile, then an open link is worth nothing', async () => {
    const { client, email } = await signUp(server);
    const token = await linkFor(email);
    await client.post('/api/account/password', { current: PASSWORD, password: OTHER_PASSWORD });
    expect((await reset(token, 'a third password here')).status).toBe(422);
  });

  it('when a link that checks an address is used to set a password, then it is refused', async () => {
    const { email } = await signUp(server);
    const [token = ''] = await linksTo(server, email, 'verify');
    expect((await reset(token)).status).toBe(422);
    expect((await signIn(email, PASSWORD)).status).toBe(200);
  });

  it('when the new password is too short, then the link stays good', async () => {
    const { email } = await signUp(server);
    const token = await linkFor(email);
    expect((await reset(token, 'too short')).status).toBe(422);
    expect((await reset(token)).status).toBe(204);
  });

  it('when the database is read, then the link does not stand in it', async () => {
    const { email, id } = await signUp(server);
    const token = await linkFor(email);
    const { rows } = await server.database.pool.query('select * from account_tokens where user_id = $1', [
      id,
    ]);
    expect(rows.length).toBeGreaterThan(0);
    expect(JSON.stringify(rows)).not.toContain(token);
  });
});

describe('asking for a link', () => {
  it('when the address is unknown, then status, body and pace are those of a known one, and no mail goes out', async () => {
    const { email } = await signUp(server);
    const nobody = freshEmail('nobody');
    const timed = async (address: string) => {
      const started = performance.now();
      const answer = await forgot(address);
      return { answer, ms: performance.now() - started };
    };
    const known = [await timed(email)];
    const unknown = [await timed(nobody)];
    // In turns, so that a busy machine slows both; the quickest of each says what the server itself takes.
    for (let round = 0; round < 3; round += 1) {
      server.clock.advance(1000);
      known.push(await timed(email));
      unknown.push(await timed(nobody));
    }
    for (const { answer } of [...known, ...unknown]) {
      expect(answer.status).toBe(204);
      expect(answer.body).toEqual(known[0]?.answer.body);
    }
    const quickest = (all: typeof known) => Math.min(...all.map((one) => one.ms));
    expect(quickest(known)).toBeGreaterThan(240);
    expect(quickest(unknown)).toBeGreaterThan(240);
    expect(Math.abs(quickest(known) - quickest(unknown))).toBeLessThan(150);
    expect(await linksTo(server, email, 'reset')).toHaveLength(4);
    expect(server.mail.messages(nobody)).toEqual([]);
  });

  it('when somebody asks again and again for a stranger’s address, then the mailbox gets six an hour', async () => {
    const { email } = await signUp(server);
    for (let ask = 0; ask < 9; ask += 1) {
      server.clock.advance(1000);
      expect((await forgot(email)).status).toBe(204);
    }
    expect(await linksTo(server, email, 'reset')).toHaveLength(6);
  });

  it('when the check link is asked for again and again, then after six an hour it says to wait', async () => {
    const { client, email } = await signUp(server);
    const statuses: number[] = [];
    for (let ask = 0; ask < 7; ask += 1) {
      server.clock.advance(1000);
      statuses.push((await client.post('/api/auth/check-mail/resend')).status);
    }
    expect(statuses).toEqual([204, 204, 204, 204, 204, 204, 429]);
    expect(await linksTo(server, email, 'verify')).toHaveLength(7);
  });
});
