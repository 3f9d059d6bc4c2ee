// The outbox: effects are written with the state they follow from, and happen after the commit, once per key.
import { sql } from 'drizzle-orm';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';
import { outbox } from './tables';

export type OutboxRow = typeof outbox.$inferSelect;
export type OutboxKind = OutboxRow['kind'];

/** `blocked`: it can't happen until something else does (a seller signs up for payouts). */
export type EffectOutcome =
  | { readonly outcome: 'done' }
  | { readonly outcome: 'blocked'; readonly why: string }
  /** It will never go through as it is; somebody must look. */
  | { readonly outcome: 'dead'; readonly why: string };

export type EffectHandler = (deps: Deps, row: OutboxRow) => Promise<EffectOutcome>;
export type EffectHandlers = Readonly<Record<OutboxKind, EffectHandler>>;

export interface OutboxInput {
  readonly key: string;
  readonly kind: OutboxKind;
  readonly orderId: string | null;
  readonly payload: Record<string, unknown>;
  readonly now: Date;
}

const CHANNEL = 'spragyard_outbox';
const CLAIM_SECONDS = 60;
const ATTEMPTS_MAX = 14;

/** Writes an effect in the caller's transaction; the same key twice is one effect. */
export async function queueEffect(tx: Tx, input: OutboxInput): Promise<void> {
  await tx
    .insert(outbox)
    .values({
      key: input.key,
      kind: input.kind,
      orderId: input.orderId,
      payload: input.payload,
      // Real time, not the product's clock: the worker's own waiting has nothing to do with the demo's date.
      notBefore: new Date(),
      createdAt: input.now,
    })
    .onConflictDoNothing({ target: outbox.key });
  await tx.execute(sql`select pg_notify(${CHANNEL}, '')`);
}

async function claim(deps: Deps, limit: number): Promise<OutboxRow[]> {
  const due = sql`(select seq from outbox where state = 'waiting' and not_before <= now()
    and (claimed_until is null or claimed_until < now()) order by seq limit ${limit} for update skip locked)`;
  return deps.db
    .update(outbox)
    .set({
      claimedUntil: sql`now() + make_interval(secs => ${CLAIM_SECONDS})`,
      attempts: sql`${outbox.attempts} + 1`,
    })
    .where(sql`${outbox.seq} in ${due}`)
    .returning();
}

/** 1 s, 2 s, 4 s ... at most 10 minutes, each with up to a quarter of jitter. */
const waitMs = (attempts: number): number =>
  Math.min(2 ** (attempts - 1) * 1000, 600_000) * (1 + Math.random() / 4);

async function settle(deps: Deps, row: OutboxRow, outcome: EffectOutcome): Promise<void> {
  const state = outcome.outcome;
  await deps.db
    .update(outbox)
    .set({
      state,
      claimedUntil: null,
      lastError: outcome.outcome === 'done' ? null : outcome.why,
      ...(state === 'done' ? { doneAt: deps.clock.now() } : {}),
    })
    // A handler may have recorded more within its own transaction; never turn done back.
    .where(sql`${outbox.seq} = ${row.seq} and ${outbox.state} <> 'done'`);
}

async function postpone(deps: Deps, row: OutboxRow, error: unknown): Promise<void> {
  const message = error instanceof Error ? error.message : String(error);
  if (row.attempts >= ATTEMPTS_MAX) {
    deps.log.error({ err: error, key: row.key }, 'effect given up; an admin must look');
    await settle(deps, row, { outcome: 'dead', why: message });
    return;
  }
  deps.log.warn({ err: message, key: row.key, attempts: row.attempts }, 'effect will be tried again');
  await deps.db
    .update(outbox)
    .set({ claimedUntil: null, lastError: message, notBefore: new Date(Date.now() + waitMs(row.attempts)) })
    .where(sql`${outbox.seq} = ${row.seq} and ${outbox.state} = 'waiting'`);
}

async function perform(deps: Deps, handlers: EffectHandlers, row: OutboxRow): Promise<void> {
  try {
    await settle(deps, row, await handlers[row.kind](deps, row));
  } catch (error) {
    await postpone(deps, row, error);
  }
}

/** Performs what waits. @returns how many effects were tried */
export async function drainOutbox(deps: Deps, handlers: EffectHandlers, limit = 10): Promise<number> {
  let tried = 0;
  for (;;) {
    const rows = await claim(deps, limit);
    if (rows.length === 0) return tried;
    await Promise.all(rows.map((row) => perform(deps, handlers, row)));
    tried += rows.length;
  }
}

/** Wakes on the commit of a new effect in any process, and looks every second in case the word was lost. */
export async function startOutbox(
  deps: Deps,
  drain: () => Promise<unknown>,
): Promise<{ stop(): Promise<void> }> {
  let stopping = false;
  let again = false;
  let running: Promise<void> | null = null;
  const loop = async (): Promise<void> => {
    do {
      again = false;
      await drain().catch((error: unknown) => deps.log.error({ err: error }, 'outbox'));
    } while (again && !stopping);
  };
  const kick = (): void => {
    if (stopping) return;
    again = true;
    running ??= loop().finally(() => {
      running = null;
    });
  };
  const timer = setInterval(kick, 1000);
  const listener = await deps.pool.connect();
  listener.on('notification', kick);
  // A lost connection costs only speed: the timer still looks.
  listener.on('error', (error) => deps.log.warn({ err: error.message }, 'outbox listener'));
  await listener.query(`listen ${CHANNEL}`);
  kick();
  return {
    stop: async () => {
      stopping = true;
      clearInterval(timer);
      await running;
      listener.release(true);
    },
  };
}
