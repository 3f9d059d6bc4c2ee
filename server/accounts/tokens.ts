// Single-use links: 32 random bytes go out by mail, only their hash stays here.
import { createHash, randomBytes } from 'node:crypto';
import { and, eq, gt, isNull } from 'drizzle-orm';
import type { Tx } from '../db/client';
import { accountTokens } from './tables';

export const LINK_MINUTES = 30;

export const hashToken = (token: string): string => createHash('sha256').update(token).digest('hex');
export const newToken = (): string => randomBytes(32).toString('base64url');

export type Purpose = 'check_mail' | 'reset';

/** A new link of a kind; older ones of the same kind stop working. */
export async function issueToken(tx: Tx, userId: string, purpose: Purpose, now: Date): Promise<string> {
  await tx
    .update(accountTokens)
    .set({ usedAt: now })
    .where(
      and(eq(accountTokens.userId, userId), eq(accountTokens.purpose, purpose), isNull(accountTokens.usedAt)),
    );
  const token = newToken();
  await tx.insert(accountTokens).values({
    tokenHash: hashToken(token),
    userId,
    purpose,
    expiresAt: new Date(now.getTime() + LINK_MINUTES * 60_000),
    createdAt: now,
  });
  return token;
}

/** Uses a link up. @returns whose it was, or null where it is unknown, used or too old */
export async function useToken(tx: Tx, token: string, purpose: Purpose, now: Date): Promise<string | null> {
  const [row] = await tx
    .update(accountTokens)
    .set({ usedAt: now })
    .where(
      and(
        eq(accountTokens.tokenHash, hashToken(token)),
        eq(accountTokens.purpose, purpose),
        isNull(accountTokens.usedAt),
        gt(accountTokens.expiresAt, now),
      ),
    )
    .returning({ userId: accountTokens.userId });
  return row?.userId ?? null;
}
