// Delivers events to the one endpoint: signed, at least once, in order unless a fault says otherwise, retried until a 2xx.
import { createHmac } from 'node:crypto';
import type { Faults } from '../faults';
import { faultMs } from '../http';
import type { Delivery, ProviderEvent } from './model/delivery';
import type { State } from './state';
import { newId } from './world';

const LATE_MS = 2_000;
const ATTEMPT_MS = 10_000;
const RETRY_CAP_MS = 60_000;
/** The provider gives up after three days. */
const GIVE_UP_ATTEMPTS = 4_000;

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

/** `t=<seconds>,v1=<hex HMAC-SHA256 of "t.body">`, as the provider documents it. */
export function sign(payload: string, secret: string, atSeconds: number): string {
  const signature = createHmac('sha256', secret).update(`${atSeconds}.${payload}`).digest('hex');
  return `t=${atSeconds},v1=${signature}`;
}

const newDelivery = (eventId: string, dueAtMs: number, held = false): Delivery => ({
  id: newId('dlv', 16),
  eventId,
  attempts: 0,
  dueAtMs,
  held,
  deliveredAtMs: null,
  givenUp: false,
  lastAnswer: null,
});

export const renderEvent = (event: ProviderEvent, open: boolean): object => ({
  ...event,
  pending_webhooks: open ? 1 : 0,
});

export function createWebhooks(settings: {
  state: State;
  faults: Faults;
  secret: string;
  retryBaseMs: number;
  url: string | undefined;
}): Webhooks {
  const { state, faults } = settings;
  const open = new Map<string, Delivery>();
  for (const delivery of state.deliveries.all()) {
    if (delivery.deliveredAtMs === null && !delivery.givenUp) open.set(delivery.id, delivery);
  }
  const stopping = new AbortController();
  let url = settings.url;
  let timer: NodeJS.Timeout | undefined;
  let pumping: Promise<void> | null = null;

  const save = (delivery: Delivery): void => {
    state.deliveries.put(delivery.id, delivery);
    if (delivery.deliveredAtMs === null && !delivery.givenUp) open.set(delivery.id, delivery);
    else open.delete(delivery.id);
  };

  const enqueue = (event: ProviderEvent, subject: string): void => {
    const subjects = [event.type, subject, `webhook ${event.type}`];
    const now = Date.now();
    const late = faults.take(subjects, ['late_webhook']);
    const reorder = faults.take(subjects, ['reorder_webhooks']);
    const twice = faults.take(subjects, ['duplicate_webhook']);
    const wait = late ? faultMs(late, LATE_MS) : reorder ? faultMs(reorder, LATE_MS) : 0;
    save(newDelivery(event.id, now + wait, reorder !== null));
    if (twice) save(newDelivery(event.id, now + wait + faultMs(twice, 0)));
  };

  /** One attempt; `null` when it was taken, otherwise what was answered. */
  const attempt = async (event: ProviderEvent, target: string): Promise<string | null> => {
    const payload = JSON.stringify(renderEvent(event, true), null, 2);
    try {
      const answer = await fetch(target, {
        method: 'POST',
        headers: {
          'content-type': 'application/json; charset=utf-8',
          'stripe-signature': sign(payload, settings.secret, Math.floor(Date.now() / 1000)),
        },
        body: payload,
        redirect: 'manual',
        signal: AbortSignal.any([stopping.signal, AbortSignal.timeout(ATTEMPT_MS)]),
      });
      await answer.arrayBuffer();
      return answer.ok ? null : `HTTP ${answer.status}`;
    } catch (error) {
      return error instanceof Error ? error.message : 'no answer';
    }
  };

  /** Held events go out in reverse order as soon as a later one has been taken. */
  const releaseHeld = (): void => {
    const held = Array.from(open.values()).filter((delivery) => delivery.held);
    for (const [index, delivery] of held.reverse().entries())
      save({ ...delivery, held: false, dueAtMs: Date.now() - held.length + index });
  };

  const nextDue = (): Delivery | undefined => {
    let first: Delivery | undefined;
    for (const delivery of open.values()) {
      if (delivery.dueAtMs <= Date.now() && (first === undefined || delivery.dueAtMs < first.dueAtMs))
        first = delivery;
    }
    return first;
  };

  const deliver = async (delivery: Delivery, target: string): Promise<void> => {
    const event = state.events.get(delivery.eventId);
    if (event === undefined) return save({ ...delivery, givenUp: true });
    const failure = await attempt(event, target);
    if (stopping.signal.aborted) return;
    const attempts = delivery.attempts + 1;
    if (failure === null) {
      save({ ...delivery, attempts, held: false, deliveredAtMs: Date.now(), lastAnswer: 'taken' });
      if (!delivery.held) releaseHeld();
    } else {
      const wait = Math.min(settings.retryBaseMs * 2 ** Math.min(attempts - 1, 20), RETRY_CAP_MS);
      const givenUp = attempts >= GIVE_UP_ATTEMPTS;
      save({ ...delivery, attempts, dueAtMs: Date.now() + wait, givenUp, lastAnswer: failure });
    }
    state.flush();
  };

  const schedule = (): void => {
    clearTimeout(timer);
    if (open.size === 0 || url === undefined || stopping.signal.aborted) return;
    const soonest = Math.min(...Array.from(open.values(), (delivery) => delivery.dueAtMs));
    timer = setTimeout(kick, Math.max(5, soonest - Date.now()));
    timer.unref();
  };

  const pump = async (): Promise<void> => {
    for (let due = nextDue(); due !== undefined && !stopping.signal.aborted; due = nextDue()) {
      if (url === undefined) break;
      await deliver(due, url);
    }
  };

  const kick = (): void => {
    if (pumping !== null || url === undefined || stopping.signal.aborted) return;
    pumping = pump().finally(() => {
      pumping = null;
      schedule();
    });
  };

  return {
    enqueue,
    kick,
    settled: async (ms) => {
      const until = Date.now() + ms;
      let waiting: NodeJS.Timeout | undefined;
      const enough = new Promise<void>((resolve) => {
        waiting = setTimeout(resolve, ms);
      });
      while (url !== undefined && nextDue() !== undefined && Date.now() < until) {
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
