// One way to run a write: a refusal returned from inside rolls everything back and comes out as the value it is.
import type { Tx } from './client';
import { isRefusal, type Refusal } from '../http/refusal';

class RolledBack extends Error {
  readonly refusal: Refusal;
  constructor(refusal: Refusal) {
    super('rolled back');
    this.refusal = refusal;
  }
}

export async function transaction<T>(
  db: Pick<Tx, 'transaction'>,
  work: (tx: Tx) => Promise<T>,
): Promise<T | Refusal> {
  try {
    return await db.transaction(async (tx) => {
      const result = await work(tx);
      if (isRefusal(result)) throw new RolledBack(result);
      return result;
    });
  } catch (error) {
    if (error instanceof RolledBack) return error.refusal;
    throw error;
  }
}

/** The SQLSTATE and constraint of a database error, through Drizzle's wrapper. */
export function databaseError(error: unknown): { code: string; constraint: string | undefined } | null {
  const inner = error instanceof Error && error.cause instanceof Error ? error.cause : error;
  if (typeof inner !== 'object' || inner === null || !('code' in inner) || typeof inner.code !== 'string')
    return null;
  const constraint =
    'constraint' in inner && typeof inner.constraint === 'string' ? inner.constraint : undefined;
  return { code: inner.code, constraint };
}

export const isUniqueViolation = (error: unknown, constraint?: string): boolean => {
  const found = databaseError(error);
  return found?.code === '23505' && (constraint === undefined || found.constraint === constraint);
};
