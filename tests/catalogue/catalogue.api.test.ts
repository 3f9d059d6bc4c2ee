// The catalogue and the code reader over HTTP, on the demo's catalogue imported into a real database.
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { importCatalogue } from '../../server/catalogue/for-others';
import { readDemoCatalogue } from '../../server/demo/catalogue';
import { familyOfCode, familyOfVariant } from '../../server/reading/for-others';
import { at, list, number, text, type Client } from '../support/client';
import { startTestServer, type TestServer } from '../support/server';

let server: TestServer;
let visitor: Client;
const data = readDemoCatalogue();

beforeAll(async () => {
  server = await startTestServer({ background: false });
  await server.deps.db.transaction((tx) => importCatalogue(tx, data));
  visitor = server.client();
});
afterAll(() => server.close());

const stored = async (): Promise<string> => {
  const { rows } = await server.database.pool.query<{ digest: string }>(
    `select md5(string_agg(f::text, '' order by f.id)) || (select md5(string_agg(v::text, '' order by v.id)) from variants v)
       as digest from families f`,
  );
  return rows[0]?.digest ?? '';
};

describe('importing', () => {
  test('when the same data comes again, nothing is written', async () => {
    const before = await stored();
    expect(await server.deps.db.transaction((tx) => importCatalogue(tx, data))).toBe(false);
    expect(await stored()).toBe(before);
  });

  test('when a row has changed, that row is brought up to date and the code book follows', async () => {
    const read = () => visitor.post('/api/codes/read', { text: 'K66A 4X D9 09147 03' });
    const label = 'Keld 66A, 4x4, D9 bell, 16-pin plug';
    expect(text((await read()).body, 'candidates', 0, 'label')).toBe(label);
    const changed = data.variants.map((variant) =>
      variant.id === 'keld-66a-4x4-d9-late' ? { ...variant, label: '4x4, D9 bell, long plug' } : variant,
    );
    await server.deps.db.transaction((tx) => importCatalogue(tx, { ...data, variants: changed }));
    expect(text((await read()).body, 'candidates', 0, 'label')).toBe('Keld 66A, 4x4, D9 bell, long plug');
    await server.deps.db.transaction((tx) => importCatalogue(tx, data));
    expect(text((await read()).body, 'candidates', 0, 'label')).toBe(label);
  });

  test('when a row breaks a rule of the database, the whole import is rolled back', async () => {
    const before = await stored();
    const broken = data.families.map((family, index) =>
      index === 40 ? { ...family, dryWeightLb: -1 } : family,
    );
    const attempt = server.deps.db.transaction((tx) => importCatalogue(tx, { ...data, families: broken }));
    await expect(attempt).rejects.toMatchObject({ cause: { constraint: 'families_sizes' } });
    expect(await stored()).toBe(before);
  });
});

describe('families', () => {
  test('pages follow each other in order of maker and designation, none twice and none lost', async () => {
    const names: string[] = [];
    let cursor = '';
    do {
      const { status, body } = await visitor.get(
        `/api/catalogue/families?limit=7${cursor && `&cursor=${cursor}`}`,
      );
      expect(status).toBe(200);
      names.push(...list(body, 'items').map((item) => text(item, 'name')));
      cursor = at(body, 'next') === null ? '' : text(body, 'next');
    } while (cursor);
    expect(names).toHaveLength(data.families.length);
    expect(new Set(names).size).toBe(names.length);
    expect(names).toEqual([...names].sort());
  });

  test('narrowed by kind and words in any case; a typed % is only itself', async () => {
    const find = async (query: string) =>
      list((await visitor.get(`/api/catalogue/families?${query}`)).body, 'items');
    expect((await find('kind=axle')).map((one) => text(one, 'kind'))).toEqual(Array(10).fill('axle'));
    expect((await find('q=kElD%2066')).map((one) => text(one, 'id'))).toEqual(['keld-66a']);
    expect(await find('q=66a&kind=manual')).toEqual([]);
    expect(await find('q=%25')).toEqual([]);
  });

  test('a summary says how many variants and which years', async () => {
    const { body } = await visitor.get('/api/catalogue/families?q=66A');
    expect(at(body, 'items', 0)).toMatchObject({
      name: 'Keld 66A',
      variantCount: 6,
      years: { from: 2004, to: 2014 },
    });
  });

  test('one family has its gears, ratios, variants, interfaces and code patterns', async () => {
    const { status, body } = await visitor.get('/api/catalogue/families/keld-66a');
    expect(status).toBe(200);
    expect(body).toMatchObject({
      kind: 'automatic',
      name: 'Keld 66A',
      forwardRatios: [4.086, 2.248, 1.459, 1.127, 0.881, 0.7],
    });
    expect(at(body, 'gears', 'layout')).toBe('simple_ravigneaux');
    expect(list(body, 'variants')).toHaveLength(6);
    expect(at(body, 'variants', 0, 'interfaces', 'enginePattern')).toMatchObject({
      bolts: expect.any(Number),
    });
    expect(
      list(body, 'variants', 0, 'codePatterns', 0, 'segments').map((one) => text(one, 'name')),
    ).toContain('Family');
  });

  test('a variant comes with its family and the adapters that fit it', async () => {
    const { body } = await visitor.get('/api/catalogue/variants/keld-66a-4x4-d9-late');
    expect(at(body, 'family', 'name')).toBe('Keld 66A');
    const labels = list(body, 'adapters').map((one) => text(one, 'label'));
    // From the unit's 16 pins to a vehicle's 14, and not the other way.
    expect(labels).toContain('Keld 14-to-16-pin plug lead');
    expect(labels).not.toContain('Keld 16-to-14-pin plug lead with resistor');
  });

  test('what does not exist is 404; a bad kind, limit or cursor is 422', async () => {
    for (const path of ['families/keld-99z', 'variants/keld-99z', 'families/x'])
      expect((await visitor.get(`/api/catalogue/${path}`)).status, path).toBe(404);
    for (const query of ['kind=boat', 'limit=0', 'limit=101', 'cursor=abc', 'colour=red'])
      expect((await visitor.get(`/api/catalogue/families?${query}`)).status, query).toBe(422);
  });

  test('counts, adapters and vehicles', async () => {
    expect((await visitor.get('/api/catalogue/counts')).body).toEqual({
      makers: 15,
      families: data.families.length,
      variants: data.variants.length,
      adapters: data.adapters.length,
      vehicles: data.vehicles.length,
    });
    const first = await visitor.get('/api/catalogue/adapters?limit=40');
    const second = await visitor.get(`/api/catalogue/adapters?limit=40&cursor=${text(first.body, 'next')}`);
    expect(list(first.body, 'items').length + list(second.body, 'items').length).toBe(data.adapters.length);
    const vehicles = list((await visitor.get('/api/catalogue/vehicles?q=drover%205.2')).body, 'items');
    expect(vehicles).toHaveLength(8);
    expect(new Set(vehicles.map((one) => text(one, 'make')))).toEqual(new Set(['Corvane']));
  });
});

