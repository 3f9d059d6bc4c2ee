// Reading the ledger and the state of the background work for admins.
import { and, asc, desc, eq, inArray, isNull, lte, ne, sql, type SQL } from 'drizzle-orm';
import type { Account } from '../../shared/money/ledger';
import { ACCOUNTS } from '../../shared/money/ledger';
import type { Tx } from '../db/client';
import { outbox } from '../jobs/tables';
import { deadlines, orders } from '../orders/tables';
import { ledgerEntries, ledgerPostings, providerEvents } from './tables';

const isAccount = (text: string): text is Account => ACCOUNTS.some((one) => one === text);

export async function entriesOf(
  tx: Tx,
  filter: { orderId: string | undefined; after: [string, string] | null; limit: number },
) {
  const conditions: (SQL | undefined)[] = [
    filter.orderId ? eq(ledgerEntries.orderId, filter.orderId) : undefined,
    filter.after
      ? sql`(${ledgerEntries.at}, ${ledgerEntries.id}) < (${filter.after[0]}::timestamptz, ${filter.after[1]})`
      : undefined,
  ];
  const entries = await tx
    .select({ entry: ledgerEntries, orderNumber: orders.number })
    .from(ledgerEntries)
    .leftJoin(orders, eq(orders.id, ledgerEntries.orderId))
    .where(and(...conditions))
    .orderBy(desc(ledgerEntries.at), desc(ledgerEntries.id))
    .limit(filter.limit);
  const ids = entries.map((one) => one.entry.id);
  const postings = ids.length
    ? await tx
        .select()
        .from(ledgerPostings)
        .where(inArray(ledgerPostings.entryId, ids))
        .orderBy(asc(ledgerPostings.id))
    : [];
  return entries.map(({ entry, orderNumber }) => ({
    id: entry.id,
    at: entry.at.toISOString(),
    event: entry.event,
    orderId: entry.orderId,
    orderNumber,
    postings: postings.flatMap((one) =>
      one.entryId === entry.id && isAccount(one.account)
        ? [
            {
              account: one.account,
              leg: one.leg,
              debitCents: Math.max(one.cents, 0),
              creditCents: Math.max(-one.cents, 0),
            },
          ]
        : [],
    ),
  }));
}

export async function balancesOf(tx: Tx, orderId: string | undefined) {
  const rows = await tx
    .select({
      account: ledgerPostings.account,
      leg: ledgerPostings.leg,
      debitCents: sql<number>`coalesce(sum(${ledgerPostings.cents}) filter (where ${ledgerPostings.cents} > 0), 0)::bigint`,
      creditCents: sql<number>`coalesce(sum(-${ledgerPostings.cents}) filter (where ${ledgerPostings.cents} < 0), 0)::bigint`,
      balanceCents: sql<number>`sum(${ledgerPostings.cents})::bigint`,
    })
    .from(ledgerPostings)
    .where(orderId ? eq(ledgerPostings.orderId, orderId) : undefined)
    .groupBy(ledgerPostings.account, ledgerPostings.leg)
    .orderBy(ledgerPostings.account, ledgerPostings.leg);
  return rows.flatMap((row) => (isAccount(row.account) ? [{ ...row, account: row.account }] : []));
}

export async function unfinishedEffects(tx: Tx) {
  return tx
    .select({ effect: outbox, orderNumber: orders.number })
    .from(outbox)
    .leftJoin(orders, eq(orders.id, outbox.orderId))
    .where(ne(outbox.state, 'done'))
    .orderBy(asc(outbox.seq))
    .limit(200);
}

export async function waitingCounts(tx: Tx, now: Date) {
  const [events, open, overdue] = await Promise.all([
    tx.$count(providerEvents, isNull(providerEvents.appliedAt)),
    tx.$count(deadlines, eq(deadlines.state, 'open')),
    tx.$count(deadlines, and(eq(deadlines.state, 'open'), lte(deadlines.dueAt, now))),
  ]);
  return { waitingEvents: events, openClocks: open, overdueClocks: overdue };
}
