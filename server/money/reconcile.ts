// Compares the ledger with the provider's own list of movements, item by item and in the sum.
import { eq, sql } from 'drizzle-orm';
import type { Reconciliation } from '../../shared/money/contract';
import type { Deps } from '../deps';
import type { BalanceMovement } from '../gateways/payments';
import { ledgerPostings, providerObjects } from './tables';

type Difference = Reconciliation['differences'][number];
type ObjectRow = typeof providerObjects.$inferSelect;

/** What an object of the provider moved on its balance: payments in, everything else out; failed refunds came back. */
function expectedCents(row: ObjectRow): number {
  if (row.kind === 'payment') return row.cents;
  if (row.kind === 'dispute') return row.state === 'won' ? 0 : -row.cents;
  return row.state === 'failed' ? 0 : -row.cents;
}

const difference = (
  kind: Difference['kind'],
  objectId: string,
  row: ObjectRow | null,
  ledgerCents: number,
  providerCents: number,
  cause: string,
): Difference => ({ kind, objectId, orderId: row?.orderId ?? null, ledgerCents, providerCents, cause });

export function compare(objects: readonly ObjectRow[], moved: ReadonlyMap<string, number>): Difference[] {
  const differences: Difference[] = [];
  const known = new Set<string>();
  for (const row of objects) {
    const expected = expectedCents(row);
    // A charge moves the balance under its own id, a payment is known to us by its payment intent.
    const ids = [row.id, row.providerChargeId].filter((one): one is string => one !== null);
    for (const one of ids) known.add(one);
    const actual = ids.reduce((sum, one) => sum + (moved.get(one) ?? 0), 0);
    if (actual === expected) continue;
    differences.push(
      ids.some((one) => moved.has(one))
        ? difference(
            'amount',
            row.id,
            row,
            expected,
            actual,
            'The provider moved another amount than we entered.',
          )
        : difference(
            'missing_at_provider',
            row.id,
            row,
            expected,
            0,
            'Entered here, but the provider has no such movement.',
          ),
    );
  }
  for (const [id, cents] of moved) {
    if (!known.has(id)) {
      differences.push(
        difference(
          'missing_in_ledger',
          id,
          null,
          0,
          cents,
          'Moved at the provider; the event has not been applied here yet.',
        ),
      );
    }
  }
  return differences;
}

async function movementsOf(
  deps: Deps,
): Promise<{ bySource: Map<string, number>; sum: number; count: number }> {
  const bySource = new Map<string, number>();
  let sum = 0;
  let count = 0;
  const add = (movement: BalanceMovement): void => {
    const source = movement.sourceId ?? movement.id;
    const net = movement.amountCents - movement.feeCents;
    bySource.set(source, (bySource.get(source) ?? 0) + net);
    sum += net;
    count += 1;
  };
  for await (const movement of deps.payments.movements()) add(movement);
  return { bySource, sum, count };
}

export async function reconcile(deps: Deps): Promise<Reconciliation> {
  const provider = await movementsOf(deps);
  const [ledger] = await deps.db
    .select({ cents: sql<number>`coalesce(sum(${ledgerPostings.cents}), 0)::bigint` })
    .from(ledgerPostings)
    .where(eq(ledgerPostings.account, 'provider'));
  const objects = await deps.db.select().from(providerObjects);
  return {
    at: deps.clock.now().toISOString(),
    ledgerCents: Number(ledger?.cents ?? 0),
    providerCents: provider.sum,
    movements: provider.count,
    differences: compare(objects, provider.bySource),
  };
}
