// A database of its own for one test file, cloned from the migrated template.
import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { inject } from 'vitest';
import { TEMPLATE } from './global-setup';

pg.types.setTypeParser(pg.types.builtins.INT8, Number);

export interface TestDatabase {
  readonly url: string;
  readonly pool: pg.Pool;
  close(): Promise<void>;
}

async function asAdmin(statement: string): Promise<void> {
  const admin = new pg.Client(`${inject('postgres')}/postgres`);
  await admin.connect();
  try {
    await admin.query(statement);
  } finally {
    await admin.end();
  }
}

/** Two files may want a clone at the same moment: the template takes one at a time. */
async function cloneTemplate(name: string): Promise<void> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await asAdmin(`create database ${name} template ${TEMPLATE}`);
    } catch (error) {
      if (attempt >= 40) throw error;
      await new Promise((resolve) => setTimeout(resolve, 100 + attempt * 20));
    }
  }
}

export async function openDatabase(): Promise<TestDatabase> {
  const name = `t_${randomBytes(6).toString('hex')}`;
  await cloneTemplate(name);
  const url = `${inject('postgres')}/${name}`;
  const pool = new pg.Pool({ connectionString: url, max: 4 });
  pool.on('error', () => undefined);
  return {
    url,
    pool,
    close: async () => {
      await pool.end();
      await asAdmin(`drop database if exists ${name} with (force)`);
    },
  };
}
