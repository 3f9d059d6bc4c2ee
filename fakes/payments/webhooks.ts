// Delivers events to the one endpoint: at least once, in order unless a fault says otherwise, retried until a 2xx.
import type { Faults } from '../faults';
import { faultMs } from '../http';
import type { Delivery, ProviderEvent } from './model/delivery';
import type { State } from './state';
import { attempt } from './webhook-attempt';
import { openQueue, type WebhookQueue } from './webhook-queue';

const LATE_MS = 2_000;
const RETRY_CAP_MS = 60_000;
/** With the waits growing to a minute this is close to the provider's three days. */
const GIVE_UP_ATTEMPTS = 4_000;

interface Settings {
  readonly state: State;
  readonly faults: Faults;
  readonly secret: string;
  readonly retryBaseMs: number;
  readonly url: string | undefined;
}

export interface Webhooks {
  /** Queues an event; the faults decide whether it goes once, twice, late or after the next one. */
  enqueue(event: ProviderEvent, subject: string): void;
  /** Starts sending what is due. */
  kick(): void;
  /** Resolves when everything that is due now has been tried once, or after `ms`. */
  settled(ms: number): Promise<void>;
  setUrl(url: string): void;
  close(): Promise<void>;
}

function enqueue(queue: WebhookQueue, faults: Faults, event: ProviderEvent, subject: string): void {
  const subjects = [event.type, subject, `webhook ${event.type}`];
  const late = faults.take(subjects, ['late_webhook']);
  const reorder = faults.take(subjects, ['reorder_webhooks']);
  const twice = faults.take(subjects, ['duplicate_webhook']);
  const wait = late ? faultMs(late, LATE_MS) : reorder ? faultMs(reorder, LATE_MS) : 0;
  const dueAtMs = Date.now() + wait;
  queue.add(event.id, dueAtMs, reorder !== null);
  if (twice) queue.add(event.id, dueAtMs + faultMs(twice, 0), false);
}

async function deliver(
  { state, secret, retryBaseMs }: Settings,
  queue: WebhookQueue,
  delivery: Delivery,
  target: { url: string; stop: AbortSignal },
): Promise<void> {
  const event = state.events.get(delivery.eventId);
  if (event === undefined) return queue.save({ ...delivery, givenUp: true });
  const failure = await attempt(event, { ...target, secret });
  if (target.stop.aborted) return;
  const attempts = delivery.attempts + 1;
  if (failure === null) {
    queue.save({ ...delivery, attempts, held: false, deliveredAtMs: Date.now(), lastAnswer: 'taken' });
    if (!delivery.held) queue.releaseHeld();
  } else {
    const wait = Math.min(retryBaseMs * 2 ** Math.min(attempts - 1, 20), RETRY_CAP_MS);
    const givenUp = attempts >= GIVE_UP_ATTEMPTS;
    queue.save({ ...delivery, attempts, dueAtMs: Date.now() + wait, givenUp, lastAnswer: failure });
  }
  state.journal.flush();
}

export function createWebhooks(settings: Settings): Webhooks {
  const queue = openQueue(settings.state);
  const stopping = new AbortController();
  const stop = stopping.signal;
  let url = settings.url;
  let timer: NodeJS.Timeout | undefined;
  let pumping: Promise<void> | null = null;

  const pump = async (): Promise<void> => {
    for (let due = queue.nextDue(); due !== undefined && !stop.aborted; due = queue.nextDue()) {
      if (url === undefined) return;
      await deliver(settings, queue, due, { url, stop });
    }
  };

  const kick = (): void => {
    if (pumping !== null || url === undefined || stop.aborted) return;
    pumping = pump().finally(() => {
      pumping = null;
      const soonest = queue.soonestMs();
      clearTimeout(timer);
      if (soonest === null || stop.aborted) return;
      timer = setTimeout(kick, Math.max(5, soonest - Date.now()));
      timer.unref();
    });
  };

  return {
    enqueue: (event, subject) => enqueue(queue, settings.faults, event, subject),
    kick,
    settled: async (ms) => {
      const until = Date.now() + ms;
      let waiting: NodeJS.Timeout | undefined;
      const enough = new Promise<void>((resolve) => {
        waiting = setTimeout(resolve, ms);
      });
      while (url !== undefined && queue.nextDue() !== undefined && Date.now() < until && !stop.aborted) {
        kick();
        await Promise.race([pumping, enough]);
      }
      clearTimeout(waiting);
    },
    setUrl: (next) => {
      url = next;
      kick();
    },
    close: async () => {
      stopping.abort();
      clearTimeout(timer);
      await pumping;
    },
  };
}
