import Holidays from 'date-holidays';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  addBusinessDays,
  addDays,
  daysBetween,
  endOfDay,
  federalHolidays,
  isBusinessDay,
  localDate,
} from '../../shared/kernel/calendar';

// Observed days of 5 U.S.C. 6103(a), with the weekend rule of 6103(b)(1) and Executive Order 11582 section 3.
const PUBLISHED: Readonly<Record<number, readonly string[]>> = {
  2026: [
    '2026-01-01',
    '2026-01-19',
    '2026-02-16',
    '2026-05-25',
    '2026-06-19',
    '2026-07-03',
    '2026-09-07',
    '2026-10-12',
    '2026-11-11',
    '2026-11-26',
    '2026-12-25',
  ],
  2028: [
    '2027-12-31',
    '2028-01-17',
    '2028-02-21',
    '2028-05-29',
    '2028-06-19',
    '2028-07-04',
    '2028-09-04',
    '2028-10-09',
    '2028-11-10',
    '2028-11-23',
    '2028-12-25',
  ],
};

describe('US federal holidays (5 U.S.C. 6103)', () => {
  test.each([2026, 2028])('%i as published', (year) => {
    expect(federalHolidays(year)).toEqual(PUBLISHED[year]);
  });

  test('agrees with date-holidays 3.37.0 from 2024 to 2033, save the two Veterans Days that library does not move', () => {
    const library = new Holidays('US');
    const known = new Set(['2028-11-10', '2029-11-12']);
    for (let year = 2024; year <= 2033; year += 1) {
      const theirs = new Set(
        [year - 1, year].flatMap((one) =>
          library
            .getHolidays(one, 'en')
            .filter((day) => day.type === 'public')
            .map((day) => day.date.slice(0, 10)),
        ),
      );
      for (const day of federalHolidays(year)) {
        if (!known.has(day)) expect(theirs, `${day} of ${year}`).toContain(day);
      }
    }
  });
});

describe('business days', () => {
  test.each([
    // New Year 2028 is observed on Friday 31 December 2027.
    ['2027-12-30', 2, '2028-01-04'],
    ['2026-07-02', 1, '2026-07-06'],
    ['2026-12-24', 1, '2026-12-28'],
    ['2026-03-06', 5, '2026-03-13'],
    ['2026-11-25', 1, '2026-11-27'],
  ])('%s plus %i is %s', (from, count, to) => {
    expect(addBusinessDays(from, count)).toBe(to);
  });

  test('the result is a business day and exactly that many lie between', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 3_000 }), fc.integer({ min: 1, max: 30 }), (offset, count) => {
        const from = addDays('2024-01-01', offset);
        const to = addBusinessDays(from, count);
        expect(isBusinessDay(to)).toBe(true);
        let counted = 0;
        for (let day = addDays(from, 1); day <= to; day = addDays(day, 1))
          if (isBusinessDay(day)) counted += 1;
        expect(counted).toBe(count);
      }),
      { numRuns: 200 },
    );
  });
});

describe('the end of a day in a zone', () => {
  // Computed with luxon 3.7.2 on tz database 2025c.
  test.each([
    ['2026-03-08', 'America/Chicago', '2026-03-09T04:59:59.999Z'],
    ['2026-11-01', 'America/Chicago', '2026-11-02T05:59:59.999Z'],
    ['2026-07-04', 'America/Phoenix', '2026-07-05T06:59:59.999Z'],
    ['2026-01-15', 'Pacific/Honolulu', '2026-01-16T09:59:59.999Z'],
  ])('%s in %s is %s', (day, zone, instant) => {
    expect(endOfDay(day, zone).toISOString()).toBe(instant);
  });

  test('it is still that day, and a millisecond later it is the next', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 3_000 }),
        fc.constantFrom(
          'America/New_York',
          'America/Chicago',
          'America/Denver',
          'America/Phoenix',
          'America/Los_Angeles',
        ),
        (offset, zone) => {
          const day = addDays('2024-01-01', offset);
          const end = endOfDay(day, zone);
          expect(localDate(end, zone)).toBe(day);
          expect(localDate(new Date(end.getTime() + 1), zone)).toBe(addDays(day, 1));
        },
      ),
    );
  });

  test('thirty days over the spring change are 719 hours', () => {
    const from = endOfDay('2026-02-20', 'America/Chicago');
    const to = endOfDay(addDays('2026-02-20', 30), 'America/Chicago');
    expect((to.getTime() - from.getTime()) / 3_600_000).toBe(719);
    expect(daysBetween('2026-02-20', '2026-03-22')).toBe(30);
  });
});
