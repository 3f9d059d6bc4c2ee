// The header: a white bar of ruled cells over a race, where the section you are in has its sprag tipped.
import { Camera } from 'lucide-react';
import { Link } from 'react-router-dom';
import { paths } from '../paths';
import { Mark } from '../ui/art/mark';
import { Hidden } from '../ui/hidden';
import { Icon } from '../ui/icon';
import type { MenuLink, ShellAccount } from './account';
import { AccountMenu } from './account-menu';
import type { NavCell } from './nav';
import { PhoneMenu } from './phone-menu';

interface RaceHeaderProps {
  readonly cells: readonly NavCell[];
  readonly account: ShellAccount | null;
  /** While it isn't known who is signed in, the corner stays empty. */
  readonly accountKnown?: boolean;
}

const VISITOR_LINKS: readonly MenuLink[] = [
  { label: 'Sign in', to: paths.signIn.to() },
  { label: 'Make an account', to: paths.signUp.to() },
];

const YARD_LINKS: readonly MenuLink[] = [
  { label: 'Yard desk', to: paths.yard.to() },
  { label: 'List a unit', to: paths.newListing.to() },
];

/** The desks a person may sit at, and their account. */
function accountLinks(account: ShellAccount): MenuLink[] {
  return [
    { label: 'My orders', to: paths.orders.to() },
    ...(account.isMember ? YARD_LINKS : []),
    ...(account.isAdmin ? [{ label: 'Admin desk', to: paths.admin.to() }] : []),
    { label: 'Account', to: paths.account.to() },
  ];
}

export function RaceHeader({ cells, account, accountKnown = true }: RaceHeaderProps) {
  const links = account ? accountLinks(account) : VISITOR_LINKS;
  return (
    <header>
      <div className="bar">
        <Link className="bar-logo" to={paths.home.to()} aria-label="Spragyard home">
          <Mark size={38} />
          <b aria-hidden="true">SPRAGYARD</b>
        </Link>
        <nav className="bar-nav" aria-label="Main">
          <ul>
            {cells.map((cell) => (
              <li key={cell.to}>
                <Link to={cell.to} aria-current={cell.current ? 'page' : undefined}>
                  {cell.label}
                  {cell.count > 0 && (
                    <span className="bar-count">
                      {cell.count}
                      <Hidden> waiting</Hidden>
                    </span>
                  )}
                </Link>
              </li>
            ))}
          </ul>
        </nav>
        <span className="bar-space" />
        {account?.isMember && (
          <Link className="bar-cell bar-wide bar-list" to={paths.newListing.to()}>
            <Icon of={Camera} />
            List a unit
          </Link>
        )}
        {account && <AccountMenu account={account} links={links} />}
        {!account && accountKnown && (
          <Link className="bar-cell bar-wide" to={paths.signIn.to()}>
            Sign in
          </Link>
        )}
        <PhoneMenu cells={cells} links={accountKnown ? links : []} account={account} />
      </div>
      <div className="race" aria-hidden="true" />
    </header>
  );
}
