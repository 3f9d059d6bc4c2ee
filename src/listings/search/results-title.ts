// The heading of the list: how many, of what.
import { KIND_WORDS } from '../../../shared/catalogue/kinds';
import type { SearchAnswer } from '../../../shared/listings/card';
import type { UnitQuery } from './search-url';

function noun(query: UnitQuery, count: number): string {
  const [kind, other] = query.kind ?? [];
  if (!kind || other) return count === 1 ? 'core' : 'cores';
  return count === 1 ? KIND_WORDS[kind].one : KIND_WORDS[kind].many.toLowerCase();
}

export function resultsTitle(query: UnitQuery, total: SearchAnswer['total'] | undefined): string {
  if (!total) return 'Find a core';
  const count = `${total.value.toLocaleString('en-US')}${total.exact ? '' : ' or more'}`;
  const asked = query.q ? ` for “${query.q}”` : '';
  return `${count} ${noun(query, total.value)}${asked}`;
}

/** How the words were understood, where that isn't plain. */
export function matchedWords(query: UnitQuery, matched: SearchAnswer['matched']): string {
  if (matched === 'code') return `Codes that begin with ${query.q ?? ''}.`;
  if (matched === 'near') return 'No unit has exactly these words. These come close.';
  return '';
}
