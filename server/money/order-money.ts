// The money of orders in sums, read from the ledger alone.
import { inArray, sql } from 'drizzle-orm';
import type { Tx } from '../db/client';
import { ledgerEntries, ledgerPostings } from './tables';

export interface MoneyRow {
  readonly capturedCents: number;
  readonly heldUnitCents: number;
  readonly heldCoreCents: number;
  readonly refundedCents: number;
  readonly paidOutCents: number;
  readonly feeCents: number;
  readonly taxCents: number;
  /** Owed to either side, not yet confirmed by the provider. */
  readonly onTheWayCents: number;
}

const NOTHING: MoneyRow = {
  capturedCents: 0,
  heldUnitCents: 0,
  heldCoreCents: 0,
  refundedCents: 0,
  paidOutCents: 0,
  feeCents: 0,
  taxCents: 0,
  onTheWayCents: 0,
};

const P = ledgerPostings;
/** Credits minus debits of an account. */
const balance = (account: string) =>
  sql<number>`coalesce(sum(-${P.cents}) filter (where ${P.account} = ${account}), 0)::bigint`;
const hold = (leg: string) =>
  sql<number>`coalesce(sum(-${P.cents}) filter (where ${P.account} = 'hold' and ${P.leg} = ${leg}), 0)::bigint`;
/** Credits only, less what came back: what was decided in a side's favour. */
const decided = (account: string, cameBack: string) =>
  sql<number>`coalesce(sum(-${P.cents}) filter (where ${P.account} = ${account} and ${P.cents} < 0
    and ${ledgerEntries.event} <> ${cameBack}), 0)::bigint`;

export async function moneyOf(tx: Tx, orderIds: readonly string[]): Promise<(orderId: string) => MoneyRow> {
  if (orderIds.length === 0) return () => NOTHING;
  const rows = await tx
    .select({
      orderId: P.orderId,
      capturedCents: sql<number>`coalesce(sum(${P.cents}) filter (where ${P.account} = 'provider'
        and ${ledgerEntries.event} in ('captured', 'captured_late')), 0)::bigint`,
      heldUnitCents: hold('unit'),
      heldCoreCents: hold('core'),
      refundedCents: decided('refund', 'refund_failed'),
      paidOutCents: decided('payable', 'transfer_failed'),
      feeCents: balance('fee'),
      taxCents: balance('tax'),
      onTheWayCents: sql<number>`(${balance('refund')} + ${balance('payable')})::bigint`,
    })
    .from(P)
    .innerJoin(ledgerEntries, sql`${ledgerEntries.id} = ${P.entryId}`)
    .where(inArray(P.orderId, [...orderIds]))
    .groupBy(P.orderId);
  const byOrder = new Map(rows.map((row) => [row.orderId, row]));
  return (orderId) => byOrder.get(orderId) ?? NOTHING;
}
