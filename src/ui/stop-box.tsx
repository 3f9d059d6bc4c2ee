// The black block: an error or a refusal, said in words, in both themes.
import type { ReactNode } from 'react';

interface StopBoxProps {
  readonly title: string;
  readonly children?: ReactNode;
  /** Read out at once; leave off where the page already opens with it. */
  readonly announce?: boolean;
}

export function StopBox({ title, children, announce = false }: StopBoxProps) {
  return (
    <div className="stopbox" role={announce ? 'alert' : undefined}>
      <span className="stopbox-title">{title}</span>
      {children}
    </div>
  );
}
