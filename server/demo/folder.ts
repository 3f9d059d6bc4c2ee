// Where the demo's data files are: beside the sources, or further up when this runs from a bundle.
import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export function demoFolder(name: string): string {
  let folder = path.dirname(fileURLToPath(import.meta.url));
  for (let depth = 0; depth < 4; depth += 1) {
    const found = [path.join(folder, 'data', name), path.join(folder, 'server/demo/data', name)].find(
      (candidate) => fs.existsSync(candidate),
    );
    if (found) return found;
    folder = path.dirname(folder);
  }
  throw new Error(`The demo's ${name} are missing; run from a whole checkout.`);
}
