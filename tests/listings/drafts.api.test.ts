// A unit from the first draft to an offer: who may, what is missing, photos, price changes, withdrawing and relisting.
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { listStock, sellerListing, type SellerListing } from '../../shared/listings/contract';
import { listingPage } from '../../shared/listings/page';
import { problemSchema } from '../../shared/kernel/problem';
import { requiredShots } from '../../shared/listings/shots';
import { quarters } from '../photos/pictures';
import { ALL_YES, FREIGHT, givenWorld, TERMS, type Answer, type World } from './given-listings';

let world: World;
beforeAll(async () => {
  world = await givenWorld();
});
afterAll(() => world.close());

const lister = () => world.as('usr_lister');
const draftOf = (answer: Answer): SellerListing => sellerListing.parse(answer.body);
const problemOf = (answer: Answer) => {
  const problem = problemSchema.parse(answer.body);
  return {
    status: answer.status,
    code: problem.code,
    paths: (problem.errors ?? []).map((error) => error.path),
  };
};
const picture = (side: number): Promise<Buffer> => quarters(side, side).jpeg().toBuffer();

const BODY = {
  sellerId: 'slr_yard',
  caseCode: 'k66a 4x 09147',
  state: 'pulled',
  mileage: 118_400,
  condition: ALL_YES,
  priceCents: 145_000,
  terms: TERMS,
  freight: FREIGHT,
  notes: 'Pulled for engine. Pan has surface rust.',
};

async function draft(body: object = {}): Promise<SellerListing> {
  const answer = await lister().send('POST', '/api/seller/listings', { ...BODY, ...body });
  expect(answer.status, JSON.stringify(answer.body)).toBe(201);
  return draftOf(answer);
}

const SHOTS = requiredShots('automatic', 'pulled', {}).map((shot) => shot.code);

async function photographed(body: object = {}): Promise<SellerListing> {
  let one = await draft(body);
  for (const [index, shot] of SHOTS.entries()) {
    const answer = await lister().upload(
      `/api/seller/listings/${one.id}/photos`,
      shot,
      await picture(40 + index * 2),
    );
    expect(answer.status, JSON.stringify(answer.body)).toBe(201);
    one = draftOf(answer);
  }
  return one;
}

const act = (id: string, verb: string, body: object = {}): Promise<Answer> =>
  lister().send('POST', `/api/seller/listings/${id}/${verb}`, body);

async function published(body: object = {}): Promise<SellerListing> {
  const one = await photographed(body);
  const answer = await act(one.id, 'publish');
  expect(answer.status, JSON.stringify(answer.body)).toBe(200);
  return draftOf(answer);
}

