// Checks the solver against closed forms, printed ratios and an independent fraction library.
import Fraction from 'fraction.js';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fractionText, toNumber } from '../../shared/gearing/fraction';
import {
  assemblyWarnings,
  solveGearset,
  type Arrangement,
  type GearSet,
  type Turning,
} from '../../shared/gearing/gearset';
import { ASSEMBLY, PRINTED, RAVIGNEAUX, SIMPLE, SIMPSON } from './published';

const ratio = (turning: Turning): string =>
  turning.outcome === 'turns' ? fractionText(turning.ratio) : turning.outcome;

const simple = (sun: number, ring: number): GearSet => ({ type: 'simple', name: 'a', sun, ring });
const one = (sets: readonly GearSet[], rest: Partial<Arrangement>): Turning =>
  solveGearset({ sets, links: [], hold: [], drive: [], driven: 'a.carrier', ...rest });
const ofOne = (sun: number, ring: number, held: string, drive: string, driven: string): Turning =>
  one([simple(sun, ring)], { hold: [`a.${held}`], drive: [`a.${drive}`], driven: `a.${driven}` });

describe('a simple set', () => {
  const cases = SIMPLE.flatMap((one) =>
    Object.entries(one.ratios).map(([how, exact]) => ({ ...one, how, exact })),
  );
  test.each(cases)('$sun/$ring with $how is $exact', ({ sun, ring, how, exact }) => {
    const [held = '', rest = ''] = how.split(', ');
    const [drive = '', driven = ''] = rest.split(' > ');
    expect(ratio(ofOne(sun, ring, held, drive, driven))).toBe(exact);
  });

  test.each(PRINTED)('$sun/$ring is printed as $ratio ($source)', (printed) => {
    const turning = ofOne(printed.sun, printed.ring, printed.held, printed.drive, printed.driven);
    expect(turning.outcome === 'turns' && toNumber(turning.ratio)).toBeCloseTo(printed.ratio, printed.places);
  });

  test('for any teeth, the sun driving with the ring held is 1 + ring / sun, and backwards its inverse', () => {
    const teeth = fc.integer({ min: 8, max: 150 });
    fc.assert(
      fc.property(teeth, teeth, (sun, ring) => {
        const exact = new Fraction(ring, sun).add(1);
        expect(ratio(ofOne(sun, ring, 'ring', 'sun', 'carrier'))).toBe(exact.toFraction());
        expect(ratio(ofOne(sun, ring, 'ring', 'carrier', 'sun'))).toBe(exact.inverse().toFraction());
        expect(ratio(ofOne(sun, ring, 'carrier', 'sun', 'ring'))).toBe(new Fraction(-ring, sun).toFraction());
      }),
    );
  });

  test('when two members are joined, all turn as one', () => {
    const joined = one([simple(30, 72)], { links: [['a.sun', 'a.ring']], drive: ['a.sun'] });
    expect(ratio(joined)).toBe('1');
    expect(
      joined.outcome === 'turns' && Object.values(joined.speeds).map((s) => s && fractionText(s)),
    ).toEqual(['1', '1', '1']);
  });

  test('when nothing is held, it is neutral and no number is given', () => {
    expect(one([simple(30, 72)], { drive: ['a.sun'] }).outcome).toBe('neutral');
    expect(one([simple(30, 72)], { hold: ['a.ring'] }).outcome).toBe('neutral');
  });

  test('when two members are held and the third is driven, it locks', () => {
    expect(one([simple(30, 72)], { hold: ['a.sun', 'a.ring'], drive: ['a.carrier'] }).outcome).toBe('locked');
    expect(one([simple(30, 72)], { hold: ['a.sun'], drive: ['a.sun'] }).outcome).toBe('locked');
  });

  test('when the output is the member held, it stands still', () => {
    expect(ofOne(30, 72, 'ring', 'sun', 'ring').outcome).toBe('held');
  });

  test('a member that no set has is named', () => {
    expect(one([simple(30, 72)], { hold: ['b.sun'] })).toEqual({
      outcome: 'unknown_member',
      member: 'b.sun',
    });
  });

  test('the speeds keep the power: torques in the ratio sun : ring : -(sun + ring) do no work in sum', () => {
    const teeth = fc.integer({ min: 8, max: 150 });
    fc.assert(
      fc.property(teeth, teeth, (sun, ring) => {
        const turning = ofOne(sun, ring, 'ring', 'sun', 'carrier');
        if (turning.outcome !== 'turns') throw new Error('does not turn');
        const speed = (member: string): number => toNumber(turning.speeds[`a.${member}`] ?? { n: 0n, d: 1n });
        const power = sun * speed('sun') + ring * speed('ring') - (sun + ring) * speed('carrier');
        expect(Math.abs(power)).toBeLessThan(1e-9);
      }),
    );
  });
});

