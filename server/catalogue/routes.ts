// The routes of the catalogue: a table of endpoint and function.
import { z } from 'zod';
import {
  catalogueCounts,
  listAdapters,
  listFamilies,
  listVehicles,
  readFamily,
  readVariant,
} from '../../shared/catalogue/contract';
import { interfaceKey } from '../../shared/catalogue/joints';
import type { Adapter } from '../../shared/catalogue/adapter';
import type { InterfaceName, Interfaces } from '../../shared/catalogue/interfaces';
import { packCursor, unpackCursor } from '../../shared/kernel/cursor';
import type { Tx } from '../db/client';
import { invalid, notFound } from '../http/refusal';
import { publicRoute, type Route } from '../http/route';
import { presentAdapter, presentSummary, presentVehicle } from './present';
import {
  allAdapters,
  countCatalogue,
  findAdapters,
  findFamilies,
  findFamily,
  findVariant,
  findVehicles,
  variantsOf,
} from './queries';

const nameCursor = z.tuple([z.string(), z.string(), z.string()]);
const idCursor = z.tuple([z.string()]);

const badCursor = () => invalid('cursor', 'Start from the first page');

/** One row more than asked for tells whether there is a next page. */
function pageOf<Row, Item>(
  rows: readonly Row[],
  limit: number,
  show: (row: Row) => Item,
  mark: (item: Item) => readonly string[],
): { items: Item[]; next: string | null } {
  const items = rows.slice(0, limit).map(show);
  const last = items.at(-1);
  return { items, next: rows.length > limit && last ? packCursor(mark(last)) : null };
}

function keyOf(side: Interfaces, name: InterfaceName): string | null {
  const value = side[name];
  return value === undefined ? null : interfaceKey(name, value);
}

async function adaptersFor(tx: Tx, all: Interfaces): Promise<Adapter[]> {
  const rows = await allAdapters(tx);
  return rows.map(presentAdapter).filter((one) => {
    const from = keyOf(one.from, one.interface);
    return from !== null && from === keyOf(all, one.interface);
  });
}

export const catalogueRoutes: readonly Route[] = [
  publicRoute(listFamilies, async (call, deps) => {
    const { kind, q, cursor, limit } = call.query;
    const after = cursor ? unpackCursor(cursor, nameCursor) : null;
    if (cursor && !after) return badCursor();
    const rows = await findFamilies(deps.db, { kind, q, after, limit: limit + 1 });
    return pageOf(rows, limit, presentSummary, (one) => [one.maker, one.designation, one.id]);
  }),
  publicRoute(readFamily, async (call, deps) => {
    const family = await findFamily(deps.db, call.params.id);
    if (!family) return notFound('family');
    return { ...family, variants: await variantsOf(deps.db, family.id) };
  }),
  publicRoute(readVariant, async (call, deps) => {
    const variant = await findVariant(deps.db, call.params.id);
    const family = variant ? await findFamily(deps.db, variant.familyId) : null;
    if (!variant || !family) return notFound('variant');
    return { ...variant, family, adapters: await adaptersFor(deps.db, variant.interfaces) };
  }),
  publicRoute(listAdapters, async (call, deps) => {
    const { cursor, limit } = call.query;
    const after = cursor ? unpackCursor(cursor, idCursor) : null;
    if (cursor && !after) return badCursor();
    const rows = await findAdapters(deps.db, after?.[0] ?? null, limit + 1);
    return pageOf(rows, limit, presentAdapter, (one) => [one.id]);
  }),
  publicRoute(listVehicles, async (call, deps) => {
    const { q, cursor, limit } = call.query;
    const after = cursor ? unpackCursor(cursor, idCursor) : null;
    if (cursor && !after) return badCursor();
    const rows = await findVehicles(deps.db, q, after?.[0] ?? null, limit + 1);
    return pageOf(rows, limit, presentVehicle, (one) => [one.id]);
  }),
  publicRoute(catalogueCounts, (_call, deps) => countCatalogue(deps.db)),
];
