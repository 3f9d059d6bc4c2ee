// A manila tag on the wire: one physical unit or core. The page draws what stands on it.
import clsx from 'clsx';
import type { ReactNode } from 'react';
import { Link, type LinkProps } from 'react-router-dom';

interface TagCardProps {
  readonly children: ReactNode;
  /** Off the wire: for tags inside a sheet or a narrow column. */
  readonly flat?: boolean;
  /** The hole near the top, for tall tags. */
  readonly holeAtTop?: boolean;
  readonly className?: string;
}

export function TagCard({ children, flat = false, holeAtTop = false, className }: TagCardProps) {
  return (
    <div className={clsx('tag', flat && 'tag-flat', holeAtTop && 'tag-top', className)}>
      <span className="tag-hole" aria-hidden="true" />
      {children}
    </div>
  );
}

/** The unit's name as the link of the whole tag; give whatever else can be pressed the class `tag-above`. */
export function TagLink({ className, children, ...rest }: LinkProps) {
  return (
    <Link {...rest} className={clsx('tag-link', className)}>
      {children}
    </Link>
  );
}

/** What the tags hang on; inside a page with `wired` the wire runs on above and below. */
export function Wire({ children, className }: { readonly children: ReactNode; readonly className?: string }) {
  return <div className={clsx('wirebox', className)}>{children}</div>;
}
