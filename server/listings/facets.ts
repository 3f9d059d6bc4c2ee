// Counts beside the filters. Counting stops at the cap, so that it costs the same at a thousand units and at a million.
import type { Pool, QueryResultRow } from 'pg';
import { COUNT_CAP, type Facets } from '../../shared/listings/card';
import { conditions, newValues, sellersNear, type Ask, type FacetName } from './search-parts';
import { named, run, type Statement } from './search';

export interface Counts {
  readonly facets: Facets;
  readonly total: { readonly value: number; readonly exact: boolean };
}

interface CountRow extends QueryResultRow {
  readonly facet: string;
  readonly value: string | null;
  readonly label: string | null;
  readonly count: number;
}

const FAMILIES_SHOWN = 12;
const CACHE_MS = 3_000;

const EXPRESSIONS: Readonly<Record<FacetName, string>> = {
  kind: `select 'kind', kind, null, count(*)::int from f group by kind`,
  grade: `select 'grade', grade, null, count(*)::int from f group by grade`,
  terms: `select 'terms', t.name, null, count(*)::int from f
    cross join lateral (values ('exchange', f.exchange), ('outright', f.outright)) t (name, offered)
    where t.offered group by t.name`,
  state: `select 'state', state, null, count(*)::int from f group by state`,
  familyId: `select 'familyId', g.family_id, m.label, g.n from (select family_id, count(*)::int as n from f
    group by family_id order by n desc, family_id limit ${FAMILIES_SHOWN}) g
    join (select id, maker || ' ' || designation as label from families) m on m.id = g.family_id`,
};

const ALL: readonly FacetName[] = ['kind', 'grade', 'terms', 'state', 'familyId'];

/** Does the question already narrow this facet? Then its other values are counted as if it didn't. */
function narrows({ query }: Ask, facet: FacetName): boolean {
  const chosen = facet === 'terms' && query.terms?.length !== 1 ? undefined : query[facet];
  return chosen !== undefined && chosen.length > 0;
}

export function countStatement(ask: Ask, facets: readonly FacetName[], without?: FacetName): Statement {
  const values = newValues();
  const where = conditions(ask, values, without).join(' and ');
  const near = ask.query.withinMiles === undefined ? null : sellersNear(ask, values);
  const columns = 'l.kind, l.grade, l.exchange, l.outright, l.state, l.family_id';
  const limit = COUNT_CAP + 1;
  const walk = ask.mode === 'none' ? 'order by l.total_cents, l.id' : '';
  const base = near
    ? `select x.* from (${near}) n cross join lateral (select ${columns} from listings l
        where l.seller_id = n.id and ${where} limit ${limit}) x limit ${limit}`
    : `select ${columns} from listings l where ${where} ${walk} limit ${limit}`;
  const parts = facets.map((facet) => `(${EXPRESSIONS[facet]})`);
  const total = without ? [] : [`(select 'total', null::text, null::text, count(*)::int from f)`];
  const text = `with f as materialized (${base})
    select * from (${[...total, ...parts].join(' union all ')}) r (facet, value, label, count)
    order by facet, count desc, value`;
  return named(text, values.list);
}

async function runCounts(pool: Pool, ask: Ask): Promise<Counts> {
  const narrowed = ALL.filter((facet) => narrows(ask, facet));
  const statements = [
    countStatement(
      ask,
      ALL.filter((facet) => !narrowed.includes(facet)),
    ),
    ...narrowed.map((facet) => countStatement(ask, [facet], facet)),
  ];
  const rows = (await Promise.all(statements.map((one) => run<CountRow>(pool, ask.mode, one)))).flat();
  const of = (facet: FacetName) =>
    rows
      .filter((row) => row.facet === facet && row.value !== null)
      .map((row) => ({
        value: row.value ?? '',
        count: Math.min(row.count, COUNT_CAP),
        ...(row.label ? { label: row.label } : {}),
      }));
  const counted = rows.find((row) => row.facet === 'total')?.count ?? 0;
  return {
    facets: {
      kind: of('kind'),
      grade: of('grade'),
      terms: of('terms'),
      state: of('state'),
      familyId: of('familyId'),
    },
    total: { value: Math.min(counted, COUNT_CAP), exact: counted <= COUNT_CAP },
  };
}

/** The counts of everything on offer, while there is so much that they are capped anyway. */
const wholeSite = new WeakMap<Pool, { readonly until: number; readonly counts: Counts }>();

const asksForAll = ({ query, mode }: Ask): boolean =>
  mode === 'none' &&
  query.withinMiles === undefined &&
  query.minCents === undefined &&
  query.maxCents === undefined &&
  [query.kind, query.familyId, query.variantId, query.sellerId, query.grade, query.terms, query.state].every(
    (filter) => filter === undefined,
  );

export async function countListings(pool: Pool, ask: Ask): Promise<Counts> {
  const forAll = asksForAll(ask);
  const kept = forAll ? wholeSite.get(pool) : undefined;
  if (kept && kept.until > Date.now()) return kept.counts;
  const counts = await runCounts(pool, ask);
  if (forAll && !counts.total.exact) wholeSite.set(pool, { until: Date.now() + CACHE_MS, counts });
  return counts;
}
