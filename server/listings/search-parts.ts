// The pieces a search statement is composed of: only the filters present, each value a parameter, one order per form.
import type { SearchQuery } from '../../shared/listings/card';
import type { Mode, Order } from './search-cursor';

/** Collects the values of one statement and hands out their `$n`. */
export interface Values {
  readonly list: unknown[];
  take(value: unknown): string;
}

export function newValues(): Values {
  const list: unknown[] = [];
  return { list, take: (value) => `$${list.push(value)}` };
}

export interface Point {
  readonly lat: number;
  readonly lon: number;
}

export interface Ask {
  readonly query: SearchQuery;
  readonly mode: Mode;
  /** Where miles are measured from; null without a known ZIP code. */
  readonly from: Point | null;
}

/** Earth's mean radius of 6,371,008.8 m (IUGG) in miles, as in the kernel's own distance. */
const RADIUS_MILES = 6_371_008.8 / 1_609.344;

/** The letters and digits of a code, in upper case: how codes are stored and compared. */
export const codeKeyOf = (text: string): string => text.toUpperCase().replace(/[^A-Z0-9]/g, '');

/** Worth looking up as a case code: long enough to mean something, with a digit, and not a sentence. */
export const looksLikeCode = (text: string): boolean => {
  const key = codeKeyOf(text);
  return key.length >= 3 && key.length <= 40 && /\d/.test(key) && text.trim().split(/\s+/).length <= 6;
};

/** All but the last word as a person would type it into a search box, and the last as a beginning of a word. */
export function splitWords(text: string): { whole: string; last: string } {
  const quoted = text.includes('"');
  const parts = quoted ? [] : text.trim().split(/\s+/);
  const tail = (parts.at(-1) ?? '').replace(/[^\p{L}\p{N}-]/gu, '').replace(/^-+|-+$/g, '');
  // A word with a minus before it is one to leave out, so it isn't the beginning of another.
  const isPrefix = !quoted && tail !== '' && !(parts.at(-1) ?? '').startsWith('-');
  return isPrefix ? { whole: parts.slice(0, -1).join(' '), last: `'${tail}':*` } : { whole: text, last: '' };
}

function wordsClause(text: string, values: Values): string {
  const { whole, last } = splitWords(text);
  const parts: string[] = [];
  if (whole.trim() !== '') parts.push(`websearch_to_tsquery('simple', ${values.take(whole)})`);
  if (last !== '') parts.push(`to_tsquery('simple', ${values.take(last)})`);
  return parts.length === 0 ? 'false' : `l.search @@ (${parts.join(' && ')})`;
}

function matchClause(ask: Ask, values: Values): string | null {
  const text = ask.query.q ?? '';
  switch (ask.mode) {
    case 'none':
      return null;
    case 'code': {
      const key = codeKeyOf(text);
      // '~' sorts after every letter and digit in byte order, so this range is exactly "begins with".
      return `l.code_key >= ${values.take(key)} and l.code_key < ${values.take(`${key}~`)}`;
    }
    case 'words':
      return wordsClause(text, values);
    case 'near':
      return `${values.take(text)} <% (l.title || ' ' || l.words)`;
  }
}

function oneOf(column: string, given: readonly string[] | undefined, values: Values): string | null {
  if (!given || given.length === 0) return null;
  // A single value keeps the order of an index that starts with the column; a list can't.
  return given.length === 1
    ? `${column} = ${values.take(given[0])}`
    : `${column} = any(${values.take(given)})`;
}

export type FacetName = 'kind' | 'grade' | 'terms' | 'state' | 'familyId';

