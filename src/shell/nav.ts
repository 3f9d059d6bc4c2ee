// What each kind of visitor finds in the race header, as a table.
import { paths } from '../paths';

export type NavRole = 'visitor' | 'builder' | 'yard' | 'admin';

/** Work that waits, by the cell that shows it. */
export type NavCounts = Readonly<Partial<Record<'orders' | 'cases' | 'today' | 'receiving', number>>>;

interface NavEntry {
  readonly label: string;
  readonly to: string;
  readonly count?: keyof NavCounts;
  /** Addresses below this one count as the same section, except those that another cell owns. */
  readonly owns: readonly string[];
}

export interface NavCell {
  readonly label: string;
  readonly to: string;
  readonly count: number;
  readonly current: boolean;
}

const FIND: NavEntry = { label: 'Find a core', to: paths.results.to(), owns: [paths.results.to()] };
const CODE: NavEntry = { label: 'Check a code', to: paths.codeReader.to(), owns: [paths.codeReader.to()] };
const BOOK: NavEntry = { label: 'Code book', to: paths.families.to(), owns: [paths.families.to()] };

export const NAV: Readonly<Record<NavRole, readonly NavEntry[]>> = {
  visitor: [FIND, CODE, BOOK],
  builder: [
    FIND,
    CODE,
    BOOK,
    { label: 'Orders', to: paths.orders.to(), count: 'orders', owns: [paths.orders.to()] },
    { label: 'Cases', to: paths.cases.to(), count: 'cases', owns: [paths.cases.to()] },
  ],
  yard: [
    { label: 'Today', to: paths.yard.to(), count: 'today', owns: [paths.yard.to()] },
    { label: 'Receive', to: paths.receiving.to(), count: 'receiving', owns: [paths.receiving.to()] },
    { label: 'Stock', to: paths.yardStock.to(), owns: [paths.yardStock.to(), paths.newListing.to()] },
    {
      label: 'Orders',
      to: paths.yardOrders.to(),
      count: 'orders',
      owns: [paths.yardOrders.to(), paths.orders.to()],
    },
    { label: 'Cases', to: paths.cases.to(), count: 'cases', owns: [paths.cases.to()] },
    { label: 'Money', to: paths.payouts.to(), owns: [paths.payouts.to()] },
    { label: 'Yard', to: paths.terms.to(), owns: [paths.terms.to(), paths.team.to()] },
  ],
  admin: [
    {
      label: 'Cases',
      to: paths.adminCases.to(),
      count: 'cases',
      owns: [paths.adminCases.to(), paths.cases.to()],
    },
    { label: 'Sellers', to: paths.adminSellers.to(), owns: [paths.adminSellers.to()] },
    { label: 'Code book', to: paths.adminCatalogue.to(), owns: [paths.adminCatalogue.to()] },
    {
      label: 'Ledger',
      to: paths.adminLedger.to(),
      owns: [paths.adminLedger.to(), paths.adminReconciliation.to()],
    },
    { label: 'Audit', to: paths.adminAudit.to(), owns: [paths.adminAudit.to()] },
    { label: 'Health', to: paths.adminHealth.to(), owns: [paths.adminHealth.to()] },
  ],
};

const covers = (prefix: string, pathname: string): boolean =>
  pathname === prefix || pathname.startsWith(`${prefix}/`);

/** How much of the address an entry owns; 0 when it doesn't. */
const reach = (entry: NavEntry, pathname: string): number =>
  Math.max(0, ...entry.owns.filter((prefix) => covers(prefix, pathname)).map((prefix) => prefix.length));

/** The cells of a role, with the one that owns most of the address as the current section. */
export function navCells(role: NavRole, pathname: string, counts: NavCounts): NavCell[] {
  const reaches = NAV[role].map((entry) => reach(entry, pathname));
  const longest = Math.max(0, ...reaches);
  return NAV[role].map((entry, index) => ({
    label: entry.label,
    to: entry.to,
    count: entry.count ? (counts[entry.count] ?? 0) : 0,
    current: longest > 0 && reaches[index] === longest,
  }));
}

/** Which header a signed-in person sees: by the part of the product they are in, else by what they mostly do. */
export function navRole(
  pathname: string,
  who: { readonly isAdmin: boolean; readonly isMember: boolean } | null,
): NavRole {
  if (!who) return 'visitor';
  if (who.isAdmin && covers(paths.admin.to(), pathname)) return 'admin';
  if (who.isMember && covers(paths.yard.to(), pathname)) return 'yard';
  const shared = covers(paths.orders.to(), pathname) || covers(paths.cases.to(), pathname);
  if (who.isAdmin && shared) return 'admin';
  return who.isMember && shared ? 'yard' : 'builder';
}
