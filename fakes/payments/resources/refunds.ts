// Refunds: several parts up to exactly the charge; one may fail later, and then its money is back on the balance.
import { z } from 'zod';
import { faultMs } from '../../http';
import { badParam, missing, refused } from '../errors';
import { expandParam, metadata, positive, readParams } from '../form-decode';
import { listParams, pageOf } from '../lists';
import type { Charge, Refund } from '../model/payments';
import { idOf, type Call, type Routes } from '../router';
import { isChargedBack } from './disputes';
import { move, newId, type Cause, type World } from '../world';

const FAILS_AFTER_MS = 1_000;

const createParams = z.strictObject({
  amount: positive.optional(),
  charge: z.string().optional(),
  payment_intent: z.string().optional(),
  metadata: metadata.default({}),
  reason: z.enum(['duplicate', 'fraudulent', 'requested_by_customer']).optional(),
  expand: expandParam,
});

const updateParams = z.strictObject({ metadata: metadata.default({}), expand: expandParam });

const refundListParams = z.strictObject({
  ...listParams,
  charge: z.string().optional(),
  payment_intent: z.string().optional(),
});

function chargeFor(world: World, params: z.output<typeof createParams>): Charge {
  if (params.payment_intent !== undefined) {
    const intent = world.state.paymentIntents.get(params.payment_intent);
    if (intent === undefined) throw missing('payment_intent', params.payment_intent, 'payment_intent');
    const charge = world.state.charges.get(intent.latest_charge ?? '');
    if (charge?.paid !== true)
      throw refused(
        `This payment has no successful charge to refund: ${intent.id}.`,
        'charge_not_refundable',
      );
    return charge;
  }
  if (params.charge === undefined)
    throw badParam(
      'One of the following params should be provided: payment_intent or charge.',
      'parameter_missing',
    );
  const charge = world.state.charges.get(params.charge);
  if (charge === undefined) throw missing('charge', params.charge, 'charge');
  return charge;
}

function amountFor(world: World, charge: Charge, asked: number | undefined): number {
  const left = charge.amount - charge.amount_refunded;
  if (isChargedBack(world, charge.id))
    throw refused(`Charge ${charge.id} has been charged back.`, 'charge_disputed');
  if (!charge.paid || left === 0)
    throw refused(`Charge ${charge.id} has already been refunded.`, 'charge_already_refunded');
  const amount = asked ?? left;
  if (amount > left) {
    throw refused(
      `Refund amount (${amount}) is greater than unrefunded amount on charge (${left}).`,
      'charge_refund_amount_too_large',
      'amount',
    );
  }
  return amount;
}

function create({ world, form, cause }: Call): Refund {
  const params = readParams(createParams, form);
  const charge = chargeFor(world, params);
  const amount = amountFor(world, charge, params.amount);
  const id = newId('re');
  const transaction = move(world, { type: 'refund', amount: -amount, currency: charge.currency, source: id });
  const refund = world.state.refunds.put(id, {
    id,
    object: 'refund',
    amount,
    balance_transaction: transaction.id,
    charge: charge.id,
    created: world.seconds(),
    currency: charge.currency,
    metadata: params.metadata,
    payment_intent: charge.payment_intent,
    reason: params.reason ?? null,
    receipt_number: null,
    source_transfer_reversal: null,
    status: 'succeeded',
    transfer_reversal: null,
  });
  const refunded = charge.amount_refunded + amount;
  const after = world.state.charges.put(charge.id, {
    ...charge,
    amount_refunded: refunded,
    refunded: refunded === charge.amount,
  });
  world.emit('refund.created', refund, cause);
  world.emit('charge.refunded', after, cause);
  const later = world.faults.take([cause.subject], ['fail_later']);
  if (later)
    world.state.scheduled.put(id, { refund: id, dueAtMs: Date.now() + faultMs(later, FAILS_AFTER_MS) });
  return refund;
}

/** The bank sends the money back: the refund has failed and its amount is on the balance again. */
export function failRefund(world: World, refundId: string, cause: Cause): Refund | null {
  const refund = world.state.refunds.get(refundId);
  const charge = refund && world.state.charges.get(refund.charge);
  world.state.scheduled.remove(refundId);
  if (refund === undefined || charge === undefined || refund.status === 'failed') return null;
  const transaction = move(world, {
    type: 'refund_failure',
    amount: refund.amount,
    currency: refund.currency,
    source: refund.id,
  });
  const failed = world.state.refunds.put(refund.id, {
    ...refund,
    failure_balance_transaction: transaction.id,
    failure_reason: 'lost_or_stolen_card',
    status: 'failed',
  });
  // From memory: the failed part no longer counts as refunded.
  world.state.charges.put(charge.id, {
    ...charge,
    amount_refunded: charge.amount_refunded - refund.amount,
    refunded: false,
  });
  world.emit('refund.updated', failed, cause);
  world.emit('charge.refund.updated', failed, cause);
  world.emit('refund.failed', failed, cause);
  return failed;
}

function find(call: Call): Refund {
  const refund = call.world.state.refunds.get(idOf(call));
  if (refund === undefined) throw missing('refund', idOf(call));
  return refund;
}

export const refundRoutes: Routes = {
  'POST /v1/refunds': create,
  'GET /v1/refunds': ({ world, form, path }) => {
    const { charge, payment_intent: intent, ...paging } = readParams(refundListParams, form);
    const refunds = world.state.refunds
      .all()
      .filter((refund) => charge === undefined || refund.charge === charge)
      .filter((refund) => intent === undefined || refund.payment_intent === intent);
    return pageOf(refunds, paging, path);
  },
  'GET /v1/refunds/:id': (call) => {
    readParams(z.strictObject({ expand: expandParam }), call.form);
    return find(call);
  },
  'POST /v1/refunds/:id': (call) => {
    const params = readParams(updateParams, call.form);
    const refund = find(call);
    const updated = call.world.state.refunds.put(refund.id, {
      ...refund,
      metadata: { ...refund.metadata, ...params.metadata },
    });
    call.world.emit('refund.updated', updated, call.cause);
    call.world.emit('charge.refund.updated', updated, call.cause);
    return updated;
  },
};