/** The conditions on a listing, without those of one facet where its own values are counted. */
export function conditions(ask: Ask, values: Values, without?: FacetName): string[] {
  const { query } = ask;
  const clauses: (string | null)[] = ["l.status = 'live'", matchClause(ask, values)];
  if (without !== 'kind') clauses.push(oneOf('l.kind', query.kind, values));
  if (without !== 'familyId') clauses.push(oneOf('l.family_id', query.familyId, values));
  clauses.push(oneOf('l.variant_id', query.variantId, values));
  clauses.push(oneOf('l.seller_id', query.sellerId, values));
  if (without !== 'grade') clauses.push(oneOf('l.grade', query.grade, values));
  if (without !== 'state') clauses.push(oneOf('l.state', query.state, values));
  if (without !== 'terms' && query.terms?.length === 1) clauses.push(`l.${query.terms[0]}`);
  if (query.minCents !== undefined) clauses.push(`l.total_cents >= ${values.take(query.minCents)}`);
  if (query.maxCents !== undefined) clauses.push(`l.total_cents <= ${values.take(query.maxCents)}`);
  return clauses.filter((clause) => clause !== null);
}

/** Great-circle miles from the asked place to a seller, the haversine formula. */
const milesTo = (lat: string, lon: string): string =>
  `${RADIUS_MILES} * 2 * asin(least(1, sqrt(
    power(sin(radians(s.lat - ${lat}) / 2), 2) +
    cos(radians(${lat})) * cos(radians(s.lat)) * power(sin(radians(s.lon - ${lon}) / 2), 2))))`;

function box(from: Point, miles: number, values: Values): string {
  const angle = miles / RADIUS_MILES;
  const deg = (radians: number): number => (radians * 180) / Math.PI;
  // A hair wider than the circle: the box only spares work, the distance itself decides.
  const dLat = deg(angle) + 0.001;
  const reach = Math.sin(angle) / Math.cos((from.lat * Math.PI) / 180);
  const clauses = [`s.lat between ${values.take(from.lat - dLat)} and ${values.take(from.lat + dLat)}`];
  if (angle < Math.PI / 2 && reach < 1) {
    const dLon = deg(Math.asin(reach)) + 0.001;
    // Across the date line the box would have two halves; the distance alone is right there too.
    if (from.lon - dLon > -180 && from.lon + dLon < 180) {
      clauses.push(`s.lon between ${values.take(from.lon - dLon)} and ${values.take(from.lon + dLon)}`);
    }
  }
  return clauses.join(' and ');
}

/** Sellers and their miles, those inside the radius where one is asked for. */
export function sellersNear(ask: Ask, values: Values): string | null {
  const { from, query } = ask;
  if (!from) return null;
  const miles = milesTo(values.take(from.lat), values.take(from.lon));
  const clauses = ['true'];
  if (query.withinMiles !== undefined) clauses.push(box(from, query.withinMiles, values));
  const chosen = oneOf('s.id', query.sellerId, values);
  if (chosen) clauses.push(chosen);
  const all = `select s.id, ${miles} as d from sellers s where ${clauses.join(' and ')}`;
  return query.withinMiles === undefined
    ? all
    : `select a.id, a.d from (${all}) a where a.d <= ${values.take(query.withinMiles)}`;
}

interface Keyset {
  /** With `c.` for the page's rows. */
  readonly orderBy: string;
  readonly after: string | null;
}

const KEY_COLUMNS: Readonly<Record<Order, readonly string[]>> = {
  total: ['total_cents', 'id'],
  newest: ['listed_at', 'id'],
  code: ['code_key', 'total_cents', 'id'],
  distance: ['total_cents', 'id'],
};

/** The order of rows inside one seller (or overall), and what comes after a place in it. */
export function keyset(
  order: Order,
  keys: readonly (string | number)[],
  alias: string,
  values: Values,
): Keyset {
  const columns = KEY_COLUMNS[order].map((column) => `${alias}.${column}`);
  const down = order === 'newest';
  const orderBy = columns.map((column) => (down ? `${column} desc` : column)).join(', ');
  if (keys.length === 0) return { orderBy, after: null };
  const places = keys.map((key) => values.take(key)).join(', ');
  return { orderBy, after: `(${columns.join(', ')}) ${down ? '<' : '>'} (${places})` };
}
