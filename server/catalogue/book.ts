// The code book in memory: all patterns, loaded again when the catalogue's version changes.
import { codeBook, type BookEntry } from '../../shared/reading/read-code';
import type { Tx } from '../db/client';
import { loadAll, readVersion } from './queries';

interface Loaded {
  readonly version: string;
  readonly book: readonly BookEntry[];
}

let latest: Loaded | null = null;

/** The code book as the catalogue stands now; reads the database only when something changed. */
export async function currentBook(tx: Tx): Promise<readonly BookEntry[]> {
  const version = await readVersion(tx);
  if (version === null) return [];
  if (latest?.version !== version) {
    const { families, variants } = await loadAll(tx);
    latest = { version, book: codeBook(families, variants) };
  }
  return latest.book;
}
