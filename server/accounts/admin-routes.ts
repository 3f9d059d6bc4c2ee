// What an admin sees of accounts: sellers to look at, and the audit trail.
import { and, asc, desc, eq, ilike, lt, or, sql } from 'drizzle-orm';
import { z } from 'zod';
import { adminAudit, adminSellers, adminUsers, verifySeller } from '../../shared/accounts/admin-contract';
import { packCursor, unpackCursor } from '../../shared/kernel/cursor';
import { id } from '../../shared/kernel/fields';
import { transaction } from '../db/transaction';
import { invalid, isRefusal, notFound, type Refusal } from '../http/refusal';
import { route, type Route } from '../http/route';
import { recordAudit } from './for-others';
import { presentSeller, type SellerRow } from './present';
import { audit, sellerMembers, sellers, users } from './tables';
import { memberCount } from './team';

const sellerCursor = z.tuple([z.union([z.literal(0), z.literal(1)]), z.iso.datetime(), id]);
const auditCursor = z.tuple([z.number().int().min(0)]);
const userCursor = z.tuple([z.iso.datetime(), id]);

/*
 * Inside the sub-selects below the outer row is named by its table: Drizzle writes a column of a single table without
 * it, and a bare "id" would mean the inner one.
 */

/** 0 for those nobody has looked at yet: they come first. */
const looked = sql<number>`(${sellers.verifiedAt} is not null)::int`;

/** `%` and `_` stand for themselves in what somebody looks for. */
const escapeLike = (text: string): string => text.replaceAll(/[\\%_]/g, (mark) => `\\${mark}`);

const presentPerson = (row: typeof users.$inferSelect) => ({
  id: row.id,
  name: row.name,
  email: row.email,
  isAdmin: row.isAdmin,
  mailChecked: row.mailCheckedAt !== null,
  createdAt: row.createdAt.toISOString(),
  closedAt: row.closedAt?.toISOString() ?? null,
});

export const adminRoutes: readonly Route[] = [
  route(adminSellers, async (call, deps) => {
    const { query } = call;
    const after = query.cursor ? unpackCursor(query.cursor, sellerCursor) : null;
    if (query.cursor && !after) return invalid('cursor', 'Start from the first page');
    const rows = await deps.db
      .select({
        seller: sellers,
        looked,
        members: memberCount(sql`sellers.id`),
        liveListings: sql<number>`(select count(*)::int from listings l where l.seller_id = sellers.id and l.status = 'live')`,
      })
      .from(sellers)
      .where(
        after
          ? sql`(${looked}, ${sellers.createdAt}, ${sellers.id}) > (${after[0]}, ${after[1]}::timestamptz, ${after[2]})`
          : undefined,
      )
      .orderBy(asc(looked), asc(sellers.createdAt), asc(sellers.id))
      .limit(query.limit + 1);
    const shown = rows.slice(0, query.limit);
    const last = shown.at(-1);
    return {
      items: shown.map((row) => ({
        ...presentSeller(row.seller, call.actor),
        members: row.members,
        liveListings: row.liveListings,
      })),
      next:
        rows.length > query.limit && last
          ? packCursor([last.looked, last.seller.createdAt.toISOString(), last.seller.id])
          : null,
    };
  }),
  route(verifySeller, async (call, deps) => {
    const now = deps.clock.now();
    const row = await transaction(deps.db, async (tx): Promise<SellerRow | Refusal> => {
      const [changed] = await tx
        .update(sellers)
        .set({ verifiedAt: call.body.verified ? now : null })
        .where(eq(sellers.id, call.params.id))
        .returning();
      if (!changed) return notFound('seller');
      await recordAudit(tx, {
        at: now,
        actorUserId: call.actor.userId,
        actorKind: 'admin',
        action: call.body.verified ? 'seller.verify' : 'seller.unverify',
        objectKind: 'seller',
        objectId: changed.id,
        detail: {},
      });
      return changed;
    });
    return isRefusal(row) ? row : presentSeller(row, call.actor);
  }),
  route(adminAudit, async (call, deps) => {
    const { query } = call;
    const after = query.cursor ? unpackCursor(query.cursor, auditCursor) : null;
    if (query.cursor && !after) return invalid('cursor', 'Start from the first page');
    const rows = await deps.db
      .select({ line: audit, actorName: users.name })
      .from(audit)
      .leftJoin(users, eq(users.id, audit.actorUserId))
      .where(
        and(
          query.objectId ? eq(audit.objectId, query.objectId) : undefined,
          after ? lt(audit.id, after[0]) : undefined,
        ),
      )
      .orderBy(desc(audit.id))
      .limit(query.limit + 1);
    const shown = rows.slice(0, query.limit);
    const last = shown.at(-1);
    return {
      items: shown.map(({ line, actorName }) => ({
        id: String(line.id),
        at: line.at.toISOString(),
        actorName,
        actorKind: line.actorKind,
        action: line.action,
        objectKind: line.objectKind,
        objectId: line.objectId,
        detail: line.detail,
      })),
      next: rows.length > query.limit && last ? packCursor([last.line.id]) : null,
    };
  }),
  route(adminUsers, async (call, deps) => {
    const { query } = call;
    const after = query.cursor ? unpackCursor(query.cursor, userCursor) : null;
    if (query.cursor && !after) return invalid('cursor', 'Start from the first page');
    const part = query.q ? `%${escapeLike(query.q)}%` : null;
    const rows = await deps.db
      .select({
        user: users,
        sellers: sql<{ id: string; name: string }[]>`coalesce(
          (select json_agg(json_build_object('id', s.id, 'name', s.name) order by s.name)
           from ${sellerMembers} m join ${sellers} s on s.id = m.seller_id where m.user_id = users.id), '[]'::json)`,
      })
      .from(users)
      .where(
        and(
          part ? or(ilike(users.name, part), ilike(users.email, part)) : undefined,
          after
            ? sql`(${users.createdAt}, ${users.id}) < (${after[0]}::timestamptz, ${after[1]})`
            : undefined,
        ),
      )
      .orderBy(desc(users.createdAt), desc(users.id))
      .limit(query.limit + 1);
    const shown = rows.slice(0, query.limit);
    const last = shown.at(-1)?.user;
    return {
      items: shown.map((row) => ({ ...presentPerson(row.user), sellers: row.sellers })),
      next: rows.length > query.limit && last ? packCursor([last.createdAt.toISOString(), last.id]) : null,
    };
  }),
];
