// The page's one h1: names the browser tab, and takes focus after a move inside the product so that a reader hears where it is.
import { useEffect, useRef, type ReactNode, type RefObject } from 'react';
import { useLocation } from 'react-router-dom';

const SITE = 'Spragyard';

/**
 * Sets the tab's title, and focuses the heading once for each address the reader moves to inside the product.
 * @returns the ref for the page's h1; `<PageTitle>` does it for you
 */
export function usePageTitle(title: string): RefObject<HTMLHeadingElement | null> {
  const heading = useRef<HTMLHeadingElement>(null);
  const { pathname, key } = useLocation();
  // The first page of a visit keeps the browser's own focus, so that the skip link stays the first stop.
  const arrived = useRef(key === 'default' ? pathname : null);

  useEffect(() => {
    document.title = title === SITE ? SITE : `${title} · ${SITE}`;
  }, [title]);

  useEffect(() => {
    if (arrived.current === pathname) return;
    arrived.current = pathname;
    heading.current?.focus({ preventScroll: true });
  }, [pathname]);

  return heading;
}

interface PageTitleProps {
  /** For the browser tab. */
  readonly title: string;
  /** What the heading shows, when it is more than the title. */
  readonly children?: ReactNode;
  readonly className?: string;
}

export function PageTitle({ title, children, className }: PageTitleProps) {
  const heading = usePageTitle(title);
  return (
    <h1 ref={heading} tabIndex={-1} className={className}>
      {children ?? title}
    </h1>
  );
}

interface PageHeadProps extends PageTitleProps {
  /** Second line under the heading. */
  readonly under?: ReactNode;
  /** A plain button or a chip on the right. */
  readonly right?: ReactNode;
}

/** Heading, a line under it, and one thing on the right: how most pages begin. */
export function PageHead({ title, children, under, right }: PageHeadProps) {
  return (
    <div className="page-head">
      <div>
        <PageTitle title={title}>{children ?? title}</PageTitle>
        {under && <div className="mt-10 flex flex-wrap items-center gap-14">{under}</div>}
      </div>
      {right}
    </div>
  );
}
