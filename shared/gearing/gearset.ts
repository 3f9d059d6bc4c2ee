// Planetary gearsets as linear kinematics: one Willis row for each mesh, one row for each member held, driven or joined.
import { fraction, isZero, ONE, over, ZERO, type Fraction } from './fraction';
import { solveLinear, type Equation } from './linear';

export interface SimpleSet {
  readonly type: 'simple';
  readonly name: string;
  readonly sun: number;
  readonly ring: number;
  readonly planet?: number;
  readonly planets?: number;
}

/** Small sun through short and long planets, large sun through long planets only, one carrier, one ring. */
export interface RavigneauxSet {
  readonly type: 'ravigneaux';
  readonly name: string;
  readonly smallSun: number;
  readonly largeSun: number;
  readonly ring: number;
  readonly shortPlanet?: number;
  readonly longPlanet?: number;
  readonly planets?: number;
}

export type GearSet = SimpleSet | RavigneauxSet;

/** 'front.sun' */
export type Member = string;

export interface Arrangement {
  readonly sets: readonly GearSet[];
  /** Members joined, for good or by a clutch. */
  readonly links: readonly (readonly [Member, Member])[];
  readonly hold: readonly Member[];
  /** Members turned by the input; their speed is 1. */
  readonly drive: readonly Member[];
  readonly driven: Member;
}

export type Turning =
  | {
      readonly outcome: 'turns';
      /** Input speed over output speed; negative when the output turns backwards. */
      readonly ratio: Fraction;
      readonly direction: 'same' | 'opposite';
      /** Speed of each member, input = 1; null where nothing decides it. */
      readonly speeds: Readonly<Record<Member, Fraction | null>>;
    }
  /** Nothing decides the output's speed: it freewheels. */
  | { readonly outcome: 'neutral' }
  /** The output stands still while the input turns. */
  | { readonly outcome: 'held' }
  /** Two gears at once: no member can turn. */
  | { readonly outcome: 'locked' }
  | { readonly outcome: 'unknown_member'; readonly member: Member };

export function membersOf(set: GearSet): Member[] {
  const parts =
    set.type === 'simple' ? ['sun', 'carrier', 'ring'] : ['smallSun', 'largeSun', 'carrier', 'ring'];
  return parts.map((part) => `${set.name}.${part}`);
}

type Terms = Readonly<Record<Member, number>>;

/** Willis: `gear * (w - carrier) = sense * ring * (wRing - carrier)`, as coefficients that add up to 0. */
const willis = (name: string, gear: string, teeth: number, ring: number, sense: 1 | -1): Terms => ({
  [`${name}.${gear}`]: teeth,
  [`${name}.ring`]: -sense * ring,
  [`${name}.carrier`]: sense * ring - teeth,
});

/** One planet between turns the sense round, two in line turn it back. */
function meshRows(set: GearSet): Terms[] {
  if (set.type === 'simple') return [willis(set.name, 'sun', set.sun, set.ring, -1)];
  return [
    willis(set.name, 'smallSun', set.smallSun, set.ring, 1),
    willis(set.name, 'largeSun', set.largeSun, set.ring, -1),
  ];
}

function equationsOf(given: Arrangement, members: readonly Member[]): Equation[] {
  const row = (terms: Terms, is: Fraction): Equation => ({
    of: members.map((member) => fraction(terms[member] ?? 0)),
    is,
  });
  return [
    ...given.sets.flatMap(meshRows).map((terms) => row(terms, ZERO)),
    ...given.links.filter(([a, b]) => a !== b).map(([a, b]) => row({ [a]: 1, [b]: -1 }, ZERO)),
    ...given.hold.map((member) => row({ [member]: 1 }, ZERO)),
    ...given.drive.map((member) => row({ [member]: 1 }, ONE)),
  ];
}

/**
 * Works out the ratio and the speed of every member of one or more planetary sets.
 * Source of the rows: Willis' equation, `Zs * ws + Zr * wr = (Zs + Zr) * wc` for a simple set.
 * @returns the ratio as an exact fraction, or why there is none; nothing is thrown for a bad arrangement
 */
export function solveGearset(given: Arrangement): Turning {
  const members = given.sets.flatMap(membersOf);
  const named = [...given.links.flat(), ...given.hold, ...given.drive, given.driven];
  const stranger = named.find((member) => !members.includes(member));
  if (stranger !== undefined) return { outcome: 'unknown_member', member: stranger };
  const solution = solveLinear(equationsOf(given, members), members.length);
  if (solution.outcome === 'contradiction') return { outcome: 'locked' };
  const speeds = Object.fromEntries(
    members.map((member, index) => [member, solution.values[index] ?? null] as const),
  );
  const output = speeds[given.driven] ?? null;
  if (output === null || given.drive.length === 0) return { outcome: 'neutral' };
  if (isZero(output)) return { outcome: 'held' };
  const ratio = over(ONE, output);
  return { outcome: 'turns', ratio, direction: output.n > 0n ? 'same' : 'opposite', speeds };
}

const fitsRound = (teeth: number, planets: number): boolean => teeth % planets === 0;

function simpleWarnings(set: SimpleSet): string[] {
  const planet = set.planet ?? (set.ring - set.sun) / 2;
  const planets = set.planets ?? 3;
  const warnings: string[] = [];
  if (set.ring !== set.sun + 2 * planet || !Number.isInteger(planet))
    warnings.push(
      `${set.name}: ring ${set.ring} is not sun ${set.sun} and twice a planet of whole teeth; the gears must be shifted in profile`,
    );
  if (!fitsRound(set.sun + set.ring, planets))
    warnings.push(
      `${set.name}: ${set.sun} + ${set.ring} teeth do not divide by ${planets} planets, so they cannot be spaced evenly`,
    );
  if ((set.sun + planet) * Math.sin(Math.PI / planets) <= planet + 2)
    warnings.push(`${set.name}: ${planets} planets of ${planet} teeth touch each other`);
  return warnings;
}

function ravigneauxWarnings(set: RavigneauxSet): string[] {
  const long = set.longPlanet ?? (set.ring - set.largeSun) / 2;
  const planets = set.planets ?? 3;
  const warnings: string[] = [];
  if (set.ring !== set.largeSun + 2 * long || !Number.isInteger(long))
    warnings.push(
      `${set.name}: ring ${set.ring} is not large sun ${set.largeSun} and twice a long planet of whole teeth`,
    );
  if (!fitsRound(set.largeSun + set.ring, planets))
    warnings.push(
      `${set.name}: ${set.largeSun} + ${set.ring} teeth do not divide by ${planets} long planets`,
    );
  if (!fitsRound(set.ring - set.smallSun, planets))
    warnings.push(
      `${set.name}: ${set.ring} - ${set.smallSun} teeth do not divide by ${planets} pairs of planets`,
    );
  return warnings;
}

/**
 * What stands in the way of putting the set together: tooth rule, even spacing, planets that touch (textbook conditions,
 * from memory). A warning, never an error: gears shifted in profile break the tooth rule and run well.
 */
export const assemblyWarnings = (set: GearSet): string[] =>
  set.type === 'simple' ? simpleWarnings(set) : ravigneauxWarnings(set);
