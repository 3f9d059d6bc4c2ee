// Density and class against printed values, and a quote that follows weight, class and distance.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { classOf, densityPcf, quoteFreight } from '../../shared/listings/freight';

const pallet = (weightLb: number, lengthIn: number, widthIn: number, heightIn: number) => ({
  weightLb,
  lengthIn,
  widthIn,
  heightIn,
});

describe('density and class', () => {
  // centralfreight.com/densityCalc prints 31.11 ft3, 3.54 lb/ft3, class 250 for this load.
  test('when 110 lb stand on 48 x 40 x 28 in, then it is 3.54 lb/ft3 and class 250 as the carrier prints', () => {
    const pcf = densityPcf(pallet(110, 48, 40, 28));
    expect(pcf).toBeCloseTo(3.5357, 4);
    expect(classOf(pcf)).toBe(250);
  });

  // Lower bounds inclusive, upper exclusive: the density scale in force since 19 July 2025. Steps 11 to 13:
  // help.nmfta.org article 32790591446427; steps 1 to 10: vmeasure.ai (2025 density scale).
  test.each([
    [0.99, 400],
    [1, 300],
    [2, 250],
    [4, 175],
    [6, 125],
    [8, 100],
    [10, 92.5],
    [12, 85],
    [15, 70],
    [22.5, 65],
    [29.999, 65],
    [30, 60],
    [35, 55],
    [49.99, 55],
    [50, 50],
    [400, 50],
  ])('when the density is %d lb/ft3, then the class is %d', (pcf, freightClass) => {
    expect(classOf(pcf)).toBe(freightClass);
  });

  // Computed from the formula lb / (L x W x H / 1728); the last lies exactly on the edge of a class.
  test.each([
    [pallet(260, 48, 40, 36), 6.5, 125],
    [pallet(245, 40, 32, 30), 11.025, 92.5],
    [pallet(180, 36, 24, 24), 15, 70],
    [pallet(150, 30, 24, 20), 18, 70],
    [pallet(1_000, 48, 40, 30), 30, 60],
  ])('when %o ships, then it is %d lb/ft3 and class %d', (figures, pcf, freightClass) => {
    expect(densityPcf(figures)).toBeCloseTo(pcf, 9);
    expect(classOf(densityPcf(figures))).toBe(freightClass);
  });
});

describe('the quote', () => {
  const unit = pallet(245, 40, 32, 30);

  test('when 245 lb of class 92.5 go 600 miles, then base and hundredweight add up to the cent', () => {
    // 10,600 + 2.45 x 4,100 x 0.95 = 20,142.75, rounded up.
    expect(quoteFreight(unit, 600)).toMatchObject({ cents: 20_143, freightClass: 92.5, densityPcf: 11.03 });
  });

  test('when the distance is at the end of a band, then the band still counts', () => {
    expect(quoteFreight(unit, 100).cents).toBeLessThan(quoteFreight(unit, 100.001).cents);
    expect(quoteFreight(unit, 0).cents).toBe(quoteFreight(unit, 100).cents);
  });

  test('when it is farther or heavier at the same class, then it never costs less', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 6_000, noNaN: true }),
        fc.double({ min: 0, max: 6_000, noNaN: true }),
        fc.integer({ min: 1, max: 2_000 }),
        (a, b, weightLb) => {
          const figures = { ...unit, weightLb };
          const [near, far] = a < b ? [a, b] : [b, a];
          const quote = quoteFreight(figures, near);
          expect(quoteFreight(figures, far).cents).toBeGreaterThanOrEqual(quote.cents);
          expect(Number.isSafeInteger(quote.cents)).toBe(true);
        },
      ),
      { numRuns: 500, seed: 7 },
    );
  });

  test('when the distance is not a number of miles, then it throws', () => {
    expect(() => quoteFreight(unit, Number.NaN)).toThrow(RangeError);
    expect(() => quoteFreight(unit, -1)).toThrow(RangeError);
  });
});
