// Fills an empty database with the demo: catalogue, people, units, orders in every state, a case waiting.
import type { Deps } from '../deps';
import { drainOnce } from '../background-work';
import { importCatalogue } from '../catalogue/import';
import { readDemoCatalogue } from './catalogue';
import { hasPeople, seedPeople } from './people';
import { playScenes } from './scenes';
import { seedUnits } from './units';

const LOCK = 7_731_027;
const FOUNDED_DAYS_AGO = 120;

/** @returns one line that says what was done */
export async function seedDemo(deps: Deps): Promise<string> {
  const client = await deps.pool.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [LOCK]);
    const data = readDemoCatalogue();
    await deps.db.transaction((tx) => importCatalogue(tx, data));
    if (await hasPeople(deps)) return 'the demo is there already';
    await deps.storage.prepare();
    await deps.queue.start();
    const started = deps.clock.now();
    let now = started;
    const clock = { now: () => new Date(now), set: (at: Date) => void (now = at) };
    const past: Deps = { ...deps, clock };
    clock.set(new Date(started.getTime() - FOUNDED_DAYS_AGO * 86_400_000));
    const cast = await seedPeople(past, clock.now());
    const units = await seedUnits(past, cast, data, clock, started);
    const played = await playScenes({ deps: past, cast, clock, now: started }, units, data);
    clock.set(started);
    await drainOnce(past);
    await deps.queue.stop();
    return `${cast.sellers.length} sellers, ${units.length} units, ${played} orders`;
  } finally {
    client.release(true);
  }
}
