// What of a person and a seller leaves the server.
import { asc, eq, inArray } from 'drizzle-orm';
import { isMember, type Actor } from '../../shared/accounts/actor';
import type { Me } from '../../shared/accounts/contract';
import type { Seller } from '../../shared/accounts/seller-contract';
import type { Deps } from '../deps';
import type { SessionSeam } from '../http/route';
import { loadActor } from './load-actor';
import { sellers } from './tables';

export type SellerRow = typeof sellers.$inferSelect;

export function presentSeller(row: SellerRow, actor: Actor | null): Seller {
  const inside = actor !== null && (isMember(actor, row.id) || actor.isAdmin);
  return {
    id: row.id,
    name: row.name,
    kind: row.kind,
    city: row.city,
    region: row.region,
    zip: row.zip,
    timeZone: row.timeZone,
    verified: row.verifiedAt !== null,
    createdAt: row.createdAt.toISOString(),
    terms: inside ? row.terms : null,
    payoutsEnabled: inside ? row.payoutsEnabled : null,
  };
}

export async function presentMe(deps: Deps, userId: string | null, session: SessionSeam): Promise<Me> {
  const actor = userId ? await loadActor(deps, userId) : null;
  if (!actor) return { user: null, csrfToken: session.csrfToken() };
  const ids = actor.memberships.map((one) => one.sellerId);
  const rows = ids.length
    ? await deps.db
        .select({ id: sellers.id, name: sellers.name, kind: sellers.kind })
        .from(sellers)
        .where(inArray(sellers.id, ids))
        .orderBy(asc(sellers.name))
    : [];
  return {
    user: {
      id: actor.userId,
      name: actor.name,
      email: actor.email,
      mailChecked: actor.mailChecked,
      roles: [
        'builder',
        ...(rows.length > 0 ? (['seller'] as const) : []),
        ...(actor.isAdmin ? (['admin'] as const) : []),
      ],
      sellers: rows.map((row) => ({
        ...row,
        duties: [...(actor.memberships.find((one) => one.sellerId === row.id)?.duties ?? [])],
      })),
    },
    csrfToken: session.csrfToken(),
  };
}

export async function findSeller(deps: Deps, sellerId: string): Promise<SellerRow | null> {
  const [row] = await deps.db.select().from(sellers).where(eq(sellers.id, sellerId));
  return row && row.closedAt === null ? row : null;
}
