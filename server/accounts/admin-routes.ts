// What an admin sees of accounts: sellers to look at, and the audit trail.
import { and, asc, desc, eq, lt, sql } from 'drizzle-orm';
import { z } from 'zod';
import { adminAudit, adminSellers, verifySeller } from '../../shared/accounts/contract';
import { packCursor, unpackCursor } from '../../shared/kernel/cursor';
import { transaction } from '../db/transaction';
import { invalid, isRefusal, notFound, type Refusal } from '../http/refusal';
import { route, type Route } from '../http/route';
import { recordAudit } from './for-others';
import { presentSeller, type SellerRow } from './present';
import { audit, sellers, users } from './tables';
import { memberCount } from './team';

const sellerCursor = z.tuple([z.number().int(), z.iso.datetime(), z.string().max(64)]);
const auditCursor = z.tuple([z.number().int()]);

/** 0 for those nobody has looked at yet: they come first. */
const looked = sql<number>`(${sellers.verifiedAt} is not null)::int`;

export const adminRoutes: readonly Route[] = [
  route(adminSellers, async (call, deps) => {
    const { query } = call;
    const after = query.cursor ? unpackCursor(query.cursor, sellerCursor) : null;
    if (query.cursor && !after) return invalid('cursor', 'Start from the first page');
    const rows = await deps.db
      .select({
        seller: sellers,
        looked,
        members: memberCount(sellers.id),
        liveListings: sql<number>`(select count(*)::int from listings l where l.seller_id = ${sellers.id} and l.status = 'live')`,
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
];
