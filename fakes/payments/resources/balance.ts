// The balance, every movement of it, and payouts to the bank.
import { z } from 'zod';
import { missing } from '../errors';
import { currency, expandParam, metadata, positive, readParams } from '../form-decode';
import { listParams, pageOf } from '../lists';
import type { BalanceTransaction, Payout } from '../model/balance';
import { idOf, type Call, type Routes } from '../router';
import { accountBalance, move, needAvailable, newId, platformBalance, type World } from '../world';
import { findAccount } from './accounts';

const payoutParams = z.strictObject({
  amount: positive,
  currency,
  description: z.string().optional(),
  metadata: metadata.default({}),
  expand: expandParam,
});

const transactionListParams = z.strictObject({
  ...listParams,
  currency: currency.optional(),
  source: z.string().optional(),
  type: z.string().optional(),
});

const withStatus = (
  world: World,
  transaction: BalanceTransaction,
): BalanceTransaction & { status: string } => ({
  ...transaction,
  status: transaction.available_on <= world.seconds() ? 'available' : 'pending',
});

function moneys(world: World): string[] {
  const seen = new Set(world.state.balanceTransactions.all().map((transaction) => transaction.currency));
  return Array.from(seen.add('usd'));
}

function balance({ world, account, form }: Call): object {
  readParams(z.strictObject({ expand: expandParam }), form);
  const amounts = moneys(world).map((money) => ({
    currency: money,
    ...(account === null
      ? platformBalance(world, money)
      : { available: accountBalance(world, findAccount(world, account).id, money), pending: 0 }),
  }));
  const side = (name: 'available' | 'pending'): object[] =>
    amounts.map((entry) => ({
      amount: entry[name],
      currency: entry.currency,
      source_types: { card: entry[name] },
    }));
  return { object: 'balance', available: side('available'), livemode: false, pending: side('pending') };
}

function payOut({ world, account, form, cause }: Call): Payout {
  const params = readParams(payoutParams, form);
  const available =
    account === null
      ? platformBalance(world, params.currency).available
      : accountBalance(world, findAccount(world, account).id, params.currency);
  needAvailable(available, params.amount);
  const id = newId('po');
  const transaction =
    account === null
      ? move(world, { type: 'payout', amount: -params.amount, currency: params.currency, source: id })
      : null;
  world.state.payoutOwners.put(id, { account });
  const payout = world.state.payouts.put(id, {
    id,
    object: 'payout',
    amount: params.amount,
    arrival_date: world.seconds(),
    automatic: false,
    balance_transaction: transaction?.id ?? null,
    created: world.seconds(),
    currency: params.currency,
    description: params.description ?? null,
    livemode: false,
    metadata: params.metadata,
    method: 'standard',
    status: 'paid',
    type: 'bank_account',
  });
  world.emit('payout.paid', payout, cause, account ?? undefined);
  return payout;
}

const payoutsOf = (world: World, account: string | null): Payout[] =>
  world.state.payouts
    .all()
    .filter((payout) => (world.state.payoutOwners.get(payout.id)?.account ?? null) === account);

export const balanceRoutes: Routes = {
  'GET /v1/balance': balance,
  'GET /v1/balance_transactions': ({ world, form, path }) => {
    const { currency: money, source, type, ...paging } = readParams(transactionListParams, form);
    const transactions = world.state.balanceTransactions
      .all()
      .filter((transaction) => money === undefined || transaction.currency === money)
      .filter((transaction) => source === undefined || transaction.source === source)
      .filter((transaction) => type === undefined || transaction.type === type);
    const found = pageOf(transactions, paging, path);
    return { ...found, data: found.data.map((transaction) => withStatus(world, transaction)) };
  },
  'GET /v1/balance_transactions/:id': (call) => {
    const transaction = call.world.state.balanceTransactions.get(idOf(call));
    if (transaction === undefined) throw missing('balance transaction', idOf(call));
    return withStatus(call.world, transaction);
  },
  'POST /v1/payouts': payOut,
  'GET /v1/payouts': ({ world, account, form, path }) =>
    pageOf(payoutsOf(world, account), readParams(z.strictObject(listParams), form), path),
  'GET /v1/payouts/:id': (call) => {
    const payout = payoutsOf(call.world, call.account).find((each) => each.id === idOf(call));
    if (payout === undefined) throw missing('payout', idOf(call));
    return payout;
  },
};
