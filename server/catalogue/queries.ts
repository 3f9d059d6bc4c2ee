// All SQL that reads the catalogue.
import { and, asc, count, countDistinct, eq, max, min, sql, type SQL } from 'drizzle-orm';
import type { Family } from '../../shared/catalogue/family';
import type { UnitKind } from '../../shared/catalogue/kinds';
import type { Variant } from '../../shared/catalogue/variant';
import type { Tx } from '../db/client';
import { presentFamily, presentVariant, type FamilyCount } from './present';
import { adapters, catalogueVersion, families, variants, vehicleModels } from './tables';

/** Each word must stand somewhere, in any case; a typed % or _ means itself. */
function wordsIn(text: SQL, q: string | undefined): SQL[] {
  const words = (q ?? '').split(/\s+/).filter(Boolean);
  return words.map((word) => {
    const like = `%${word.replace(/[\\%_]/g, (character) => `\\${character}`)}%`;
    return sql`${text} ilike ${like}`;
  });
}

export interface FamilyFilter {
  readonly kind: UnitKind | undefined;
  readonly q: string | undefined;
  readonly after: readonly [maker: string, designation: string, id: string] | null;
  readonly limit: number;
}

export async function findFamilies(tx: Tx, filter: FamilyFilter): Promise<FamilyCount[]> {
  const { after } = filter;
  return tx
    .select({
      family: families,
      variantCount: count(variants.id),
      yearFrom: min(variants.yearFrom),
      yearTo: max(variants.yearTo),
    })
    .from(families)
    .leftJoin(variants, eq(variants.familyId, families.id))
    .where(
      and(
        filter.kind ? eq(families.kind, filter.kind) : undefined,
        ...wordsIn(sql`(${families.maker} || ' ' || ${families.designation})`, filter.q),
        after
          ? sql`(${families.maker}, ${families.designation}, ${families.id}) > (${after[0]}, ${after[1]}, ${after[2]})`
          : undefined,
      ),
    )
    .groupBy(families.id)
    .orderBy(asc(families.maker), asc(families.designation), asc(families.id))
    .limit(filter.limit);
}

export async function findFamily(tx: Tx, id: string): Promise<(Family & { name: string }) | null> {
  const [row] = await tx.select().from(families).where(eq(families.id, id));
  return row ? presentFamily(row) : null;
}

export async function variantsOf(tx: Tx, familyId: string): Promise<Variant[]> {
  const rows = await tx
    .select()
    .from(variants)
    .where(eq(variants.familyId, familyId))
    .orderBy(asc(variants.yearFrom), asc(variants.label));
  return rows.map(presentVariant);
}

export async function findVariant(tx: Tx, id: string): Promise<Variant | null> {
  const [row] = await tx.select().from(variants).where(eq(variants.id, id));
  return row ? presentVariant(row) : null;
}

export const findAdapters = (tx: Tx, after: string | null, limit: number) =>
  tx
    .select()
    .from(adapters)
    .where(after === null ? undefined : sql`${adapters.id} > ${after}`)
    .orderBy(asc(adapters.id))
    .limit(limit);

export const allAdapters = (tx: Tx) => tx.select().from(adapters).orderBy(asc(adapters.id));

export const findVehicles = (tx: Tx, q: string | undefined, after: string | null, limit: number) =>
  tx
    .select()
    .from(vehicleModels)
    .where(
      and(
        ...wordsIn(
          sql`(${vehicleModels.make} || ' ' || ${vehicleModels.model} || ' ' || ${vehicleModels.engine})`,
          q,
        ),
        after === null ? undefined : sql`${vehicleModels.id} > ${after}`,
      ),
    )
    .orderBy(asc(vehicleModels.id))
    .limit(limit);

export async function countCatalogue(tx: Tx) {
  const [row] = await tx
    .select({ families: count(), makers: countDistinct(families.makerId) })
    .from(families);
  return {
    makers: row?.makers ?? 0,
    families: row?.families ?? 0,
    variants: await tx.$count(variants),
    adapters: await tx.$count(adapters),
    vehicles: await tx.$count(vehicleModels),
  };
}

/** Null for an empty catalogue. */
export async function readVersion(tx: Tx): Promise<string | null> {
  const [row] = await tx.select({ version: catalogueVersion.version }).from(catalogueVersion);
  return row?.version ?? null;
}

export async function loadAll(tx: Tx): Promise<{ families: Family[]; variants: Variant[] }> {
  const familyRows = await tx.select().from(families).orderBy(asc(families.id));
  const variantRows = await tx.select().from(variants).orderBy(asc(variants.id));
  return { families: familyRows.map(presentFamily), variants: variantRows.map(presentVariant) };
}
