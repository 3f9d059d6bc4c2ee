// Health for whoever watches the process, and the demo clock (mounted only where DEMO=1).
import { sql } from 'drizzle-orm';
import { advanceClock, durationMs, live, readClock, ready } from '../../shared/system/contract';
import type { Deps } from '../deps';
import { refuse } from '../http/refusal';
import { publicRoute, type Route } from '../http/route';
import { runBackgroundOnce } from '../background-work';

async function checkServices(deps: Deps): Promise<string[]> {
  const checks: [string, () => Promise<unknown>][] = [
    ['database', () => deps.db.execute(sql`select 1`)],
    ['storage', () => deps.storage.ready()],
    ['mail', () => deps.mail.ready()],
    ['payments', () => deps.payments.ready()],
  ];
  const down = await Promise.all(
    checks.map(async ([name, check]) => {
      try {
        await check();
        return [];
      } catch (error) {
        deps.log.warn({ err: error }, `${name} does not answer`);
        return [name];
      }
    }),
  );
  return down.flat();
}

export const systemRoutes: readonly Route[] = [
  publicRoute(live, () => Promise.resolve({ status: 'ok' as const })),
  publicRoute(ready, async (_call, deps) => {
    const down = await checkServices(deps);
    return down.length === 0
      ? { status: 'ok' as const }
      : refuse('unavailable', `Not answering: ${down.join(', ')}.`);
  }),
];

/** Kept apart so that the clock's routes do not exist at all outside the demo. */
export const demoRoutes: readonly Route[] = [
  publicRoute(readClock, async (_call, deps) => {
    await deps.demoClock?.refresh();
    return { now: deps.clock.now().toISOString() };
  }),
  publicRoute(advanceClock, async (call, deps) => {
    if (!deps.demoClock) return refuse('not_found', 'There is no demo clock here.');
    await deps.demoClock.advance(durationMs(call.body.advance) ?? 0);
    await runBackgroundOnce(deps);
    return { now: deps.clock.now().toISOString() };
  }),
];
