// A unit up to its offer: what a draft takes, who may see and change it, and what is missing to publish.
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

import { SCHEDULE } from '../support/given';
import {
  act,
  ALL_YES,
  bodyOf,
  draft,
  draftOf,
  givenWorld,
  photographed,
  picture,
  problemOf,
  published,
  SHOTS,
  TERMS,
  type World,
} from './given-drafts';

let world: World;
beforeAll(async () => {
  world = await givenWorld();
});
afterAll(() => world.close());

describe('a draft', () => {
  test('when only the code is known, then the unit, its title and its shots follow from it', async () => {
    const one = await draft(world);
    expect(one).toMatchObject({
      status: 'draft',
      variantId: 'var_k66a',
      familyId: 'fam_66a',
      kind: 'automatic',
      title: 'Keld 66A, 4x4',
    });
    expect(one.condition?.grade).toBe('A');
    expect(one.shots.map((shot) => shot.number)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9]);
    expect(one.totalCents).toBe(205_000);
    expect(one.missing.map((error) => error.path)).toEqual(SHOTS.map((shot) => `photos.${shot}`));
  });

  test('when it brings no terms, then the seller’s own are its start', async () => {
    const { terms: _none, ...rest } = bodyOf(world);
    const answer = await world.lister.send('POST', '/api/seller/listings', rest);
    const { terms: taken, shipDays } = draftOf(answer);
    expect(taken).toMatchObject({
      exchange: { depositCents: 60_000, schedule: SCHEDULE, returnFreight: 'builder' },
      outright: true,
    });
    expect(shipDays).toBe(5);
  });

  test('when the code fits nothing, then the unit stays open until it is chosen', async () => {
    const one = await draft(world, { caseCode: 'ZZ 1' });
    expect([one.variantId, one.kind, one.condition]).toEqual([null, null, null]);
    const chosen = await world.lister.send('PATCH', `/api/seller/listings/${one.id}`, {
      variantId: 'var_axle',
    });
    expect(draftOf(chosen)).toMatchObject({ kind: 'axle', title: 'Keld 9R, Rear', version: one.version + 1 });
  });

  test('when a field is unknown, a question does not exist, or a donor is another’s, then it is named', async () => {
    const send = async (body: object) =>
      problemOf(await world.lister.send('POST', '/api/seller/listings', { ...bodyOf(world), ...body }));
    expect(await send({ status: 'live' })).toMatchObject({ status: 422 });
    expect(await send({ condition: { wings: 'yes' } })).toMatchObject({
      status: 422,
      paths: ['condition.wings'],
    });
    await world.pool.query(
      `insert into donor_vehicles (id, seller_id, description, created_at) values ('don_other', $1, 'Drover', now())`,
      [world.other.id],
    );
    expect(await send({ donorVehicleId: 'don_other' })).toMatchObject({
      status: 422,
      paths: ['donorVehicleId'],
    });
    expect(await send({ variantId: 'var_none' })).toMatchObject({ status: 422, paths: ['variantId'] });
    expect(await send({ priceCents: -1 })).toMatchObject({ status: 422, paths: ['priceCents'] });
    expect(await send({ terms: { ...TERMS, exchange: { ...TERMS.exchange, windowDays: 6 } } })).toMatchObject(
      {
        status: 422,
        paths: ['terms.exchange.windowDays'],
      },
    );
  });
});

describe('who may', () => {
  test('when somebody else asks for a draft, then there is none', async () => {
    const one = await draft(world);
    const path = `/api/seller/listings/${one.id}`;
    expect((await world.visitor.get(path)).status).toBe(401);
    expect((await world.builder.get(path)).status).toBe(403);
    for (const answer of [
      await world.other.lister.client.get(path),
      await world.other.lister.client.send('PATCH', path, { notes: 'mine' }),
      await world.other.lister.client.upload(`${path}/photos`, { shot: 'left' }, await picture(40)),
      await world.other.lister.client.send('DELETE', `${path}/photos/pho_1`),
      await world.other.lister.client.send('PUT', `${path}/photos/order`, { photoIds: ['pho_1'] }),
      await world.other.lister.client.send('POST', `${path}/publish`),
      await world.other.lister.client.send('POST', `${path}/withdraw`),
      await world.other.lister.client.send('POST', `${path}/relist`),
      await world.other.lister.client.get(`/api/seller/listings?sellerId=${world.yard.id}`),
      await world.other.lister.client.send('POST', '/api/seller/listings', bodyOf(world)),
      await world.visitor.get(`/api/listings/${one.id}`),
      await world.lister.get(`/api/listings/${one.id}`),
    ])
      expect(answer.status, JSON.stringify(answer.body)).toBe(404);
  });

  test('when a member without the lister duty looks, then it is shown but not changed', async () => {
    const one = await draft(world);
    const dock = world.yard.dock.client;
    expect((await dock.get(`/api/seller/listings/${one.id}`)).status).toBe(200);
    expect((await dock.send('PATCH', `/api/seller/listings/${one.id}`, { notes: 'x' })).status).toBe(403);
    expect((await dock.send('POST', '/api/seller/listings', bodyOf(world))).status).toBe(403);
  });
});

describe('publishing', () => {
  test('when things are missing, then 422 names each shot and field, and it stays a draft', async () => {
    const one = await draft(world, { priceCents: null, freight: null, condition: {} });
    const answer = problemOf(await act(world, one.id, 'publish'));
    expect(answer).toMatchObject({ status: 422, code: 'invalid' });
    expect(answer.paths).toEqual([
      ...Object.keys(ALL_YES).map((code) => `condition.${code}`),
      ...SHOTS.map((shot) => `photos.${shot}`),
      'priceCents',
      'freight',
    ]);
    expect(draftOf(await world.lister.get(`/api/seller/listings/${one.id}`)).status).toBe('draft');
  });

  test('when the lister’s address is not confirmed, then that is what is missing', async () => {
    const one = await photographed(world);
    const answer = await world.unchecked.send('POST', `/api/seller/listings/${one.id}/publish`);
    expect(problemOf(answer)).toMatchObject({ status: 422, paths: ['account.mail'] });
  });

  test('when the number was ground off or the notes claim a rebuild, then it is refused', async () => {
    const one = await photographed(world, {
      condition: { ...ALL_YES, number_intact: 'no' },
      notes: 'Rebuilt, like new',
    });
    expect(problemOf(await act(world, one.id, 'publish'))).toMatchObject({
      status: 422,
      paths: ['condition.number_intact', 'notes'],
    });
  });

  test('when all is there, then it is on offer, found by search, and written into the audit trail', async () => {
    const one = await published(world);
    expect(one).toMatchObject({ status: 'live', missing: [], listedAt: expect.any(String) });
    const found = await world.visitor.get(`/api/listings?q=${encodeURIComponent('K66A 4X')}&sort=newest`);
    expect(found.body).toMatchObject({
      matched: 'code',
      items: expect.arrayContaining([
        expect.objectContaining({ id: one.id, fit: null, photoUrl: expect.stringContaining('/small') }),
      ]),
    });
    const { rows } = await world.pool.query(`select action, actor_user_id from audit where object_id = $1`, [
      one.id,
    ]);
    expect(rows).toEqual([{ action: 'listing_published', actor_user_id: world.yard.lister.id }]);
    expect((await act(world, one.id, 'publish')).status).toBe(409);
  });
});
