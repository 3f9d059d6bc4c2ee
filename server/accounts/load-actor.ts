// The person behind a session as the rules see them, fresh at every request: a removed member is out at once.
import { and, eq, isNull, sql } from 'drizzle-orm';
import type { Actor, Membership } from '../../shared/accounts/actor';
import type { Deps } from '../deps';
import { sellerMembers, sellers, users } from './tables';

export async function loadActor(deps: Deps, userId: string): Promise<Actor | null> {
  const [row] = await deps.db
    .select({
      name: users.name,
      email: users.email,
      isAdmin: users.isAdmin,
      mailCheckedAt: users.mailCheckedAt,
      memberships: sql<Membership[]>`coalesce(
        (select json_agg(json_build_object('sellerId', m.seller_id, 'duties', m.duties) order by m.created_at, m.seller_id)
         from ${sellerMembers} m join ${sellers} s on s.id = m.seller_id
         where m.user_id = ${users}.id and s.closed_at is null), '[]'::json)`,
    })
    .from(users)
    .where(and(eq(users.id, userId), isNull(users.closedAt)));
  if (!row) return null;
  return {
    userId,
    name: row.name,
    email: row.email,
    isAdmin: row.isAdmin,
    mailChecked: row.mailCheckedAt !== null,
    memberships: row.memberships,
  };
}
