// Nightly: what nobody needs any more (old idempotency keys, ended sessions, spent rate limits).
import { sql } from 'drizzle-orm';
import type { Deps } from '../deps';

export async function tidy(deps: Deps): Promise<void> {
  await deps.db.execute(sql`delete from idempotency_keys where created_at < now() - interval '48 hours'`);
  await deps.db.execute(sql`delete from session where expire < now()`);
  await deps.db.execute(sql`delete from rate_limits where expire < extract(epoch from now()) * 1000`);
}
