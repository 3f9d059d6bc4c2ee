// What other features may use of cases: open and close one inside their own transaction.
import { and, eq } from 'drizzle-orm';
import { newId } from '../../shared/kernel/ids';
import type { Tx } from '../db/client';
import type { OrderRow } from '../orders/load';
import { cases, proposals } from './tables';

type Kind = (typeof cases.$inferSelect)['kind'];

export interface OpenCaseInput {
  readonly order: Pick<OrderRow, 'id'>;
  readonly kind: Kind;
  readonly reason: string;
  readonly openedBy: string | null;
  readonly now: Date;
  readonly disputeId?: string;
}

export async function openCase(tx: Tx, input: OpenCaseInput): Promise<void> {
  await tx.insert(cases).values({
    id: newId('cas', input.now.getTime()),
    orderId: input.order.id,
    kind: input.kind,
    reason: input.reason,
    openedBy: input.openedBy,
    openedAt: input.now,
    disputeId: input.disputeId ?? null,
  });
}

export interface CloseCaseInput {
  readonly orderId: string;
  readonly kind: Kind;
  readonly toBuyerCents: number;
  readonly toSellerCents: number;
  readonly finding: string | null;
  readonly settledBy: 'both' | 'admin' | 'provider';
  readonly settledByUserId: string | null;
  readonly now: Date;
}

export async function closeCase(tx: Tx, input: CloseCaseInput): Promise<void> {
  const closed = await tx
    .update(cases)
    .set({
      state: 'settled',
      toBuyerCents: input.toBuyerCents,
      toSellerCents: input.toSellerCents,
      finding: input.finding,
      settledBy: input.settledBy,
      settledByUserId: input.settledByUserId,
      settledAt: input.now,
    })
    .where(and(eq(cases.orderId, input.orderId), eq(cases.kind, input.kind), eq(cases.state, 'open')))
    .returning({ id: cases.id });
  for (const one of closed) {
    await tx
      .update(proposals)
      .set({ state: 'replaced', endedAt: input.now })
      .where(and(eq(proposals.caseId, one.id), eq(proposals.state, 'open')));
  }
}
