// Deduction schedules: what is refused in one, and what comes back of the deposit at each grade.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { faultsOf } from '../../shared/listings/condition';
import {
  exchangeTerms,
  returnByGrade,
  scheduleErrors,
  totalCents,
  type ExchangeTerms,
} from '../../shared/listings/terms';

const offer = (schedule: ExchangeTerms['schedule'], depositCents = 60_000): ExchangeTerms => ({
  depositCents,
  windowDays: 45,
  schedule,
  returnFreight: 'seller',
});

const LINES = [
  { code: 'pan', label: 'Pan missing', cents: 4_000 },
  { code: 'plug', label: 'Plug missing', cents: 3_000 },
  { code: 'converter', label: 'Converter missing', cents: 8_500 },
  { code: 'ears', label: 'Ear broken', cents: 24_000 },
  { code: 'no_hole', label: 'Hole in the case', cents: 60_000 },
];

describe('a schedule', () => {
  test('when every line is within the deposit and named once, then nothing is wrong with it', () => {
    expect(scheduleErrors(offer(LINES))).toEqual([]);
  });

  test('when a line is above the deposit, twice or nothing, then each is named by its place', () => {
    const errors = scheduleErrors(
      offer([
        { code: 'pan', label: 'Pan', cents: 60_001 },
        { code: 'pan', label: 'Pan again', cents: 100 },
        { code: 'plug', label: 'Plug', cents: 0 },
      ]),
    );
    expect(errors.map((error) => error.path)).toEqual([
      'terms.exchange.schedule.0.cents',
      'terms.exchange.schedule.1.code',
      'terms.exchange.schedule.2.cents',
    ]);
  });

  test('when the deposit is nothing, then it is refused', () => {
    expect(scheduleErrors(offer([], 0)).map((error) => error.path)).toContain('terms.exchange.depositCents');
  });

  test.each([6, 181, 30.5])('when the window is %d days, then it is not taken', (windowDays) => {
    expect(exchangeTerms.safeParse({ ...offer(LINES), windowDays }).success).toBe(false);
  });

  test.each([7, 180])('when the window is %d days, then it is taken', (windowDays) => {
    expect(exchangeTerms.safeParse({ ...offer(LINES), windowDays }).success).toBe(true);
  });
});

describe('what comes back by grade', () => {
  test('when the schedule has lines of each kind, then the examples follow from them to the cent', () => {
    expect(
      returnByGrade('automatic', offer(LINES)).map(({ grade, leastCents, mostCents }) => [
        grade,
        leastCents,
        mostCents,
      ]),
    ).toEqual([
      ['A', 60_000, 60_000],
      ['B', 44_500, 57_000],
      ['C', 20_500, 36_000],
      ['D', 0, 0],
    ]);
  });

  test('when lines come to more than the deposit, then nothing comes back, never less', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 200_000 }),
        fc.array(fc.integer({ min: 0, max: 10 }), { maxLength: 12 }),
        (depositCents, picks) => {
          const faults = faultsOf('automatic');
          const schedule = [...new Set(picks)].flatMap((pick) => {
            const fault = faults[pick % faults.length];
            return fault
              ? [{ code: fault.code, label: fault.fault, cents: Math.ceil(depositCents / (pick + 1)) }]
              : [];
          });
          const examples = returnByGrade('automatic', offer(schedule, depositCents));
          for (const example of examples) {
            expect(example.leastCents).toBeGreaterThanOrEqual(0);
            expect(example.mostCents).toBeLessThanOrEqual(depositCents);
            expect(example.leastCents).toBeLessThanOrEqual(example.mostCents);
          }
          const least = examples.map((example) => example.leastCents);
          expect(least).toEqual([...least].sort((a, b) => b - a));
        },
      ),
      { numRuns: 300, seed: 11 },
    );
  });
});

describe('what is paid today', () => {
  test('when it is an exchange, then price and deposit; outright only, then the outright price', () => {
    const base = { priceCents: 145_000, depositCents: 60_000, outrightCents: 198_000 };
    expect(totalCents({ ...base, exchange: true })).toBe(205_000);
    expect(totalCents({ ...base, exchange: false })).toBe(198_000);
    expect(totalCents({ ...base, exchange: false, outrightCents: null })).toBe(145_000);
  });
});
