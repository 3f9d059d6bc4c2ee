// One round of everything that works without a request: events, effects, clocks.
import type { Deps } from './deps';
import { drainOutbox } from './jobs/outbox';
import { applyEvents, type EventHandlers } from './money/apply-events';
import { effectHandlers } from './money/effects';
import { applyAccountChange } from './money/payouts';
import { applyDispute, applyExpiredCheckout, applyPayment, applyRefundChange } from './orders/apply-payment';
import { sweepDeadlines } from './orders/fire';

const eventHandlers: EventHandlers = {
  'checkout.session.completed': applyPayment,
  'checkout.session.expired': applyExpiredCheckout,
  'refund.failed': applyRefundChange,
  'refund.updated': applyRefundChange,
  'charge.refund.updated': applyRefundChange,
  'account.updated': applyAccountChange,
  'charge.dispute.created': applyDispute,
  'charge.dispute.closed': applyDispute,
};

/** Events first: what they change may owe somebody something. */
export async function drainOnce(deps: Deps): Promise<void> {
  await applyEvents(deps, eventHandlers);
  await drainOutbox(deps, effectHandlers);
}

export async function runBackgroundOnce(deps: Deps): Promise<void> {
  await drainOnce(deps);
  await sweepDeadlines(deps);
  await drainOnce(deps);
}
