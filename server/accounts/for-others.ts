// What other features may use of accounts: one line in the audit trail for every change of state.
import type { Tx } from '../db/client';
import { audit } from './tables';

export interface AuditLine {
  readonly at: Date;
  readonly actorUserId: string | null;
  /** The role they acted in: builder, dock, clock, provider ... */
  readonly actorKind: string;
  readonly action: string;
  readonly objectKind: string;
  readonly objectId: string;
  readonly detail: Record<string, unknown>;
}

export async function recordAudit(tx: Tx, entry: AuditLine): Promise<void> {
  await tx.insert(audit).values(entry);
}
