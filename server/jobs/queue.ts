// The job queue in PostgreSQL (pg-boss): timed work that survives restarts and is shared by all processes.
import PgBoss from 'pg-boss';
import type { Logger } from 'pino';

export interface Queue {
  /** Sends a job; `tx` joins it to the caller's transaction. */
  send(name: QueueName, data: Readonly<Record<string, string>>, options?: SendOptions): Promise<void>;
  work(name: QueueName, handler: (data: Readonly<Record<string, string>>) => Promise<void>): Promise<void>;
  /** Cron in UTC. */
  every(name: QueueName, cron: string, handler: () => Promise<void>): Promise<void>;
  start(): Promise<void>;
  stop(): Promise<void>;
}

export interface SendOptions {
  readonly startAfter?: Date;
  readonly query?: (text: string, values: unknown[]) => Promise<{ rows: unknown[] }>;
}

export const QUEUES = ['deadline', 'sweep', 'reconcile', 'tidy'] as const;
export type QueueName = (typeof QUEUES)[number];

export function createQueue(settings: { databaseUrl: string; log: Logger }): Queue {
  const boss = new PgBoss({
    connectionString: settings.databaseUrl,
    max: 4,
    application_name: 'spragyard-jobs',
  });
  boss.on('error', (error) => settings.log.error({ err: error }, 'job queue'));
  return {
    start: async () => {
      await boss.start();
      for (const name of QUEUES) await boss.createQueue(name);
    },
    stop: () => boss.stop({ graceful: true, wait: true, timeout: 10_000 }),
    send: async (name, data, options = {}) => {
      const query = options.query;
      await boss.send(name, data, {
        retryLimit: 20,
        retryBackoff: true,
        retryDelay: 2,
        ...(options.startAfter ? { startAfter: options.startAfter } : {}),
        ...(query ? { db: { executeSql: (sql: string, values: unknown[]) => query(sql, values) } } : {}),
      });
    },
    work: async (name, handler) => {
      await boss.work<Record<string, string>>(
        name,
        { pollingIntervalSeconds: 1, batchSize: 10 },
        async (jobs) => {
          for (const job of jobs) await handler(job.data);
        },
      );
    },
    every: async (name, cron, handler) => {
      await boss.schedule(name, cron);
      await boss.work(name, { pollingIntervalSeconds: 5 }, async () => {
        await handler();
      });
    },
  };
}
