// The exact reader of case codes against the demo's code book, and its rules on a small one.
import { describe, expect, test } from 'vitest';
import { readDemoCatalogue } from '../../server/demo/catalogue';
import type { CodePattern } from '../../shared/catalogue/code-pattern';
import type { Variant } from '../../shared/catalogue/variant';
import { composeCode } from '../../shared/reading/compose-code';
import { codeBook, readCode, type BookEntry } from '../../shared/reading/read-code';
import { checkCharacter } from '../../shared/reading/segment-text';

const { families, variants } = readDemoCatalogue();
const book = codeBook(families, variants);

/** A stream of numbers that is the same in every run. */
function picker(seed: number): (choices: readonly string[]) => string {
  let state = seed;
  return (choices) => {
    state = (Math.imul(state, 1_103_515_245) + 12_345) >>> 0;
    return choices[Math.floor((state / 2 ** 32) * choices.length)] ?? '';
  };
}

const DAY_MS = 86_400_000;
const dayIn = (variant: Variant, share: number): string => {
  const from = Date.parse(variant.builtFrom);
  const days = Math.floor((Date.parse(variant.builtTo) - from) / DAY_MS);
  return new Date(from + Math.floor(days * share) * DAY_MS).toISOString().slice(0, 10);
};

const samples = (where: readonly CodePattern['where'][]) =>
  variants.flatMap((variant, index) =>
    variant.codePatterns
      .filter((pattern) => where.includes(pattern.where))
      .flatMap((pattern) =>
        [0, 0.31, 0.62, 1].map((share, step) => {
          const builtOn = dayIn(variant, share);
          const code = composeCode(pattern, { builtOn, pick: picker(index * 17 + step) });
          return { variant, pattern, builtOn, code };
        }),
      ),
  );

const showsDay = (pattern: CodePattern): boolean =>
  pattern.segments.some((segment) => segment.kind === 'day_of_year');

describe('codes of the whole catalogue', () => {
  test('a code stamped on the rail or printed on the tag names its one variant for sure', () => {
    const all = samples(['rail', 'tag']);
    expect(all.length).toBeGreaterThan(800);
    const wrong = all.filter(({ code, variant }) => {
      const { verdict, candidates } = readCode(code, book);
      return verdict !== 'sure' || candidates[0]?.variantId !== variant.id;
    });
    expect(wrong.map(({ code, variant }) => `${code} of ${variant.id}`)).toEqual([]);
  });

  test('its build date is the day it was stamped, or not told where ten years make it two days', () => {
    const dated = samples(['rail', 'tag']).filter(({ pattern }) => showsDay(pattern));
    const read = dated.map(({ code, builtOn }) => ({
      builtOn,
      read: readCode(code, book).candidates[0]?.builtOn,
    }));
    expect(read.filter(({ builtOn, read }) => read !== null && read !== builtOn)).toEqual([]);
    expect(read.filter(({ read }) => read === null).length).toBeLessThan(read.length * 0.15);
  });

  test('a cast number names the family, and says that it cannot tell its variants apart', () => {
    for (const { code, variant } of samples(['cast'])) {
      const { candidates } = readCode(code, book);
      expect(candidates.map((one) => one.variantId)).toContain(variant.id);
      expect(new Set(candidates.map((one) => one.familyId)), code).toEqual(new Set([variant.familyId]));
    }
  });

  test('one lost character never loses the right variant', () => {
    for (const { code, variant } of samples(['rail', 'tag']).filter((_, index) => index % 7 === 0)) {
      const text = code.replaceAll(' ', '');
      for (let index = 0; index < text.length; index += 1) {
        const worn = `${text.slice(0, index)}?${text.slice(index + 1)}`;
        const { candidates, verdict } = readCode(worn, book);
        expect(
          candidates.map((one) => one.variantId),
          worn,
        ).toContain(variant.id);
        expect(verdict, worn).not.toBe('sure');
      }
    }
  });
});

