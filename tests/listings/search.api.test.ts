// Search against brute force: the same units, order, counts and pages on random questions; and pages that hold still.
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { locateZip } from '../../server/geo/zip';
import { isRefusal } from '../../server/http/refusal';
import { runSearch } from '../../server/listings/run-search';
import { searchQuery, type SearchAnswer } from '../../shared/listings/card';
import { openDatabase, type TestDatabase } from '../support/database';
import { bruteForce, type Question, type Row } from './oracle';
import { insertListing, random, seedListings, type Seeded } from './seeded';

const CASES = 160;
const ZIPS = ['83702', '80202', '60601', '98101', '78701'];

let database: TestDatabase;
let seeded: Seeded;

beforeAll(async () => {
  database = await openDatabase();
  seeded = await seedListings(database.pool, 650);
});
afterAll(() => database.close());

type Raw = Record<string, string>;

async function search(raw: Raw): Promise<SearchAnswer> {
  const answer = await runSearch({ pool: database.pool }, searchQuery.parse(raw));
  if (isRefusal(answer)) throw new Error(`refused: ${JSON.stringify(answer)}`);
  return answer;
}

async function allPages(raw: Raw): Promise<{ ids: string[]; first: SearchAnswer }> {
  const first = await search(raw);
  const ids = first.items.map((item) => item.id);
  let next = first.next;
  while (next) {
    const page = await search({ ...raw, cursor: next });
    ids.push(...page.items.map((item) => item.id));
    next = page.next;
  }
  return { ids, first };
}

const WORDS = [
  'rust',
  'keld',
  'keld 64A',
  'corv',
  'brandt axle',
  'pulled eng',
  'rust -towed',
  'transfer',
  'K66A',
  'k66a 4x',
  'C7R2XD1',
  'BX40 4X D2 001',
  'zzqqvv',
  '4x4',
];

function question(dice: ReturnType<typeof random>): Raw {
  const raw: Raw = { limit: String(1 + dice.below(40)) };
  const some = (list: readonly string[]): string =>
    [...new Set(Array.from({ length: 1 + dice.below(2) }, () => dice.pick(list)))].join(',');
  if (dice.chance(0.35)) raw['q'] = dice.pick(WORDS);
  if (dice.chance(0.3)) raw['kind'] = some(['automatic', 'manual', 'transfer_case', 'axle']);
  if (dice.chance(0.25)) raw['familyId'] = some(seeded.families);
  if (dice.chance(0.1)) raw['variantId'] = some(seeded.variants);
  if (dice.chance(0.1)) raw['sellerId'] = some(seeded.sellers.map((seller) => seller.id));
  if (dice.chance(0.3)) raw['grade'] = some(['A', 'B', 'C', 'D']);
  if (dice.chance(0.3)) raw['terms'] = some(['exchange', 'outright']);
  if (dice.chance(0.2)) raw['state'] = some(['pulled', 'in_vehicle']);
  if (dice.chance(0.25)) raw['minCents'] = String(5_000 * dice.below(30));
  if (dice.chance(0.25)) raw['maxCents'] = String(40_000 + 5_000 * dice.below(40));
  if (dice.chance(0.45)) {
    raw['zip'] = dice.pick(ZIPS);
    if (dice.chance(0.7)) raw['withinMiles'] = dice.pick(['50', '150', '400', '900', '3000']);
  }
  const sorts = raw['zip'] ? ['best', 'price', 'distance', 'newest'] : ['best', 'price', 'newest'];
  if (dice.chance(0.8)) raw['sort'] = dice.pick(sorts);
  return raw;
}

function asked(raw: Raw): Question {
  const list = (key: string): string[] | undefined => raw[key]?.split(',');
  const number = (key: string): number | undefined => (raw[key] === undefined ? undefined : Number(raw[key]));
  const from = raw['zip'] ? locateZip(raw['zip']) : null;
  return {
    q: raw['q'],
    kind: list('kind'),
    familyId: list('familyId'),
    variantId: list('variantId'),
    sellerId: list('sellerId'),
    grade: list('grade'),
    terms: list('terms'),
    state: list('state'),
    minCents: number('minCents'),
    maxCents: number('maxCents'),
    withinMiles: number('withinMiles'),
    sort: raw['sort'],
    ...(from ? { from } : {}),
  };
}

const bare = (values: { value: string; count: number }[]) =>
  values.map(({ value, count }) => ({ value, count }));

