// The page around signing in, signing up and every link that comes by mail: the form left, a whole sprag clutch right.
import type { ReactNode } from 'react';
import { SpragClutch } from '../../ui/art/sprag-clutch';
import { PageTitle } from '../../ui/page-title';
import { MAIN_ID } from '../../ui/skip-link';

interface SignFrameProps {
  readonly title: string;
  readonly children: ReactNode;
  /** Below a race rule: the other way in. */
  readonly other?: ReactNode;
}

export function SignFrame({ title, children, other }: SignFrameProps) {
  return (
    <main id={MAIN_ID} tabIndex={-1} className="sign">
      <div className="sign-form">
        <PageTitle title={title} />
        <div className="sign-body">{children}</div>
        {other && <div className="sign-other">{other}</div>}
      </div>
      <div className="sign-picture" aria-hidden="true">
        <SpragClutch live={4} />
      </div>
    </main>
  );
}
