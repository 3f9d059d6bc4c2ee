// Takes the provider's signed events: verified, stored raw once, acknowledged; applying them is a worker's business.
import type { Request, RequestHandler, Response } from 'express';
import { sql } from 'drizzle-orm';
import type { Deps } from '../deps';
import { sendProblem } from '../http/problem';
import { refuse } from '../http/refusal';
import { providerEvents } from './tables';

async function take(deps: Deps, req: Request, res: Response): Promise<void> {
  const signature = req.get('stripe-signature') ?? '';
  const body: unknown = req.body;
  const event = Buffer.isBuffer(body) ? deps.payments.readEvent(body, signature) : null;
  if (!event) {
    sendProblem(req, res, refuse('bad_request', 'The signature does not match.'));
    return;
  }
  await deps.db
    .insert(providerEvents)
    .values({
      id: event.id,
      type: event.type,
      objectId: event.objectId,
      raw: event.raw,
      receivedAt: deps.clock.now(),
    })
    .onConflictDoNothing();
  await deps.db.execute(sql`select pg_notify('spragyard_outbox', '')`);
  res.json({ received: true });
}

export const paymentWebhook =
  (deps: Deps): RequestHandler =>
  (req, res, next) => {
    take(deps, req, res).catch(next);
  };
