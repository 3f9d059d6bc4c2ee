// Vehicle identification numbers: check digit and model year as 49 CFR 565.15 lays them down, each problem by name.

/** Letters to figures, 49 CFR 565.15(c) table III; I, O and Q are never used. */
const VALUES: Readonly<Record<string, number>> = {
  ...Object.fromEntries([...'0123456789'].map((figure) => [figure, Number(figure)])),
  ...{ A: 1, B: 2, C: 3, D: 4, E: 5, F: 6, G: 7, H: 8 },
  ...{ J: 1, K: 2, L: 3, M: 4, N: 5, P: 7, R: 9 },
  ...{ S: 2, T: 3, U: 4, V: 5, W: 6, X: 7, Y: 8, Z: 9 },
};

/** 49 CFR 565.15(c) table IV; position 9 is the check digit itself. */
const WEIGHTS = [8, 7, 6, 5, 4, 3, 2, 10, 0, 9, 8, 7, 6, 5, 4, 3, 2];

/** Position 10, 1980 to 2009 and again 2010 to 2039: 49 CFR 565.15 table VII (order from memory). */
const YEAR_CODES = 'ABCDEFGHJKLMNPRSTVWXY123456789';
const FIRST_YEAR = 1980;
const CYCLE_YEARS = 30;

const LENGTH = 17;
/** Only these are taken for one another without asking: the right-hand one is never used in a VIN. */
const LOOK_ALIKE: Readonly<Record<string, string>> = { O: '0', Q: '0', I: '1' };

export type VinProblemCode =
  'wrong_length' | 'illegal_character' | 'illegal_year' | 'wrong_check_digit' | 'illegal_check_digit';

export interface VinProblem {
  readonly code: VinProblemCode;
  readonly message: string;
  /** Counted from 1, as the standard does; null where it is about the whole. */
  readonly position: number | null;
}

/** What the places of the number say of the vehicle, without any maker's own tables. */
export interface VinVehicle {
  /** World manufacturer identifier, positions 1 to 3 (with 12 to 14 for a maker of fewer than 1,000 a year). */
  readonly maker: string;
  readonly lowVolume: boolean;
  /** Where the maker is at home, by position 1. */
  readonly region: string;
  readonly plant: string;
  readonly serial: string;
}

export interface DecodedVin {
  /** Upper case without spaces and hyphens. */
  readonly vin: string;
  readonly valid: boolean;
  readonly problems: readonly VinProblem[];
  /** Null where both cycles are possible, or the code is none. */
  readonly modelYear: number | null;
  /** Every year the code can mean. */
  readonly modelYears: readonly number[];
  /** What position 9 has to be; null where it can't be worked out. */
  readonly checkDigit: string | null;
  /** The same number with O and Q read as 0 and I as 1, where that makes it right. */
  readonly suggestion: string | null;
  /** Null unless there are 17 legal characters. */
  readonly vehicle: VinVehicle | null;
}

export const normaliseVin = (text: string): string => text.toUpperCase().replace(/[\s-]/g, '');

/**
 * Check digit of a 17-character VIN, whatever stands in position 9.
 * @returns '0' to '9' or 'X'; null for another length or an illegal character. Source: 49 CFR 565.15(c).
 */
export function vinCheckDigit(vin: string): string | null {
  if (vin.length !== LENGTH) return null;
  let sum = 0;
  for (const [index, character] of [...vin].entries()) {
    if (index === 8) continue;
    const value = VALUES[character];
    if (value === undefined) return null;
    sum += value * (WEIGHTS[index] ?? 0);
  }
  const rest = sum % 11;
  return rest === 10 ? 'X' : String(rest);
}

/** Both years a model-year letter or figure stands for; none for a character that is never used. */
export function vinModelYears(code: string): number[] {
  const place = code.length === 1 ? YEAR_CODES.indexOf(code) : -1;
  return place < 0 ? [] : [FIRST_YEAR + place, FIRST_YEAR + CYCLE_YEARS + place];
}

/**
 * Model year by the position-7 rule for cars and light trucks: a figure there means 1980 to 2009, a letter 2010 to 2039
 * (49 CFR 565.15(b), 73 FR 23367). It says nothing of heavy vehicles, buses, trailers and motorcycles, and a year that
 * has not come yet can't be right, so the other one is taken then.
 * @param latestYear the newest model year on sale
 */
