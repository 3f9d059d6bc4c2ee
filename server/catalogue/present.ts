// From rows of the catalogue to its contract, field by field.
import type { Adapter } from '../../shared/catalogue/adapter';
import type { FamilySummary } from '../../shared/catalogue/contract';
import { familyName, type Family } from '../../shared/catalogue/family';
import type { Variant } from '../../shared/catalogue/variant';
import type { VehicleModel } from '../../shared/catalogue/vehicle';
import type { adapters, families, variants, vehicleModels } from './tables';

type FamilyRow = typeof families.$inferSelect;

export const presentFamily = (row: FamilyRow): Family & { name: string } => ({
  id: row.id,
  kind: row.kind,
  makerId: row.makerId,
  maker: row.maker,
  designation: row.designation,
  name: familyName(row),
  gears: row.gears,
  forwardRatios: row.forwardRatios,
  reverseRatio: row.reverseRatio,
  lowRange: row.lowRange,
  control: row.control,
  dryWeightLb: row.dryWeightLb,
  lengthMm: row.lengthMm,
  widthMm: row.widthMm,
  heightMm: row.heightMm,
  fluid: row.fluid,
  fluidLitres: row.fluidLitres,
  benchHours: row.benchHours,
  failurePoints: row.failurePoints,
  hardParts: row.hardParts,
  source: row.source,
});

export interface FamilyCount {
  readonly family: FamilyRow;
  readonly variantCount: number;
  readonly yearFrom: number | null;
  readonly yearTo: number | null;
}

export const presentSummary = ({ family, variantCount, yearFrom, yearTo }: FamilyCount): FamilySummary => ({
  id: family.id,
  kind: family.kind,
  makerId: family.makerId,
  maker: family.maker,
  designation: family.designation,
  name: familyName(family),
  forwardRatios: family.forwardRatios,
  reverseRatio: family.reverseRatio,
  lowRange: family.lowRange,
  control: family.control,
  dryWeightLb: family.dryWeightLb,
  variantCount,
  years: yearFrom === null || yearTo === null ? null : { from: yearFrom, to: yearTo },
});

export const presentVariant = (row: typeof variants.$inferSelect): Variant => ({
  id: row.id,
  familyId: row.familyId,
  label: row.label,
  modelYears: { from: row.yearFrom, to: row.yearTo },
  builtFrom: row.builtFrom,
  builtTo: row.builtTo,
  interfaces: row.interfaces,
  codePatterns: row.codePatterns,
  source: row.source,
});

export const presentAdapter = (row: typeof adapters.$inferSelect): Adapter => ({
  id: row.id,
  label: row.label,
  interface: row.interface,
  from: row.fromValue,
  to: row.toValue,
  addsMm: row.addsMm,
  costCents: row.costCents,
  source: row.source,
});

export const presentVehicle = (row: typeof vehicleModels.$inferSelect): VehicleModel => ({
  id: row.id,
  make: row.make,
  model: row.model,
  yearFrom: row.yearFrom,
  yearTo: row.yearTo,
  engine: row.engine,
  drive: row.drive,
  joints: row.joints,
  unitIds: row.unitIds,
  axleRatio: row.axleRatio,
  tyre: row.tyre,
  source: row.source,
});
