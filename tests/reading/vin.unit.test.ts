// VIN check digit and model year against published examples and an independent validator.
import fc from 'fast-check';
import { validate } from 'vin-validator';
import { describe, expect, test } from 'vitest';
import { decodeVin, vinCheckDigit, vinModelYears } from '../../shared/reading/vin';

const LATEST = 2027;
const codes = (vin: string): string[] => decodeVin(vin, LATEST).problems.map((problem) => problem.code);

const RIGHT = [
  // Position 9 is blank in the sample table; the sum of 411 printed there leaves 4.
  ['1G4AH59H45G118341', '4', '49 CFR 565 table V, sample (older edition)'],
  ['1J9RP1A36A1644345', '6', 'NHTSA, Outline for New Manufacturer Information, page 18'],
  ['1M8GDM9AXKP042788', 'X', 'autocalculator.org/VIN/VIN-Checkdigit.aspx'],
  ['LJCPCBLCX11000237', 'X', 'scientificgems.wordpress.com, 28 April 2018'],
  ['11111111111111111', '1', 'the straight-ones test of several encyclopaedias'],
  ['5GZCZ43D13S812715', '1', 'encyclopaedia example, worked by hand: 408 mod 11'],
  ['1ZZTD4A37FZ000417', '7', 'made up for the demo, worked by hand: 359 mod 11'],
  ['1ZZTD4K84AZ118203', '4', 'made up for the demo, worked by hand: 400 mod 11'],
  ['1ZZKR54296Z042366', '9', 'made up for the demo, worked by hand: 416 mod 11'],
] as const;

describe('the check digit', () => {
  test.each(RIGHT)('%s has %s (%s)', (vin, digit) => {
    expect(vinCheckDigit(vin)).toBe(digit);
    expect(decodeVin(vin, LATEST)).toMatchObject({ valid: true, problems: [], checkDigit: digit });
    expect(validate(vin)).toBe(true);
  });

  test.each([
    ['1M8GDM9A1KP042788', 'X', 'the published example with another check digit'],
    ['SGZCZ43D13S812715', 'X', 'an encyclopaedia prints it as right: the sum is 384'],
    ['WP0ZZZ99ZTS392124', '8', 'not made for the US market: position 9 is no check digit'],
    ['KLATF08Y1VB363636', '4', 'not made for the US market'],
  ])('%s should have %s (%s)', (vin, digit) => {
    const decoded = decodeVin(vin, LATEST);
    expect(decoded.checkDigit).toBe(digit);
    expect(decoded.valid).toBe(false);
    expect(decoded.problems.map((problem) => problem.position)).toEqual([9]);
    expect(validate(vin)).toBe(false);
  });

  test('agrees with vin-validator 1.0.0 on 5,000 random numbers, half of them made right', () => {
    const character = fc.constantFrom(...'ABCDEFGHJKLMNPRSTUVWXYZ0123456789IOQ');
    const seventeen = fc.string({ unit: character, minLength: 17, maxLength: 17 });
    fc.assert(
      fc.property(seventeen, fc.boolean(), (random, mend) => {
        const digit = mend ? vinCheckDigit(random) : null;
        const vin = digit === null ? random : random.slice(0, 8) + digit + random.slice(9);
        // The reference doesn't look at the model year.
        const faults = codes(vin).filter((code) => code !== 'illegal_year');
        expect(faults.length === 0).toBe(validate(vin));
      }),
      { numRuns: 5000, seed: 565 },
    );
  });

  test('two letters of one value cannot be told apart: D for U and 1 for J keep it right', () => {
    expect(codes('1ZZTU4A37FZ000417')).toEqual([]);
    expect(codes('JZZTD4A37FZ000417')).toEqual([]);
  });
});

describe('the model year', () => {
  test.each([
    ['A', [1980, 2010]],
    ['H', [1987, 2017]],
    ['J', [1988, 2018]],
    ['N', [1992, 2022]],
    ['P', [1993, 2023]],
    ['T', [1996, 2026]],
    ['V', [1997, 2027]],
    ['Y', [2000, 2030]],
    ['1', [2001, 2031]],
    ['9', [2009, 2039]],
  ])('%s is one of %j (49 CFR 565.15 table VII)', (code, years) => {
    expect(vinModelYears(code)).toEqual(years);
  });

  test.each(['I', 'O', 'Q', 'U', 'Z', '0', '', 'AB'])('"%s" is never one', (code) => {
    expect(vinModelYears(code)).toEqual([]);
  });

  test.each([
    ['1M8GDM9AXKP042788', 1989, 'figure in position 7'],
    ['1ZZKR54296Z042366', 2006, 'figure in position 7'],
    ['1ZZTD4K84AZ118203', 2010, 'letter in position 7'],
    ['1ZZTD4A37FZ000417', 2015, 'letter in position 7'],
    ['1J9RP1A36A1644345', 2010, 'letter in position 7'],
    [
      'LJCPCBLCX11000237',
      2001,
      'the rule gives 2031, which has not come: a motorcycle, of which it says nothing',
    ],
  ])('%s is %i: %s', (vin, year) => {
    expect(decodeVin(vin, LATEST).modelYear).toBe(year);
  });

  test('a character that is no year is named', () => {
    const digit = vinCheckDigit('1ZZTD4A3_UZ000417'.replace('_', '0')) ?? '';
    expect(codes(`1ZZTD4A3${digit}UZ000417`)).toEqual(['illegal_year']);
  });
});

describe('what a person types', () => {
  test('lower case, spaces and hyphens do not matter', () => {
    expect(decodeVin(' 1m8gdm9ax-kp 042788', LATEST)).toMatchObject({
      vin: '1M8GDM9AXKP042788',
      valid: true,
    });
  });

  test('O, Q and I are named with their place, and read as 0 and 1 where that makes it right', () => {
    const decoded = decodeVin('1M8GDM9AXKPO42788', LATEST);
    expect(decoded.problems).toEqual([
      {
        code: 'illegal_character',
        message: 'O is never used in a VIN (position 12). Is it 0?',
        position: 12,
      },
    ]);
    expect(decoded.suggestion).toBe('1M8GDM9AXKP042788');
    expect(decodeVin('IM8GDM9AXKPQ42788', LATEST).suggestion).toBe('1M8GDM9AXKP042788');
  });

  test('no other character is ever guessed', () => {
    expect(decodeVin('1M8GDM9AXKP04278B', LATEST).suggestion).toBeNull();
    expect(decodeVin('1M8GDM9A1KPO42788', LATEST).suggestion).toBeNull();
  });

  test('16 characters are too few, and an old short number is told to type the year', () => {
    const decoded = decodeVin('1M8GDM9AXKP04278', LATEST);
    expect(decoded).toMatchObject({ valid: false, modelYear: null, checkDigit: null, vehicle: null });
    expect(decoded.problems[0]?.message).toContain('type the year by hand');
  });

  test('the places of the number: maker, home, plant and serial; a small maker owns six places', () => {
    expect(decodeVin('1ZZKR54296Z042366', LATEST).vehicle).toEqual({
      maker: '1ZZ',
      lowVolume: false,
      region: 'United States',
      plant: 'Z',
      serial: '042366',
    });
    // NHTSA, Outline for New Manufacturer Information, page 18: a low-volume maker.
    expect(decodeVin('1J9RP1A36A1644345', LATEST).vehicle).toMatchObject({ maker: '1J9 644', serial: '345' });
  });
});
