// The routes of money: a table of endpoint and function.
import { eq } from 'drizzle-orm';
import { packCursor, timeCursor, unpackCursor } from '../../shared/kernel/cursor';
import {
  readHealth,
  readLedger,
  readPayouts,
  readReconciliation,
  retryEffect,
  startOnboarding,
} from '../../shared/money/contract';
import type { Deps } from '../deps';
import { recordAudit } from '../accounts/for-others';
import { transaction } from '../db/transaction';
import { invalid, notFound, refuse, type Refusal } from '../http/refusal';
import { route, type Route } from '../http/route';
import { outbox } from '../jobs/tables';
import { payoutsOf, startSignUp } from './payouts';
import { balancesOf, entriesOf, unfinishedEffects, waitingCounts } from './queries';
import { reconcile } from './reconcile';

async function retry(deps: Deps, key: string, actorUserId: string): Promise<{ state: string } | Refusal> {
  return transaction(deps.db, async (tx): Promise<{ state: string } | Refusal> => {
    const [row] = await tx.select().from(outbox).where(eq(outbox.key, key)).for('update');
    if (!row) return notFound('effect');
    if (row.state === 'done') return refuse('wrong_state', 'This has gone through already.');
    await tx
      .update(outbox)
      .set({ state: 'waiting', attempts: 0, notBefore: new Date(), claimedUntil: null })
      .where(eq(outbox.seq, row.seq));
    await recordAudit(tx, {
      at: deps.clock.now(),
      actorUserId,
      actorKind: 'admin',
      action: 'effect.retry',
      objectKind: 'effect',
      objectId: key,
      detail: {},
    });
    return { state: 'waiting' };
  });
}

export const moneyRoutes: readonly Route[] = [
  route(readLedger, async (call, deps) => {
    const { query } = call;
    const after = query.cursor ? unpackCursor(query.cursor, timeCursor) : null;
    if (query.cursor && !after) return invalid('cursor', 'Start from the first page');
    const rows = await entriesOf(deps.db, { orderId: query.orderId, after, limit: query.limit + 1 });
    const entries = rows.slice(0, query.limit);
    const last = entries.at(-1);
    return {
      entries,
      next: rows.length > query.limit && last ? packCursor([last.at, last.id]) : null,
      balances: await balancesOf(deps.db, query.orderId),
    };
  }),
  route(readReconciliation, (_call, deps) => reconcile(deps)),
  route(readHealth, async (_call, deps) => {
    const [effects, counts, balances] = await Promise.all([
      unfinishedEffects(deps.db),
      waitingCounts(deps.db, deps.clock.now()),
      balancesOf(deps.db, undefined),
    ]);
    const owed = (account: string): number =>
      -balances.filter((one) => one.account === account).reduce((sum, one) => sum + one.balanceCents, 0);
    return {
      effects: effects.flatMap(({ effect, orderNumber }) =>
        effect.state === 'done'
          ? []
          : [
              {
                key: effect.key,
                kind: effect.kind,
                orderId: effect.orderId,
                orderNumber,
                state: effect.state,
                attempts: effect.attempts,
                lastError: effect.lastError,
                createdAt: effect.createdAt.toISOString(),
              },
            ],
      ),
      ...counts,
      heldCents: owed('hold'),
      owedToSellersCents: owed('payable'),
      owedToBuildersCents: owed('refund'),
    };
  }),
  route(retryEffect, (call, deps) => retry(deps, call.body.key, call.actor.userId)),
  route(readPayouts, (call, deps) => payoutsOf(deps, call.actor, call.query)),
  route(startOnboarding, (call, deps) => startSignUp(deps, call.actor, call.body.sellerId)),
];
