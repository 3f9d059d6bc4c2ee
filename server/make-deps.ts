// Builds the real seams from the settings; main and the seed share it, tests pass their own clock.
import pino from 'pino';
import { createDemoClock, systemClock, type Clock } from './clock';
import { connect } from './db/client';
import type { Deps } from './deps';
import type { Env } from './env';
import { createMailGateway } from './gateways/mail';
import { createPaymentsGateway } from './gateways/payments';
import { createStorageGateway } from './gateways/storage';
import { createQueue } from './jobs/queue';

export interface OwnedDeps {
  readonly deps: Deps;
  close(): Promise<void>;
}

export async function makeDeps(env: Env, options: { clock?: Clock } = {}): Promise<OwnedDeps> {
  const log = pino({ level: env.LOG_LEVEL, base: { name: 'spragyard' } });
  const database = connect(env.DATABASE_URL, env.DATABASE_POOL, (error) =>
    log.error({ err: error }, 'database'),
  );
  const storage = createStorageGateway({
    endpoint: env.S3_ENDPOINT,
    region: env.S3_REGION,
    bucket: env.S3_BUCKET,
    accessKeyId: env.S3_ACCESS_KEY_ID,
    secretAccessKey: env.S3_SECRET_ACCESS_KEY,
  });
  const mail = createMailGateway({ url: env.SMTP_URL, from: env.MAIL_FROM, publicUrl: env.PUBLIC_URL });
  const demoClock = env.DEMO && !options.clock ? await createDemoClock(database.pool) : null;
  const deps: Deps = {
    env,
    log,
    pool: database.pool,
    db: database.db,
    clock: options.clock ?? demoClock ?? systemClock,
    demoClock,
    payments: createPaymentsGateway({
      secretKey: env.STRIPE_SECRET_KEY,
      webhookSecret: env.STRIPE_WEBHOOK_SECRET,
      host: env.STRIPE_HOST,
    }),
    storage,
    mail,
    queue: createQueue({ databaseUrl: env.DATABASE_URL, log }),
  };
  return {
    deps,
    close: async () => {
      mail.close();
      storage.close();
      await database.close();
    },
  };
}
