// Puts the payments stand-in together and starts it: in its own process, or inside a test.
import { join } from 'node:path';
import { createFaults, type Faults } from '../faults';
import { answerFaults, listen, sendHtml, sendJson, type Listening } from '../http';
import { createApi } from './api';
import { answerControl } from './control';
import { answerPage } from './hosted';
import type { ProviderEvent } from './model/delivery';
import { unknownPage } from './pages/checkout-page';
import { currentSession } from './resources/checkout-sessions';
import { failRefund } from './resources/refunds';
import { openState, type State } from './state';
import { createWebhooks, type Webhooks } from './webhooks';
import { newId, pageCause, type Settings, type World } from './world';

const TICK_MS = 250;
const MAX_BODY_BYTES = 1_000_000;

export interface PaymentsFakeOptions extends Partial<Settings> {
  readonly host?: string;
  /** 0 takes a free port. */
  readonly port?: number;
  /** The base folder; the stand-in keeps its state in `payments` below it, or in memory without one. */
  readonly dataDir?: string | undefined;
  readonly webhookUrl?: string | undefined;
}

export interface PaymentsFake {
  readonly url: string;
  readonly port: number;
  readonly faults: Faults;
  /** Events wait until there is an address to send them to. */
  setWebhookUrl(url: string): void;
  /** Resolves when every event that is due has been tried once. */
  webhooksSettled(): Promise<void>;
  close(): Promise<void>;
}

const DEFAULTS: Settings = {
  secretKey: 'sk_test_stand_in',
  webhookSecret: 'whsec_stand_in',
  feeBps: 0,
  availableDelayMs: 0,
  strictExpiry: false,
  retryBaseMs: 500,
  now: () => Date.now(),
};

/** What happens by itself: sessions run out, refunds fail. */
function tick(world: World): void {
  for (const session of world.state.sessions.all()) {
    if (session.status === 'open') currentSession(world, session.id, pageCause('clock'));
  }
  for (const planned of world.state.scheduled.all()) {
    if (planned.dueAtMs <= Date.now()) failRefund(world, planned.refund, pageCause('clock'));
  }
}

function createWorld(
  settings: Settings,
  parts: { state: State; faults: Faults; webhooks: Webhooks; baseUrl: () => string },
): World {
  const { state, faults, webhooks, baseUrl } = parts;
  const seconds = (): number => Math.floor(settings.now() / 1000);
  return {
    state,
    settings,
    faults,
    baseUrl,
    seconds,
    emit: (type, object, cause, account) => {
      const event: ProviderEvent = {
        id: newId('evt'),
        object: 'event',
        ...(account === undefined ? {} : { account }),
        api_version: cause.apiVersion,
        created: seconds(),
        data: { object },
        livemode: false,
        request: { id: cause.requestId, idempotency_key: cause.idempotencyKey },
        type,
      };
      state.events.put(event.id, event);
      webhooks.enqueue(event, cause.subject);
      return event;
    },
  };
}

function serve(options: PaymentsFakeOptions, world: World, webhooks: Webhooks): Promise<Listening> {
  const api = createApi(world, webhooks);
  return listen({
    host: options.host ?? '127.0.0.1',
    port: options.port ?? 0,
    maxBodyBytes: MAX_BODY_BYTES,
    handle: async (asked) => {
      if (asked.url.pathname.startsWith('/v1/')) return api(asked);
      if (answerFaults(asked, world.faults)) return;
      if (await answerControl(world, webhooks, asked)) return;
      if (!(await answerPage({ world, webhooks }, asked))) sendHtml(asked.response, 404, unknownPage());
    },
    failed: (error, request, response) => {
      process.stderr.write(`payments stand-in: ${request.method} ${request.url}: ${String(error)}\n`);
      if (response.headersSent) response.destroy();
      else sendJson(response, 500, { error: { type: 'api_error', message: 'The stand-in failed.' } });
    },
  });
}

export async function startPaymentsFake(options: PaymentsFakeOptions = {}): Promise<PaymentsFake> {
  const settings: Settings = { ...DEFAULTS, ...options };
  const state = openState(options.dataDir === undefined ? undefined : join(options.dataDir, 'payments'));
  const faults = createFaults();
  const { webhookSecret: secret, retryBaseMs } = settings;
  const webhooks = createWebhooks({ state, faults, secret, retryBaseMs, url: options.webhookUrl });
  const address = { url: '' };
  const world = createWorld(settings, { state, faults, webhooks, baseUrl: () => address.url });
  const server = await serve(options, world, webhooks);
  address.url = server.url;
  const timer = setInterval(() => {
    tick(world);
    state.journal.flush();
    webhooks.kick();
  }, TICK_MS);
  timer.unref();
  webhooks.kick();
  return {
    url: server.url,
    port: server.port,
    faults,
    setWebhookUrl: (url) => webhooks.setUrl(url),
    webhooksSettled: () => webhooks.settled(10_000),
    close: async () => {
      clearInterval(timer);
      await server.close();
      await webhooks.close();
      state.journal.close();
    },
  };
}
