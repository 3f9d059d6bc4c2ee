// The shots of an old unit before it is sent: the same nine as at sale, so that each can be laid beside its twin.
import { shotList } from '../../shared/listings/shots';
import type { UnitKind } from '../../shared/catalogue/kinds';
import type { ShotGuideName } from '../ui/art/shot-guide';

export interface ReturnShot {
  readonly code: string;
  readonly number: number;
  readonly name: string;
  readonly instruction: string;
  readonly guide: ShotGuideName;
}

const GUIDES: readonly ShotGuideName[] = [
  'left',
  'right',
  'bell',
  'output',
  'pan',
  'plug',
  'code',
  'fluid',
  'damage',
  'input',
];

const guideOf = (code: string): ShotGuideName => GUIDES.find((name) => name === code) ?? 'left';

/** The nine shots of a kind; where the kind isn't known, those of the commonest. */
export const returnShots = (kind: UnitKind | null): ReturnShot[] =>
  shotList(kind ?? 'automatic').map((shot) => ({
    code: shot.code,
    number: shot.number,
    name: shot.name,
    instruction: shot.instruction,
    guide: guideOf(shot.code),
  }));
