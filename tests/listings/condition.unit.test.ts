// The grade follows from the checklist, and one more fault never makes it better.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { UNIT_KINDS, type UnitKind } from '../../shared/catalogue/kinds';
import {
  checklist,
  effectOf,
  GRADES,
  gradeOf,
  numberRemoved,
  type Answer,
  type Answers,
} from '../../shared/listings/condition';
import { hazards } from '../../shared/listings/hazards';

const allYes = (kind: UnitKind): Answers =>
  Object.fromEntries(checklist(kind).map((question) => [question.code, 'yes' as const]));

const kindAndAnswers = fc.constantFrom(...UNIT_KINDS).chain((kind) =>
  fc
    .tuple(
      ...checklist(kind).map(() => fc.constantFrom<Answer | undefined>('yes', 'no', 'unknown', undefined)),
    )
    .map((values) => {
      const answers: Answers = {};
      checklist(kind).forEach((question, index) => {
        const value = values[index];
        if (value) answers[question.code] = value;
      });
      return { kind, answers };
    }),
);

describe('the grade', () => {
  test.each(UNIT_KINDS)(
    'when every check of a %s is answered yes, then it is A with nothing against it',
    (kind) => {
      expect(gradeOf(kind, allYes(kind))).toMatchObject({ grade: 'A', because: [] });
    },
  );

  test.each([
    ['pan', 'B', 'Pan missing'],
    ['converter', 'B', 'Converter missing'],
    ['ears', 'C', 'Bellhousing ear broken'],
    ['turns', 'C', 'Does not turn by hand'],
    ['no_hole', 'D', 'Hole through the case'],
    ['family_matches', 'D', 'Not the family the code says'],
  ])('when only %s fails, then an automatic is %s and says why', (code, grade, label) => {
    expect(gradeOf('automatic', { ...allYes('automatic'), [code]: 'no' })).toMatchObject({
      grade,
      because: [{ code, label }],
    });
  });

  test('when small parts and an ear are missing, then the ear decides and only the ear is named', () => {
    const result = gradeOf('automatic', { ...allYes('automatic'), pan: 'no', plug: 'no', ears: 'no' });
    expect(result.grade).toBe('C');
    expect(result.because.map((one) => one.code)).toEqual(['ears']);
  });

  test('when a check could not be made, then it is not an A, and it says what is not known', () => {
    const result = gradeOf('axle', { ...allYes('axle'), shafts: 'unknown' });
    expect(result).toMatchObject({
      grade: 'B',
      because: [{ code: 'shafts', label: 'Both shafts in: not known' }],
    });
  });

  test('when it was not drained, then the grade stays: that is work, not damage', () => {
    expect(gradeOf('manual', { ...allYes('manual'), drained: 'no' }).grade).toBe('A');
  });

  test('when one more check fails, then the grade never gets better', () => {
    fc.assert(
      fc.property(kindAndAnswers, fc.nat(), ({ kind, answers }, pick) => {
        const questions = checklist(kind);
        const code = questions[pick % questions.length]?.code ?? '';
        const before = GRADES.indexOf(gradeOf(kind, answers).grade);
        const after = GRADES.indexOf(gradeOf(kind, { ...answers, [code]: 'no' }).grade);
        expect(after).toBeGreaterThanOrEqual(before);
      }),
      { numRuns: 2_000, seed: 20_261_201 },
    );
  });

  test('when a doubt is cleared to yes, then the grade never gets worse', () => {
    fc.assert(
      fc.property(kindAndAnswers, fc.nat(), ({ kind, answers }, pick) => {
        const questions = checklist(kind);
        const code = questions[pick % questions.length]?.code ?? '';
        const before = GRADES.indexOf(gradeOf(kind, answers).grade);
        const after = GRADES.indexOf(gradeOf(kind, { ...answers, [code]: 'yes' }).grade);
        expect(after).toBeLessThanOrEqual(before);
      }),
      { numRuns: 2_000, seed: 20_261_202 },
    );
  });
});

describe('the checklist', () => {
  test.each(UNIT_KINDS)('when a %s is checked, then codes are unique and the number comes first', (kind) => {
    const codes = checklist(kind).map((question) => question.code);
    expect(new Set(codes).size).toBe(codes.length);
    expect(codes[0]).toBe('number_intact');
    expect(effectOf(kind, 'number_intact')).toBe('refused');
  });

  test('when the number was ground off, then it is known as a unit not to be sold', () => {
    expect(numberRemoved({ number_intact: 'no' })).toBe(true);
    expect(numberRemoved({ number_intact: 'yes' })).toBe(false);
  });

  test('when a unit is in the vehicle and not drained, then stands and fluid are warned of', () => {
    const words = hazards('automatic', 'in_vehicle', { drained: 'unknown' }).join(' ');
    expect(words).toMatch(/stands/);
    expect(words).toMatch(/used oil/);
    expect(words).toMatch(/converter can slide out/i);
    expect(hazards('axle', 'pulled', { drained: 'yes' }).join(' ')).not.toMatch(/stands|used oil|converter/);
  });
});
