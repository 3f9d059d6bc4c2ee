// Disputes (chargebacks): the money is taken at once, and comes back only when the dispute is won.
import { z } from 'zod';
import { missing, refused } from '../errors';
import { expandParam, readParams } from '../form-decode';
import { listParams, pageOf } from '../lists';
import type { Dispute } from '../model/payments';
import { idOf, type Routes } from '../router';
import { move, newId, type Cause, type World } from '../world';

const DAYS_TO_ANSWER = 7;

const disputeListParams = z.strictObject({
  ...listParams,
  charge: z.string().optional(),
  payment_intent: z.string().optional(),
});

const shown = (world: World, dispute: Dispute): object => ({
  ...dispute,
  balance_transactions: dispute.balance_transactions.map((id) => world.state.balanceTransactions.get(id)),
  evidence: {},
});

/** True while a dispute over the charge is open, and for good once it is lost. */
export const isChargedBack = (world: World, charge: string): boolean =>
  world.state.disputes.all().some((dispute) => dispute.charge === charge && dispute.status !== 'won');

/** @param chargeOrIntent id of a charge or of its payment intent */
export function openDispute(
  world: World,
  chargeOrIntent: string,
  request: { amount?: number | undefined; reason?: string | undefined },
  cause: Cause,
): object {
  const viaIntent = world.state.paymentIntents.get(chargeOrIntent)?.latest_charge;
  const charge = world.state.charges.get(viaIntent ?? chargeOrIntent);
  if (charge?.paid !== true) throw missing('charge', chargeOrIntent);
  if (isChargedBack(world, charge.id))
    throw refused(`Charge ${charge.id} is already disputed.`, 'charge_disputed');
  const amount = request.amount ?? charge.amount - charge.amount_refunded;
  if (amount > charge.amount)
    throw refused('A dispute cannot be over more than the charge.', 'amount_too_large');
  const id = newId('du');
  const taken = move(world, {
    type: 'adjustment',
    category: 'dispute',
    amount: -amount,
    currency: charge.currency,
    source: id,
  });
  const dispute = world.state.disputes.put(id, {
    id,
    object: 'dispute',
    amount,
    balance_transactions: [taken.id],
    charge: charge.id,
    created: world.seconds(),
    currency: charge.currency,
    evidence_details: {
      due_by: world.seconds() + DAYS_TO_ANSWER * 24 * 60 * 60,
      has_evidence: false,
      past_due: false,
      submission_count: 0,
    },
    is_charge_refundable: false,
    livemode: false,
    metadata: {},
    payment_intent: charge.payment_intent,
    reason: request.reason ?? 'product_not_received',
    status: 'needs_response',
  });
  world.state.charges.put(charge.id, { ...charge, disputed: true });
  world.emit('charge.dispute.created', shown(world, dispute), cause);
  world.emit('charge.dispute.funds_withdrawn', shown(world, dispute), cause);
  return shown(world, dispute);
}

export function closeDispute(world: World, id: string, status: 'won' | 'lost', cause: Cause): object {
  const dispute = world.state.disputes.get(id);
  if (dispute === undefined) throw missing('dispute', id);
  if (dispute.status === 'won' || dispute.status === 'lost')
    throw refused(`Dispute ${id} is already closed.`, 'dispute_closed');
  const back =
    status === 'won'
      ? [
          move(world, {
            type: 'adjustment',
            category: 'dispute_reversal',
            amount: dispute.amount,
            currency: dispute.currency,
            source: id,
          }).id,
        ]
      : [];
  const closed = world.state.disputes.put(id, {
    ...dispute,
    balance_transactions: [...dispute.balance_transactions, ...back],
    status,
  });
  if (status === 'won') world.emit('charge.dispute.funds_reinstated', shown(world, closed), cause);
  world.emit('charge.dispute.closed', shown(world, closed), cause);
  return shown(world, closed);
}

export const disputeRoutes: Routes = {
  'GET /v1/disputes': ({ world, form, path }) => {
    const { charge, payment_intent: intent, ...paging } = readParams(disputeListParams, form);
    const disputes = world.state.disputes
      .all()
      .filter((dispute) => charge === undefined || dispute.charge === charge)
      .filter((dispute) => intent === undefined || dispute.payment_intent === intent);
    const found = pageOf(disputes, paging, path);
    return { ...found, data: found.data.map((dispute) => shown(world, dispute)) };
  },
  'GET /v1/disputes/:id': (call) => {
    readParams(z.strictObject({ expand: expandParam }), call.form);
    const dispute = call.world.state.disputes.get(idOf(call));
    if (dispute === undefined) throw missing('dispute', idOf(call));
    return shown(call.world, dispute);
  },
};
