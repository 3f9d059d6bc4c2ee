// Transfers to connected accounts and their reversals: each needs the money to be there.
import { z } from 'zod';
import { badParam, missing, refused } from '../errors';
import { currency, expandParam, metadata, positive, readParams } from '../form-decode';
import { listParams, pageOf } from '../lists';
import type { Transfer, TransferReversal } from '../model/balance';
import type { Charge } from '../model/payments';
import { idOf, type Call, type Routes } from '../router';
import { accountBalance, move, needAvailable, newId, platformBalance, type World } from '../world';
import { findAccount } from './accounts';

const createParams = z.strictObject({
  amount: positive,
  currency,
  destination: z.string(),
  description: z.string().optional(),
  metadata: metadata.default({}),
  source_transaction: z.string().optional(),
  source_type: z.literal('card').optional(),
  transfer_group: z.string().optional(),
  expand: expandParam,
});

const reversalParams = z.strictObject({
  amount: positive.optional(),
  description: z.string().optional(),
  metadata: metadata.default({}),
  refund_application_fee: z.string().optional(),
  expand: expandParam,
});

const transferListParams = z.strictObject({
  ...listParams,
  destination: z.string().optional(),
  transfer_group: z.string().optional(),
});

/** With a source the money may still be pending, but no more than the charge brought can be sent. */
function checkSource(world: World, source: string, amount: number): Charge {
  const charge = world.state.charges.get(source);
  if (charge?.paid !== true) throw missing('charge', source, 'source_transaction');
  const sent = world.state.transfers
    .all()
    .filter((transfer) => transfer.source_transaction === source)
    .reduce((sum, transfer) => sum + transfer.amount - transfer.amount_reversed, 0);
  needAvailable(charge.amount - charge.amount_refunded - sent, amount);
  return charge;
}

function create({ world, form, cause }: Call): object {
  const params = readParams(createParams, form);
  const account = findAccount(world, params.destination, 'destination');
  if (account.capabilities['transfers'] !== 'active') {
    throw refused(
      'The destination account needs the transfers capability, and has not completed its onboarding.',
      'insufficient_capabilities_for_transfer',
      'destination',
    );
  }
  const source = params.source_transaction;
  const charge = source === undefined ? null : checkSource(world, source, params.amount);
  if (charge === null) needAvailable(platformBalance(world, params.currency).available, params.amount);
  else if (charge.currency !== params.currency)
    throw badParam('The currency must be that of the source transaction.', 'parameter_invalid', 'currency');
  const id = newId('tr');
  const transaction = move(world, {
    type: 'transfer',
    amount: -params.amount,
    currency: params.currency,
    source: id,
    description: params.description,
    availableOn:
      charge === null
        ? undefined
        : world.state.balanceTransactions.get(charge.balance_transaction ?? '')?.available_on,
  });
  const transfer = world.state.transfers.put(id, {
    id,
    object: 'transfer',
    amount: params.amount,
    amount_reversed: 0,
    balance_transaction: transaction.id,
    created: world.seconds(),
    currency: params.currency,
    description: params.description ?? null,
    destination: account.id,
    livemode: false,
    metadata: params.metadata,
    reversed: false,
    source_transaction: source ?? null,
    source_type: 'card',
    transfer_group: params.transfer_group ?? charge?.transfer_group ?? null,
  });
  const shown = withReversals(world, transfer);
  world.emit('transfer.created', shown, cause);
  return shown;
}

function withReversals(world: World, transfer: Transfer): object {
  const reversals = world.state.transferReversals
    .all()
    .filter((reversal) => reversal.transfer === transfer.id);
  return {
    ...transfer,
    reversals: {
      object: 'list',
      data: reversals.slice(-10).reverse(),
      has_more: reversals.length > 10,
      total_count: reversals.length,
      url: `/v1/transfers/${transfer.id}/reversals`,
    },
  };
}

function find(call: Call, name = 'id'): Transfer {
  const transfer = call.world.state.transfers.get(idOf(call, name));
  if (transfer === undefined) throw missing('transfer', idOf(call, name));
  return transfer;
}

function reverse(call: Call): TransferReversal {
  const { world } = call;
  const params = readParams(reversalParams, call.form);
  const transfer = find(call);
  const left = transfer.amount - transfer.amount_reversed;
  const amount = params.amount ?? left;
  if (left === 0)
    throw refused(`Transfer ${transfer.id} is already fully reversed.`, 'transfer_already_reversed');
  if (amount > left)
    throw refused(
      `Reversal amount (${amount}) is greater than what is left of the transfer (${left}).`,
      'amount_too_large',
      'amount',
    );
  needAvailable(accountBalance(world, transfer.destination, transfer.currency), amount);
  const id = newId('trr');
  const transaction = move(world, {
    type: 'transfer_refund',
    amount,
    currency: transfer.currency,
    source: id,
  });
  const reversal = world.state.transferReversals.put(id, {
    id,
    object: 'transfer_reversal',
    amount,
    balance_transaction: transaction.id,
    created: world.seconds(),
    currency: transfer.currency,
    destination_payment_refund: null,
    metadata: params.metadata,
    source_refund: null,
    transfer: transfer.id,
  });
  const after = world.state.transfers.put(transfer.id, {
    ...transfer,
    amount_reversed: transfer.amount_reversed + amount,
    reversed: amount === left,
  });
  world.emit('transfer.reversed', withReversals(world, after), call.cause);
  return reversal;
}

export const transferRoutes: Routes = {
  'POST /v1/transfers': create,
  'GET /v1/transfers': ({ world, form, path }) => {
    const { destination, transfer_group: group, ...paging } = readParams(transferListParams, form);
    const transfers = world.state.transfers
      .all()
      .filter((transfer) => destination === undefined || transfer.destination === destination)
      .filter((transfer) => group === undefined || transfer.transfer_group === group);
    const found = pageOf(transfers, paging, path);
    return { ...found, data: found.data.map((transfer) => withReversals(world, transfer)) };
  },
  'GET /v1/transfers/:id': (call) => {
    readParams(z.strictObject({ expand: expandParam }), call.form);
    return withReversals(call.world, find(call));
  },
  'POST /v1/transfers/:id/reversals': reverse,
  'GET /v1/transfers/:id/reversals': (call) => {
    const transfer = find(call);
    const reversals = call.world.state.transferReversals.all();
    return pageOf(
      reversals.filter((reversal) => reversal.transfer === transfer.id),
      readParams(z.strictObject(listParams), call.form),
      call.path,
    );
  },
  'GET /v1/transfers/:id/reversals/:reversal': (call) => {
    const reversal = call.world.state.transferReversals.get(idOf(call, 'reversal'));
    if (reversal?.transfer !== find(call).id) throw missing('transfer reversal', idOf(call, 'reversal'));
    return reversal;
  },
};
