// The receiving desk: which checks there are, what a no costs, and that the sums come out to the cent.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { UNIT_KINDS } from '../../shared/catalogue/kinds';
import { checklist } from '../../shared/listings/condition';
import { deskChecks, deskResult, type DeskAnswers } from '../../src/orders/view/desk-checks';

const SCHEDULE = [
  { code: 'pan', label: 'Pan missing', cents: 4_000 },
  { code: 'plug', label: 'Plug broken', cents: 3_000 },
  { code: 'case_whole', label: 'Case cracked', cents: 40_000 },
  { code: 'painted', label: 'Painted over', cents: 1_500 },
];
const DEPOSIT = 60_000;

const desk = (answers: DeskAnswers, kind: 'automatic' | null = 'automatic') =>
  deskResult({ kind, schedule: SCHEDULE, depositCents: DEPOSIT, answers });

const allYes: DeskAnswers = Object.fromEntries(
  deskChecks('automatic', SCHEDULE).map((one) => [one.code, 'yes']),
);

describe('the checks of the desk', () => {
  it('when the kind is known, then its checklist is asked, then the seller’s own lines, each once', () => {
    const codes = deskChecks('automatic', SCHEDULE).map((one) => one.code);
    expect(new Set(codes).size).toBe(codes.length);
    expect(codes.at(-1)).toBe('painted');
    expect(codes).toEqual(expect.arrayContaining(['family_matches', 'case_whole', 'pan', 'plug']));
  });

  it('when a check stands in the schedule, then a no costs what the schedule says; otherwise nothing', () => {
    const cost = (code: string) =>
      deskChecks('automatic', SCHEDULE).find((one) => one.code === code)?.costCents;
    expect([cost('pan'), cost('ears'), cost('painted')]).toEqual([4_000, 0, 1_500]);
  });

  it('when the kind is not known any more, then every line of the schedule is still checked', () => {
    expect(deskChecks(null, SCHEDULE).map((one) => one.costCents)).toEqual([4_000, 3_000, 40_000, 1_500]);
  });
});

describe('grade and sums', () => {
  it('when all is well, then it is an A and the whole deposit goes back', () => {
    expect(desk(allYes)).toMatchObject({ grade: 'A', toBuilderCents: 60_000, toSellerCents: 0, open: [] });
  });

  it('when pan and plug are wanting, then it is a B and $530.00 go back', () => {
    const result = desk({ ...allYes, pan: 'no', plug: 'no' });
    expect(result).toMatchObject({ grade: 'B', toBuilderCents: 53_000, toSellerCents: 7_000 });
    expect(result.because).toEqual(['Pan missing', 'Plug broken']);
  });

  it('when the case is cracked, then it is a C', () => {
    expect(desk({ ...allYes, case_whole: 'no' })).toMatchObject({ grade: 'C', toSellerCents: 40_000 });
  });

  it('when it is the wrong family, then it is a D, and without a line in the terms nothing is taken off', () => {
    expect(desk({ ...allYes, family_matches: 'no' })).toMatchObject({ grade: 'D', toSellerCents: 0 });
  });

  it('when only a line of the seller’s own is found, then it is no A', () => {
    expect(desk({ ...allYes, painted: 'no' })).toMatchObject({ grade: 'B', toSellerCents: 1_500 });
  });

  it('when nothing is answered, then every check is open', () => {
    expect(desk({}).open).toHaveLength(deskChecks('automatic', SCHEDULE).length);
  });

  it('when any answers are given on any kind, then the two parts are the deposit to the cent and never negative', () => {
    const answer = fc.constantFrom('yes' as const, 'no' as const);
    fc.assert(
      fc.property(
        fc.constantFrom(...UNIT_KINDS),
        fc.integer({ min: 0, max: 500_000 }),
        fc.array(fc.integer({ min: 1, max: 400_000 }), { maxLength: 8 }),
        fc.array(answer, { minLength: 30, maxLength: 30 }),
        (kind, depositCents, costs, given) => {
          const questions = checklist(kind);
          const schedule = costs.map((cents, index) => ({
            code: questions[index]?.code ?? `own_${index}`,
            label: `Fault ${index}`,
            cents,
          }));
          const answers = Object.fromEntries(
            deskChecks(kind, schedule).map((check, index) => [check.code, given[index]]),
          );
          const result = deskResult({ kind, schedule, depositCents, answers });
          expect(result.toBuilderCents + result.toSellerCents).toBe(depositCents);
          expect(Math.min(result.toBuilderCents, result.toSellerCents)).toBeGreaterThanOrEqual(0);
        },
      ),
    );
  });
});
