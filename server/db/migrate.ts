// Applies the SQL migrations under an advisory lock, so that several processes may start at once.
import { fileURLToPath } from 'node:url';
import path from 'node:path';
import fs from 'node:fs';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate as runMigrations } from 'drizzle-orm/node-postgres/migrator';
import pg from 'pg';

const LOCK = 7_731_026;

/** The drizzle folder is beside the sources in development and two levels above the bundle in production. */
function migrationsFolder(): string {
  let folder = path.dirname(fileURLToPath(import.meta.url));
  for (let depth = 0; depth < 4; depth += 1) {
    const candidate = path.join(folder, 'drizzle');
    if (fs.existsSync(path.join(candidate, 'meta', '_journal.json'))) return candidate;
    folder = path.dirname(folder);
  }
  throw new Error('The drizzle folder with the migrations is missing; run from a whole checkout.');
}

export async function migrate(databaseUrl: string): Promise<void> {
  const client = new pg.Client({ connectionString: databaseUrl, application_name: 'spragyard-migrate' });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [LOCK]);
    await runMigrations(drizzle(client), { migrationsFolder: migrationsFolder() });
  } finally {
    await client.end();
  }
}
