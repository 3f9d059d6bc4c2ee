// Starting point for tests over HTTP: the listing and photo routes on a database and an object store of their own.
import type { AddressInfo } from 'node:net';
import express from 'express';
import type pg from 'pg';
import { pinoHttp } from 'pino-http';
import { startStorageFake } from '../../fakes/storage/start';
import { loadActor } from '../../server/accounts/load-actor';
import { parseEnv } from '../../server/env';
import { mount } from '../../server/http/mount';
import { errorHandler } from '../../server/http/problem';
import { listingPhotoParty } from '../../server/listings/for-others';
import { listingRoutes } from '../../server/listings/routes';
import { makeDeps } from '../../server/make-deps';
import { photoRoutes } from '../../server/photos/routes';
import type { Deps } from '../../server/deps';
import { checklist } from '../../shared/listings/condition';
import { openDatabase } from '../support/database';

const KEYS = { accessKeyId: 'TESTKEY', secretAccessKey: 'test/secret+key' };
const BUCKET = 'listing-tests';

export const ALL_YES = Object.fromEntries(checklist('automatic').map((one) => [one.code, 'yes']));

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

export const FREIGHT = { weightLb: 245, lengthIn: 40, widthIn: 32, heightIn: 30 };

export interface Answer {
  readonly status: number;
  readonly body: unknown;
  readonly headers: Headers;
}

export interface Person {
  get(path: string, headers?: Record<string, string>): Promise<Answer>;
  send(method: string, path: string, body?: unknown): Promise<Answer>;
  upload(path: string, shot: string, bytes: Buffer, name?: string): Promise<Answer>;
}

export interface World {
  readonly deps: Deps;
  readonly pool: pg.Pool;
  readonly url: string;
  readonly as: (userId: string | null) => Person;
  pass(ms: number): void;
  close(): Promise<void>;
}

async function seedPeople(pool: pg.Pool): Promise<void> {
  const people: [id: string, admin: boolean, checked: boolean][] = [
    ['usr_lister', false, true],
    ['usr_dock', false, true],
    ['usr_other', false, true],
    ['usr_unchecked', false, false],
    ['usr_builder', false, true],
    ['usr_admin', true, true],
  ];
  for (const [id, admin, checked] of people) {
    await pool.query(
      `insert into users (id, name, email, password_hash, is_admin, mail_checked_at, created_at)
       values ($1, $1, $1 || '@test.example', 'x', $2, case when $3 then now() end, now())`,
      [id, admin, checked],
    );
  }
  const terms = {
    windowDays: 60,
    depositCents: 40_000,
    schedule: [],
    returnFreight: 'builder',
    shipDays: 4,
    graceDays: 3,
    outright: false,
  };
  for (const [id, name, kind] of [
    ['slr_yard', 'Quenby Dismantlers', 'yard'],
    ['slr_other', 'Marrow Rebuilds', 'rebuilder'],
  ]) {
    await pool.query(
      `insert into sellers (id, name, kind, zip, city, region, lat, lon, time_zone, terms, created_at)
       values ($1, $2, $3, '83702', 'Boise', 'ID', 43.63, -116.2, 'America/Boise', $4, now())`,
      [id, name, kind, JSON.stringify(terms)],
    );
  }
  for (const [sellerId, userId, duty] of [
    ['slr_yard', 'usr_lister', 'lister'],
    ['slr_yard', 'usr_unchecked', 'lister'],
    ['slr_yard', 'usr_dock', 'dock'],
    ['slr_other', 'usr_other', 'lister'],
  ]) {
    await pool.query(
      `insert into seller_members (seller_id, user_id, duties, created_at) values ($1, $2, $3, now())`,
      [sellerId, userId, [duty]],
    );
  }
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
  {
    name: 'Output',
    kind: 'option',
    length: 2,
    alphabet: 'alphanumeric',
    values: { '4X': '4x4', '2X': '4x2' },
    gap: true,
  },
  { name: 'Serial', kind: 'serial', length: 5, alphabet: 'digits', gap: true },
];

