// The team of a seller account: invitations, duties, removal, and that there is always an owner.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { at, list, text } from '../support/client';
import { givenYard, type Yard } from '../support/given';
import { startTestServer, type TestServer } from '../support/server';
import { freshEmail, linksTo, signUp } from './given';

let server: TestServer;
let yard: Yard;

beforeAll(async () => {
  server = await startTestServer({ background: false });
  yard = await givenYard(server);
});
afterAll(() => server.close());

const invite = (email: string, duties: string[]) =>
  yard.owner.client.post(`/api/sellers/${yard.id}/invites`, { email, duties });

const dutiesOf = async (userId: string) => {
  const team = await yard.owner.client.get(`/api/sellers/${yard.id}/team`);
  const member = list(team.body, 'members').find((one) => text(one, 'userId') === userId);
  return member ? at(member, 'duties') : null;
};

describe('an invitation', () => {
  it('when the invited person opens the link, then they work there with those duties and their address is proved', async () => {
    const { client, email, id } = await signUp(server);
    expect((await invite(email.toUpperCase(), ['lister', 'lister'])).status).toBe(201);
    const [token = ''] = await linksTo(server, email.toUpperCase(), 'invite');
    const joined = await client.post('/api/invites/accept', { token });
    expect(joined.body).toEqual({ sellerId: yard.id, sellerName: yard.name });
    expect(await dutiesOf(id)).toEqual(['lister']);
    const me = await client.get('/api/auth/me');
    expect(at(me.body, 'user', 'mailChecked')).toBe(true);
    expect(at(me.body, 'user', 'sellers', 0, 'duties')).toEqual(['lister']);
    expect((await client.post('/api/invites/accept', { token })).status).toBe(422);
  });

  it('when somebody else opens the link, then they do not join and the link stays good', async () => {
    const invited = await signUp(server);
    const other = await signUp(server);
    await invite(invited.email, ['dock']);
    const [token = ''] = await linksTo(server, invited.email, 'invite');
    expect((await other.client.post('/api/invites/accept', { token })).status).toBe(403);
    expect((await invited.client.post('/api/invites/accept', { token })).status).toBe(200);
  });

  it('when it is older than 7 days or was taken back, then the link is worth nothing', async () => {
    const late = await signUp(server);
    await invite(late.email, ['dock']);
    const [old = ''] = await linksTo(server, late.email, 'invite');
    server.clock.advance(7 * 86_400_000 + 1);
    expect((await late.client.post('/api/invites/accept', { token: old })).status).toBe(422);
    const team = await invite(late.email, ['dock']);
    const [token = ''] = await linksTo(server, late.email, 'invite');
    const inviteId = text(list(team.body, 'invites').at(-1) ?? null, 'id');
    const taken = await yard.owner.client.send('DELETE', `/api/sellers/${yard.id}/invites/${inviteId}`);
    expect(taken.status).toBe(200);
    expect((await late.client.post('/api/invites/accept', { token })).status).toBe(422);
    expect(await dutiesOf(late.id)).toBeNull();
  });

  it('when an older invitation is opened by an owner, then it only adds duties', async () => {
    const { client, email, id } = await signUp(server);
    await invite(email, ['dock']);
    server.clock.advance(1000);
    await invite(email, ['owner']);
    const [owner = '', dock = ''] = await linksTo(server, email, 'invite');
    await client.post('/api/invites/accept', { token: owner });
    expect((await client.post('/api/invites/accept', { token: dock })).status).toBe(200);
    expect(await dutiesOf(id)).toEqual(['dock', 'owner']);
    await yard.owner.client.send('DELETE', `/api/sellers/${yard.id}/team/${id}`);
  });

  it.each([
    ['no duty', { duties: [] }],
    ['a duty that does not exist', { duties: ['boss'] }],
    ['no address', { email: 'nobody' }],
    ['a field of its own', { sellerId: 'slr_other' }],
  ])('when it has %s, then it is refused', async (_, over) => {
    const answer = await yard.owner.client.post(`/api/sellers/${yard.id}/invites`, {
      email: freshEmail(),
      duties: ['dock'],
      ...over,
    });
    expect(answer.status).toBe(422);
  });

  it('when the person is a member already, then it says so', async () => {
    expect((await invite(yard.dock.email, ['lister'])).status).toBe(422);
  });
});