describe('a draft', () => {
  test('when only the code is known, then the unit, its title and its shots follow from it', async () => {
    const one = await draft();
    expect(one).toMatchObject({
      status: 'draft',
      variantId: 'var_4x',
      familyId: 'fam_auto',
      kind: 'automatic',
      title: 'Keld 66A, 4x4',
    });
    expect(one.condition?.grade).toBe('A');
    expect(one.shots.map((shot) => shot.number)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9]);
    expect(one.totalCents).toBe(205_000);
    expect(one.missing.map((error) => error.path)).toEqual(SHOTS.map((shot) => `photos.${shot}`));
  });

  test('when it brings no terms, then the seller’s own are its start', async () => {
    const { terms: _none, ...rest } = BODY;
    const answer = await lister().send('POST', '/api/seller/listings', rest);
    expect(draftOf(answer).terms).toMatchObject({
      exchange: { depositCents: 40_000, windowDays: 60, returnFreight: 'builder' },
      outright: false,
    });
    expect(draftOf(answer).shipDays).toBe(4);
  });

  test('when the code fits nothing, then the unit stays open until it is chosen', async () => {
    const one = await draft({ caseCode: 'ZZ 1' });
    expect([one.variantId, one.kind, one.condition]).toEqual([null, null, null]);
    const chosen = await lister().send('PATCH', `/api/seller/listings/${one.id}`, { variantId: 'var_axle' });
    expect(draftOf(chosen)).toMatchObject({ kind: 'axle', title: 'Keld 9R, Rear', version: one.version + 1 });
  });

  test('when a field is unknown, a question does not exist, or a donor is another’s, then it is named', async () => {
    const send = async (body: object) =>
      problemOf(await lister().send('POST', '/api/seller/listings', { ...BODY, ...body }));
    expect(await send({ status: 'live' })).toMatchObject({ status: 422 });
    expect(await send({ condition: { wings: 'yes' } })).toMatchObject({
      status: 422,
      paths: ['condition.wings'],
    });
    await world.pool.query(
      `insert into donor_vehicles (id, seller_id, description, created_at) values ('don_other', 'slr_other', 'Drover', now())`,
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
    const one = await draft();
    const path = `/api/seller/listings/${one.id}`;
    expect((await world.as(null).get(path)).status).toBe(401);
    expect((await world.as('usr_builder').get(path)).status).toBe(403);
    for (const answer of [
      await world.as('usr_other').get(path),
      await world.as('usr_other').send('PATCH', path, { notes: 'mine' }),
      await world.as('usr_other').upload(`${path}/photos`, 'left', await picture(40)),
      await world.as('usr_other').send('DELETE', `${path}/photos/pho_1`),
      await world.as('usr_other').send('PUT', `${path}/photos/order`, { photoIds: ['pho_1'] }),
      await world.as('usr_other').send('POST', `${path}/publish`),
      await world.as('usr_other').send('POST', `${path}/withdraw`),
      await world.as('usr_other').send('POST', `${path}/relist`),
      await world.as('usr_other').get('/api/seller/listings?sellerId=slr_yard'),
      await world.as('usr_other').send('POST', '/api/seller/listings', BODY),
      await world.as(null).get(`/api/listings/${one.id}`),
      await lister().get(`/api/listings/${one.id}`),
    ])
      expect(answer.status, JSON.stringify(answer.body)).toBe(404);
  });

  test('when a member without the lister duty looks, then it is shown but not changed', async () => {
    const one = await draft();
    const dock = world.as('usr_dock');
    expect((await dock.get(`/api/seller/listings/${one.id}`)).status).toBe(200);
    expect((await dock.send('PATCH', `/api/seller/listings/${one.id}`, { notes: 'x' })).status).toBe(403);
    expect((await dock.send('POST', '/api/seller/listings', BODY)).status).toBe(403);
  });
});

describe('publishing', () => {
  test('when things are missing, then 422 names each shot and field, and it stays a draft', async () => {
    const one = await draft({ priceCents: null, freight: null, condition: {} });
    const answer = problemOf(await act(one.id, 'publish'));
    expect(answer).toMatchObject({ status: 422, code: 'invalid' });
    expect(answer.paths).toEqual([
      ...Object.keys(ALL_YES).map((code) => `condition.${code}`),
      ...SHOTS.map((shot) => `photos.${shot}`),
      'priceCents',
      'freight',
    ]);
    expect(draftOf(await lister().get(`/api/seller/listings/${one.id}`)).status).toBe('draft');
  });

  test('when the lister’s address is not confirmed, then that is what is missing', async () => {
    const one = await photographed();
    const answer = await world.as('usr_unchecked').send('POST', `/api/seller/listings/${one.id}/publish`);
    expect(problemOf(answer)).toMatchObject({ status: 422, paths: ['account.mail'] });
  });

  test('when the number was ground off or the notes claim a rebuild, then it is refused', async () => {
    const one = await photographed({
      condition: { ...ALL_YES, number_intact: 'no' },
      notes: 'Rebuilt, like new',
    });
    expect(problemOf(await act(one.id, 'publish'))).toMatchObject({
      status: 422,
      paths: ['condition.number_intact', 'notes'],
    });
  });

  test('when all is there, then it is on offer, found by search, and written into the audit trail', async () => {
    const one = await published();
    expect(one).toMatchObject({ status: 'live', missing: [], listedAt: expect.any(String) });
    const found = await world.as(null).get(`/api/listings?q=${encodeURIComponent('K66A 4X')}&sort=newest`);
    expect(found.body).toMatchObject({
      matched: 'code',
      items: expect.arrayContaining([
        expect.objectContaining({ id: one.id, fit: null, photoUrl: expect.stringContaining('/small') }),
      ]),
    });
    const { rows } = await world.pool.query(`select action, actor_user_id from audit where object_id = $1`, [
      one.id,
    ]);
    expect(rows).toEqual([{ action: 'listing_published', actor_user_id: 'usr_lister' }]);
    expect((await act(one.id, 'publish')).status).toBe(409);
  });
});

