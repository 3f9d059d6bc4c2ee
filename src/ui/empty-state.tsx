// Nothing there: a line drawing, what is missing, and what to do about it.
import type { ReactNode } from 'react';

interface EmptyStateProps {
  /** "No transfer case with 32 splines today" */
  readonly title: string;
  readonly children?: ReactNode;
  /** A line drawing of the kind of thing that is missing; give it `thin` and `label={null}`. */
  readonly drawing?: ReactNode;
  /** The red button, then a plain one. */
  readonly actions?: ReactNode;
}

export function EmptyState({ title, children, drawing, actions }: EmptyStateProps) {
  return (
    <div className="state">
      {drawing}
      <h2>{title}</h2>
      {children && <div>{children}</div>}
      {actions && <div className="state-actions">{actions}</div>}
    </div>
  );
}