describe('two sets with one sun', () => {
  const simpson = (t: (typeof SIMPSON)[number], rest: Partial<Arrangement>): string =>
    ratio(
      one(
        [
          { type: 'simple', name: 'front', sun: t.frontSun, ring: t.frontRing },
          { type: 'simple', name: 'rear', sun: t.rearSun, ring: t.rearRing },
        ],
        {
          links: [
            ['front.sun', 'rear.sun'],
            ['front.carrier', 'rear.ring'],
          ],
          driven: 'front.carrier',
          ...rest,
        },
      ),
    );

  test.each(SIMPSON)('$frontSun/$frontRing and $rearSun/$rearRing ($source)', (t) => {
    expect(simpson(t, { hold: ['rear.carrier'], drive: ['front.ring'] })).toBe(t.ratios['1']);
    expect(simpson(t, { hold: ['front.sun'], drive: ['front.ring'] })).toBe(t.ratios['2']);
    expect(simpson(t, { drive: ['front.ring', 'front.sun'] })).toBe(t.ratios['3']);
    expect(simpson(t, { hold: ['rear.carrier'], drive: ['front.sun'] })).toBe(t.ratios.R);
  });
});

describe('a set with two suns', () => {
  const ravigneaux = (t: (typeof RAVIGNEAUX)[number], rest: Partial<Arrangement>): string =>
    ratio(
      one([{ type: 'ravigneaux', name: 'a', smallSun: t.smallSun, largeSun: t.largeSun, ring: t.ring }], {
        driven: 'a.ring',
        ...rest,
      }),
    );

  test.each(RAVIGNEAUX)('$smallSun, $largeSun and $ring ($source)', (t) => {
    expect(ravigneaux(t, { hold: ['a.carrier'], drive: ['a.smallSun'] })).toBe(t.ratios['1']);
    expect(ravigneaux(t, { hold: ['a.largeSun'], drive: ['a.smallSun'] })).toBe(t.ratios['2']);
    expect(ravigneaux(t, { drive: ['a.smallSun', 'a.largeSun'] })).toBe(t.ratios['3']);
    expect(ravigneaux(t, { hold: ['a.largeSun'], drive: ['a.carrier'] })).toBe(t.ratios['4']);
    expect(ravigneaux(t, { hold: ['a.carrier'], drive: ['a.largeSun'] })).toBe(t.ratios.R);
  });
});

describe('putting a set together', () => {
  test.each(ASSEMBLY)('$sun/$ring with $planets planets: $ok', ({ sun, ring, planets, ok }) => {
    expect(assemblyWarnings({ type: 'simple', name: 'a', sun, ring, planets }).length === 0).toBe(ok);
  });

  test('a set shifted in profile (sun 21, ring 108, planet 43) turns, with a warning', () => {
    const set: GearSet = { type: 'simple', name: 'a', sun: 21, ring: 108, planet: 43, planets: 3 };
    expect(assemblyWarnings(set)).toHaveLength(1);
    expect(ratio(one([set], { hold: ['a.ring'], drive: ['a.sun'] }))).toBe('43/7');
  });

  test('planets that touch are told: five of 30 teeth round a sun of 15', () => {
    const warnings = assemblyWarnings({ type: 'simple', name: 'a', sun: 15, ring: 75, planets: 5 });
    expect(warnings.join()).toContain('touch');
  });

  test('two suns: long planets and pairs must both divide', () => {
    const set = { type: 'ravigneaux', name: 'a', smallSun: 30, largeSun: 36, ring: 84 } as const;
    expect(assemblyWarnings({ ...set, planets: 3 })).toEqual([]);
    expect(assemblyWarnings({ ...set, planets: 4 })).toHaveLength(1);
    expect(assemblyWarnings({ ...set, smallSun: 31, planets: 3 })).toHaveLength(1);
  });
});
