// The sprag: the hourglass wedge of a one-way clutch, and the product's mark of proof. Tipped means it holds.
import clsx from 'clsx';

/** Centred on 0 0, 15 wide and 28 high, upright. */
export const SPRAG_PATH =
  'M-5.2-13Q.6-14.8 6-12.4C7.2-12 8-10.6 7.4-8.6 6.2-4.6 4.9-2.4 4.9 0 4.9 3 6.4 5.4 7.3 8.4 7.9 10.6 7 12.2 5.2 13Q-.6 14.8-6 12.4C-7.2 12-8 10.6-7.4 8.6-6.2 4.6-4.9 2.4-4.9 0-4.9-3-6.4-5.4-7.3-8.4-7.9-10.6-7-12.2-5.2-13Z';

export const TIPPED_DEGREES = 18;

/** `proved` is tipped ink, `now` is tipped red and larger, `todo` is an upright outline, `stopped` is upright ink. */
export type StepState = 'proved' | 'now' | 'todo' | 'stopped';

/** Where a drawing carries no words, a reader needs these. */
export const STEP_WORDS: Readonly<Record<StepState, string>> = {
  proved: 'done',
  now: 'now',
  todo: 'not yet',
  stopped: 'stopped',
};

export const spragTurn = (state: StepState): number =>
  state === 'proved' || state === 'now' ? TIPPED_DEGREES : 0;

interface SpragProps {
  readonly state?: StepState;
  readonly size?: number;
  readonly className?: string;
}

/** Decoration: the state is always said in words beside it. */
export function Sprag({ state = 'proved', size = 20, className }: SpragProps) {
  return (
    <svg
      className={clsx('sprag', `sprag-${state}`, className)}
      width={size}
      height={size}
      viewBox="-16 -16 32 32"
      aria-hidden="true"
    >
      <path transform={`rotate(${spragTurn(state)})`} d={SPRAG_PATH} />
    </svg>
  );
}
