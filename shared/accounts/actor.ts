// Who is asking: the signed-in person as the rules see them, and which endpoints that person may call at all.
import type { Access } from '../kernel/endpoint';

export const DUTIES = ['owner', 'lister', 'dock'] as const;
export type Duty = (typeof DUTIES)[number];

export const SELLER_KINDS = ['yard', 'rebuilder', 'private'] as const;
export type SellerKind = (typeof SELLER_KINDS)[number];

export interface Membership {
  readonly sellerId: string;
  readonly duties: readonly Duty[];
}

export interface Actor {
  readonly userId: string;
  readonly name: string;
  readonly email: string;
  readonly isAdmin: boolean;
  readonly mailChecked: boolean;
  readonly memberships: readonly Membership[];
}

/** Has this person the duty in that seller account? An owner doesn't get the other duties by being owner. */
export function hasDuty(actor: Actor, sellerId: string, ...anyOf: readonly Duty[]): boolean {
  const membership = actor.memberships.find((candidate) => candidate.sellerId === sellerId);
  if (!membership) return false;
  return anyOf.length === 0 || membership.duties.some((duty) => anyOf.includes(duty));
}

/** Is this person a member of that seller account with any duty? */
export const isMember = (actor: Actor, sellerId: string): boolean => hasDuty(actor, sellerId);

export type CallVerdict = 'ok' | 'signed_out' | 'forbidden';

/** May this person call an endpoint with that access at all? Whose object it is, is decided where it is loaded. */
export function mayCall(access: Access, actor: Actor | null): CallVerdict {
  if (access === 'public') return 'ok';
  if (!actor) return 'signed_out';
  switch (access) {
    case 'signed_in':
    case 'party':
      return 'ok';
    case 'admin':
      return actor.isAdmin ? 'ok' : 'forbidden';
    case 'member':
      return actor.memberships.length > 0 ? 'ok' : 'forbidden';
    case 'owner':
    case 'lister':
    case 'dock':
      return actor.memberships.some((membership) => membership.duties.includes(access)) ? 'ok' : 'forbidden';
  }
}
