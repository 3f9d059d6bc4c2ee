// Instant suggestions over the catalogue while a person types: near enough is found, best first.
import Fuse from 'fuse.js';
import type { FamilySummary } from '../../shared/catalogue/contract';
import { unitWords } from './family-words';

export type Suggester = (typed: string) => FamilySummary[];

/** Makes a suggester for these families; an empty text gives all of them in their own order. */
export function makeSuggester(families: readonly FamilySummary[]): Suggester {
  const fuse = new Fuse(
    families.map((family) => ({ family, name: family.name, words: unitWords(family) })),
    {
      keys: [
        { name: 'name', weight: 3 },
        { name: 'words', weight: 1 },
      ],
      // Every word typed must be found, each with at most a slip or two.
      useExtendedSearch: true,
      ignoreLocation: true,
      threshold: 0.28,
    },
  );
  return (typed) => {
    // A bar, quote, equals or bang would be read as an operator.
    const plain = typed.replace(/[|"'=!^$]/g, ' ').trim();
    return plain === '' ? [...families] : fuse.search(plain).map((found) => found.item.family);
  };
}