describe('a unit on offer', () => {
  test('when its price changes from the version seen, then total and outright follow; from an older one it is refused', async () => {
    const one = await published();
    const path = `/api/seller/listings/${one.id}`;
    expect(problemOf(await lister().send('PATCH', path, { priceCents: 130_000 }))).toMatchObject({
      status: 422,
      paths: ['version'],
    });
    const changed = await lister().send('PATCH', path, {
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
    expect((await lister().send('PATCH', path, { version: one.version, priceCents: 1_000 })).status).toBe(
      409,
    );
  });

  test('when anything else is to change, then it must be withdrawn first', async () => {
    const one = await published();
    const path = `/api/seller/listings/${one.id}`;
    for (const change of [
      { mileage: 1 },
      { terms: TERMS },
      { condition: {} },
      { caseCode: 'X' },
      { state: 'in_vehicle' },
    ])
      expect((await lister().send('PATCH', path, { version: one.version, ...change })).status).toBe(409);
    expect((await lister().upload(`${path}/photos`, 'fluid', await picture(64))).status).toBe(409);
    const first = one.photos[0]?.id ?? '';
    expect((await lister().send('DELETE', `${path}/photos/${first}`)).status).toBe(409);
    const claims = await lister().send('PATCH', path, { version: one.version, notes: 'Factory rebuilt' });
    expect(problemOf(claims)).toMatchObject({ status: 422, paths: ['notes'] });
  });

  test('when it is withdrawn and relisted, then it is a draft with everything it had, and can go live again', async () => {
    const one = await published();
    expect(draftOf(await act(one.id, 'withdraw'))).toMatchObject({ status: 'withdrawn' });
    expect((await world.as(null).get(`/api/listings/${one.id}`)).status).toBe(404);
    expect((await lister().get(`/api/listings/${one.id}`)).status).toBe(200);
    expect((await act(one.id, 'withdraw')).status).toBe(409);
    expect(draftOf(await act(one.id, 'relist'))).toMatchObject({ status: 'draft', missing: [] });
    world.pass(60_000);
    const again = draftOf(await act(one.id, 'publish'));
    expect(again.status).toBe('live');
    expect(again.listedAt).not.toBe(one.listedAt);
  });

  test('when somebody holds it, then it is neither changed nor withdrawn', async () => {
    const one = await published();
    await world.pool.query(`update listings set status = 'reserved' where id = $1`, [one.id]);
    expect((await act(one.id, 'withdraw')).status).toBe(409);
    expect(
      (
        await lister().send('PATCH', `/api/seller/listings/${one.id}`, {
          version: one.version,
          priceCents: 1_000,
        })
      ).status,
    ).toBe(409);
    const page = await world.as(null).get(`/api/listings/${one.id}`);
    expect(page.body).toMatchObject({ status: 'reserved' });
  });

  test('when the page is asked for with a ZIP code, then it shows everything and a quote to there', async () => {
    await world.pool.query(
      `insert into donor_vehicles (id, seller_id, vin, description, year, created_at)
       values ('don_mine', 'slr_yard', '1ZZSECRET00000001', 'Corvane Drover', 2009, now())`,
    );
    const one = await published({ condition: { ...ALL_YES, pan: 'no' }, donorVehicleId: 'don_mine' });
    const answer = await world.as(null).get(`/api/listings/${one.id}?zip=80202`);
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
    // Boise to Denver is about 640 miles as the crow flies.
    expect(page.miles).toBeGreaterThan(600);
    expect(page.miles).toBeLessThan(680);
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
    const one = await draft();
    const path = `/api/seller/listings/${one.id}/photos`;
    await lister().upload(path, 'code', await picture(40));
    await lister().upload(path, 'left', await picture(42));
    const two = draftOf(await lister().upload(path, 'bell', await picture(44)));
    expect(two.photos.map((photo) => photo.shot)).toEqual(['left', 'bell', 'code']);
    expect(two.coverPhotoId).toBe(two.photos[0]?.id);
    const turned = [...two.photos].reverse().map((photo) => photo.id);
    const three = draftOf(await lister().send('PUT', `${path}/order`, { photoIds: turned }));
    expect(three.photos.map((photo) => photo.id)).toEqual(turned);
    expect(three.coverPhotoId).toBe(turned[0]);
    expect(
      problemOf(await lister().send('PUT', `${path}/order`, { photoIds: turned.slice(1) })),
    ).toMatchObject({ status: 422, paths: ['photoIds'] });
    const four = draftOf(await lister().send('DELETE', `${path}/${turned[0]}`));
    expect([four.photos.length, four.coverPhotoId]).toEqual([2, turned[1]]);
    expect((await lister().send('DELETE', `${path}/${turned[0]}`)).status).toBe(404);
  });

  test('when an upload is sent again after a lost answer, then there is one photo', async () => {
    const one = await draft();
    const bytes = await picture(48);
    const path = `/api/seller/listings/${one.id}/photos`;
    const [first, second] = [
      await lister().upload(path, 'left', bytes),
      await lister().upload(path, 'left', bytes),
    ];
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(draftOf(second).photos.length).toBe(1);
  });

  test('when several arrive at once, then each is there', async () => {
    const one = await draft();
    const path = `/api/seller/listings/${one.id}/photos`;
    const answers = await Promise.all(
      SHOTS.map(async (shot, index) => lister().upload(path, shot, await picture(60 + 2 * index))),
    );
    expect(answers.map((answer) => answer.status)).toEqual(SHOTS.map(() => 201));
    expect(draftOf(await lister().get(`/api/seller/listings/${one.id}`)).photos.length).toBe(SHOTS.length);
  });

  test('when the file is not a photo, too large, or the shot unknown, then 415, 413, 422', async () => {
    const one = await draft();
    const path = `/api/seller/listings/${one.id}/photos`;
    const svg = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>');
    expect((await lister().upload(path, 'left', svg, 'left.jpg')).status).toBe(415);
    expect((await lister().upload(path, 'left', Buffer.alloc(20 * 1024 * 1024 + 1))).status).toBe(413);
    expect((await lister().upload(path, 'roof', await picture(40))).status).toBe(422);
    expect((await lister().send('POST', path, { shot: 'left' })).status).toBe(422);
  });
});

describe('the stock list', () => {
  test('when it is paged and filtered, then each listing of the seller stands in it once, newest first', async () => {
    const ids: string[] = [];
    let next: string | null = null;
    do {
      const path: string = `/api/seller/listings?sellerId=slr_yard&limit=4${next ? `&cursor=${next}` : ''}`;
      const body = listStock.answer?.parse((await lister().get(path)).body);
      if (!body) throw new Error('no answer');
      ids.push(...body.items.map((item) => item.id));
      next = body.next;
    } while (next);
    const { rows } = await world.pool.query<{ id: string }>(
      `select id from listings where seller_id = 'slr_yard' order by created_at desc, id desc`,
    );
    expect(ids).toEqual(rows.map((row) => row.id));
    const live = (await lister().get('/api/seller/listings?sellerId=slr_yard&status=live&q=66A')).body;
    expect(live).toMatchObject({
      items: expect.arrayContaining([expect.objectContaining({ status: 'live', missing: [] })]),
    });
    expect((await lister().get('/api/seller/listings?sellerId=slr_yard&cursor=zz')).status).toBe(422);
  });
});
