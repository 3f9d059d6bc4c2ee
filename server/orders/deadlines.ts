// The clocks of orders: started and stopped with the step they belong to, fired once when their time has come.
import { and, asc, eq, inArray, lte, sql } from 'drizzle-orm';
import { newId } from '../../shared/kernel/ids';
import type { ClockName, ClockStart } from '../../shared/orders/clocks';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';
import { queryIn } from '../jobs/raw-sql';
import { deadlines } from './tables';

export async function stopClocks(
  tx: Tx,
  orderId: string,
  clocks: readonly ClockName[],
  now: Date,
): Promise<void> {
  if (clocks.length === 0) return;
  await tx
    .update(deadlines)
    .set({ state: 'stopped', endedAt: now })
    .where(
      and(eq(deadlines.orderId, orderId), eq(deadlines.state, 'open'), inArray(deadlines.clock, [...clocks])),
    );
}

/** How far the product's clock is ahead of the queue's, which runs on real time. */
const aheadMs = (deps: Deps): number => deps.clock.now().getTime() - Date.now();

/** One open row and one job per clock; starting a clock that runs moves it. */
export async function startClocks(
  deps: Deps,
  tx: Tx,
  orderId: string,
  starts: readonly ClockStart[],
): Promise<void> {
  const now = deps.clock.now();
  await stopClocks(
    tx,
    orderId,
    starts.map((start) => start.clock),
    now,
  );
  for (const start of starts) {
    const id = newId('ddl');
    await tx.insert(deadlines).values({ id, orderId, clock: start.clock, dueAt: start.at, createdAt: now });
    await deps.queue.send(
      'deadline',
      { deadlineId: id },
      { startAfter: new Date(start.at.getTime() - aheadMs(deps)), query: queryIn(tx) },
    );
  }
}

export async function openClocks(tx: Tx, orderId: string): Promise<{ clock: ClockName; at: Date }[]> {
  const rows = await tx
    .select({ clock: deadlines.clock, at: deadlines.dueAt })
    .from(deadlines)
    .where(and(eq(deadlines.orderId, orderId), eq(deadlines.state, 'open')))
    .orderBy(asc(deadlines.dueAt));
  return rows;
}

export interface DueClock {
  readonly id: string;
  readonly orderId: string;
  readonly clock: ClockName;
}

/** Takes a due clock for this transaction; null where it was stopped, moved, fired, or another worker has it. */
export async function takeDue(tx: Tx, id: string, now: Date): Promise<DueClock | null> {
  const [row] = await tx
    .select({ id: deadlines.id, orderId: deadlines.orderId, clock: deadlines.clock })
    .from(deadlines)
    .where(and(eq(deadlines.id, id), eq(deadlines.state, 'open'), lte(deadlines.dueAt, now)))
    .for('update', { skipLocked: true });
  return row ?? null;
}

export async function endClock(tx: Tx, id: string, state: 'fired' | 'stopped', now: Date): Promise<void> {
  await tx.update(deadlines).set({ state, endedAt: now }).where(eq(deadlines.id, id));
}

/** Due clocks in the order they fell due; those already tried in this sweep are left out. */
export async function dueClockIds(deps: Deps, now: Date, except: readonly string[]): Promise<string[]> {
  const rows = await deps.db
    .select({ id: deadlines.id })
    .from(deadlines)
    .where(
      and(
        eq(deadlines.state, 'open'),
        lte(deadlines.dueAt, now),
        except.length > 0 ? sql`${deadlines.id} <> all(${sql.param([...except])}::text[])` : undefined,
      ),
    )
    .orderBy(asc(deadlines.dueAt), asc(deadlines.id))
    .limit(200);
  return rows.map((row) => row.id);
}
