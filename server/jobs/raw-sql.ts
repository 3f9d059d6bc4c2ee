// Lets pg-boss write its job inside our Drizzle transaction: its "$1" text becomes Drizzle's SQL with bound values.
import { sql, type SQL } from 'drizzle-orm';
import type { Tx } from '../db/client';

export function rawSql(text: string, values: readonly unknown[]): SQL {
  const chunks: SQL[] = [];
  let rest = 0;
  for (const match of text.matchAll(/\$(\d+)/g)) {
    chunks.push(sql.raw(text.slice(rest, match.index)));
    chunks.push(sql`${sql.param(values[Number(match[1]) - 1])}`);
    rest = match.index + match[0].length;
  }
  chunks.push(sql.raw(text.slice(rest)));
  return sql.join(chunks);
}

export const queryIn =
  (tx: Tx) =>
  async (text: string, values: unknown[]): Promise<{ rows: unknown[] }> => {
    const result = await tx.execute(rawSql(text, values));
    return { rows: result.rows };
  };
