// A database of its own for one test file.
import pg from 'pg';
import { migrate } from '../../server/db/migrate';

pg.types.setTypeParser(pg.types.builtins.INT8, Number);

export interface TestDatabase {
  readonly url: string;
  readonly pool: pg.Pool;
  close(): Promise<void>;
}

export async function openDatabase(): Promise<TestDatabase> {
  const base = process.env['TEST_PG'] ?? 'postgres://app@127.0.0.1:47600';
  const name = `t_${process.pid}_${Date.now()}`;
  const admin = new pg.Client(`${base}/postgres`);
  await admin.connect();
  await admin.query(`create database ${name}`);
  await admin.end();
  await migrate(`${base}/${name}`);
  const pool = new pg.Pool({ connectionString: `${base}/${name}`, max: 4 });
  return { url: `${base}/${name}`, pool, close: () => pool.end() };
}
