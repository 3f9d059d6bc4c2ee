// Writes ledger entries; the database checks that each balances and that no hold goes below zero.
import { eq } from 'drizzle-orm';
import { newId } from '../../shared/kernel/ids';
import type { Entry, Holds } from '../../shared/money/ledger';
import type { Tx } from '../db/client';
import { ledgerBalances, ledgerEntries, ledgerPostings } from './tables';

export interface PostInput {
  readonly orderId: string;
  readonly sellerId: string;
  /** Made from the event's meaning: the same event can't be entered twice. */
  readonly key: string;
  readonly entry: Entry;
  readonly now: Date;
}

/** Enters one money event. @returns false where it was entered before */
export async function postEntry(tx: Tx, input: PostInput): Promise<boolean> {
  if (input.entry.postings.length === 0) return true;
  const [row] = await tx
    .insert(ledgerEntries)
    .values({
      id: newId('ent'),
      key: input.key,
      event: input.entry.event,
      orderId: input.orderId,
      at: input.now,
    })
    .onConflictDoNothing({ target: ledgerEntries.key })
    .returning({ id: ledgerEntries.id });
  if (!row) return false;
  await tx.insert(ledgerPostings).values(
    input.entry.postings.map((posting) => ({
      entryId: row.id,
      account: posting.account,
      orderId: input.orderId,
      leg: posting.leg,
      sellerId: posting.account === 'payable' ? input.sellerId : null,
      cents: posting.cents,
    })),
  );
  return true;
}

/** What the ledger holds for an order now. */
export async function holdsOf(tx: Tx, orderId: string): Promise<Holds> {
  const rows = await tx.select().from(ledgerBalances).where(eq(ledgerBalances.orderId, orderId));
  const balance = (account: string, leg: string): number =>
    rows.find((row) => row.account === account && row.leg === leg)?.cents ?? 0;
  return {
    unitCents: balance('hold', 'unit'),
    coreCents: balance('hold', 'core'),
    taxCents: balance('tax', ''),
  };
}
