// What an admin sees of accounts, and a trail that the database itself keeps.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { at, list, text, type Json } from '../support/client';
import {
  givenCatalogue,
  givenListing,
  givenPerson,
  givenYard,
  type Person,
  type Yard,
} from '../support/given';
import { startTestServer, type TestServer } from '../support/server';

let server: TestServer;
let admin: Person;
let yards: Yard[];

beforeAll(async () => {
  server = await startTestServer({ background: false });
  admin = await givenPerson(server, 'Admin', { admin: true });
  await givenCatalogue(server);
  yards = [];
  for (const name of ['Alpha Yard', 'Beta Yard', 'Gamma Yard', 'Delta Yard', 'Epsilon Yard']) {
    yards.push(await givenYard(server, name, { payouts: false }));
  }
});
afterAll(() => server.close());

async function allPages(path: string, limit: number): Promise<Json[]> {
  const items: Json[] = [];
  let cursor = '';
  for (let page = 0; page < 50; page += 1) {
    const answer = await admin.client.get(`${path}${path.includes('?') ? '&' : '?'}limit=${limit}${cursor}`);
    expect(answer.status).toBe(200);
    expect(list(answer.body, 'items').length).toBeLessThanOrEqual(limit);
    items.push(...list(answer.body, 'items'));
    const next = at(answer.body, 'next');
    if (next === null) return items;
    cursor = `&cursor=${String(next)}`;
  }
  throw new Error('the pages do not end');
}

describe('sellers', () => {
  it('when an admin looks through them two at a time, then each stands once, those not yet looked at first', async () => {
    const [alpha] = yards;
    if (!alpha) throw new Error('no yard');
    await givenListing(server, alpha);
    const verified = await admin.client.post(`/api/admin/sellers/${alpha.id}/verify`, { verified: true });
    expect(at(verified.body, 'verified')).toBe(true);
    expect(at((await server.client().get(`/api/sellers/${alpha.id}`)).body, 'verified')).toBe(true);
    const items = await allPages('/api/admin/sellers', 2);
    expect(items.map((one) => text(one, 'id')).sort()).toEqual(yards.map((one) => one.id).sort());
    expect(items.map((one) => at(one, 'verified'))).toEqual([false, false, false, false, true]);
    expect(items.at(-1)).toMatchObject({ id: alpha.id, members: 3, liveListings: 1 });
    expect(items[0]).toMatchObject({ members: 3, liveListings: 0 });
    const back = await admin.client.post(`/api/admin/sellers/${alpha.id}/verify`, { verified: false });
    expect(at(back.body, 'verified')).toBe(false);
  });

  it('when the cursor is made up, then it is refused', async () => {
    for (const cursor of [
      'x',
      btoa('[2,"2026-01-01T00:00:00Z","slr_1"]'),
      btoa('[99999999999,"2026-01-01T00:00:00Z","slr_1"]'),
    ]) {
      expect((await admin.client.get(`/api/admin/sellers?cursor=${cursor}`)).status).toBe(422);
    }
  });
});

describe('people', () => {
  it('when an admin looks through them, then each stands once, newest first, with where they work', async () => {
    const items = await allPages('/api/admin/users', 4);
    expect(items).toHaveLength(16);
    expect(new Set(items.map((one) => text(one, 'id'))).size).toBe(16);
    const dates = items.map((one) => text(one, 'createdAt'));
    expect(dates).toEqual([...dates].sort().reverse());
    const owner = items.find((one) => text(one, 'id') === yards[1]?.owner.id) ?? null;
    expect(at(owner, 'sellers', 0, 'name')).toBe('Beta Yard');
    expect(JSON.stringify(items)).not.toMatch(/argon2|passwordHash/);
  });

  it('when a part of a name is asked for, then % and _ stand for themselves', async () => {
    expect(await allPages('/api/admin/users?q=beta yard', 24)).toHaveLength(3);
    expect(await allPages('/api/admin/users?q=%25', 24)).toHaveLength(0);
    expect(await allPages('/api/admin/users?q=bet_', 24)).toHaveLength(0);
  });
});

describe('the audit trail', () => {
  it('when something was changed, then it says who did what, newest first, and can be asked by object', async () => {
    const [, beta] = yards;
    if (!beta) throw new Error('no yard');
    await beta.owner.client.send('PATCH', `/api/sellers/${beta.id}`, { name: 'Beta Salvage' });
    await beta.owner.client.send('DELETE', `/api/sellers/${beta.id}/team/${beta.dock.id}`);
    const items = await allPages(`/api/admin/audit?objectId=${beta.id}`, 1);
    expect(items.map((one) => text(one, 'action'))).toEqual(['team.remove', 'seller.update']);
    expect(items[0]).toMatchObject({
      actorName: 'Beta Yard owner',
      actorKind: 'owner',
      objectKind: 'seller',
    });
    const all = await allPages('/api/admin/audit', 10);
    const ids = all.map((one) => Number(text(one, 'id')));
    expect(ids).toEqual([...ids].sort((a, b) => b - a));
  });

  it.each(['update audit set action = $$x$$', 'delete from audit', 'truncate audit'])(
    'when somebody tries to “%s”, then the database refuses',
    async (statement) => {
      await expect(server.database.pool.query(statement)).rejects.toThrow(/append-only/);
    },
  );
});
