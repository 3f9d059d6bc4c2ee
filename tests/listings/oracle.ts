// Search done the slow and obvious way over plain rows, to hold the real one against.
import { milesBetween } from '../../shared/kernel/geo';

export interface Row {
  readonly id: string;
  readonly sellerId: string;
  readonly kind: string;
  readonly familyId: string;
  readonly variantId: string;
  readonly title: string;
  readonly words: string;
  readonly notes: string;
  readonly caseCode: string;
  readonly grade: string;
  readonly state: string;
  readonly status: string;
  readonly exchange: boolean;
  readonly outright: boolean;
  readonly totalCents: number;
  readonly listedAt: string;
  readonly lat: number;
  readonly lon: number;
}

export interface Question {
  readonly q?: string;
  readonly kind?: string[];
  readonly familyId?: string[];
  readonly variantId?: string[];
  readonly sellerId?: string[];
  readonly grade?: string[];
  readonly terms?: string[];
  readonly state?: string[];
  readonly minCents?: number;
  readonly maxCents?: number;
  readonly from?: { lat: number; lon: number };
  readonly withinMiles?: number;
  readonly sort?: string;
}

type Facet = 'kind' | 'grade' | 'terms' | 'state' | 'familyId';
const keyOf = (text: string): string => text.toUpperCase().replace(/[^A-Z0-9]/g, '');
const tokensOf = (row: Row): string[] =>
  `${row.title} ${row.caseCode} ${keyOf(row.caseCode)} ${row.words} ${row.notes}`.toLowerCase().split(/\s+/);

const isCodeLike = (text: string): boolean => keyOf(text).length >= 3 && /\d/.test(text);

function matchesWords(row: Row, text: string): boolean {
  const tokens = tokensOf(row);
  const asked = text.toLowerCase().split(/\s+/);
  return asked.every((word, index) => {
    if (word.startsWith('-')) return !tokens.includes(word.slice(1));
    return index === asked.length - 1
      ? tokens.some((token) => token.startsWith(word))
      : tokens.includes(word);
  });
}

export type Matched = 'code' | 'words' | null;

/** How the words are meant: by what any unit on offer matches, whatever the other filters. */
export function matchedAs(rows: readonly Row[], q: string | undefined): Matched | 'nothing' {
  if (!q) return null;
  const live = rows.filter((row) => row.status === 'live');
  if (isCodeLike(q) && live.some((row) => keyOf(row.caseCode).startsWith(keyOf(q)))) return 'code';
  return live.some((row) => matchesWords(row, q)) ? 'words' : 'nothing';
}

const within = (list: string[] | undefined, value: string): boolean => !list || list.includes(value);

function passes(row: Row, ask: Question, matched: Matched | 'nothing', without?: Facet): boolean {
  if (row.status !== 'live' || matched === 'nothing') return false;
  const q = ask.q ?? '';
  if (matched === 'code' && !keyOf(row.caseCode).startsWith(keyOf(q))) return false;
  if (matched === 'words' && !matchesWords(row, q)) return false;
  const terms = ask.terms?.length === 1 ? ask.terms[0] : undefined;
  return (
    (without === 'kind' || within(ask.kind, row.kind)) &&
    (without === 'familyId' || within(ask.familyId, row.familyId)) &&
    within(ask.variantId, row.variantId) &&
    within(ask.sellerId, row.sellerId) &&
    (without === 'grade' || within(ask.grade, row.grade)) &&
    (without === 'state' || within(ask.state, row.state)) &&
    (without === 'terms' || terms === undefined || (terms === 'exchange' ? row.exchange : row.outright)) &&
    (ask.minCents === undefined || row.totalCents >= ask.minCents) &&
    (ask.maxCents === undefined || row.totalCents <= ask.maxCents) &&
    (ask.withinMiles === undefined ||
      (ask.from !== undefined && milesBetween(ask.from, row) <= ask.withinMiles))
  );
}

const text = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
const byTotal = (a: Row, b: Row): number => a.totalCents - b.totalCents || text(a.id, b.id);
const byNewest = (a: Row, b: Row): number => text(b.listedAt, a.listedAt) || text(b.id, a.id);

function comparator(ask: Question, matched: Matched | 'nothing'): (a: Row, b: Row) => number {
  const sort = ask.sort ?? 'best';
  if (sort === 'newest') return byNewest;
  if (sort === 'distance') {
    const { from } = ask;
    const miles = (row: Row): number => (from ? milesBetween(from, row) : 0);
    return (a, b) =>
      a.sellerId === b.sellerId ? byTotal(a, b) : miles(a) - miles(b) || text(a.sellerId, b.sellerId);
  }
  if (sort === 'best' && matched === 'code')
    return (a, b) => text(keyOf(a.caseCode), keyOf(b.caseCode)) || byTotal(a, b);
  return sort === 'best' && matched === 'words' ? byNewest : byTotal;
}

function tally(rows: readonly Row[], of: (row: Row) => string[]): { value: string; count: number }[] {
  const counts = new Map<string, number>();
  for (const value of rows.flatMap(of)) counts.set(value, (counts.get(value) ?? 0) + 1);
  return [...counts]
    .map(([value, count]) => ({ value, count }))
    .sort((a, b) => b.count - a.count || text(a.value, b.value));
}

const VALUES: Readonly<Record<Facet, (row: Row) => string[]>> = {
  kind: (row) => [row.kind],
  grade: (row) => [row.grade],
  state: (row) => [row.state],
  familyId: (row) => [row.familyId],
  terms: (row) => [...(row.exchange ? ['exchange'] : []), ...(row.outright ? ['outright'] : [])],
};

export interface Expected {
  readonly ids: string[];
  readonly matched: Matched;
  readonly facets: Readonly<Record<Facet, { value: string; count: number }[]>>;
}

export function bruteForce(rows: readonly Row[], ask: Question): Expected {
  const matched = matchedAs(rows, ask.q);
  const facet = (name: Facet) => {
    const counted = tally(
      rows.filter((row) => passes(row, ask, matched, name)),
      VALUES[name],
    );
    return name === 'familyId' ? counted.slice(0, 12) : counted;
  };
  return {
    ids: rows
      .filter((row) => passes(row, ask, matched))
      .sort(comparator(ask, matched))
      .map((row) => row.id),
    matched: matched === 'nothing' ? null : matched,
    facets: {
      kind: facet('kind'),
      grade: facet('grade'),
      terms: facet('terms'),
      state: facet('state'),
      familyId: facet('familyId'),
    },
  };
}
