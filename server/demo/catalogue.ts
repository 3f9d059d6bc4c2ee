// Reads the demo's invented catalogue from its data files.
import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { z } from 'zod';
import { catalogueData, type CatalogueData } from '../../shared/catalogue/contract';

const UNIT_FILES = ['automatics', 'manuals', 'transfer-cases', 'axles'] as const;
const unitFile = catalogueData.pick({ families: true, variants: true });

/** Beside the sources while developing; further up when this runs from a bundle. */
function dataFolder(): string {
  let folder = path.dirname(fileURLToPath(import.meta.url));
  for (let depth = 0; depth < 4; depth += 1) {
    const found = [path.join(folder, 'data/catalogue'), path.join(folder, 'server/demo/data/catalogue')].find(
      (candidate) => fs.existsSync(candidate),
    );
    if (found) return found;
    folder = path.dirname(folder);
  }
  throw new Error('The demo catalogue is missing; run from a whole checkout.');
}

function readFile<T extends z.ZodType>(folder: string, name: string, schema: T): z.output<T> {
  const parsed: unknown = JSON.parse(fs.readFileSync(path.join(folder, `${name}.json`), 'utf8'));
  return schema.parse(parsed);
}

/** @throws when a file is missing or a row breaks the schema: the demo can't start on a broken catalogue */
export function readDemoCatalogue(): CatalogueData {
  const folder = dataFolder();
  const units = UNIT_FILES.map((name) => readFile(folder, name, unitFile));
  return {
    families: units.flatMap((one) => one.families),
    variants: units.flatMap((one) => one.variants),
    adapters: readFile(folder, 'adapters', catalogueData.shape.adapters),
    vehicles: readFile(folder, 'vehicles', catalogueData.shape.vehicles),
  };
}
