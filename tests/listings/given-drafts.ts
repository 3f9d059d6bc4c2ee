// Starting points for tests of drafts and offers: a yard with its people, another one, and units on their way to an offer.
import type pg from 'pg';
import { expect } from 'vitest';
import { problemSchema } from '../../shared/kernel/problem';
import { checklist } from '../../shared/listings/condition';
import { sellerListing, type SellerListing } from '../../shared/listings/contract';
import { requiredShots } from '../../shared/listings/shots';
import { quarters } from '../photos/pictures';
import type { Answer, Client } from '../support/client';
import { addMember, givenCatalogue, givenPerson, givenYard, type Yard } from '../support/given';
import { startTestServer, type TestServer } from '../support/server';

export const ALL_YES = Object.fromEntries(checklist('automatic').map((one) => [one.code, 'yes']));
export const SHOTS = requiredShots('automatic', 'pulled', {}).map((shot) => shot.code);

export const TERMS = {
  exchange: {
    depositCents: 60_000,
    windowDays: 45,
    schedule: [
      { code: 'pan', label: 'Pan missing', cents: 4_000 },
      { code: 'plug', label: 'Plug missing', cents: 3_000 },
      { code: 'ears', label: 'Ear broken', cents: 24_000 },
      { code: 'no_hole', label: 'Hole in the case', cents: 60_000 },
    ],
  },
  outright: true,
};

export interface World {
  readonly server: TestServer;
  readonly pool: pg.Pool;
  readonly yard: Yard;
  readonly other: Yard;
  readonly lister: Client;
  /** A lister of the yard whose address is not confirmed. */
  readonly unchecked: Client;
  readonly builder: Client;
  readonly builderId: string;
  readonly admin: Client;
  readonly visitor: Client;
  close(): Promise<void>;
}

async function givenAxle(pool: pg.Pool): Promise<void> {
  await pool.query(
    `insert into families (id, kind, maker_id, maker, designation, gears, forward_ratios, control, dry_weight_lb, length_mm,
       width_mm, height_mm, fluid, fluid_litres, bench_hours, failure_points, hard_parts, source)
     values ('fam_axle', 'axle', 'mak_keld', 'Keld', '9R', '{}', '[3.73]', 'none', 190, 1600, 400, 350, 'gear oil', 2, '{}', '[]',
       '[]', 'made for a test')`,
  );
  await pool.query(
    `insert into variants (id, family_id, label, year_from, year_to, built_from, built_to, interfaces, code_patterns, source)
     values ('var_axle', 'fam_axle', 'Rear, 63 in', 1990, 2010, '1990-01-01', '2010-12-31', '{}', '[]', 'made for a test')`,
  );
}

export async function givenWorld(): Promise<World> {
  const server = await startTestServer({ background: false });
  await givenCatalogue(server);
  await givenAxle(server.database.pool);
  const yard = await givenYard(server, 'Quenby Dismantlers', { payouts: false });
  const unchecked = await givenPerson(server, 'Unchecked', { mailChecked: false });
  await addMember(server, yard.id, unchecked.id, ['lister']);
  const builder = await givenPerson(server, 'Builder');
  return {
    server,
    pool: server.database.pool,
    yard,
    other: await givenYard(server, 'Marrow Rebuilds', { payouts: false }),
    lister: yard.lister.client,
    unchecked: unchecked.client,
    builder: builder.client,
    builderId: builder.id,
    admin: (await givenPerson(server, 'Admin', { admin: true })).client,
    visitor: server.client(),
    close: () => server.close(),
  };
}

export const draftOf = (answer: Answer): SellerListing => sellerListing.parse(answer.body);

export const problemOf = (answer: Answer) => {
  const problem = problemSchema.parse(answer.body);
  return {
    status: answer.status,
    code: problem.code,
    paths: (problem.errors ?? []).map((error) => error.path),
  };
};

export const picture = (side: number): Promise<Buffer> => quarters(side, side).jpeg().toBuffer();

export const bodyOf = (world: World) => ({
  sellerId: world.yard.id,
  caseCode: 'k66a 4x 09147',
  state: 'pulled',
  mileage: 118_400,
  condition: ALL_YES,
  priceCents: 145_000,
  terms: TERMS,
  freight: { weightLb: 245, lengthIn: 40, widthIn: 32, heightIn: 30 },
  notes: 'Pulled for engine. Pan has surface rust.',
});

export async function draft(world: World, body: object = {}): Promise<SellerListing> {
  const answer = await world.lister.post('/api/seller/listings', { ...bodyOf(world), ...body });
  expect(answer.status, JSON.stringify(answer.body)).toBe(201);
  return draftOf(answer);
}

export const shoot = (
  world: World,
  path: string,
  shot: string,
  bytes: Buffer,
  name?: string,
): Promise<Answer> => world.lister.upload(path, { shot }, bytes, name);

export async function photographed(world: World, body: object = {}): Promise<SellerListing> {
  let one = await draft(world, body);
  for (const [index, shot] of SHOTS.entries()) {
    const answer = await shoot(
      world,
      `/api/seller/listings/${one.id}/photos`,
      shot,
      await picture(40 + index * 2),
    );
    expect(answer.status, JSON.stringify(answer.body)).toBe(201);
    one = draftOf(answer);
  }
  return one;
}

export const act = (world: World, id: string, verb: string, body: object = {}): Promise<Answer> =>
  world.lister.post(`/api/seller/listings/${id}/${verb}`, body);

export async function published(world: World, body: object = {}): Promise<SellerListing> {
  const one = await photographed(world, body);
  const answer = await act(world, one.id, 'publish');
  expect(answer.status, JSON.stringify(answer.body)).toBe(200);
  return draftOf(answer);
}
