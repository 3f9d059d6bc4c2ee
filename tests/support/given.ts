// People, yards and units that a test starts from. What a test does not say is filled in plainly.
import { randomBytes } from 'node:crypto';
import { hash } from '@node-rs/argon2';
import sharp from 'sharp';
import { newId } from '../../shared/kernel/ids';
import { newTagCode } from '../../shared/kernel/tag-code';
import { checklist } from '../../shared/listings/condition';
import type { Duty } from '../../shared/accounts/actor';
import type { Client } from './client';
import type { TestServer } from './server';

export const PASSWORD = 'one-way-only-2026';
const passwordHash = hash(PASSWORD);

export interface Person {
  readonly id: string;
  readonly email: string;
  readonly client: Client;
}

let people = 0;

export async function givenPerson(
  server: TestServer,
  name: string,
  options: { admin?: boolean; mailChecked?: boolean } = {},
): Promise<Person> {
  const id = newId('usr');
  people += 1;
  const email = `${name.toLowerCase().replaceAll(/\W+/g, '.')}.${people}@test.example`;
  await server.database.pool.query(
    `insert into users (id, name, email, password_hash, is_admin, mail_checked_at, created_at)
     values ($1, $2, $3, $4, $5, case when $6 then now() end, now())`,
    [id, name, email, await passwordHash, options.admin ?? false, options.mailChecked ?? true],
  );
  const client = server.client();
  const answer = await client.post('/api/auth/sign-in', { email, password: PASSWORD });
  if (answer.status !== 200) throw new Error(`sign-in of ${name}: ${JSON.stringify(answer.body)}`);
  return { id, email, client };
}

export const SCHEDULE = [
  { code: 'pan', label: 'Pan missing', cents: 4_000 },
  { code: 'plug', label: 'Plug missing', cents: 3_000 },
  { code: 'ears', label: 'Ear broken', cents: 24_000 },
  { code: 'not_a_core', label: 'Not a core', cents: 60_000 },
];

export interface Yard {
  readonly id: string;
  readonly name: string;
  readonly owner: Person;
  readonly lister: Person;
  readonly dock: Person;
}

export async function addMember(
  server: TestServer,
  sellerId: string,
  userId: string,
  duties: Duty[],
): Promise<void> {
  await server.database.pool.query(
    `insert into seller_members (seller_id, user_id, duties, created_at) values ($1, $2, $3, now())
     on conflict (seller_id, user_id) do update set duties = excluded.duties`,
    [sellerId, userId, duties],
  );
}

/** A yard in Chicago that can be paid out, unless said otherwise. */
export async function givenYard(
  server: TestServer,
  name = 'Quenby Dismantlers',
  options: { payouts?: boolean } = {},
): Promise<Yard> {
  const id = newId('slr');
  let accountId: string | null = null;
  if (options.payouts !== false) {
    const opened = await server.deps.payments.openAccount(
      { sellerId: id, email: 'yard@test.example' },
      `account:${id}`,
    );
    accountId = opened.accountId;
    await fetch(`${server.payments.url}/_onboard/${accountId}`, { method: 'POST' });
  }
  const terms = {
    windowDays: 45,
    depositCents: 60_000,
    schedule: SCHEDULE,
    returnFreight: 'builder',
    shipDays: 5,
    graceDays: 3,
    outright: true,
  };
  await server.database.pool.query(
    `insert into sellers (id, name, kind, zip, city, region, lat, lon, time_zone, terms, payout_account_id, payouts_enabled, created_at)
     values ($1, $2, 'yard', '60601', 'Chicago', 'IL', 41.8858, -87.6181, 'America/Chicago', $3, $4, $5, now())`,
    [id, name, JSON.stringify(terms), accountId, accountId !== null],
  );
  const [owner, lister, dock] = await Promise.all([
    givenPerson(server, `${name} owner`),
    givenPerson(server, `${name} lister`),
    givenPerson(server, `${name} dock`),
  ]);
  await addMember(server, id, owner.id, ['owner']);
  await addMember(server, id, lister.id, ['lister']);
  await addMember(server, id, dock.id, ['dock']);
  return { id, name, owner, lister, dock };
}

const SEGMENTS = [
  {
    name: 'Family',
    kind: 'literal',
    length: 4,
    alphabet: 'alphanumeric',
    values: { K66A: 'Keld 66A' },
    gap: false,
  },
  { name: 'Output', kind: 'option', length: 2, alphabet: 'alphanumeric', values: { '4X': '4x4' }, gap: true },
  { name: 'Serial', kind: 'serial', length: 5, alphabet: 'digits', gap: true },
];

