// Where a person is signed in. A session is shown by a hash of its id, never by the id itself.
import { createHash } from 'node:crypto';
import { sql } from 'drizzle-orm';
import { z } from 'zod';
import type { Deps } from '../deps';
import { notFound, type Refusal } from '../http/refusal';

const publicId = (sid: string): string =>
  `ses_${createHash('sha256').update(sid).digest('hex').slice(0, 24)}`;

const row = z.object({
  sid: z.string(),
  agent: z.string().nullable(),
  started: z.coerce.number().nullable(),
  ends: z.coerce.number().nullable(),
});

async function sessionsOf(deps: Deps, userId: string) {
  const result = await deps.db.execute(
    sql`select sid, sess->>'agent' as agent, sess->>'startedAtMs' as started, sess->>'endsAtMs' as ends
        from session where sess->>'userId' = ${userId} and expire > now() order by expire desc limit 50`,
  );
  return z.array(row).parse(result.rows);
}

export async function presentSessions(deps: Deps, userId: string, currentSid: string | null) {
  const rows = await sessionsOf(deps, userId);
  return {
    items: rows.map((one) => ({
      id: publicId(one.sid),
      agent: one.agent ?? '',
      startedAt: one.started === null ? null : new Date(one.started).toISOString(),
      endsAt: new Date(one.ends ?? Date.now()).toISOString(),
      current: one.sid === currentSid,
    })),
  };
}

export async function endOneSession(deps: Deps, userId: string, id: string): Promise<void | Refusal> {
  const rows = await sessionsOf(deps, userId);
  const found = rows.find((one) => publicId(one.sid) === id);
  if (!found) return notFound('session');
  await deps.db.execute(sql`delete from session where sid = ${found.sid}`);
}
