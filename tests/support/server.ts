// A whole Spragyard for one test file: its own database, the three stand-ins, the real app and its background work.
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createMailFake } from './fakes';
import { createApp } from '../../server/app';
import { startBackground } from '../../server/background';
import { runBackgroundOnce } from '../../server/background-work';
import type { Deps } from '../../server/deps';
import { parseEnv } from '../../server/env';
import { makeDeps } from '../../server/make-deps';
import { startPaymentsFake, type PaymentsFake } from '../../fakes/payments/start';
import { startStorageFake } from '../../fakes/storage/start';
import type { MailFake } from '../../fakes/mail/start';
import { createClient, type Client } from './client';
import { testClock, type TestClock } from './clock';
import { openDatabase, type TestDatabase } from './database';

export interface TestServer {
  readonly baseUrl: string;
  readonly deps: Deps;
  readonly database: TestDatabase;
  readonly clock: TestClock;
  readonly payments: PaymentsFake;
  readonly mail: MailFake;
  client(): Client;
  /** Lets everything that is due happen: events, effects, clocks, until nothing waits. */
  settle(): Promise<void>;
  close(): Promise<void>;
}

export interface TestServerOptions {
  readonly start?: string;
  readonly background?: boolean;
  readonly clientFolder?: string;
}

const KEYS = { accessKeyId: 'TESTKEY', secretAccessKey: 'test/secret+key' };
const BUCKET = 'spragyard-tests';

/** Wednesday 4 March 2026, 09:00 in Chicago. */
export const START = '2026-03-04T15:00:00Z';

async function settle(deps: Deps, payments: PaymentsFake): Promise<void> {
  for (let round = 0; round < 20; round += 1) {
    await payments.webhooksSettled();
    await runBackgroundOnce(deps);
    const { rows } = await deps.pool.query<{ waiting: number }>(
      `select (select count(*) from outbox where state = 'waiting')
            + (select count(*) from provider_events where applied_at is null) as waiting`,
    );
    if (Number(rows[0]?.waiting ?? 0) === 0) return;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

export async function startTestServer(options: TestServerOptions = {}): Promise<TestServer> {
  const database = await openDatabase();
  const payments = await startPaymentsFake({ port: 0, retryBaseMs: 100 });
  const storage = await startStorageFake({ port: 0, ...KEYS, bucket: BUCKET });
  const mail = await createMailFake();
  const clock = testClock(options.start ?? START);
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  const baseUrl = `http://127.0.0.1:${port}`;
  const env = parseEnv({
    NODE_ENV: 'test',
    PORT: String(port),
    DATABASE_URL: database.url,
    DATABASE_POOL: '12',
    DEMO: '0',
    SESSION_SECRET: 'a secret that only this test run knows 0123456789',
    STRIPE_SECRET_KEY: 'sk_test_stand_in',
    STRIPE_WEBHOOK_SECRET: 'whsec_stand_in',
    STRIPE_HOST: payments.url,
    S3_ENDPOINT: storage.url,
    S3_BUCKET: BUCKET,
    S3_ACCESS_KEY_ID: KEYS.accessKeyId,
    S3_SECRET_ACCESS_KEY: KEYS.secretAccessKey,
    SMTP_URL: mail.smtpUrl,
    PUBLIC_URL: baseUrl,
    RATE_LIMIT_FACTOR: '100',
    LOG_LEVEL: process.env['TEST_LOG'] ?? 'fatal',
  });
  const { deps, close } = await makeDeps(env, { clock });
  await deps.storage.prepare();
  const background = options.background === false ? null : await startBackground(deps);
  if (!background) await deps.queue.start();
  server.on('request', createApp(deps, options.clientFolder ? { clientFolder: options.clientFolder } : {}));
  payments.setWebhookUrl(`${baseUrl}/api/payments/webhook`);
  return {
    baseUrl,
    deps,
    database,
    clock,
    payments,
    mail,
    client: () => createClient(baseUrl),
    settle: () => settle(deps, payments),
    close: async () => {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      await (background ? background.stop() : deps.queue.stop());
      await close();
      await Promise.all([payments.close(), storage.close(), mail.close()]);
      await database.close();
    },
  };
}