/** Two families: K66A codes name the automatic of the tests, K77B codes another one. */
export async function givenCatalogue(server: TestServer): Promise<void> {
  for (const [family, mark] of [
    ['fam_66a', 'K66A'],
    ['fam_77b', 'K77B'],
  ] as const) {
    await server.database.pool.query(
      `insert into families (id, kind, maker_id, maker, designation, gears, forward_ratios, control, dry_weight_lb, length_mm,
         width_mm, height_mm, fluid, fluid_litres, bench_hours, failure_points, hard_parts, source)
       values ($1, 'automatic', 'mak_keld', 'Keld', $2, '{}', '[2.84,1.6,1,0.7]', 'hydraulic', 168, 780, 420, 410, 'ATF', 8, '{}', '[]',
         '[]', 'made for a test') on conflict do nothing`,
      [family, mark.slice(1)],
    );
    const segments = [{ ...SEGMENTS[0], values: { [mark]: `Keld ${mark}` } }, ...SEGMENTS.slice(1)];
    await server.database.pool.query(
      `insert into variants (id, family_id, label, year_from, year_to, built_from, built_to, interfaces, code_patterns, source)
       values ($1, $2, '4x4', 2004, 2012, '2003-08-01', '2012-07-31', '{}', $3, 'made for a test')
       on conflict do nothing`,
      [`var_${mark.toLowerCase()}`, family, JSON.stringify([{ where: 'rail', mark: 'stamped', segments }])],
    );
  }
  await server.database.pool.query(`insert into catalogue_version (version) values ('test') on conflict do nothing`);
}

export interface GivenListing {
  readonly id: string;
  readonly tagCode: string;
  readonly caseCode: string;
}

export interface ListingOptions {
  readonly priceCents?: number;
  readonly depositCents?: number;
  readonly windowDays?: number;
}

/** A unit on sale, as it stands in the database after a lister has published it. */
export async function givenListing(
  server: TestServer,
  yard: Yard,
  options: ListingOptions = {},
): Promise<GivenListing> {
  const id = newId('lst');
  const photoId = newId('pho');
  const tagCode = newTagCode();
  const caseCode = `K66A 4X ${String(10_000 + (randomBytes(2).readUInt16BE(0) % 89_999))}`;
  const priceCents = options.priceCents ?? 145_000;
  const depositCents = options.depositCents ?? 60_000;
  const sha = randomBytes(32).toString('hex');
  await server.database.pool.query(
    `insert into photos (id, owner_user_id, seller_id, purpose, shot, sha256, stored_sha256, width_px, height_px, bytes, created_at)
     values ($1, $2, $3, 'listing', 'left', $4, $4, 1600, 1200, 1000, now())`,
    [photoId, yard.lister.id, yard.id, sha],
  );
  const condition = Object.fromEntries(checklist('automatic').map((one) => [one.code, 'yes']));
  await server.database.pool.query(
    `insert into listings (id, seller_id, variant_id, family_id, kind, title, case_code, code_key, tag_code, grade, state, status,
       condition, price_cents, exchange, deposit_cents, outright, outright_cents, total_cents, window_days, schedule, return_freight,
       freight, ship_days, zip, lat, lon, photo_count, cover_photo_id, created_at, updated_at, published_at, listed_at)
     values ($1, $2, 'var_k66a', 'fam_66a', 'automatic', 'Keld 66A, 4x4', $3, $4, $5, 'A', 'pulled', 'live',
       $6, $7, true, $8, true, $9, $10, $11, $12, 'builder', $13, 5, '60601', 41.8858, -87.6181, 1, $14, now(), now(), now(), now())`,
    [
      ...[
        id,
        yard.id,
        caseCode,
        caseCode.replaceAll(' ', ''),
        tagCode,
        JSON.stringify(condition),
        priceCents,
        depositCents,
      ],
      ...[priceCents + 50_000, priceCents + depositCents, options.windowDays ?? 45, JSON.stringify(SCHEDULE)],
      ...[JSON.stringify({ weightLb: 245, lengthIn: 40, widthIn: 32, heightIn: 30 }), photoId],
    ],
  );
  await server.database.pool.query(
    `insert into listing_photos (listing_id, photo_id, shot, position) values ($1, $2, 'left', 0)`,
    [id, photoId],
  );
  return { id, tagCode, caseCode };
}

/** A small real JPEG, another one each time. */
export async function givenJpeg(): Promise<Buffer> {
  const [r = 0, g = 0, b = 0] = randomBytes(3);
  return sharp({ create: { width: 320, height: 240, channels: 3, background: { r, g, b } } })
    .jpeg()
    .toBuffer();
}

export const DELIVERY = {
  method: 'freight',
  name: 'Ines Abara',
  line1: '12 Shop Lane',
  city: 'Boise',
  region: 'ID',
  zip: '83702',
} as const;
