// Which line drawing stands for a shot of each kind of unit: the same shot code shows another part on an axle.
import type { UnitKind } from '../../shared/catalogue/kinds';
import type { ShotGuideName } from '../ui/art/shot-guide';

const GUIDES: Readonly<Record<string, ShotGuideName>> = {
  left: 'left',
  right: 'right',
  bell: 'bell',
  output: 'output',
  pan: 'pan',
  top: 'pan',
  input: 'input',
  code: 'code',
  plug: 'plug',
  damage: 'damage',
  fluid: 'fluid',
};

const AXLE: Readonly<Record<string, ShotGuideName>> = { bell: 'pan', pan: 'bell', plug: 'bell' };

export function guideOf(kind: UnitKind, shot: string): ShotGuideName {
  const own = kind === 'axle' ? AXLE[shot] : undefined;
  return own ?? GUIDES[shot] ?? 'damage';
}
