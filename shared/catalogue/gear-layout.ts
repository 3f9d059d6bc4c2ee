// How the gears of a family are laid out: tooth counts, what is joined, and what each gear holds and drives.
import { z } from 'zod';

const teeth = z.number().int().min(6).max(200);
const count = z.number().int().min(1).max(12);
/** 'front.sun': the set's name and the member of it. */
const member = z.string().regex(/^[a-z][a-z0-9]*\.[a-zA-Z]+$/);
const setName = z.string().regex(/^[a-z][a-z0-9]{0,11}$/);
const gearName = z.string().regex(/^([1-9]|R|L|H)$/);

const simpleSet = z.object({
  type: z.literal('simple'),
  name: setName,
  sun: teeth,
  ring: teeth,
  planet: teeth,
  planets: count,
});

/** Two suns on one carrier: the small one through short and long planets, the large one through the long planets. */
const ravigneauxSet = z.object({
  type: z.literal('ravigneaux'),
  name: setName,
  smallSun: teeth,
  largeSun: teeth,
  shortPlanet: teeth,
  longPlanet: teeth,
  ring: teeth,
  planets: count,
});

export const planetSet = z.discriminatedUnion('type', [simpleSet, ravigneauxSet]);
export type PlanetSet = z.infer<typeof planetSet>;

/** What the clutches, bands and one-way clutches do in one gear. */
export const powerStep = z.object({
  gear: gearName,
  /** Members turned by the input shaft. */
  drive: z.array(member).min(1),
  /** Members held still against the case. */
  hold: z.array(member),
  /** Members that a clutch joins in this gear only. */
  lock: z.array(z.tuple([member, member])),
});
export type PowerStep = z.infer<typeof powerStep>;

export const PLANETARY_LAYOUTS = [
  'simpson',
  'simpson_overdrive',
  'ravigneaux',
  'simple_ravigneaux',
  'three_row',
] as const;

export const LAYOUT_WORDS: Readonly<Record<(typeof PLANETARY_LAYOUTS)[number], string>> = {
  simpson: 'Two sets with one sun between them',
  simpson_overdrive: 'Two sets with one sun between them, then an overdrive set',
  ravigneaux: 'One set with two suns and long and short planets',
  simple_ravigneaux: 'A simple set ahead of a set with two suns',
  three_row: 'Three simple sets in a row',
};

export const planetaryGears = z.object({
  type: z.literal('planetary'),
  layout: z.enum(PLANETARY_LAYOUTS),
  sets: z.array(planetSet).min(1).max(4),
  /** Members that are one piece for good. */
  links: z.array(z.tuple([member, member])),
  output: member,
  steps: z.array(powerStep).min(1),
});
export type PlanetaryGears = z.infer<typeof planetaryGears>;

const gearPair = z.object({ gear: gearName, counter: teeth, main: teeth });

export const countershaftGears = z.object({
  type: z.literal('countershaft'),
  /** The constant-mesh pair that drives the countershaft. */
  input: teeth,
  counter: teeth,
  pairs: z.array(gearPair).min(2),
  /** The gear in which input and output are one shaft. */
  direct: gearName,
  reverse: z.object({ counter: teeth, idler: teeth, main: teeth }),
  /** Gears with a synchroniser; the rest slide. */
  synchronised: z.array(gearName),
});
export type CountershaftGears = z.infer<typeof countershaftGears>;

export const planetaryLow = z.object({
  type: z.literal('planetary_low'),
  sun: teeth,
  ring: teeth,
  planet: teeth,
  planets: count,
  /** Both sprockets of the chain to the front output; null where gears take it there. */
  sprocket: teeth.nullable(),
});
export type PlanetaryLow = z.infer<typeof planetaryLow>;

export const gearedLow = z.object({
  type: z.literal('geared_low'),
  /** The reduction in low: input to idler, idler to output. */
  input: teeth,
  idlerIn: teeth,
  idlerOut: teeth,
  output: teeth,
});
export type GearedLow = z.infer<typeof gearedLow>;

export const chainOnly = z.object({ type: z.literal('chain_only'), sprocket: teeth });

export const ringAndPinion = z.object({
  type: z.literal('ring_and_pinion'),
  ringGearMm: z.number().min(100).max(400),
  pairs: z.array(z.object({ ring: teeth, pinion: teeth })).min(1),
});
export type RingAndPinion = z.infer<typeof ringAndPinion>;

export const gears = z.discriminatedUnion('type', [
  planetaryGears,
  countershaftGears,
  planetaryLow,
  gearedLow,
  chainOnly,
  ringAndPinion,
]);
export type Gears = z.infer<typeof gears>;
