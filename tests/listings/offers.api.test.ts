// A unit on offer: price changes, withdrawing and relisting, its page, its photos, and the seller's list of stock.
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { listStock } from '../../shared/listings/contract';
import { listingPage } from '../../shared/listings/page';
import {
  act,
  ALL_YES,
  draft,
  draftOf,
  givenWorld,
  picture,
  problemOf,
  published,
  shoot,
  SHOTS,
  TERMS,
  type World,
} from './given-drafts';

let world: World;
beforeAll(async () => {
  world = await givenWorld();
});
afterAll(() => world.close());

describe('a unit on offer', () => {
  test('when its price changes from the version seen, then total and outright follow; from an older one it is refused', async () => {
    const one = await published(world);
    const path = `/api/seller/listings/${one.id}`;
    expect(problemOf(await world.lister.send('PATCH', path, { priceCents: 130_000 }))).toMatchObject({
      status: 422,
      paths: ['version'],
    });
    const changed = await world.lister.send('PATCH', path, {
      version: one.version,
      priceCents: 130_000,
      notes: 'Now cheaper',
    });
    expect(draftOf(changed)).toMatchObject({
      priceCents: 130_000,
      totalCents: 190_000,
      notes: 'Now cheaper',
    });
    expect(draftOf(changed).terms.outrightCents).toBe(190_000);
    expect((await world.lister.send('PATCH', path, { version: one.version, priceCents: 1_000 })).status).toBe(
      409,
    );
  });

  test('when anything else is to change, then it must be withdrawn first', async () => {
    const one = await published(world);
    const path = `/api/seller/listings/${one.id}`;
    for (const change of [
      { mileage: 1 },
      { terms: TERMS },
      { condition: {} },
      { caseCode: 'X' },
      { state: 'in_vehicle' },
    ])
      expect((await world.lister.send('PATCH', path, { version: one.version, ...change })).status).toBe(409);
    expect((await shoot(world, `${path}/photos`, 'fluid', await picture(64))).status).toBe(409);
    const first = one.photos[0]?.id ?? '';
    expect((await world.lister.send('DELETE', `${path}/photos/${first}`)).status).toBe(409);
    const claims = await world.lister.send('PATCH', path, { version: one.version, notes: 'Factory rebuilt' });
    expect(problemOf(claims)).toMatchObject({ status: 422, paths: ['notes'] });
  });

  test('when it is withdrawn and relisted, then it is a draft with everything it had, and can go live again', async () => {
    const one = await published(world);
    expect(draftOf(await act(world, one.id, 'withdraw'))).toMatchObject({ status: 'withdrawn' });
    expect((await world.visitor.get(`/api/listings/${one.id}`)).status).toBe(404);
    expect((await world.lister.get(`/api/listings/${one.id}`)).status).toBe(200);
    expect((await act(world, one.id, 'withdraw')).status).toBe(409);
    expect(draftOf(await act(world, one.id, 'relist'))).toMatchObject({ status: 'draft', missing: [] });
    world.server.clock.advance(60_000);
    const again = draftOf(await act(world, one.id, 'publish'));
    expect(again.status).toBe('live');
    expect(again.listedAt).not.toBe(one.listedAt);
  });

  test('when somebody holds it, then it is neither changed nor withdrawn', async () => {
    const one = await published(world);
    await world.pool.query(`update listings set status = 'reserved' where id = $1`, [one.id]);
    expect((await act(world, one.id, 'withdraw')).status).toBe(409);
    expect(
      (
        await world.lister.send('PATCH', `/api/seller/listings/${one.id}`, {
          version: one.version,
          priceCents: 1_000,
        })
      ).status,
    ).toBe(409);
    const page = await world.visitor.get(`/api/listings/${one.id}`);
    expect(page.body).toMatchObject({ status: 'reserved' });
  });

  test('when the page is asked for with a ZIP code, then it shows everything and a quote to there', async () => {
    await world.pool.query(
      `insert into donor_vehicles (id, seller_id, vin, description, year, created_at)
       values ('don_mine', $1, '1ZZSECRET00000001', 'Corvane Drover', 2009, now())`,
      [world.yard.id],
    );
    const one = await published(world, { condition: { ...ALL_YES, pan: 'no' }, donorVehicleId: 'don_mine' });
    const answer = await world.visitor.get(`/api/listings/${one.id}?zip=80202`);
    const page = listingPage.parse(answer.body);
    expect(page).toMatchObject({
      title: 'Keld 66A, 4x4',
      usedNotice: 'Used core',
      fit: null,
      donor: { description: 'Corvane Drover', year: 2009 },
      code: { text: 'k66a 4x 09147', segments: [{ value: 'K66A' }, { value: '4X' }, { value: '09147' }] },
      condition: { grade: 'B', because: [{ code: 'pan', label: 'Pan missing' }] },
      terms: { priceCents: 145_000, totalCents: 205_000, outrightCents: 205_000 },
      seller: { name: 'Quenby Dismantlers', verified: false, record: null },
      freight: { pickupCents: 0, quote: { toZip: '80202', freightClass: 92.5 } },
    });
    // Chicago to Denver is about 920 miles as the crow flies.
    expect(page.miles).toBeGreaterThan(910);
    expect(page.miles).toBeLessThan(930);
    expect(page.terms.exchange?.examples.map((example) => [example.grade, example.mostCents])).toEqual([
      ['A', 60_000],
      ['B', 57_000],
      ['C', 36_000],
      ['D', 0],
    ]);
    expect(page.similar.map((other) => other.id)).not.toContain(one.id);
    expect(page.similar.length).toBeGreaterThan(0);
    expect(JSON.stringify(answer.body)).not.toMatch(/SECRET|"lat"|"lon"|ownerUserId/);
  });
});

