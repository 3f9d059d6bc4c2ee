// Where things stand on the closed race of an order: positions of steps, sprags and the finished part of the channel.
import type { StepState } from './art/sprag';

export const LOOP = { width: 880, height: 462 } as const;

/** Where the steps of a leg begin and end; the ends of the race are round. */
const FIRST_X = 160;
const LAST_X = 730;

export interface RacePoint {
  readonly x: number;
  readonly y: number;
  readonly leg: 'out' | 'shop' | 'back';
  readonly state: StepState;
}

const TOP_Y = 119;
const BOTTOM_Y = 343;

const spread = (count: number, index: number): number =>
  count === 1 ? (FIRST_X + LAST_X) / 2 : FIRST_X + (index * (LAST_X - FIRST_X)) / (count - 1);

/** How far apart the steps of a leg are, as a share of the picture's width. */
export const stepShare = (count: number): number =>
  count <= 1 ? 0.6 : (LAST_X - FIRST_X) / (count - 1) / LOOP.width;

/** The points in the order money and iron pass them: out along the top, the turn, back along the bottom. */
export function racePoints(
  out: readonly StepState[],
  shop: StepState,
  back: readonly StepState[],
): { readonly out: RacePoint[]; readonly shop: RacePoint; readonly back: RacePoint[] } {
  return {
    out: out.map((state, index) => ({ x: spread(out.length, index), y: TOP_Y, leg: 'out', state })),
    shop: { x: 847, y: 231, leg: 'shop', state: shop },
    back: back.map((state, index) => ({
      x: FIRST_X + LAST_X - spread(back.length, index),
      y: BOTTOM_Y,
      leg: 'back',
      state,
    })),
  };
}

const START = 'M33 231A112 112 0 0 1 145 119';
const TURN = 'H735A112 112 0 0 1 847 231';
/** The channel is finished as far as the middle of the live step's sprag and a little past it. */
const PAST = 8;

/** The finished part of the channel as a path along its middle; null while nothing is proved. */
export function finishedPath(points: readonly RacePoint[]): string | null {
  if (!points.some((point) => point.state === 'proved')) return null;
  const reached = points.filter((point) => point.state !== 'todo').at(-1);
  if (!reached) return null;
  const isWhole = points.at(-1)?.state === 'proved' && reached.leg === 'back';
  if (isWhole) return `${START}${TURN}A112 112 0 0 1 735 343H145A112 112 0 0 1 33 231`;
  if (reached.leg === 'out') return `${START}H${reached.x + PAST}`;
  if (reached.leg === 'shop') return `${START}${TURN}`;
  return `${START}${TURN}A112 112 0 0 1 735 343H${reached.x - PAST}`;
}

/** A sprag's turn: it leans with the way of its leg, and stands upright where nothing holds. */
export function turnDegrees(point: RacePoint): number {
  const tipped = point.state === 'proved' || point.state === 'now';
  if (point.leg === 'shop') return tipped ? 108 : 90;
  if (!tipped) return 0;
  return point.leg === 'out' ? 18 : -18;
}
