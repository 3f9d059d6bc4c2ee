// Once per run: a throw-away PostgreSQL (unless one is given), a migrated template, and its connection for the tests.
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { freePort, startPostgres } from '../../scripts/lib/postgres.mjs';
import { migrate } from '../../server/db/migrate';

declare module 'vitest' {
  export interface ProvidedContext {
    postgres: string;
  }
}

export const TEMPLATE = 'spragyard_template';

async function makeTemplate(server: string): Promise<void> {
  const admin = new pg.Client(`${server}/postgres`);
  await admin.connect();
  await admin.query(`drop database if exists ${TEMPLATE}`);
  await admin.query(`create database ${TEMPLATE}`);
  await admin.end();
  await migrate(`${server}/${TEMPLATE}`);
}

export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const given = process.env['TEST_PG'];
  if (given) {
    await makeTemplate(given);
    project.provide('postgres', given);
    return () => Promise.resolve();
  }
  const dataDir = fs.mkdtempSync(path.join(os.tmpdir(), 'spragyard-test-'));
  fs.chmodSync(dataDir, 0o755);
  const cluster = await startPostgres({ dataDir, port: await freePort(), throwAway: true });
  const server = cluster.url.replace(/\/postgres$/, '');
  await makeTemplate(server);
  project.provide('postgres', server);
  return async () => {
    await cluster.stop();
    fs.rmSync(dataDir, { recursive: true, force: true });
  };
}