describe('photos of a draft', () => {
  test('when they come in any order, then they show in the order of the list; after a reorder in the lister’s', async () => {
    const one = await draft(world);
    const path = `/api/seller/listings/${one.id}/photos`;
    await shoot(world, path, 'code', await picture(40));
    await shoot(world, path, 'left', await picture(42));
    const two = draftOf(await shoot(world, path, 'bell', await picture(44)));
    expect(two.photos.map((photo) => photo.shot)).toEqual(['left', 'bell', 'code']);
    expect(two.coverPhotoId).toBe(two.photos[0]?.id);
    const turned = [...two.photos].reverse().map((photo) => photo.id);
    const three = draftOf(await world.lister.send('PUT', `${path}/order`, { photoIds: turned }));
    expect(three.photos.map((photo) => photo.id)).toEqual(turned);
    expect(three.coverPhotoId).toBe(turned[0]);
    expect(
      problemOf(await world.lister.send('PUT', `${path}/order`, { photoIds: turned.slice(1) })),
    ).toMatchObject({ status: 422, paths: ['photoIds'] });
    const four = draftOf(await world.lister.send('DELETE', `${path}/${turned[0]}`));
    expect([four.photos.length, four.coverPhotoId]).toEqual([2, turned[1]]);
    expect((await world.lister.send('DELETE', `${path}/${turned[0]}`)).status).toBe(404);
  });

  test('when an upload is sent again after a lost answer, then there is one photo', async () => {
    const one = await draft(world);
    const bytes = await picture(48);
    const path = `/api/seller/listings/${one.id}/photos`;
    const [first, second] = [
      await shoot(world, path, 'left', bytes),
      await shoot(world, path, 'left', bytes),
    ];
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(draftOf(second).photos.length).toBe(1);
  });

  test('when several arrive at once, then each is there', async () => {
    const one = await draft(world);
    const path = `/api/seller/listings/${one.id}/photos`;
    const answers = await Promise.all(
      SHOTS.map(async (shot, index) => shoot(world, path, shot, await picture(60 + 2 * index))),
    );
    expect(answers.map((answer) => answer.status)).toEqual(SHOTS.map(() => 201));
    expect(draftOf(await world.lister.get(`/api/seller/listings/${one.id}`)).photos.length).toBe(
      SHOTS.length,
    );
  });

  test('when the file is not a photo, too large, or the shot unknown, then 415, 413, 422', async () => {
    const one = await draft(world);
    const path = `/api/seller/listings/${one.id}/photos`;
    const svg = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>');
    expect((await shoot(world, path, 'left', svg, 'left.jpg')).status).toBe(415);
    expect((await shoot(world, path, 'left', Buffer.alloc(20 * 1024 * 1024 + 1))).status).toBe(413);
    expect((await shoot(world, path, 'roof', await picture(40))).status).toBe(422);
    expect((await world.lister.send('POST', path, { shot: 'left' })).status).toBe(422);
  });
});

describe('the stock list', () => {
  test('when it is paged and filtered, then each listing of the seller stands in it once, newest first', async () => {
    const ids: string[] = [];
    let next: string | null = null;
    do {
      const path: string = `/api/seller/listings?sellerId=${world.yard.id}&limit=4${next ? `&cursor=${next}` : ''}`;
      const body = listStock.answer?.parse((await world.lister.get(path)).body);
      if (!body) throw new Error('no answer');
      ids.push(...body.items.map((item) => item.id));
      next = body.next;
    } while (next);
    const { rows } = await world.pool.query<{ id: string }>(
      `select id from listings where seller_id = $1 order by created_at desc, id desc`,
      [world.yard.id],
    );
    expect(ids).toEqual(rows.map((row) => row.id));
    const live = (await world.lister.get(`/api/seller/listings?sellerId=${world.yard.id}&status=live&q=66A`))
      .body;
    expect(live).toMatchObject({
      items: expect.arrayContaining([expect.objectContaining({ status: 'live', missing: [] })]),
    });
    expect((await world.lister.get(`/api/seller/listings?sellerId=${world.yard.id}&cursor=zz`)).status).toBe(
      422,
    );
  });
});
