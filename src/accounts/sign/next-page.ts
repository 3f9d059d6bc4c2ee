// Where somebody goes after signing in: back to what they came for, else to their own desk.
import { paths, safeNext } from '../../paths';
import type { SignedIn } from '../session';

function desk(user: SignedIn): string {
  if (user.roles.includes('admin')) return paths.admin.to();
  return user.sellers.length > 0 ? paths.yard.to() : paths.home.to();
}

/** `next` is only ever followed inside this site. */
export const nextPage = (user: SignedIn, next: string | null): string => (next ? safeNext(next) : desk(user));
