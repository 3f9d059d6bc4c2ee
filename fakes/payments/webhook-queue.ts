// The deliveries that are still to be made, and which of them is next.
import type { Delivery } from './model/delivery';
import type { State } from './state';
import { newId } from './world';

export interface WebhookQueue {
  add(eventId: string, dueAtMs: number, held: boolean): void;
  /** Keeps what became of a delivery; a finished one leaves the queue. */
  save(delivery: Delivery): void;
  /** The delivery that has been due longest. */
  nextDue(): Delivery | undefined;
  /** When the next delivery is due; null when there is none. */
  soonestMs(): number | null;
  /** Held deliveries become due, in reverse order. */
  releaseHeld(): void;
}

const isOpen = (delivery: Delivery): boolean => delivery.deliveredAtMs === null && !delivery.givenUp;

export function openQueue(state: State): WebhookQueue {
  const open = new Map<string, Delivery>();
  for (const delivery of state.deliveries.all()) if (isOpen(delivery)) open.set(delivery.id, delivery);

  const save = (delivery: Delivery): void => {
    state.deliveries.put(delivery.id, delivery);
    if (isOpen(delivery)) open.set(delivery.id, delivery);
    else open.delete(delivery.id);
  };

  return {
    save,
    add: (eventId, dueAtMs, held) =>
      save({
        id: newId('dlv', 16),
        eventId,
        attempts: 0,
        dueAtMs,
        held,
        deliveredAtMs: null,
        givenUp: false,
        lastAnswer: null,
      }),
    nextDue: () => {
      let first: Delivery | undefined;
      for (const delivery of open.values()) {
        if (delivery.dueAtMs <= Date.now() && (first === undefined || delivery.dueAtMs < first.dueAtMs))
          first = delivery;
      }
      return first;
    },
    soonestMs: () => {
      let soonest: number | null = null;
      for (const { dueAtMs } of open.values())
        soonest = soonest === null ? dueAtMs : Math.min(soonest, dueAtMs);
      return soonest;
    },
    releaseHeld: () => {
      const held = Array.from(open.values()).filter((delivery) => delivery.held);
      for (const [index, delivery] of held.reverse().entries())
        save({ ...delivery, held: false, dueAtMs: Date.now() - held.length + index });
    },
  };
}
