// Bytes by file name, in memory or on disk, for what is too large for a journal.
import { mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';

interface Files {
  /** @param file a name made by the stand-in itself: letters, digits, dashes and dots */
  write(file: string, data: Buffer): void;
  read(file: string): Promise<Buffer>;
  drop(file: string): void;
}

function inMemory(): Files {
  const held = new Map<string, Buffer>();
  return {
    write: (file, data) => void held.set(file, data),
    read: (file) => Promise.resolve(held.get(file) ?? Buffer.alloc(0)),
    drop: (file) => void held.delete(file),
  };
}

function onDisk(directory: string): Files {
  const pathOf = (file: string): string => join(directory, file.slice(0, 2), file);
  mkdirSync(directory, { recursive: true });
  return {
    write: (file, data) => {
      mkdirSync(join(directory, file.slice(0, 2)), { recursive: true });
      writeFileSync(pathOf(file), data);
    },
    read: (file) => readFile(pathOf(file)),
    drop: (file) => rmSync(pathOf(file), { force: true }),
  };
}

/** Files that nothing points to, left by a process that was stopped between two writes. */
function sweep(directory: string, wanted: ReadonlySet<string>): void {
  for (const folder of readdirSync(directory)) {
    for (const file of readdirSync(join(directory, folder))) {
      if (!wanted.has(file)) rmSync(join(directory, folder, file), { force: true });
    }
  }
}

/** @param directory where the files live; without one they stay in memory
 *  @param wanted the files that are still pointed to; all others are removed */
export function openFiles(directory: string | undefined, wanted: readonly string[]): Files {
  if (directory === undefined) return inMemory();
  const files = onDisk(directory);
  sweep(directory, new Set(wanted));
  return files;
}
