// The seams of the server, made once at start and handed to every function that needs them.
import type { Pool } from 'pg';
import type { Logger } from 'pino';
import type { Clock, DemoClock } from './clock';
import type { Db } from './db/client';
import type { Env } from './env';
import type { MailGateway } from './gateways/mail';
import type { PaymentsGateway } from './gateways/payments';
import type { StorageGateway } from './gateways/storage';
import type { Queue } from './jobs/queue';

export interface Deps {
  readonly env: Env;
  readonly log: Logger;
  readonly pool: Pool;
  readonly db: Db;
  readonly clock: Clock;
  /** Only where DEMO=1. */
  readonly demoClock: DemoClock | null;
  readonly payments: PaymentsGateway;
  readonly storage: StorageGateway;
  readonly mail: MailGateway;
  readonly queue: Queue;
}