describe('reading over HTTP', () => {
  test('a whole code is sure, in the shape of the contract and nothing more', async () => {
    const { status, body } = await visitor.post('/api/codes/read', {
      text: 'k66a 4x d9 09147 03',
      donorYear: 2006,
    });
    expect(status).toBe(200);
    expect(Object.keys(Object(body)).sort()).toEqual(['candidates', 'verdict']);
    expect(text(body, 'verdict')).toBe('sure');
    expect(at(body, 'candidates', 0)).toMatchObject({
      familyId: 'keld-66a',
      builtOn: '2009-05-27',
      probability: 1,
    });
    expect(list(body, 'candidates', 0, 'conflicts')).toHaveLength(2);
  });

  test('nonsense cannot be told; no text, a long one and an unknown field are 422', async () => {
    const nonsense = await visitor.post('/api/codes/read', { text: 'ZZZZ 0000' });
    expect(nonsense.body).toEqual({ candidates: [], verdict: 'cannot_tell' });
    for (const body of [
      {},
      { text: '  ' },
      { text: 'A'.repeat(65) },
      { text: 'K66A', year: 2009 },
      { text: 'K66A', kind: 'boat' },
    ])
      expect((await visitor.post('/api/codes/read', body)).status).toBe(422);
  });

  test('a vehicle number: year and check digit; the clock of the server says which years have come', async () => {
    const { body } = await visitor.post('/api/vin/decode', { vin: '1m8gdm9axkp042788' });
    // autocalculator.org/VIN/VIN-Checkdigit.aspx
    expect(body).toMatchObject({ valid: true, problems: [], modelYear: 1989, checkDigit: 'X' });
    expect(at(body, 'vehicle', 'region')).toBe('United States');
    const motorcycle = await visitor.post('/api/vin/decode', { vin: 'LJCPCBLCX11000237' });
    expect(number(motorcycle.body, 'modelYear')).toBe(2001);
    expect((await visitor.post('/api/vin/decode', { vin: '' })).status).toBe(422);
  });
});

describe('for other features', () => {
  test('a whole code names its family even where its variants cannot be told apart; a part of it does not', async () => {
    const castNumber = data.variants
      .find((variant) => variant.id === 'varrick-vane-4-4x4-n6-late')
      ?.codePatterns.find((pattern) => pattern.where === 'cast');
    const code = (castNumber?.segments ?? []).map((segment) => Object.keys(segment.values ?? {})[0]).join('');
    expect(await familyOfCode(server.deps, code)).toBe('varrick-vane-4');
    expect(await familyOfCode(server.deps, 'K66A 4X D9 09147 03')).toBe('keld-66a');
    expect(await familyOfCode(server.deps, 'K66A 4X D9')).toBeNull();
    expect(await familyOfCode(server.deps, 'not a code')).toBeNull();
  });

  test('the family of a variant', async () => {
    expect(await familyOfVariant(server.deps, 'keld-66a-4x4-d9-late')).toBe('keld-66a');
    expect(await familyOfVariant(server.deps, 'nothing')).toBeNull();
  });
});