/** One family of each of two kinds; the automatic's codes read K66A, then 4X or 2X, then five figures. */
async function seedCatalogue(pool: pg.Pool): Promise<void> {
  for (const [id, kind, designation] of [
    ['fam_auto', 'automatic', '66A'],
    ['fam_axle', 'axle', '9R'],
  ]) {
    await pool.query(
      `insert into families (id, kind, maker_id, maker, designation, gears, forward_ratios, control, dry_weight_lb, length_mm,
         width_mm, height_mm, fluid, fluid_litres, bench_hours, failure_points, hard_parts, source)
       values ($1, $2, 'mak_keld', 'Keld', $3, '{}', '[2.84,1.6,1,0.7]', 'none', 168, 780, 420, 410, 'gear oil', 8, '{}', '[]',
         '[]', 'made for a test')`,
      [id, kind, designation],
    );
  }
  for (const [id, familyId, label, option] of [
    ['var_4x', 'fam_auto', '4x4, D9 bell', '4X'],
    ['var_2x', 'fam_auto', '4x2, D9 bell', '2X'],
    ['var_axle', 'fam_axle', 'Rear, 63 in', null],
  ]) {
    const segments = SEGMENTS.map((one) =>
      one.kind === 'option' && option ? { ...one, values: { [option]: label } } : one,
    );
    await pool.query(
      `insert into variants (id, family_id, label, year_from, year_to, built_from, built_to, interfaces, code_patterns, source)
       values ($1, $2, $3, 1990, 2010, '1990-01-01', '2010-12-31', '{}', $4, 'made for a test')`,
      [id, familyId, label, JSON.stringify(option ? [{ where: 'rail', mark: 'stamped', segments }] : [])],
    );
  }
  await pool.query(`insert into catalogue_version (version) values ('test')`);
}

function person(base: string, userId: string | null): Person {
  const call = async (path: string, init: RequestInit): Promise<Answer> => {
    const headers = {
      ...(userId ? { 'x-test-user': userId } : {}),
      ...Object.fromEntries(new Headers(init.headers)),
    };
    const answer = await fetch(base + path, { ...init, headers });
    const isJson = /json/.test(answer.headers.get('content-type') ?? '');
    return {
      status: answer.status,
      body: isJson ? await answer.json() : Buffer.from(await answer.arrayBuffer()),
      headers: answer.headers,
    };
  };
  return {
    get: (path, headers = {}) => call(path, { headers }),
    send: (method, path, body = {}) =>
      call(path, { method, headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) }),
    upload: (path, shot, bytes, name = 'photo.jpg') => {
      const form = new FormData();
      form.set('shot', shot);
      form.set('file', new Blob([new Uint8Array(bytes)]), name);
      return call(path, { method: 'POST', body: form });
    },
  };
}

const settings = (databaseUrl: string, storageUrl: string): Record<string, string> => ({
  NODE_ENV: 'test',
  DATABASE_URL: databaseUrl,
  SESSION_SECRET: 'x'.repeat(40),
  STRIPE_SECRET_KEY: 'sk_test_none',
  STRIPE_WEBHOOK_SECRET: 'whsec_none',
  S3_ENDPOINT: storageUrl,
  S3_BUCKET: BUCKET,
  S3_ACCESS_KEY_ID: KEYS.accessKeyId,
  S3_SECRET_ACCESS_KEY: KEYS.secretAccessKey,
  SMTP_URL: 'smtp://127.0.0.1:9',
  PUBLIC_URL: 'http://127.0.0.1',
  LOG_LEVEL: 'error',
});

export async function givenWorld(): Promise<World> {
  const database = await openDatabase();
  await seedPeople(database.pool);
  await seedCatalogue(database.pool);
  const fake = await startStorageFake({ ...KEYS, bucket: BUCKET });
  let nowMs = Date.UTC(2026, 2, 2, 17, 0, 0);
  const owned = await makeDeps(parseEnv(settings(database.url, fake.url)), {
    clock: { now: () => new Date(nowMs) },
  });
  const app = express();
  app.set('query parser', 'simple');
  app.use(pinoHttp({ logger: owned.deps.log, autoLogging: false }));
  app.use(express.json());
  mount(
    app,
    [...listingRoutes(() => Promise.resolve(null)), ...photoRoutes([listingPhotoParty])],
    owned.deps,
    {
      actorOf: (req) => {
        const userId = req.get('x-test-user');
        return userId ? loadActor(owned.deps, userId) : Promise.resolve(null);
      },
      sessionOf: () => ({
        id: () => null,
        signIn: () => Promise.resolve(),
        signOut: () => Promise.resolve(),
        csrfToken: () => '',
      }),
      limit: () => Promise.resolve(null),
    },
  );
  app.use(errorHandler);
  const server = app.listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  const address: AddressInfo | string | null = server.address();
  const url = `http://127.0.0.1:${typeof address === 'object' && address ? address.port : 0}`;
  return {
    deps: owned.deps,
    pool: database.pool,
    url,
    as: (userId) => person(url, userId),
    pass: (ms) => {
      nowMs += ms;
    },
    close: async () => {
      await new Promise((resolve) => server.close(resolve));
      await owned.close();
      await fake.close();
      await database.close();
    },
  };
}
