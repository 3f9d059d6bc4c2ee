// Starts one server process: settings, database, background work, then it listens; stops cleanly on SIGTERM.
import { createServer } from 'node:http';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { createApp } from './app';
import { startBackground } from './background';
import { migrate } from './db/migrate';
import { readEnv, type Env } from './env';
import { makeDeps } from './make-deps';

const STOP_AFTER_MS = 10_000;

function settingsOrExit(): Env {
  try {
    return readEnv();
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(2);
  }
}

async function main(): Promise<void> {
  const env = settingsOrExit();
  await migrate(env.DATABASE_URL);
  const { deps, close } = await makeDeps(env);
  await deps.storage.prepare();
  const background = await startBackground(deps);
  const here = path.dirname(fileURLToPath(import.meta.url));
  // Bundled: dist/server/main.js beside dist/client. From sources: server/main.ts with the build in dist/client.
  const clientFolder = here.includes(`${path.sep}dist${path.sep}`)
    ? path.join(here, '..', 'client')
    : path.join(here, '..', 'dist', 'client');
  const server = createServer(createApp(deps, { clientFolder }));
  server.listen(env.PORT, env.HOST, () => deps.log.info({ port: env.PORT, host: env.HOST }, 'ready'));
  let stopping = false;
  const stop = async (): Promise<void> => {
    if (stopping) return;
    stopping = true;
    const force = setTimeout(() => process.exit(1), STOP_AFTER_MS);
    server.closeIdleConnections();
    await new Promise((resolve) => server.close(resolve));
    await background.stop();
    await close();
    clearTimeout(force);
  };
  server.on('error', (error) => {
    process.stderr.write(`The web server cannot listen on ${env.HOST}:${env.PORT}: ${error.message}\n`);
    process.exit(1);
  });
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => void stop());
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
  process.exit(1);
});
