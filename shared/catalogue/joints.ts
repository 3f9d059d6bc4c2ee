// Which interfaces each kind of unit has, what the trade calls them, which ones decide whether it bolts in, and their words.
import type { InterfaceName, Interfaces, InterfaceValue } from './interfaces';
import type { UnitKind } from './kinds';

export interface Joint {
  readonly name: InterfaceName;
  readonly label: string;
  /** Deciding: a "no" here means that it does not fit. The others can at worst ask for a part. */
  readonly deciding: boolean;
}

const deciding = (name: InterfaceName, label: string): Joint => ({ name, label, deciding: true });
const advisory = (name: InterfaceName, label: string): Joint => ({ name, label, deciding: false });

/** In the order of the joint strip; for an automatic the first eight are the strip. */
export const JOINTS: Readonly<Record<UnitKind, readonly Joint[]>> = {
  automatic: [
    deciding('crankFlange', 'Converter'),
    deciding('enginePattern', 'Bellhousing'),
    deciding('control', 'Plug'),
    advisory('shiftLinkage', 'Shift'),
    advisory('mount', 'Mount'),
    deciding('outputSpline', 'Output'),
    deciding('rearPattern', 'Rear face'),
    advisory('length', 'Length'),
    deciding('inputSpline', 'Input spline'),
    advisory('speedometer', 'Speedometer'),
    advisory('kickdown', 'Kick-down'),
    advisory('cooler', 'Cooler lines'),
  ],
  manual: [
    deciding('crankFlange', 'Flywheel'),
    deciding('enginePattern', 'Bellhousing'),
    deciding('inputSpline', 'Input spline'),
    advisory('clutch', 'Clutch'),
    advisory('shiftLinkage', 'Shift'),
    advisory('mount', 'Mount'),
    deciding('outputSpline', 'Output'),
    deciding('rearPattern', 'Rear face'),
    advisory('length', 'Length'),
    advisory('speedometer', 'Speedometer'),
  ],
  transfer_case: [
    deciding('rearPattern', 'Front face'),
    deciding('inputSpline', 'Input spline'),
    deciding('dropSide', 'Drop'),
    deciding('control', 'Plug'),
    advisory('frontOutput', 'Front output'),
    advisory('rearOutput', 'Rear output'),
    advisory('shiftLinkage', 'Shift'),
    advisory('speedometer', 'Speedometer'),
    advisory('length', 'Length'),
  ],
  axle: [
    deciding('housingWidth', 'Width'),
    deciding('perches', 'Perches'),
    deciding('wheelBolts', 'Wheel bolts'),
    deciding('dropSide', 'Centre section'),
    advisory('axleRatio', 'Ratio'),
    advisory('shaftSpline', 'Shaft spline'),
    advisory('rearOutput', 'Pinion yoke'),
    advisory('brake', 'Brakes'),
  ],
};

const INCH_MM = 25.4;
const inches = (mm: number, places = 2): string => `${(mm / INCH_MM).toFixed(places)} in`;

const CONTROL: Readonly<Record<string, string>> = {
  hydraulic: 'Hydraulic, no plug',
  none: 'No control plug',
};
const CLUTCH: Readonly<Record<string, string>> = {
  cable: 'cable',
  rod: 'rod',
  slave_outside: 'slave cylinder outside',
  slave_inside: 'slave cylinder inside the bell',
};
const PERCHES: Readonly<Record<string, string>> = {
  leaf_under: 'leaf springs under the tube',
  leaf_over: 'leaf springs over the tube',
  coil: 'coil springs and arms',
};
const KICKDOWN: Readonly<Record<string, string>> = {
  cable: 'Cable',
  vacuum: 'Vacuum modulator',
  none: 'None',
};

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

type Words = { readonly [N in InterfaceName]: (value: InterfaceValue<N>) => string };

const WORDS: Words = {
  enginePattern: (v) => `${v.pattern}, ${v.bolts} bolts, ${v.dowels} dowels`,
  crankFlange: (v) => `${v.bolts}-bolt, ${inches(v.circleMm)} circle, ${inches(v.pilotMm)} pilot`,
  inputSpline: (v) => `${v.count}-spline, ${inches(v.diameterMm, 3)}`,
  outputSpline: (v) => `${v.count}-spline, ${inches(v.diameterMm, 3)}, ${v.form}`,
  rearPattern: (v) =>
    `${v.pattern}, ${v.bolts} bolts${v.clockingDeg === 0 ? '' : `, turned ${v.clockingDeg} degrees`}`,
  control: (v) => CONTROL[v.by] ?? `${v.pins}-pin${v.controller ? `, controller ${v.controller}` : ''}`,
  speedometer: (v) =>
    v.by === 'none' ? 'None' : capital(v.by) + (v.teeth === null ? '' : `, ${v.teeth}-tooth gear`),
  mount: (v) =>
    `${v.bolts}-bolt pad, ${inches(v.spacingMm)} apart, ${inches(v.fromFaceMm, 1)} from the bell face`,
  length: (v) => `${inches(v.mm, 1)}, face to face`,
  shiftLinkage: (v) => `${capital(v.by)}, ${v.side === 'top' ? 'on top' : `${v.side} side`}`,
  kickdown: (v) => KICKDOWN[v.by] ?? v.by,
  cooler: (v) =>
    v.fitting === 'none' ? 'None' : `${capital(v.fitting)} fitting, ${inches(v.lineMm, 3)} line`,
  clutch: (v) => `${inches(v.discMm, 1)} disc, ${CLUTCH[v.by] ?? v.by}`,
  dropSide: (v) => (v.side === 'centre' ? 'In the centre' : `On the ${v.side}`),
  frontOutput: (v) => `${capital(v.form)}, ${v.joint} joint`,
  rearOutput: (v) => `${v.form === 'slip' ? 'Slip yoke' : capital(v.form)}, ${v.joint} joint`,
  housingWidth: (v) => `${inches(v.mm, 1)}, wheel face to wheel face`,
  perches: (v) => `${inches(v.spacingMm, 1)} apart, ${PERCHES[v.form] ?? v.form}`,
  wheelBolts: (v) => `${v.bolts} on ${inches(v.circleMm)}, ${inches(v.pilotMm)} hub`,
  brake: (v) => `${capital(v.by)}, ${inches(v.sizeMm, 1)}`,
  shaftSpline: (v) => `${v.count}-spline, ${inches(v.diameterMm, 2)}`,
  axleRatio: (v) => `${(v.ring / v.pinion).toFixed(2)} (${v.ring} to ${v.pinion})`,
};

/** The measure of one interface as a person in the trade says it. */
export function interfaceWords<N extends InterfaceName>(name: N, value: InterfaceValue<N>): string {
  return WORDS[name](value);
}

/** Two values with the same key are the same interface. */
export function interfaceKey<N extends InterfaceName>(name: N, value: InterfaceValue<N>): string {
  const sorted = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
  return `${name} ${JSON.stringify(sorted)}`;
}

export interface ShownJoint extends Joint {
  /** Null where it isn't known. */
  readonly words: string | null;
}

function wordsOf<N extends InterfaceName>(name: N, all: Interfaces): string | null {
  const value = all[name];
  return value === undefined ? null : interfaceWords(name, value);
}

/** Every joint that a unit of this kind has, in order, with its words where it is known. */
export const shownJoints = (kind: UnitKind, all: Interfaces): ShownJoint[] =>
  JOINTS[kind].map((joint) => ({ ...joint, words: wordsOf(joint.name, all) }));
