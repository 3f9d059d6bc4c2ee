// Debian's PostgreSQL: found or installed, and a cluster of our own made, started and stopped on loopback.
import fs from 'node:fs';
import net from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { install } from './apt.mjs';
import { asUser, isRoot, run, StepFailed } from './run.mjs';

const BASE = '/usr/lib/postgresql';

function findBin() {
  if (!fs.existsSync(BASE)) return null;
  const versions = fs
    .readdirSync(BASE)
    .filter((name) => fs.existsSync(path.join(BASE, name, 'bin', 'initdb')))
    .sort((a, b) => Number(b) - Number(a));
  return versions[0] ? path.join(BASE, versions[0], 'bin') : null;
}

/** The folder with initdb and pg_ctl; installs the server where it is missing. */
export async function postgresBin() {
  const found = findBin();
  if (found) return found;
  await install(['postgresql']);
  const installed = findBin();
  if (!installed) throw new StepFailed('PostgreSQL was installed but is not found.', `Look into ${BASE}.`);
  return installed;
}

export const portIsFree = (port, host = '127.0.0.1') =>
  new Promise((resolve) => {
    const server = net.createServer();
    server.once('error', () => resolve(false));
    server.listen(port, host, () => server.close(() => resolve(true)));
  });

export const freePort = () =>
  new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address();
      server.close(() => resolve(port));
    });
  });

/** PostgreSQL refuses to run as root, so root hands the cluster to the user that Debian's package made. */
const owner = () => (isRoot() ? 'postgres' : os.userInfo().username);

const as = (command, args) => asUser(owner(), command, args);

async function enterable(folder) {
  if (!isRoot()) return true;
  const [command, args] = as('test', ['-w', folder, '-a', '-x', folder]);
  try {
    await run(command, args, { cwd: '/' });
    return true;
  } catch {
    return false;
  }
}

/** The cluster's folder: below the data folder, or elsewhere where the server's user can't get in. */
async function clusterFolder(dataDir) {
  const wanted = path.join(dataDir, 'postgres');
  fs.mkdirSync(wanted, { recursive: true });
  if (!isRoot()) return wanted;
  await run('chown', ['postgres:', wanted], { todo: 'Is there a user postgres?' });
  if (await enterable(wanted)) return wanted;
  const name = path
    .resolve(dataDir)
    .replaceAll(/[^A-Za-z0-9]+/g, '-')
    .replace(/^-|-$/g, '');
  const instead = path.join('/var/lib', `spragyard-${name}`);
  fs.mkdirSync(instead, { recursive: true });
  await run('chown', ['postgres:', instead]);
  return instead;
}

async function control(bin, folder, args) {
  const [command, all] = as(path.join(bin, 'pg_ctl'), ['-D', path.join(folder, 'data'), '-w', ...args]);
  return run(command, all, { cwd: '/', todo: `Look into ${path.join(folder, 'log')}.` });
}

async function isRunning(bin, folder) {
  try {
    await control(bin, folder, ['status']);
    return true;
  } catch {
    return false;
  }
}

/**
 * Makes the cluster where it is missing and starts it.
 * @param {{ dataDir: string, port: number, throwAway?: boolean }} options throwAway: for tests, may lose all at a crash
 * @returns {Promise<{ url: string, folder: string, stop(): Promise<void> }>}
 */
export async function startPostgres({ dataDir, port, throwAway = false }) {
  const bin = await postgresBin();
  const folder = await clusterFolder(dataDir);
  const data = path.join(folder, 'data');
  if (!fs.existsSync(path.join(data, 'PG_VERSION'))) {
    const [command, args] = as(path.join(bin, 'initdb'), [
      ...['-D', data, '-U', 'app', '--auth=trust', '-E', 'UTF8', '--locale=C.UTF-8'],
      ...(throwAway ? ['--no-sync'] : []),
    ]);
    await run(command, args, { cwd: '/', todo: `Remove ${data} and try again.` });
  }
  const stop = async () => {
    await control(bin, folder, ['-m', 'fast', 'stop']).catch(() => undefined);
  };
  // Left running by a start that was killed: stopped first, so that the port asked for is the one taken.
  if (await isRunning(bin, folder)) await stop();
  if (!(await portIsFree(port))) {
    throw new StepFailed(`Port ${port} is in use.`, 'Set PG_PORT to a free one.');
  }
  const settings = [
    `-p ${port}`,
    '-c listen_addresses=127.0.0.1',
    "-c unix_socket_directories=''",
    '-c max_connections=120',
    ...(throwAway ? ['-c fsync=off', '-c synchronous_commit=off', '-c full_page_writes=off'] : []),
  ].join(' ');
  await control(bin, folder, ['-l', path.join(folder, 'log'), '-o', settings, 'start']);
  return { url: `postgres://app@127.0.0.1:${port}/postgres`, folder, stop };
}