describe('duties', () => {
  it('when a member is removed, then their next request is a stranger’s', async () => {
    const { dock, owner } = await givenYard(server, 'Marl Auto Parts');
    const sellers = (await owner.client.get('/api/auth/me')).body;
    const id = text(sellers, 'user', 'sellers', 0, 'id');
    expect((await dock.client.get(`/api/sellers/${id}/team`)).status).toBe(200);
    expect(at((await dock.client.get(`/api/sellers/${id}`)).body, 'terms')).not.toBeNull();
    expect((await owner.client.send('DELETE', `/api/sellers/${id}/team/${dock.id}`)).status).toBe(200);
    expect((await dock.client.get(`/api/sellers/${id}/team`)).status).toBe(403);
    expect(at((await dock.client.get(`/api/sellers/${id}`)).body, 'terms')).toBeNull();
    expect(at((await dock.client.get('/api/auth/me')).body, 'user', 'sellers')).toEqual([]);
  });

  it('when a duty is taken away, then the next request that needs it is refused', async () => {
    const { owner, lister, id } = await givenYard(server, 'Corve Parts');
    const draft = () => lister.client.get(`/api/seller/listings?sellerId=${id}`);
    expect((await draft()).status).toBe(200);
    const create = () => lister.client.post('/api/seller/listings', { sellerId: id });
    const before = await create();
    expect(before.status).not.toBe(403);
    const changed = await owner.client.send('PATCH', `/api/sellers/${id}/team/${lister.id}`, {
      duties: ['dock'],
    });
    expect(changed.status).toBe(200);
    expect((await create()).status).toBe(403);
  });

  it('when the last owner would go, then it is refused, also as two owners who remove each other at once', async () => {
    const { owner, lister, id } = await givenYard(server, 'Hask Salvage');
    const remove = (who: typeof owner, whom: typeof owner) =>
      who.client.send('DELETE', `/api/sellers/${id}/team/${whom.id}`);
    expect((await remove(owner, owner)).status).toBe(422);
    const demote = await owner.client.send('PATCH', `/api/sellers/${id}/team/${owner.id}`, {
      duties: ['dock'],
    });
    expect(demote.status).toBe(422);
    await owner.client.send('PATCH', `/api/sellers/${id}/team/${lister.id}`, { duties: ['owner'] });
    const answers = await Promise.all([remove(owner, lister), remove(lister, owner)]);
    expect(answers.filter((one) => one.status === 200)).toHaveLength(1);
    const { rows } = await server.database.pool.query(
      `select 1 from seller_members where seller_id = $1 and 'owner' = any(duties)`,
      [id],
    );
    expect(rows).toHaveLength(1);
  });

  it('when the database is asked for a member without a duty or with an unknown one, then it refuses', async () => {
    for (const duties of [[], ['boss']]) {
      await expect(
        server.database.pool.query('update seller_members set duties = $1 where user_id = $2', [
          duties,
          yard.dock.id,
        ]),
      ).rejects.toMatchObject({ constraint: 'seller_members_duties' });
    }
  });
});

describe('terms', () => {
  const terms = {
    windowDays: 60,
    depositCents: 50_000,
    schedule: [
      { code: 'pan', label: 'Pan missing', cents: 4_000 },
      { code: 'own_1', label: 'Wrong yoke', cents: 50_000 },
    ],
    returnFreight: 'seller',
    shipDays: 4,
    graceDays: 2,
    outright: false,
  };
  const put = (body: unknown) => yard.owner.client.send('PUT', `/api/sellers/${yard.id}/terms`, body);

  it('when an owner sets them, then members read them and the public does not', async () => {
    expect((await put(terms)).status).toBe(200);
    expect((await yard.lister.client.get(`/api/sellers/${yard.id}/terms`)).body).toEqual(terms);
    const open = await server.client().get(`/api/sellers/${yard.id}`);
    expect(open.body).toMatchObject({ name: yard.name, terms: null, payoutsEnabled: null });
  });

  it.each<[string, Record<string, unknown>, string]>([
    ['a deduction above the deposit', { depositCents: 30_000 }, 'schedule.1.cents'],
    [
      'a deduction of nothing',
      { schedule: [{ code: 'pan', label: 'Pan missing', cents: 0 }] },
      'schedule.0.cents',
    ],
    ['the same fault twice', { schedule: [terms.schedule[0], terms.schedule[0]] }, 'schedule.1.code'],
    ['a deposit of nothing', { depositCents: 0, schedule: [] }, 'depositCents'],
    ['neither exchange nor outright', { depositCents: null }, 'outright'],
    ['a window of six days', { windowDays: 6 }, 'windowDays'],
    ['half a day', { shipDays: 1.5 }, 'shipDays'],
    ['a negative amount', { depositCents: -1 }, 'depositCents'],
    ['a fraction of a cent', { depositCents: 400.5 }, 'depositCents'],
    ['a field of its own', { feeBps: 0 }, ''],
  ])('when they have %s, then they are refused with the field named', async (_, over, path) => {
    const answer = await put({ ...terms, ...over });
    expect(answer.status).toBe(422);
    expect(list(answer.body, 'errors').map((one) => text(one, 'path'))).toContain(path);
  });
});