describe('the code of the Keld 66A', () => {
  const keld = (text: string, options = {}) => readCode(text, book, options);

  test('is taken apart segment by segment', () => {
    expect(keld('K66A 4X D9 09147 03')).toEqual({
      verdict: 'sure',
      whole: true,
      candidates: [
        {
          variantId: 'keld-66a-4x4-d9-late',
          familyId: 'keld-66a',
          label: 'Keld 66A, 4x4, D9 bell, 16-pin plug',
          probability: 1,
          builtOn: '2009-05-27',
          segments: [
            { name: 'Family', value: 'K66A', meaning: 'Keld 66A, six-speed automatic' },
            { name: 'Output', value: '4X', meaning: 'Four-wheel-drive output, 31-spline' },
            { name: 'Bell', value: 'D9', meaning: 'D9 pattern, nine bolts' },
            { name: 'Year', value: '09', meaning: 'Built in 2009' },
            { name: 'Day', value: '147', meaning: 'Built on 27 May' },
            { name: 'Change', value: '03', meaning: 'Level 03, late pump' },
          ],
          assumed: [],
          conflicts: [],
        },
      ],
    });
  });

  test.each(['k66a4xd90914703', ' K66A-4X-D9-09147-03 ', 'k66a.4x.d9.09147.03'])(
    'typed as "%s" reads the same',
    (text) => {
      expect(keld(text)).toEqual(keld('K66A 4X D9 09147 03'));
    },
  );

  test('the day before the mid-year change it is the early variant', () => {
    // Day 120 of 2009 is 30 April: the last day of the 14-pin plug.
    expect(keld('K66A 4X D9 09120 02').candidates[0]?.variantId).toBe('keld-66a-4x4-d9-early');
    expect(keld('K66A 4X D9 09121 03').candidates[0]?.variantId).toBe('keld-66a-4x4-d9-late');
    expect(keld('K66A 4X D9 09121 02').candidates).toEqual([]);
  });

  test('a lost character that only one thing can be is filled in and said', () => {
    const { candidates, verdict } = keld('K66A 4? D9 09147 03');
    expect(verdict).toBe('likely');
    expect(candidates[0]?.assumed).toEqual([
      {
        index: 5,
        read: '?',
        took: 'X',
        why: 'Nothing else can stand here: Four-wheel-drive output, 31-spline',
      },
    ]);
  });

  test('a lost output leaves both, evenly, and no verdict', () => {
    const { candidates, verdict } = keld('K66A ?? D9 09147 03');
    expect(verdict).toBe('cannot_tell');
    expect(candidates.map((one) => [one.variantId, one.probability])).toEqual([
      ['keld-66a-4x4-d9-late', 0.5],
      ['keld-66a-4x2-d9-late', 0.5],
    ]);
  });

  test('a lost figure of the day leaves the date open', () => {
    const [found] = keld('K66A 4X D9 09?47 03').candidates;
    expect(found?.builtOn).toBeNull();
    expect(found?.segments.find((segment) => segment.name === 'Day')).toEqual({
      name: 'Day',
      value: '?47',
      meaning: 'One of 3 days',
    });
  });

  test('day 366 is a day of leap years only', () => {
    expect(keld('K66A 4X D9 08366 02').candidates[0]?.builtOn).toBe('2008-12-31');
    expect(keld('K66A 4X D9 07366 02').candidates).toEqual([]);
  });

  test('a code that stops early is read as far as it goes, never for sure', () => {
    const { candidates, verdict, whole } = keld('K66A 4X D9');
    expect({ verdict, whole }).toEqual({ verdict: 'cannot_tell', whole: false });
    expect(candidates.map((one) => one.variantId)).toEqual(['keld-66a-4x4-d9-early', 'keld-66a-4x4-d9-late']);
    expect(candidates[0]?.segments.map((segment) => segment.name)).toEqual(['Family', 'Output', 'Bell']);
    expect(keld('K66A 4X D9 0914').verdict).toBe('likely');
  });

  test('too little, too much or nothing known is no reading', () => {
    for (const text of ['K6', '???????????????', 'K66A4XD90914703X', 'B4CKP0RCH', ''])
      expect(keld(text), text).toEqual({ candidates: [], verdict: 'cannot_tell', whole: false });
  });

  test('another kind of unit is left out when the kind is known', () => {
    expect(keld('K66A 4X D9 09147 03', { kind: 'manual' }).candidates).toEqual([]);
    expect(keld('K66A 4X D9 09147 03', { kind: 'automatic' }).verdict).toBe('sure');
  });

  test('the stamp counts against the donor, and the conflict is said', () => {
    expect(keld('K66A 4X D9 09147 03', { donorYear: 2010 }).candidates[0]?.conflicts).toEqual([]);
    const older = keld('K66A 4X D9 09147 03', { donorYear: 2006 });
    expect(older.verdict).toBe('sure');
    expect(older.candidates[0]?.conflicts.join(' ')).toContain('built in 2009, after a 2006 vehicle');
    const newer = keld('K66A 4X D9 09147 03', { donorYear: 2019 }).candidates[0]?.conflicts.join(' ');
    expect(newer).toContain('donor is a 2019');
    expect(newer).toContain('long before a 2019 vehicle');
  });
});

describe('the check figure', () => {
  const entry: BookEntry = {
    variantId: 'v1',
    familyId: 'f1',
    kind: 'axle',
    label: 'One',
    modelYears: { from: 2000, to: 2004 },
    builtFrom: '2000-01-01',
    builtTo: '2004-12-31',
    codePatterns: [
      {
        where: 'tag',
        mark: 'printed',
        segments: [
          {
            name: 'Family',
            kind: 'literal',
            length: 2,
            alphabet: 'alphanumeric',
            values: { A1: 'One' },
            gap: false,
          },
          { name: 'Serial', kind: 'serial', length: 3, alphabet: 'digits', gap: false },
          { name: 'Check', kind: 'check', length: 1, alphabet: 'digits', gap: false },
        ],
      },
    ],
  };

  test('weighs each place: A1 427 makes 1 * 10 + 2 * 1 + 3 * 4 + 4 * 2 + 5 * 7 = 67, so 7', () => {
    expect(checkCharacter('A1427', 'digits')).toBe('7');
    expect(readCode('A1 4277', [entry]).verdict).toBe('sure');
  });

  test('a wrong one is no reading, a lost one is worked out, and with a lost serial it is not checked', () => {
    expect(readCode('A1 4278', [entry]).candidates).toEqual([]);
    expect(readCode('A1 427?', [entry]).candidates[0]?.assumed[0]).toMatchObject({ index: 5, took: '7' });
    expect(readCode('A1 4?77', [entry]).candidates[0]?.segments[2]?.meaning).toBe(
      'Check figure, not checked',
    );
  });
});
