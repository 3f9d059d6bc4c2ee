// How two flanges meet: closed fits, a ring between fits with a part, offset with a slash doesn't, dashed isn't known.
import clsx from 'clsx';
import type { ReactNode } from 'react';

export type JointState = 'fits' | 'with_part' | 'no_fit' | 'not_known';

/** The verdict in two words, for rows and flags. */
export const JOINT_WORDS: Readonly<Record<JointState, string>> = {
  fits: 'Fits',
  with_part: 'With a part',
  no_fit: 'No fit',
  not_known: 'Not known',
};

/** The verdict as it is read out after a joint's name. */
export const JOINT_SPOKEN: Readonly<Record<JointState, string>> = {
  fits: 'fits',
  with_part: 'needs a part',
  no_fit: 'does not fit',
  not_known: 'not known',
};

const GLYPHS: Readonly<Record<JointState, ReactNode>> = {
  fits: (
    <g fill="currentColor">
      <path d="M1 4h9v16H1z" />
      <path d="M10 9h4v6h-4z" />
      <path d="M14 4h9v16h-9z" />
    </g>
  ),
  with_part: (
    <>
      <path d="M1 4h6v16H1z" fill="currentColor" />
      <path d="M9.2 4.8h5.6v14.4H9.2z" fill="none" stroke="currentColor" strokeWidth="1.8" />
      <path d="M17 4h6v16h-6z" fill="currentColor" />
    </>
  ),
  no_fit: (
    <>
      <path d="M1 4h6v16H1z" fill="currentColor" />
      <path d="M17 1h6v16h-6z" fill="currentColor" />
      <path d="M8.6 20.4L15.4 9" stroke="currentColor" strokeWidth="2.4" fill="none" />
    </>
  ),
  not_known: (
    <>
      <path d="M2 5h6v14H2z" fill="none" stroke="currentColor" strokeWidth="1.8" />
      <path
        d="M16 5h6v14h-6z"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.8"
        strokeDasharray="2.4 2.2"
      />
    </>
  ),
};

/** Decoration: a word or the strip's label says the verdict. */
export function JointGlyph({ state, size = 24 }: { readonly state: JointState; readonly size?: number }) {
  return (
    <svg
      className={clsx('joint', `joint-${state}`)}
      width={size}
      height={size}
      viewBox="0 0 24 24"
      aria-hidden="true"
    >
      {GLYPHS[state]}
    </svg>
  );
}
