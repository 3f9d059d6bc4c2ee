// One photo of the shot list in each of its states: taken, next, to do, shoot again, can't reach.
import clsx from 'clsx';
import type { ReactNode } from 'react';
import { ShotGuide, type ShotGuideName } from './art/shot-guide';

interface ShotTileProps {
  readonly number: number;
  /** "Bell face" */
  readonly label: string;
  readonly state?: 'taken' | 'next' | 'todo' | 'redo' | 'skip';
  readonly src?: string;
  /** Shot name, unit and side; the label when left out. */
  readonly alt?: string;
  /** What to draw where there is no photo yet. */
  readonly guide?: ShotGuideName;
  /** Why it must be shot again: "Blurred. Shoot again". */
  readonly reason?: string;
  readonly selected?: boolean;
  /** Makes the tile a button. */
  readonly onPress?: () => void;
  readonly className?: string;
}

const STATE_WORDS = {
  taken: '',
  next: ', shoot this next',
  todo: ', to do',
  redo: ', shoot again',
  skip: ', marked as out of reach',
} as const;

export function ShotTile(props: ShotTileProps) {
  const {
    number,
    label,
    state = 'taken',
    src,
    alt = label,
    guide,
    reason,
    selected = false,
    onPress,
    className,
  } = props;
  const classes = clsx('shot', state !== 'taken' && `shot-${state}`, selected && 'shot-selected', className);
  const inside: ReactNode = (
    <>
      {src ? (
        <img src={src} alt={alt} loading="lazy" decoding="async" />
      ) : (
        guide && <ShotGuide name={guide} />
      )}
      <span className="shot-label">
        <b>{number}</b>
        <span>{label}</span>
        {STATE_WORDS[state] && <span className="vh">{STATE_WORDS[state]}</span>}
      </span>
      {reason && <span className="shot-reason">{reason}</span>}
    </>
  );
  if (!onPress) return <div className={classes}>{inside}</div>;
  return (
    <button type="button" className={classes} aria-pressed={selected || undefined} onClick={onPress}>
      {inside}
    </button>
  );
}
