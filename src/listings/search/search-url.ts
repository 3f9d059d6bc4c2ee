// The address holds the whole question: read from it, and written to it, so that the back button and a shared link ask the same.
import { z } from 'zod';
import { searchQuery } from '../../../shared/listings/card';

export const unitQuery = searchQuery.omit({ rigId: true, cursor: true, limit: true });
export type UnitQuery = z.output<typeof unitQuery>;

const LISTS: readonly string[] = ['kind', 'familyId', 'variantId', 'sellerId', 'grade', 'terms', 'state'];

/** What the address asks for. A value nobody could have chosen is left out rather than refused: links are edited by hand. */
export function readQuery(params: URLSearchParams): UnitQuery {
  const given: Record<string, unknown> = {};
  for (const [key, field] of Object.entries(unitQuery.shape)) {
    const values = params.getAll(key).filter((value) => value.trim() !== '');
    if (LISTS.includes(key)) {
      const parts = values.flatMap((value) => value.split(','));
      given[key] = parts.filter((part) => part !== '' && field.safeParse([part]).success).slice(0, 20);
    } else if (field.safeParse(values.at(-1)).success) {
      given[key] = values.at(-1);
    }
  }
  return unitQuery.parse(given);
}

/** The address of a question; what says nothing isn't written. */
export function writeQuery(query: UnitQuery): URLSearchParams {
  const params = new URLSearchParams();
  for (const key of Object.keys(unitQuery.shape)) {
    const value: unknown = Object.entries(query).find(([name]) => name === key)?.[1];
    if (value === undefined || value === '' || (key === 'sort' && value === 'best')) continue;
    if (Array.isArray(value)) for (const one of value) params.append(key, String(one));
    else params.set(key, String(value));
  }
  return params;
}

export type ListKey = 'kind' | 'familyId' | 'variantId' | 'sellerId' | 'grade' | 'terms' | 'state';

/** Ticks a value of a filter, or takes the tick away. */
export function toggled(query: UnitQuery, key: ListKey, value: string): UnitQuery {
  const before: readonly string[] = query[key] ?? [];
  const after = before.includes(value) ? before.filter((one) => one !== value) : [...before, value];
  return unitQuery.parse({ ...query, [key]: after });
}

/** Without the filters, but with the words, the place to measure from and the order. */
export const withoutFilters = ({ q, zip, sort }: UnitQuery): UnitQuery =>
  unitQuery.parse({ q, zip, sort: sort === 'distance' && !zip ? undefined : sort });

/** How many filters narrow the list. */
export function filterCount(query: UnitQuery): number {
  const lists = [query.kind, query.familyId, query.variantId, query.sellerId, query.grade, query.state];
  const chosen = lists.reduce((sum, list) => sum + (list?.length ?? 0), 0);
  const terms = query.terms?.length === 1 ? 1 : 0;
  const price = query.minCents !== undefined || query.maxCents !== undefined ? 1 : 0;
  return chosen + terms + price + (query.withinMiles === undefined ? 0 : 1);
}
