// Pages that need somebody: signed out goes to sign-in and comes back; the wrong person finds nothing here, as the server says.
import type { ReactNode } from 'react';
import { Navigate, useLocation } from 'react-router-dom';
import { useUser, type SignedIn } from '../accounts/session';
import { paths } from '../paths';
import { NotFoundPage } from './not-found-page';
import { WaitingPage } from './waiting-page';

/** What a page needs of the person: any account, a seat in some seller account, or an admin. */
export type Needs = 'signed_in' | 'member' | 'admin';

const MEETS: Readonly<Record<Needs, (user: SignedIn) => boolean>> = {
  signed_in: () => true,
  member: (user) => user.sellers.length > 0,
  admin: (user) => user.roles.includes('admin'),
};

export function Guard({ needs, children }: { readonly needs: Needs; readonly children: ReactNode }) {
  const user = useUser();
  const { pathname, search } = useLocation();
  if (user === undefined) return <WaitingPage />;
  if (user === null) return <Navigate to={paths.signIn.to({ next: pathname + search })} replace />;
  return MEETS[needs](user) ? children : <NotFoundPage />;
}
