// The product's clock. All rules ask it for the time; the demo may push it forward, tests set it.
import type { Pool } from 'pg';

export interface Clock {
  now(): Date;
}

export interface DemoClock extends Clock {
  /** Moves time forward for every process on this database. */
  advance(ms: number): Promise<Date>;
  /** Picks up a move made by another process. */
  refresh(): Promise<void>;
}

export const systemClock: Clock = { now: () => new Date() };

/** Real time plus an offset kept in the database, so that it survives a restart and all processes agree. */
export async function createDemoClock(pool: Pool): Promise<DemoClock> {
  let offsetMs = 0;
  const refresh = async (): Promise<void> => {
    const { rows } = await pool.query<{ offset_ms: number }>('select offset_ms from demo_clock where id = 1');
    offsetMs = rows[0]?.offset_ms ?? 0;
  };
  await refresh();
  const now = (): Date => new Date(Date.now() + offsetMs);
  return {
    now,
    refresh,
    advance: async (ms) => {
      await pool.query(
        `insert into demo_clock (id, offset_ms) values (1, $1)
         on conflict (id) do update set offset_ms = demo_clock.offset_ms + excluded.offset_ms`,
        [ms],
      );
      await refresh();
      return now();
    },
  };
}
