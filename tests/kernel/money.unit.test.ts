import codes from 'currency-codes';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { allocate, formatCents, parseDollars, shareOf } from '../../shared/kernel/money';

describe('a share in basis points', () => {
  test.each([
    // Worked halves: half to even as IEEE 754 roundTiesToEven.
    [980, 250, 24],
    [100, 250, 2],
    [1020, 250, 26],
    [145_000, 600, 8_700],
    [0, 600, 0],
  ])('of %i cents at %i bps is %i', (cents, bps, expected) => {
    expect(shareOf(cents, bps)).toBe(expected);
  });

  test('never leaves the range of 0 to the amount, for whole cents', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 100_000_000 }),
        fc.integer({ min: 0, max: 10_000 }),
        (cents, bps) => {
          const share = shareOf(cents, bps);
          expect(share).toBeGreaterThanOrEqual(0);
          expect(share).toBeLessThanOrEqual(cents);
          expect(Math.abs(share - (cents * bps) / 10_000)).toBeLessThanOrEqual(0.5);
        },
      ),
    );
  });

  test('refuses fractions and negatives', () => {
    expect(() => shareOf(1.5, 100)).toThrow(RangeError);
    expect(() => shareOf(-1, 100)).toThrow(RangeError);
  });
});

describe('splitting by the largest remainder (Hamilton)', () => {
  test.each([
    [5, [3, 7], [2, 3]],
    [29_999, [60, 25, 15], [17_999, 7_500, 4_500]],
    [10, [1, 2, 3, 1], [2, 3, 4, 1]],
    [100, [1, 1, 1], [34, 33, 33]],
    // Textbook apportionment of 10 seats (Hamilton's method).
    [10, [47_000, 16_000, 15_900, 12_000, 6_000, 3_100], [5, 2, 1, 1, 1, 0]],
  ])('%i by %j is %j', (amount, weights, shares) => {
    expect(allocate(amount, weights)).toEqual(shares);
  });

  test('loses no cent and keeps every share within a cent of exact', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 10_000_000 }),
        fc
          .array(fc.integer({ min: 0, max: 1_000 }), { minLength: 1, maxLength: 12 })
          .filter((w) => w.some((x) => x > 0)),
        (amount, weights) => {
          const shares = allocate(amount, weights);
          const sum = weights.reduce((a, b) => a + b, 0);
          expect(shares.reduce((a, b) => a + b, 0)).toBe(amount);
          shares.forEach((share, i) =>
            expect(Math.abs(share - (amount * (weights[i] ?? 0)) / sum)).toBeLessThan(1),
          );
        },
      ),
    );
  });

  test('refuses an empty list, weights of nothing and negatives', () => {
    expect(() => allocate(1, [])).toThrow(RangeError);
    expect(() => allocate(1, [0, 0])).toThrow(RangeError);
    expect(() => allocate(1, [-1, 2])).toThrow(RangeError);
  });
});

describe('dollars as people read and type them', () => {
  test.each([
    [0, '$0.00'],
    [5, '$0.05'],
    [145_000, '$1,450.00'],
    [123_456_789, '$1,234,567.89'],
    [-6_000, '\u2212$60.00'],
  ])('%i cents read %s', (cents, text) => {
    expect(formatCents(cents)).toBe(text);
  });

  test.each([
    ['1450', 145_000],
    ['$1,450.5', 145_050],
    ['0.285', null],
    ['1.005', null],
    ['12,34', null],
    ['', null],
    ['-5', null],
  ])('"%s" is %s', (text, cents) => {
    expect(parseDollars(text)).toBe(cents);
  });

  test('two decimals are what ISO 4217 says of the US dollar (currency-codes, list of 2024-06-25)', () => {
    expect(codes.code('USD')?.digits).toBe(2);
  });

  test('what is written can be read back', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 100_000_000 }), (cents) => {
        expect(parseDollars(formatCents(cents))).toBe(cents);
      }),
    );
  });
});
