// The one connection pool and its Drizzle face.
import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import pg from 'pg';

// Amounts are bigint columns; 2^53 cents is far beyond any order, so a JavaScript number is exact.
pg.types.setTypeParser(pg.types.builtins.INT8, Number);

export type Db = NodePgDatabase;
/** A transaction, or the database itself where one statement is enough. */
export type Tx = Pick<
  NodePgDatabase,
  'select' | 'insert' | 'update' | 'delete' | 'execute' | 'selectDistinct' | '$count' | 'transaction'
>;

export interface Database {
  readonly pool: pg.Pool;
  readonly db: Db;
  close(): Promise<void>;
}

export function connect(url: string, size: number, onError: (error: Error) => void): Database {
  const pool = new pg.Pool({
    connectionString: url,
    max: size,
    idleTimeoutMillis: 30_000,
    connectionTimeoutMillis: 10_000,
    statement_timeout: 15_000,
    application_name: 'spragyard',
  });
  // An idle connection that the server ends must not end the process.
  pool.on('error', onError);
  return { pool, db: drizzle(pool), close: () => pool.end() };
}
