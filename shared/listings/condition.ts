// The condition checklist of each kind of unit, and the grade that follows from its answers by a rule both sides can read.
import { z } from 'zod';
import { UNIT_KINDS, type UnitKind } from '../catalogue/kinds';

export type { UnitKind } from '../catalogue/kinds';

export const GRADES = ['A', 'B', 'C', 'D'] as const;
export type Grade = (typeof GRADES)[number];

export const answer = z.enum(['yes', 'no', 'unknown']);
export type Answer = z.infer<typeof answer>;
export const answers = z.record(z.string().regex(/^[a-z][a-z_]{1,39}$/), answer);
export type Answers = Partial<Record<string, Answer>>;

/**
 * What a "no" does: nothing to the grade, a small part missing (B), the case damaged but usable or a hard part in doubt
 * (C), not a core (D), or not to be sold at all.
 */
export type FaultEffect = 'none' | 'small_part' | 'case' | 'not_core' | 'refused';

export interface Question {
  readonly code: string;
  /** A statement that is good when true, so that "no" is always the fault. */
  readonly label: string;
  readonly hint: string;
  readonly effect: FaultEffect;
  /** The fault in words, as a deduction line prints it. */
  readonly fault: string;
  /** False where only yes or no will do. */
  readonly mayBeUnknown: boolean;
}

const question = (
  code: string,
  effect: FaultEffect,
  label: string,
  fault: string,
  hint = '',
  mayBeUnknown = true,
): Question => ({ code, label, hint, effect, fault, mayBeUnknown });

const NUMBER = question(
  'number_intact',
  'refused',
  'Identifying number in place, not removed or ground off',
  'Identifying number removed or ground off',
  'Look at the pad and the tag. A unit whose number was removed cannot be sold here (18 U.S.C. 511).',
  false,
);
const CODE = question(
  'family_matches',
  'not_core',
  'Family matches the code on the unit',
  'Not the family the code says',
  'Read the code from the unit, not from the windscreen.',
);
const ASSEMBLED = question(
  'assembled',
  'not_core',
  'In one piece, not apart in a box',
  'Apart in a box',
  '',
  false,
);
const NO_HOLE = question('no_hole', 'not_core', 'No hole through the case', 'Hole through the case');
const NO_WATER = question('no_water', 'not_core', 'No water or rust inside', 'Water or rust inside');
const THREADS = question(
  'threads',
  'case',
  'Mount, pan and cover threads hold',
  'Stripped thread',
  'Turn a bolt in by hand where one is out.',
);
const TURNS = question(
  'turns',
  'case',
  'Turns by hand',
  'Does not turn by hand',
  'Chock the wheels first where the unit is still in the vehicle.',
);
const DRAINED = question(
  'drained',
  'none',
  'Drained and every opening plugged',
  'Not drained',
  'Let it drip overnight. It must be dry before it ships.',
);

const CASE = question(
  'case_whole',
  'case',
  'Case whole: no crack, no weld',
  'Crack or weld in the case',
  'Worn clutches, seals and bearings are expected and no fault.',
);
const EARS = question('ears', 'case', 'All bellhousing ears whole', 'Bellhousing ear broken');
const PLUG = question('plug', 'small_part', 'Plug whole, pins straight', 'Plug missing or broken');

