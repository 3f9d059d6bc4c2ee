// Ratios that are printed elsewhere, or follow exactly from the tooth counts, each with its source.

export interface SimpleCase {
  readonly sun: number;
  readonly ring: number;
  readonly planet: number;
  readonly ratios: Readonly<Record<string, string>>;
  readonly source: string;
}

/** Keys read 'held, driving > driven'. */
export const SIMPLE: readonly SimpleCase[] = [
  {
    sun: 30,
    ring: 72,
    planet: 21,
    ratios: {
      'ring, sun > carrier': '17/5',
      'ring, carrier > sun': '5/17',
      'sun, ring > carrier': '17/12',
      'sun, carrier > ring': '12/17',
      'carrier, sun > ring': '-12/5',
      'carrier, ring > sun': '-5/12',
    },
    source: 'science.howstuffworks.com/transport/engines-equipment/gear7.htm prints 3.4, 0.71, -2.4',
  },
  {
    sun: 21,
    ring: 108,
    planet: 43.5,
    ratios: {
      'ring, sun > carrier': '43/7',
      'ring, carrier > sun': '7/43',
      'sun, ring > carrier': '43/36',
      'sun, carrier > ring': '36/43',
      'carrier, sun > ring': '-36/7',
      'carrier, ring > sun': '-7/36',
    },
    source:
      'lecad.uni-lj.si/~leon/FS/PlanetryTransmissions/node8.html: ring fixed, sun 21, ring 108, 3 planets -> planet 43 (addendum-modified; (108-21)/2 = 43.5), printed ratio 6.14286',
  },
  {
    sun: 25,
    ring: 43,
    planet: 9,
    ratios: {
      'ring, sun > carrier': '68/25',
      'ring, carrier > sun': '25/68',
      'sun, ring > carrier': '68/43',
      'sun, carrier > ring': '43/68',
      'carrier, sun > ring': '-43/25',
      'carrier, ring > sun': '-25/43',
    },
    source: 'invented counts: 2.72 low range exactly, planet 9, 4 planets, (25+43)/4=17',
  },
  {
    sun: 18,
    ring: 54,
    planet: 18,
    ratios: {
      'ring, sun > carrier': '4',
      'ring, carrier > sun': '1/4',
      'sun, ring > carrier': '4/3',
      'sun, carrier > ring': '3/4',
      'carrier, sun > ring': '-3',
      'carrier, ring > sun': '-1/3',
    },
    source: 'invented counts: 4.00 low range, planet 18, 3 planets, 72/3=24',
  },
  {
    sun: 24,
    ring: 60,
    planet: 18,
    ratios: {
      'ring, sun > carrier': '7/2',
      'ring, carrier > sun': '2/7',
      'sun, ring > carrier': '7/5',
      'sun, carrier > ring': '5/7',
      'carrier, sun > ring': '-5/2',
      'carrier, ring > sun': '-2/5',
    },
    source: 'invented counts, worked by hand',
  },
];

export const SIMPSON = [
  {
    frontSun: 28,
    frontRing: 62,
    rearSun: 28,
    rearRing: 62,
    ratios: { '1': '76/31', '2': '45/31', '3': '1', R: '-31/14' },
    source: "worked by hand from Willis' equation, equal sets",
  },
  {
    frontSun: 30,
    frontRing: 70,
    rearSun: 30,
    rearRing: 70,
    ratios: { '1': '17/7', '2': '10/7', '3': '1', R: '-7/3' },
    source: "worked by hand from Willis' equation",
  },
  {
    frontSun: 30,
    frontRing: 70,
    rearSun: 34,
    rearRing: 66,
    ratios: { '1': '269/119', '2': '10/7', '3': '1', R: '-33/17' },
    source: "worked by hand from Willis' equation, unequal sets",
  },
] as const;

export const RAVIGNEAUX = [
  {
    smallSun: 30,
    largeSun: 36,
    ring: 72,
    ratios: { '1': '12/5', '2': '22/15', '3': '1', '4': '2/3', R: '-2' },
    source:
      'auto.howstuffworks.com/automatic-transmission9.htm prints 2.4, 1.47, 1.0, 0.67, -2.0 (reverse printed as 2.0:1 in the text, -2.0 in the table)',
  },
  {
    smallSun: 24,
    largeSun: 36,
    ring: 72,
    ratios: { '1': '3', '2': '5/3', '3': '1', '4': '2/3', R: '-2' },
    source: "worked by hand from Willis' equation",
  },
  {
    smallSun: 26,
    largeSun: 34,
    ring: 74,
    ratios: { '1': '37/13', '2': '185/117', '3': '1', '4': '37/54', R: '-37/17' },
    source: "worked by hand from Willis' equation",
  },
] as const;

/** Ratios as printed, rounded. */
export const PRINTED = [
  {
    sun: 30,
    ring: 72,
    held: 'ring',
    drive: 'sun',
    driven: 'carrier',
    ratio: 3.4,
    places: 2,
    source: 'science.howstuffworks.com, transport/engines-equipment/gear7',
  },
  {
    sun: 30,
    ring: 72,
    held: 'sun',
    drive: 'carrier',
    driven: 'ring',
    ratio: 0.71,
    places: 2,
    source: 'science.howstuffworks.com, transport/engines-equipment/gear7',
  },
  {
    sun: 30,
    ring: 72,
    held: 'carrier',
    drive: 'sun',
    driven: 'ring',
    ratio: -2.4,
    places: 2,
    source: 'science.howstuffworks.com, transport/engines-equipment/gear7',
  },
  {
    sun: 21,
    ring: 108,
    held: 'ring',
    drive: 'sun',
    driven: 'carrier',
    ratio: 6.14286,
    places: 5,
    source: 'lecad.uni-lj.si, PlanetryTransmissions/node8',
  },
] as const;

export const ASSEMBLY = [
  { sun: 25, ring: 43, planets: 4, ok: true, source: 'rule (S + R) / n whole and R = S + 2P (textbook)' },
  { sun: 18, ring: 54, planets: 3, ok: true, source: 'rule (S + R) / n whole and R = S + 2P (textbook)' },
  { sun: 30, ring: 72, planets: 3, ok: true, source: 'rule (S + R) / n whole and R = S + 2P (textbook)' },
  { sun: 30, ring: 72, planets: 4, ok: false, source: 'rule (S + R) / n whole and R = S + 2P (textbook)' },
  { sun: 24, ring: 60, planets: 3, ok: true, source: 'rule (S + R) / n whole and R = S + 2P (textbook)' },
  { sun: 24, ring: 61, planets: 5, ok: false, source: 'rule (S + R) / n whole and R = S + 2P (textbook)' },
] as const;
