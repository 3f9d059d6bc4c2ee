// Brings a whole catalogue into the database: what is new is added, what is there is brought up to date, nothing is lost.
import { createHash } from 'node:crypto';
import { getTableColumns, sql, type SQL } from 'drizzle-orm';
import type { PgTable } from 'drizzle-orm/pg-core';
import type { CatalogueData } from '../../shared/catalogue/contract';
import type { Tx } from '../db/client';
import { readVersion } from './queries';
import { adapters, catalogueVersion, families, variants, vehicleModels } from './tables';

/** Every column but the key takes the value that was to be inserted. */
function allExcluded(table: PgTable): Record<string, SQL> {
  const columns = Object.entries(getTableColumns(table)).filter(([, column]) => !column.primary);
  return Object.fromEntries(
    columns.map(([key, column]) => [key, sql`excluded.${sql.identifier(column.name)}`]),
  );
}

/** PostgreSQL takes at most 65,535 parameters in one statement. */
const CHUNK = 200;

const chunks = <T>(list: readonly T[]): T[][] =>
  Array.from({ length: Math.ceil(list.length / CHUNK) }, (_, index) =>
    list.slice(index * CHUNK, (index + 1) * CHUNK),
  );

async function putFamilies(tx: Tx, data: CatalogueData): Promise<void> {
  for (const part of chunks(data.families))
    await tx
      .insert(families)
      .values(part)
      .onConflictDoUpdate({ target: families.id, set: allExcluded(families) });
}

async function putVariants(tx: Tx, data: CatalogueData): Promise<void> {
  for (const part of chunks(data.variants))
    await tx
      .insert(variants)
      .values(
        part.map(({ modelYears, ...rest }) => ({
          ...rest,
          yearFrom: modelYears.from,
          yearTo: modelYears.to,
        })),
      )
      .onConflictDoUpdate({ target: variants.id, set: allExcluded(variants) });
}

async function putAdapters(tx: Tx, data: CatalogueData): Promise<void> {
  for (const part of chunks(data.adapters))
    await tx
      .insert(adapters)
      .values(part.map(({ from, to, ...rest }) => ({ ...rest, fromValue: from, toValue: to })))
      .onConflictDoUpdate({ target: adapters.id, set: allExcluded(adapters) });
}

async function putVehicles(tx: Tx, data: CatalogueData): Promise<void> {
  for (const part of chunks(data.vehicles))
    await tx
      .insert(vehicleModels)
      .values(part)
      .onConflictDoUpdate({ target: vehicleModels.id, set: allExcluded(vehicleModels) });
}

/**
 * Imports checked data; a second import of the same data changes nothing.
 * @returns whether anything was written
 */
export async function importCatalogue(tx: Tx, data: CatalogueData): Promise<boolean> {
  const version = createHash('sha256').update(JSON.stringify(data)).digest('hex');
  if ((await readVersion(tx)) === version) return false;
  await putFamilies(tx, data);
  await putVariants(tx, data);
  await putAdapters(tx, data);
  await putVehicles(tx, data);
  await tx
    .insert(catalogueVersion)
    .values({ version })
    .onConflictDoUpdate({ target: catalogueVersion.one, set: { version } });
  return true;
}
