// Applies the provider's events, each once, in any order: the object is read again rather than the event trusted.
import { and, asc, eq, isNull, lt, sql } from 'drizzle-orm';
import type { Deps } from '../deps';
import { providerEvents } from './tables';

type EventRow = typeof providerEvents.$inferSelect;
export type EventHandler = (deps: Deps, objectId: string) => Promise<void>;
/** By event type; a type that is not here is stored and needs nothing done. */
export type EventHandlers = Readonly<Record<string, EventHandler>>;

const ATTEMPTS_MAX = 20;

async function applyOne(deps: Deps, handlers: EventHandlers, row: EventRow): Promise<void> {
  try {
    await handlers[row.type]?.(deps, row.objectId);
    await deps.db
      .update(providerEvents)
      .set({ appliedAt: deps.clock.now(), lastError: null })
      .where(eq(providerEvents.id, row.id));
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    deps.log.warn({ err: error, event: row.id, type: row.type }, 'event will be applied again');
    await deps.db
      .update(providerEvents)
      .set({ attempts: sql`${providerEvents.attempts} + 1`, lastError: message })
      .where(eq(providerEvents.id, row.id));
  }
}

/** Applies what waits, oldest first. Two workers on one event are harmless: each handler is idempotent. */
export async function applyEvents(deps: Deps, handlers: EventHandlers): Promise<number> {
  const rows = await deps.db
    .select()
    .from(providerEvents)
    .where(and(isNull(providerEvents.appliedAt), lt(providerEvents.attempts, ATTEMPTS_MAX)))
    .orderBy(asc(providerEvents.receivedAt), asc(providerEvents.id))
    .limit(50);
  for (const row of rows) await applyOne(deps, handlers, row);
  return rows.length;
}
