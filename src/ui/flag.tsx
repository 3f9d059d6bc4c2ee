// A flag says a state in words on a ground that has its own shape and edge.
import clsx from 'clsx';
import type { ReactNode } from 'react';
import { JOINT_WORDS, type JointState } from './art/joint-glyph';

export type FlagTone = JointState | 'held' | 'stop' | 'plain';

interface FlagProps {
  /** The four verdicts of fit; `held` for money or a unit on hold; `stop` for a refusal; `fits` also means on sale or proved. */
  readonly tone: FlagTone;
  /** The verdict's own word when left out. */
  readonly children?: ReactNode;
}

const WORDS: Readonly<Record<FlagTone, string>> = {
  ...JOINT_WORDS,
  held: 'Held',
  stop: 'Stopped',
  plain: '',
};

export function Flag({ tone, children }: FlagProps) {
  return <span className={clsx('flag', `flag-${tone}`)}>{children ?? WORDS[tone]}</span>;
}
