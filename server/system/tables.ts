// The demo clock's offset: one row, shared by all processes.
import { sql } from 'drizzle-orm';
import { bigint, check, integer, pgTable } from 'drizzle-orm/pg-core';

export const demoClock = pgTable(
  'demo_clock',
  {
    id: integer('id').primaryKey(),
    offsetMs: bigint('offset_ms', { mode: 'number' }).notNull().default(0),
  },
  (t) => [
    check('demo_clock_one_row', sql`${t.id} = 1`),
    check('demo_clock_forward', sql`${t.offsetMs} >= 0`),
  ],
);
