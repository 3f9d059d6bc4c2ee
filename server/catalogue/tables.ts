// The catalogue: families, their variants, adapters between interfaces, and models of vehicles. Nested shapes are JSON.
import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  date,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  uniqueIndex,
} from 'drizzle-orm/pg-core';
import type { CodePattern } from '../../shared/catalogue/code-pattern';
import type { Family } from '../../shared/catalogue/family';
import type { Gears } from '../../shared/catalogue/gear-layout';
import type { InterfaceName, Interfaces } from '../../shared/catalogue/interfaces';
import type { UnitKind } from '../../shared/catalogue/kinds';
import type { VehicleModel } from '../../shared/catalogue/vehicle';

export const families = pgTable(
  'families',
  {
    id: text('id').primaryKey(),
    kind: text('kind').$type<UnitKind>().notNull(),
    makerId: text('maker_id').notNull(),
    maker: text('maker').notNull(),
    designation: text('designation').notNull(),
    gears: jsonb('gears').$type<Gears>().notNull(),
    forwardRatios: jsonb('forward_ratios').$type<number[]>().notNull(),
    reverseRatio: doublePrecision('reverse_ratio'),
    lowRange: doublePrecision('low_range'),
    control: text('control').$type<Family['control']>().notNull(),
    dryWeightLb: integer('dry_weight_lb').notNull(),
    lengthMm: integer('length_mm').notNull(),
    widthMm: integer('width_mm').notNull(),
    heightMm: integer('height_mm').notNull(),
    fluid: text('fluid').notNull(),
    fluidLitres: doublePrecision('fluid_litres').notNull(),
    benchHours: jsonb('bench_hours').$type<Family['benchHours']>().notNull(),
    failurePoints: jsonb('failure_points').$type<Family['failurePoints']>().notNull(),
    hardParts: jsonb('hard_parts').$type<Family['hardParts']>().notNull(),
    source: text('source').notNull(),
  },
  (t) => [
    check('families_kind', sql`${t.kind} in ('automatic', 'manual', 'transfer_case', 'axle')`),
    check('families_control', sql`${t.control} in ('hydraulic', 'electronic', 'none')`),
    check('families_reverse', sql`${t.reverseRatio} < 0`),
    check('families_low_range', sql`${t.lowRange} > 1`),
    check(
      'families_sizes',
      sql`${t.dryWeightLb} > 0 and ${t.lengthMm} > 0 and ${t.widthMm} > 0 and ${t.heightMm} > 0 and ${t.fluidLitres} > 0`,
    ),
    check('families_source', sql`${t.source} <> ''`),
    uniqueIndex('families_name').on(t.makerId, t.designation),
    index('families_kind_name').on(t.kind, t.maker, t.designation),
  ],
);

export const variants = pgTable(
  'variants',
  {
    id: text('id').primaryKey(),
    familyId: text('family_id')
      .notNull()
      .references(() => families.id),
    label: text('label').notNull(),
    yearFrom: integer('year_from').notNull(),
    yearTo: integer('year_to').notNull(),
    builtFrom: date('built_from', { mode: 'string' }).notNull(),
    builtTo: date('built_to', { mode: 'string' }).notNull(),
    interfaces: jsonb('interfaces').$type<Interfaces>().notNull(),
    codePatterns: jsonb('code_patterns').$type<CodePattern[]>().notNull(),
    source: text('source').notNull(),
  },
  (t) => [
    check('variants_years', sql`${t.yearFrom} <= ${t.yearTo}`),
    check('variants_built', sql`${t.builtFrom} <= ${t.builtTo}`),
    check('variants_source', sql`${t.source} <> ''`),
    uniqueIndex('variants_label').on(t.familyId, t.label),
  ],
);

export const adapters = pgTable(
  'adapters',
  {
    id: text('id').primaryKey(),
    label: text('label').notNull(),
    interface: text('interface').$type<InterfaceName>().notNull(),
    fromValue: jsonb('from_value').$type<Interfaces>().notNull(),
    toValue: jsonb('to_value').$type<Interfaces>().notNull(),
    addsMm: integer('adds_mm').notNull(),
    costCents: integer('cost_cents').notNull(),
    source: text('source').notNull(),
  },
  (t) => [
    check('adapters_amounts', sql`${t.addsMm} >= 0 and ${t.costCents} >= 0`),
    check('adapters_source', sql`${t.source} <> ''`),
    index('adapters_interface').on(t.interface),
  ],
);

export const vehicleModels = pgTable(
  'vehicle_models',
  {
    id: text('id').primaryKey(),
    make: text('make').notNull(),
    model: text('model').notNull(),
    yearFrom: integer('year_from').notNull(),
    yearTo: integer('year_to').notNull(),
    engine: text('engine').notNull(),
    drive: text('drive').$type<VehicleModel['drive']>().notNull(),
    joints: jsonb('joints').$type<VehicleModel['joints']>().notNull(),
    unitIds: jsonb('unit_ids').$type<string[]>().notNull(),
    axleRatio: doublePrecision('axle_ratio').notNull(),
    tyre: text('tyre').notNull(),
    source: text('source').notNull(),
  },
  (t) => [
    check('vehicle_models_years', sql`${t.yearFrom} <= ${t.yearTo}`),
    check('vehicle_models_drive', sql`${t.drive} in ('4x2', '4x4')`),
    check('vehicle_models_source', sql`${t.source} <> ''`),
    uniqueIndex('vehicle_models_name').on(t.make, t.model, t.engine, t.drive, t.yearFrom),
  ],
);

/** One row that changes with every change of the catalogue, so that each process knows when its code book is old. */
export const catalogueVersion = pgTable(
  'catalogue_version',
  {
    one: boolean('one').primaryKey().default(true),
    version: text('version').notNull(),
  },
  (t) => [check('catalogue_version_one', sql`${t.one}`)],
);