export function vinModelYear(vin: string, latestYear: number): number | null {
  const years = vinModelYears(vin.charAt(9)).filter((year) => year <= latestYear);
  if (years.length <= 1) return years[0] ?? null;
  const [older, newer] = years;
  return (/\d/.test(vin.charAt(6)) ? older : newer) ?? null;
}

const problem = (code: VinProblemCode, message: string, position: number | null = null): VinProblem => ({
  code,
  message,
  position,
});

function characterProblems(vin: string): VinProblem[] {
  return [...vin].flatMap((character, index) => {
    if (VALUES[character] !== undefined) return [];
    const like = LOOK_ALIKE[character];
    const hint = like ? ` Is it ${like}?` : '';
    return [
      problem(
        'illegal_character',
        `${character} is never used in a VIN (position ${index + 1}).${hint}`,
        index + 1,
      ),
    ];
  });
}

function checkProblems(vin: string, checkDigit: string | null): VinProblem[] {
  const given = vin.charAt(8);
  if (checkDigit === null || given === checkDigit) return [];
  if (!/[\dX]/.test(given))
    return [
      problem(
        'illegal_check_digit',
        `Position 9 is a figure or X on vehicles for the US market, not ${given}.`,
        9,
      ),
    ];
  return [
    problem(
      'wrong_check_digit',
      `Position 9 is ${given} and should be ${checkDigit}: a character is misread, or the vehicle was not made for the US market.`,
      9,
    ),
  ];
}

/** O and Q for 0, I for 1; only offered where the number is right after it. */
function suggestionFor(vin: string): string | null {
  const folded = vin.replace(/[OQI]/g, (character) => LOOK_ALIKE[character] ?? character);
  return folded !== vin && vinCheckDigit(folded) === folded.charAt(8) ? folded : null;
}

/** Position 1, ISO 3780 (from memory). */
const REGIONS: readonly (readonly [RegExp, string])[] = [
  [/[145]/, 'United States'],
  [/2/, 'Canada'],
  [/3/, 'Mexico or Central America'],
  [/[67]/, 'Oceania'],
  [/[89]/, 'South America'],
  [/[A-H]/, 'Africa'],
  [/[J-R]/, 'Asia'],
  [/[S-Z]/, 'Europe'],
];

function vehicleOf(vin: string): VinVehicle {
  // A 9 in third place: a maker so small that positions 12 to 14 belong to its identifier (49 CFR 565.15(a)).
  const lowVolume = vin.charAt(2) === '9';
  return {
    maker: lowVolume ? `${vin.slice(0, 3)} ${vin.slice(11, 14)}` : vin.slice(0, 3),
    lowVolume,
    region: REGIONS.find(([first]) => first.test(vin.charAt(0)))?.[1] ?? 'Not known',
    plant: vin.charAt(10),
    serial: vin.slice(lowVolume ? 14 : 11),
  };
}

/**
 * Takes a VIN apart as far as the number itself tells: check digit and model year. Nothing is refused: a vehicle from
 * abroad or from before 1981 has no check digit to be wrong.
 * @param latestYear the newest model year on sale
 */
export function decodeVin(text: string, latestYear: number): DecodedVin {
  const vin = normaliseVin(text);
  const checkDigit = vinCheckDigit(vin);
  const modelYears = vin.length === LENGTH ? vinModelYears(vin.charAt(9)) : [];
  const illegal = characterProblems(vin);
  const problems = [
    ...(vin.length === LENGTH
      ? []
      : [
          problem(
            'wrong_length',
            `A VIN has ${LENGTH} characters since model year 1981; this has ${vin.length}. Before that, type the year by hand.`,
          ),
        ]),
    ...illegal,
    ...(vin.length === LENGTH && illegal.length === 0 && modelYears.length === 0
      ? [problem('illegal_year', `${vin.charAt(9)} is never a model year (position 10).`, 10)]
      : []),
    ...checkProblems(vin, checkDigit),
  ];
  return {
    vin,
    valid: problems.length === 0,
    problems,
    modelYear: modelYears.length > 0 ? vinModelYear(vin, latestYear) : null,
    modelYears: modelYears.filter((year) => year <= latestYear),
    checkDigit,
    suggestion: suggestionFor(vin),
    vehicle: checkDigit === null ? null : vehicleOf(vin),
  };
}