describe('search', () => {
  test(`when ${CASES} random questions are asked, then every page, order and count equals brute force`, async () => {
    const dice = random(20_261_201);
    const forms = new Set<string>();
    let found = 0;
    for (let round = 0; round < CASES; round += 1) {
      const raw = question(dice);
      const expected = bruteForce(seeded.rows, asked(raw));
      const { ids, first } = await allPages(raw);
      const told = `question ${round}: ${JSON.stringify(raw)}`;
      expect(ids, told).toEqual(expected.ids);
      expect(first.total, told).toEqual({ value: expected.ids.length, exact: true });
      if (expected.matched) expect(first.matched, told).toBe(expected.matched);
      for (const facet of ['kind', 'grade', 'terms', 'state', 'familyId'] as const) {
        expect(bare(first.facets[facet]), `${facet} of ${told}`).toEqual(expected.facets[facet]);
      }
      found += ids.length > 0 ? 1 : 0;
      forms.add([raw['sort'] ?? 'best', first.matched, raw['withinMiles'] ? 'near' : ''].join());
    }
    // Random questions that find nothing, or that all take one form, would prove nothing.
    expect(found).toBeGreaterThan(CASES / 2);
    expect(forms.size).toBeGreaterThanOrEqual(14);
  }, 120_000);

  test.each(['price', 'newest', 'distance'])(
    'when units are listed and sold between two pages sorted by %s, then nobody who stayed is shown twice or lost',
    async (sort) => {
      const raw = { sort, limit: '20', zip: '83702' };
      const before = bruteForce(seeded.rows, asked(raw)).ids;
      const seen: string[] = [];
      const gone: string[] = [];
      let page = await search(raw);
      let round = 0;
      for (;;) {
        seen.push(...page.items.map((item) => item.id));
        if (!page.next) break;
        const model = seeded.rows[round * 7];
        if (model) await addLike(model, `${sort}_${round}`);
        const sold = before[before.length - 1 - round * 3];
        if (sold && !seen.includes(sold)) {
          await database.pool.query(`update listings set status = 'sold' where id = $1`, [sold]);
          gone.push(sold);
        }
        round += 1;
        page = await search({ ...raw, cursor: page.next });
      }
      await database.pool.query(`update listings set status = 'live' where id = any($1)`, [gone]);
      await database.pool.query(`delete from listings where id like 'lst_new_%'`);
      const stayed = before.filter((id) => !gone.includes(id));
      expect(new Set(seen).size).toBe(seen.length);
      expect(seen.filter((id) => stayed.includes(id))).toEqual(stayed);
      expect(gone.length).toBeGreaterThan(3);
    },
  );

  const addLike = (row: Row, name: string): Promise<void> =>
    insertListing(database.pool, {
      ...row,
      id: `lst_new_${name}`,
      status: 'live',
      exchange: true,
      outright: false,
      priceCents: row.totalCents - 10_000,
      depositCents: 10_000,
      listedAt: new Date(Date.UTC(2026, 0, 31)).toISOString(),
    });
});

describe('words and codes', () => {
  test('when a whole code is typed in any spacing, then that unit comes first and the code is how it was read', async () => {
    const row = seeded.rows.find((candidate) => candidate.status === 'live');
    if (!row) throw new Error('nothing live');
    const answer = await search({ q: row.caseCode.toLowerCase().replaceAll(' ', '-') });
    expect(answer.matched).toBe('code');
    expect(answer.items[0]?.caseCode).toBe(row.caseCode);
  });

  test.each(['Keldt 60A', 'corvanne', 'ostro axel', 'tilage 64A', 'automtic'])(
    'when “%s” is typed, then what nearly matches is shown and said to be only near',
    async (q) => {
      const answer = await search({ q });
      expect(answer.matched).toBe('near');
      expect(answer.items.length).toBeGreaterThan(0);
    },
  );

  test('when nothing is like it, then nothing is shown', async () => {
    expect((await search({ q: 'xyzzyplugh' })).items).toEqual([]);
  });

  test.each(['%', '_', '"', "'; drop table listings; --", '\\', '-', ':*', '((', 'a & | !', '   '])(
    'when the words are “%s”, then it answers',
    async (q) => {
      expect((await search({ q })).total.exact).toBe(true);
    },
  );
});

describe('what is refused', () => {
  test.each([
    [{ sort: 'distance' }, 'zip'],
    [{ withinMiles: '100' }, 'zip'],
    [{ zip: '00000', withinMiles: '100' }, 'zip'],
    [{ cursor: 'nonsense' }, 'cursor'],
    [{ cursor: Buffer.from('["none","total",1]').toString('base64url') }, 'cursor'],
    [{ cursor: Buffer.from('["none","newest","yesterday","lst_1"]').toString('base64url') }, 'cursor'],
    [{ cursor: Buffer.from('["none","distance",1,"slr_1",1,"lst_1"]').toString('base64url') }, 'cursor'],
    [
      { cursor: Buffer.from('["words","newest","2026-01-01T00:00:00.000Z","lst_1"]').toString('base64url') },
      'cursor',
    ],
  ])('when %o is asked, then the field %s is named', async (raw: Raw, path) => {
    const answer = await runSearch({ pool: database.pool }, searchQuery.parse(raw));
    expect(answer).toMatchObject({ refusal: 'invalid', errors: [{ path }] });
  });

  test.each([{ kind: 'engine' }, { grade: 'E' }, { zip: '8370' }, { limit: '101' }, { sort: 'cheapest' }])(
    'when %o is asked, then it does not parse',
    (raw) => {
      expect(searchQuery.safeParse(raw).success).toBe(false);
    },
  );
});
