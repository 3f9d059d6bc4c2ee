// Starting point for tests of keeping photos: a database and an object store of their own, and a clock that is set.
import pg from 'pg';
import { drizzle } from 'drizzle-orm/node-postgres';
import { startStorageFake } from '../../fakes/storage/start';
import { createStorageGateway } from '../../server/gateways/storage';
import type { PhotoDeps } from '../../server/photos/store-photo';
import { openDatabase } from '../support/database';

const KEYS = { accessKeyId: 'TESTKEY', secretAccessKey: 'test/secret+key' };
const BUCKET = 'photo-tests';

export interface Given {
  readonly pool: pg.Pool;
  readonly deps: PhotoDeps;
  /** Moves the clock on. */
  pass(hours: number): void;
  /** The keys of all stored objects. */
  objects(): Promise<string[]>;
  fault(body: object): Promise<void>;
  close(): Promise<void>;
}

export async function givenPhotos(): Promise<Given> {
  const database = await openDatabase();
  const fake = await startStorageFake({ ...KEYS, bucket: BUCKET });
  const storage = createStorageGateway({ endpoint: fake.url, region: 'us-east-1', bucket: BUCKET, ...KEYS });
  let nowMs = Date.UTC(2026, 2, 2, 17, 0, 0);
  await database.pool.query(
    `insert into users (id, name, email, password_hash, created_at) values ('usr_1', 'Lister', 'l@test.example', 'x', now())`,
  );
  return {
    pool: database.pool,
    deps: { db: drizzle(database.pool), storage, clock: { now: () => new Date(nowMs) } },
    pass: (hours) => {
      nowMs += hours * 3_600_000;
    },
    objects: async () => {
      const state = await fetch(`${fake.url}/_state`);
      const keys = new Set(
        JSON.stringify(await state.json()).match(/photos\/v1\/[0-9a-f]{2}\/[0-9a-f]{64}\/\w+\.webp/g),
      );
      return [...keys].sort();
    },
    fault: async (body) => {
      await fetch(`${fake.url}/_faults`, { method: 'POST', body: JSON.stringify(body) });
    },
    close: async () => {
      storage.close();
      await fake.close();
      await database.close();
    },
  };
}
