// The frame around every page: skip link, header, the page itself, footer, notices.
import clsx from 'clsx';
import type { ReactNode } from 'react';
import { useLocation } from 'react-router-dom';
import { Notices } from '../ui/notices';
import { MAIN_ID, SkipLink } from '../ui/skip-link';
import type { ShellAccount } from './account';
import { Footer } from './footer';
import { navCells, navRole, type NavCounts } from './nav';
import { RaceHeader } from './race-header';

interface LayoutProps {
  readonly account: ShellAccount | null;
  readonly accountKnown?: boolean;
  readonly counts?: NavCounts;
  readonly children: ReactNode;
}

const NO_COUNTS: NavCounts = {};

export function Layout({ account, accountKnown = true, counts = NO_COUNTS, children }: LayoutProps) {
  const { pathname } = useLocation();
  const cells = navCells(navRole(pathname, account), pathname, counts);
  return (
    <>
      <SkipLink />
      <RaceHeader cells={cells} account={account} accountKnown={accountKnown} />
      {children}
      <Footer />
      <Notices />
    </>
  );
}

interface PageProps {
  /** Draws the wire down the left: for pages with physical units, and only those. */
  readonly wired?: boolean;
  /** Larger text, for screens used with gloves. */
  readonly yard?: boolean;
  readonly children: ReactNode;
}

/** The main region, with the page's measure. Every page's outermost element. */
export function Page({ wired = false, yard = false, children }: PageProps) {
  return (
    <main id={MAIN_ID} tabIndex={-1} className={clsx('page', wired && 'wired', yard && 'page-yard')}>
      {children}
    </main>
  );
}
