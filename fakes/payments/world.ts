// What every resource works with: the state, the clock, new ids, events, and the movements of the balance.
import { randomInt } from 'node:crypto';
import type { Faults } from '../faults';
import { refused } from './errors';
import type { BalanceTransaction } from './model/balance';
import type { ProviderEvent } from './model/delivery';
import type { State } from './state';

export const API_VERSION = '2026-10-28.endive';

export interface Settings {
  /** The key that calls must carry. */
  readonly secretKey: string;
  readonly webhookSecret: string;
  /** The processing fee in hundredths of a percent of a charge. */
  readonly feeBps: number;
  /** How long a charge stays pending before it counts as available. */
  readonly availableDelayMs: number;
  /** Refuse sessions that end in less than 30 minutes or after more than 24 hours, as the provider does. */
  readonly strictExpiry: boolean;
  /** The first wait between two attempts to deliver an event; it doubles from there. */
  readonly retryBaseMs: number;
  now(): number;
}

/** The call that caused something: its event carries the ids, faults are matched against `subject`. */
export interface Cause {
  readonly subject: string;
  readonly requestId: string | null;
  readonly idempotencyKey: string | null;
  readonly apiVersion: string;
}

export interface World {
  readonly state: State;
  readonly settings: Settings;
  readonly faults: Faults;
  /** Where the stand-in is reached: links to its own pages start with it. */
  baseUrl(): string;
  /** The provider's clock, in whole seconds. */
  seconds(): number;
  emit(type: string, object: unknown, cause: Cause, account?: string): ProviderEvent;
}

const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789';

export const newId = (prefix: string, length = 24): string =>
  `${prefix}_${Array.from({ length }, () => ALPHABET[randomInt(ALPHABET.length)]).join('')}`;

export const pageCause = (subject: string): Cause => ({
  subject,
  requestId: null,
  idempotencyKey: null,
  apiVersion: API_VERSION,
});

interface Movement {
  readonly type: string;
  readonly category?: string;
  readonly amount: number;
  readonly fee?: number;
  readonly currency: string;
  readonly source: string;
  readonly description?: string | null;
  readonly availableOn?: number;
}

/** Books one movement of the platform's balance. */
export function move(world: World, movement: Movement): BalanceTransaction {
  const fee = movement.fee ?? 0;
  const transaction: BalanceTransaction = {
    id: newId('txn'),
    object: 'balance_transaction',
    amount: movement.amount,
    available_on: movement.availableOn ?? world.seconds(),
    balance_type: 'payments',
    created: world.seconds(),
    currency: movement.currency,
    description: movement.description ?? null,
    exchange_rate: null,
    fee,
    fee_details:
      fee === 0
        ? []
        : [{ amount: fee, currency: movement.currency, description: 'Processing fee', type: 'stripe_fee' }],
    net: movement.amount - fee,
    reporting_category: movement.category ?? movement.type,
    source: movement.source,
    type: movement.type,
  };
  return world.state.balanceTransactions.put(transaction.id, transaction);
}

interface Sums {
  readonly available: number;
  readonly pending: number;
}

/** The platform's balance in one currency, in cents. */
export function platformBalance(world: World, currency: string): Sums {
  const now = world.seconds();
  let available = 0;
  let pending = 0;
  for (const transaction of world.state.balanceTransactions.all()) {
    if (transaction.currency !== currency) continue;
    if (transaction.available_on <= now) available += transaction.net;
    else pending += transaction.net;
  }
  return { available, pending };
}

/** A connected account's balance in one currency, in cents: what was sent, less what came back or was paid out. */
export function accountBalance(world: World, account: string, currency: string): number {
  let cents = 0;
  for (const transfer of world.state.transfers.all()) {
    if (transfer.destination === account && transfer.currency === currency)
      cents += transfer.amount - transfer.amount_reversed;
  }
  for (const payout of world.state.payouts.all()) {
    const owner = world.state.payoutOwners.get(payout.id);
    if (owner?.account === account && payout.currency === currency) cents -= payout.amount;
  }
  return cents;
}

export function needAvailable(available: number, wanted: number): void {
  if (wanted > available) {
    throw refused(
      `Insufficient available funds: ${wanted} asked for, ${available} available.`,
      'balance_insufficient',
    );
  }
}