/** The checklists. Effects follow common practice of core buyers: what can be rebuilt, what is only missing, what is scrap. */
const CHECKLISTS: Readonly<Record<UnitKind, readonly Question[]>> = {
  automatic: [
    NUMBER,
    CODE,
    ASSEMBLED,
    CASE,
    EARS,
    NO_HOLE,
    NO_WATER,
    THREADS,
    TURNS,
    question('pan', 'small_part', 'Pan on', 'Pan missing'),
    PLUG,
    question(
      'converter',
      'small_part',
      'Converter on and strapped in',
      'Converter missing',
      'It slides out when the unit tips. Strap it before moving.',
    ),
    DRAINED,
  ],
  manual: [
    NUMBER,
    CODE,
    ASSEMBLED,
    CASE,
    EARS,
    NO_HOLE,
    NO_WATER,
    THREADS,
    TURNS,
    question('gears', 'case', 'Goes into every gear by hand', 'A gear does not go in'),
    question('shift_cover', 'small_part', 'Shift cover and lever on', 'Shift cover or lever missing'),
    question('fork', 'small_part', 'Clutch fork or slave on', 'Clutch fork or slave missing'),
    DRAINED,
  ],
  transfer_case: [
    NUMBER,
    CODE,
    ASSEMBLED,
    CASE,
    question('flange_face', 'case', 'Adapter face and studs whole', 'Adapter face or stud broken'),
    NO_HOLE,
    NO_WATER,
    THREADS,
    TURNS,
    question('ranges', 'case', 'Goes into high and low by hand', 'A range does not go in'),
    question('shift_motor', 'small_part', 'Shift motor or lever on', 'Shift motor or lever missing'),
    question('yokes', 'small_part', 'Both yokes or flanges on', 'Yoke or flange missing'),
    PLUG,
    DRAINED,
  ],
  axle: [
    NUMBER,
    CODE,
    ASSEMBLED,
    question('case_whole', 'case', 'Housing whole: no crack, no weld', 'Crack or weld in the housing'),
    question('tubes', 'case', 'Tubes straight, perches whole', 'Tube bent or perch torn'),
    NO_HOLE,
    NO_WATER,
    THREADS,
    TURNS,
    question('cover', 'small_part', 'Cover on', 'Cover missing'),
    question('yoke', 'small_part', 'Pinion yoke on', 'Pinion yoke missing'),
    question('shafts', 'small_part', 'Both shafts in', 'Shaft missing'),
    question('backing_plates', 'small_part', 'Backing plates on', 'Backing plate missing'),
    DRAINED,
  ],
};

/** The checklist of a kind, in the order it is worked through. */
export const checklist = (kind: UnitKind): readonly Question[] => CHECKLISTS[kind];

/** What a "no" to that question does to the grade; null where the kind has no such question. */
export const effectOf = (kind: UnitKind, code: string): FaultEffect | null =>
  CHECKLISTS[kind].find((candidate) => candidate.code === code)?.effect ?? null;

/** True where any kind asks it: a draft may hold answers before its kind is known. */
export const isQuestion = (code: string): boolean => UNIT_KINDS.some((kind) => effectOf(kind, code) !== null);

export const GRADE_RULES: Readonly<Record<Grade, string>> = {
  A: 'Complete: case whole, nothing missing, every check answered yes.',
  B: 'Small parts missing, or a check that could not be made. Case whole.',
  C: 'Case damaged but usable, or it does not turn or shift.',
  D: 'Not a core: wrong family, apart, holed, or water inside.',
};

export interface GradeResult {
  readonly grade: Grade;
  readonly rule: string;
  /** The questions that brought it there, in the checklist's order; empty for A. */
  readonly because: readonly { readonly code: string; readonly label: string }[];
}

const RANK: Readonly<Record<FaultEffect, number>> = {
  none: 0,
  small_part: 1,
  case: 2,
  not_core: 3,
  refused: 3,
};

function severity(one: Question, given: Answer | undefined): number {
  if (given === 'yes') return 0;
  if (given === 'no') return RANK[one.effect];
  // What was not looked at is not shown to be whole, so it cannot be an A; it is not held to be broken either.
  return one.effect === 'none' ? 0 : 1;
}

/**
 * The grade of a unit: the worst fault decides. A "no" never gives a better grade than a "yes" or "unknown" did, and an
 * answer left out counts as unknown.
 */
export function gradeOf(kind: UnitKind, given: Answers): GradeResult {
  const found = checklist(kind).map((one) => ({ one, level: severity(one, given[one.code]) }));
  const worst = Math.max(...found.map(({ level }) => level));
  const grade = GRADES[worst] ?? 'D';
  const because = found
    .filter(({ level }) => level === worst && worst > 0)
    .map(({ one }) => ({
      code: one.code,
      label: given[one.code] === 'no' ? one.fault : `${one.label}: not known`,
    }));
  return { grade, rule: GRADE_RULES[grade], because };
}

/** True where the answers say that the unit must not be sold (18 U.S.C. 511: identifying number removed). */
export const numberRemoved = (given: Answers): boolean => given['number_intact'] === 'no';

/** Deduction lines a seller can start from: every fault that touches the grade, with the words of the checklist. */
export const faultsOf = (kind: UnitKind): readonly Question[] =>
  checklist(kind).filter((one) => one.effect !== 'none' && one.effect !== 'refused');
