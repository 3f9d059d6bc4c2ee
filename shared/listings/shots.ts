// The shot list of each kind of unit: nine pictures in a fixed order, taken again when the old unit comes back.
import { UNIT_KINDS, type UnitKind } from '../catalogue/kinds';
import { effectOf, type Answers } from './condition';

export interface Shot {
  readonly code: string;
  readonly number: number;
  readonly name: string;
  /** At most eight words: it's read with gloves on. */
  readonly instruction: string;
  /** Needed to publish a pulled unit. */
  readonly required: boolean;
  /** Can be reached, and is needed, while the unit is still in the vehicle. */
  readonly inVehicle: boolean;
}

type Entry = readonly [
  code: string,
  name: string,
  instruction: string,
  need: 'always' | 'pulled' | 'optional',
];

const LEFT: Entry = ['left', 'Left side', 'Whole unit, square on. Step back.', 'pulled'];
const RIGHT: Entry = ['right', 'Right side', 'Whole unit, square on. Step back.', 'pulled'];
const BELL: Entry = ['bell', 'Bell face', 'Fill the ring. Show every ear.', 'pulled'];
const CODE: Entry = ['code', 'Code pad', 'Wipe it. Light from the side.', 'always'];
const DAMAGE: Entry = ['damage', 'Worst spot', 'Closest view of any damage.', 'optional'];
const FLUID: Entry = ['fluid', 'Fluid on rag', 'Dab some on a white rag.', 'optional'];

const LISTS: Readonly<Record<UnitKind, readonly Entry[]>> = {
  automatic: [
    LEFT,
    RIGHT,
    BELL,
    ['output', 'Output end', 'Spline and rear face, straight on.', 'pulled'],
    ['pan', 'Pan', 'From below, all four corners.', 'always'],
    CODE,
    ['plug', 'Plug', 'Straight into the pins, no blur.', 'pulled'],
    DAMAGE,
    FLUID,
  ],
  manual: [
    LEFT,
    RIGHT,
    BELL,
    ['output', 'Output end', 'Spline and rear face, straight on.', 'pulled'],
    ['top', 'Shift cover', 'From above, lever or rail showing.', 'pulled'],
    CODE,
    ['input', 'Input shaft', 'Spline and pilot tip, close up.', 'pulled'],
    DAMAGE,
    FLUID,
  ],
  transfer_case: [
    ['left', 'Front side', 'Whole unit, front output facing you.', 'pulled'],
    ['right', 'Back side', 'Whole unit, rear output facing you.', 'pulled'],
    ['bell', 'Input face', 'Studs and input spline, straight on.', 'pulled'],
    ['output', 'Front output', 'Yoke or flange, straight on.', 'pulled'],
    ['pan', 'Underside', 'From below, drain plug showing.', 'always'],
    CODE,
    ['plug', 'Shift motor side', 'Motor or lever, and its plug.', 'pulled'],
    DAMAGE,
    FLUID,
  ],
  axle: [
    ['left', 'Front side', 'Whole axle, both ends in view.', 'pulled'],
    ['right', 'Back side', 'Whole axle, both ends in view.', 'pulled'],
    ['bell', 'Cover', 'Straight on, every bolt in view.', 'always'],
    ['output', 'Pinion yoke', 'Straight on, fill the frame.', 'pulled'],
    ['pan', 'Left end', 'Brake plate and studs, straight on.', 'pulled'],
    CODE,
    ['plug', 'Right end', 'Brake plate and studs, straight on.', 'pulled'],
    DAMAGE,
    FLUID,
  ],
};

/** The nine shots of a kind in their order. */
export const shotList = (kind: UnitKind): readonly Shot[] =>
  LISTS[kind].map(([code, name, instruction, need], index) => ({
    code,
    number: index + 1,
    name,
    instruction,
    required: need !== 'optional',
    inVehicle: need === 'always',
  }));

/** Does any kind have a shot of that code? A draft may be photographed before its kind is known. */
export const isShot = (code: string): boolean =>
  UNIT_KINDS.some((kind) => LISTS[kind].some(([candidate]) => candidate === code));

export const SHOT_CODES = [
  'left',
  'right',
  'bell',
  'output',
  'pan',
  'top',
  'input',
  'code',
  'plug',
  'damage',
  'fluid',
] as const;

/** A fault on the case is shown, not only told. */
const showsDamage = (kind: UnitKind, given: Answers): boolean =>
  Object.entries(given).some(
    ([code, value]) => value === 'no' && effectOf(kind, code) === 'case' && code !== 'turns',
  );

/** The shots this unit can't be published without. */
export function requiredShots(
  kind: UnitKind,
  state: 'in_vehicle' | 'pulled',
  given: Answers,
): readonly Shot[] {
  return shotList(kind).filter((shot) => {
    if (shot.code === 'damage') return showsDamage(kind, given);
    return state === 'pulled' ? shot.required : shot.inVehicle;
  });
}
