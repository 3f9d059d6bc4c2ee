// The plans of the hot search forms at 20,000 units: none may read the whole table, also when planned without the values.
import type { PoolClient } from 'pg';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { countStatement } from '../../server/listings/facets';
import { orderOf, pageStatement, type Statement } from '../../server/listings/search';
import type { Mode, Place } from '../../server/listings/search-cursor';
import { searchQuery } from '../../shared/listings/card';
import { openDatabase, type TestDatabase } from '../support/database';
import { seedListings } from './seeded';

let database: TestDatabase;
let client: PoolClient;

beforeAll(async () => {
  database = await openDatabase();
  await seedListings(database.pool, 300, 400);
  // Seventy copies of each, spread over sellers, prices and days; a third of them no longer on offer.
  await database.pool.query(`
    insert into listings (id, seller_id, variant_id, family_id, kind, title, words, case_code, code_key, tag_code, grade, state,
      status, price_cents, exchange, deposit_cents, outright, outright_cents, total_cents, window_days, return_freight, freight,
      notes, zip, lat, lon, photo_count, cover_photo_id, created_at, updated_at, published_at, listed_at)
    select l.id || '_' || i, 'slr_s' || lpad(((i * 37 + l.price_cents / 100) % 400)::text, 4, '0'), variant_id, family_id, kind,
      title, words, case_code || i, code_key || i, l.tag_code || '_' || i, grade, state,
      case when i % 3 = 0 then 'sold' else 'live' end, price_cents + i, exchange, deposit_cents, outright, outright_cents,
      total_cents + i, window_days, return_freight, freight, notes, zip, lat, lon, photo_count, cover_photo_id, created_at,
      updated_at, published_at, listed_at + i * interval '1 hour'
    from listings l cross join generate_series(1, 70) i`);
  await database.pool.query('vacuum analyze listings');
  client = await database.pool.connect();
}, 120_000);
afterAll(async () => {
  client.release();
  await database.close();
});

interface Node {
  readonly 'Node Type': string;
  readonly 'Relation Name'?: string;
  readonly Plans?: readonly Node[];
}

const nodesOf = (node: Node): Node[] => [node, ...(node.Plans ?? []).flatMap(nodesOf)];

const literal = (value: unknown): string => {
  if (Array.isArray(value)) return `array[${value.map(literal).join(', ')}]`;
  if (typeof value === 'number') return String(value);
  return client.escapeLiteral(String(value));
};

async function wholeTableReads(statement: Statement, mode: string): Promise<string[]> {
  await client.query(`set plan_cache_mode = ${mode}`);
  await client.query(`prepare form as ${statement.text}`);
  try {
    const given = statement.values.length > 0 ? `(${statement.values.map(literal).join(', ')})` : '';
    const { rows } = await client.query<{ 'QUERY PLAN': [{ Plan: Node }] }>(
      `explain (format json) execute form${given}`,
    );
    const plan = rows[0]?.['QUERY PLAN'][0].Plan;
    if (!plan) throw new Error('no plan');
    return nodesOf(plan)
      .filter((node) => node['Node Type'] === 'Seq Scan' && node['Relation Name'] === 'listings')
      .map((node) => node['Node Type']);
  } finally {
    await client.query('deallocate form');
  }
}

const FROM = { lat: 43.6, lon: -116.2 };
const day = '2026-02-01T00:00:00.000Z';
type Form = readonly [name: string, raw: Record<string, string>, mode: Mode, keys: Place['keys']];
const FORMS: readonly Form[] = [
  ['everything', {}, 'none', []],
  ['everything, a later page', {}, 'none', [90_000, 'lst_s5']],
  ['newest with a price cap', { sort: 'newest', maxCents: '90000' }, 'none', []],
  ['newest, a later page', { sort: 'newest' }, 'none', [day, 'lst_s5']],
  ['one kind, newest', { kind: 'axle', sort: 'newest' }, 'none', []],
  ['one family by price', { familyId: 'fam_s003', sort: 'price' }, 'none', []],
  ['one family, newest, a later page', { familyId: 'fam_s003', sort: 'newest' }, 'none', [day, 'lst_s5']],
  [
    'one family, four filters',
    { familyId: 'fam_s003', grade: 'A,B', terms: 'exchange', state: 'pulled', maxCents: '150000' },
    'none',
    [],
  ],
  ['one variant', { variantId: 'var_s003_4x4' }, 'none', []],
  ['one seller', { sellerId: 'slr_s0007' }, 'none', []],
  ['a code’s beginning', { q: 'K66A4XD1' }, 'code', []],
  ['a code’s beginning, a later page', { q: 'K66A4XD1' }, 'code', ['K66A4XD100200', 60_000, 'lst_s5']],
  ['words', { q: 'keld rust' }, 'words', []],
  ['words in one family', { q: 'rust', familyId: 'fam_s003' }, 'words', []],
  ['nearly words', { q: 'brnadt axle' }, 'near', []],
  ['a radius', { zip: '83702', withinMiles: '300' }, 'none', []],
  ['a radius, newest', { zip: '83702', withinMiles: '300', sort: 'newest' }, 'none', []],
  [
    'a family in a radius, filtered',
    { zip: '83702', withinMiles: '500', familyId: 'fam_s003', grade: 'A' },
    'none',
    [],
  ],
  ['words in a radius', { zip: '83702', withinMiles: '300', q: 'rust' }, 'words', []],
  ['by distance', { zip: '83702', sort: 'distance' }, 'none', []],
  [
    'by distance in a radius, a later page',
    { zip: '83702', sort: 'distance', withinMiles: '300' },
    'none',
    [12.5, 'slr_s0007', 60_000, 'lst_s5'],
  ],
];

describe.each(['force_generic_plan', 'force_custom_plan'])('plans under %s', (planMode) => {
  test.each(FORMS)(
    'when the question is %s, then page and counts come through an index',
    async (_name, raw, mode, keys) => {
      const query = searchQuery.parse(raw);
      const ask = { query, mode, from: raw['zip'] ? FROM : null };
      const page = pageStatement(ask, orderOf(query, mode), keys);
      expect(await wholeTableReads(page, planMode), page.text).toEqual([]);
      const counts = countStatement(ask, ['kind', 'grade', 'terms', 'state', 'familyId']);
      expect(await wholeTableReads(counts, planMode), counts.text).toEqual([]);
    },
  );

  test('when a filter has no index and no order, then this very check sees the whole table read', async () => {
    const bare = { name: 'bare', text: `select id from listings where notes = $1`, values: ['rust'] };
    expect(await wholeTableReads(bare, planMode)).toEqual(['Seq Scan']);
  });
});
