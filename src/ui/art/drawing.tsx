// The sheet a line drawing is made on: an image to a reader, with one sentence that says what it shows.
import clsx from 'clsx';
import type { ReactNode } from 'react';

export interface DrawingProps {
  /** Replaces the drawing's own sentence. `null` where the words beside it already say it: then it is decoration. */
  readonly label?: string | null;
  /** Lighter lines and no axis, for small sizes. */
  readonly thin?: boolean;
  readonly className?: string;
}

export function Drawing({
  label,
  thin = false,
  className,
  viewBox,
  children,
}: DrawingProps & { readonly viewBox: string; readonly children: ReactNode }) {
  const words = label === null ? { 'aria-hidden': true } : { role: 'img', 'aria-label': label };
  return (
    <svg className={clsx('art', thin && 'art-thin', className)} viewBox={viewBox} {...words}>
      {children}
    </svg>
  );
}
