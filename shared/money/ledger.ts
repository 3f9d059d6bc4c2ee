// The double-entry ledger's rules: which accounts there are, and the balanced entry that each money event makes.
import type { Cents } from '../kernel/money';

/**
 * `provider` what the payment provider holds for us (asset); `hold` money held per order and leg; `tax` sales tax set
 * aside; `fee` our revenue; `payable` owed to a seller; `refund` owed to a builder; `dispute` taken by a card network
 * while a chargeback runs (asset); `loss` what a lost chargeback cost us.
 */
export const ACCOUNTS = ['provider', 'hold', 'tax', 'fee', 'payable', 'refund', 'dispute', 'loss'] as const;
export type Account = (typeof ACCOUNTS)[number];

/** What a hold is for: the unit with its freight, or the core deposit. */
export type HoldLeg = 'unit' | 'core';

export interface Posting {
  readonly account: Account;
  readonly leg: HoldLeg | null;
  /** Positive = debit, negative = credit, in cents; never 0. */
  readonly cents: number;
}

export const MONEY_EVENTS = [
  'captured',
  'captured_late',
  'cancelled',
  'accepted',
  'deposit_to_seller',
  'core_settled',
  'case_settled',
  'refund_sent',
  'refund_failed',
  'transfer_sent',
  'dispute_opened',
  'dispute_won',
  'dispute_lost',
] as const;
export type MoneyEvent = (typeof MONEY_EVENTS)[number];

export interface Entry {
  readonly event: MoneyEvent;
  readonly postings: readonly Posting[];
}

export interface OrderAmounts {
  readonly priceCents: Cents;
  readonly freightCents: Cents;
  readonly depositCents: Cents;
  readonly taxCents: Cents;
  readonly feeCents: Cents;
}

/** What is held now, from the ledger. */
export interface Holds {
  readonly unitCents: Cents;
  readonly coreCents: Cents;
  readonly taxCents: Cents;
}

const debit = (account: Account, cents: Cents, leg: HoldLeg | null = null): Posting => ({
  account,
  leg,
  cents,
});
const credit = (account: Account, cents: Cents, leg: HoldLeg | null = null): Posting => ({
  account,
  leg,
  cents: -cents,
});

/**
 * Makes an entry of the postings that aren't zero.
 * @throws RangeError when they don't add up to zero or an amount isn't whole cents
 */
export function entry(event: MoneyEvent, postings: readonly Posting[]): Entry {
  const real = postings.filter((posting) => posting.cents !== 0);
  const sum = real.reduce((total, posting) => total + posting.cents, 0);
  if (sum !== 0) throw new RangeError(`${event} is out of balance by ${sum} cents`);
  if (!real.every((posting) => Number.isSafeInteger(posting.cents)))
    throw new RangeError(`${event}: not whole cents`);
  return { event, postings: real };
}

export const totalOf = (amounts: Omit<OrderAmounts, 'feeCents'>): Cents =>
  amounts.priceCents + amounts.freightCents + amounts.depositCents + amounts.taxCents;

/** The builder paid: everything is held, tax set aside. */
export const captured = (amounts: OrderAmounts): Entry =>
  entry('captured', [
    debit('provider', totalOf(amounts)),
    credit('hold', amounts.priceCents + amounts.freightCents, 'unit'),
    credit('hold', amounts.depositCents, 'core'),
    credit('tax', amounts.taxCents),
  ]);

/** A payment that found no order waiting for it: owed back whole. */
export const capturedLate = (cents: Cents): Entry =>
  entry('captured_late', [debit('provider', cents), credit('refund', cents)]);

/** Everything held goes back to the builder. */
export const cancelled = (holds: Holds): Entry =>
  entry('cancelled', [
    debit('hold', holds.unitCents, 'unit'),
    debit('hold', holds.coreCents, 'core'),
    debit('tax', holds.taxCents),
    credit('refund', holds.unitCents + holds.coreCents + holds.taxCents),
  ]);

/** Price and freight to the seller, less the fee. */
export const accepted = (holds: Holds, feeCents: Cents): Entry => {
  const fee = Math.min(feeCents, holds.unitCents);
  return entry('accepted', [
    debit('hold', holds.unitCents, 'unit'),
    credit('payable', holds.unitCents - fee),
    credit('fee', fee),
  ]);
};

/** The builder kept the old unit, or never sent it. */
export const depositToSeller = (holds: Holds): Entry =>
  entry('deposit_to_seller', [debit('hold', holds.coreCents, 'core'), credit('payable', holds.coreCents)]);

export const coreSettled = (split: { toBuilderCents: Cents; toSellerCents: Cents }): Entry =>
  entry('core_settled', [
    debit('hold', split.toBuilderCents + split.toSellerCents, 'core'),
    credit('refund', split.toBuilderCents),
    credit('payable', split.toSellerCents),
  ]);

/**
 * Tax that goes back with a settlement: the same share of the tax as the builder gets of what was held for the unit,
 * rounded down so that never more tax goes back than was set aside.
 */
export function taxBack(holds: Holds, toBuilderCents: Cents): Cents {
  if (holds.taxCents === 0 || holds.unitCents === 0) return 0;
  const unitShare = Math.min(toBuilderCents, holds.unitCents);
  return Number((BigInt(holds.taxCents) * BigInt(unitShare)) / BigInt(holds.unitCents));
}

/** A case was settled: the legs it covers are split exactly; `toBuilderCents + toSellerCents` = what those legs hold. */
export const caseSettled = (
  covered: Holds,
  split: { toBuilderCents: Cents; toSellerCents: Cents },
): Entry => {
  const tax = taxBack(covered, split.toBuilderCents);
  return entry('case_settled', [
    debit('hold', covered.unitCents, 'unit'),
    debit('hold', covered.coreCents, 'core'),
    debit('tax', tax),
    credit('refund', split.toBuilderCents + tax),
    credit('payable', split.toSellerCents),
  ]);
};

export const refundSent = (cents: Cents): Entry =>
  entry('refund_sent', [debit('refund', cents), credit('provider', cents)]);

/** The provider gave the money back to us: it is owed to the builder again. */
export const refundFailed = (cents: Cents): Entry =>
  entry('refund_failed', [debit('provider', cents), credit('refund', cents)]);

export const transferSent = (cents: Cents): Entry =>
  entry('transfer_sent', [debit('payable', cents), credit('provider', cents)]);

/** The card network takes the money at once; what is held stays held until it is decided. */
export const disputeOpened = (cents: Cents): Entry =>
  entry('dispute_opened', [debit('dispute', cents), credit('provider', cents)]);

export const disputeWon = (cents: Cents): Entry =>
  entry('dispute_won', [debit('provider', cents), credit('dispute', cents)]);

/** Lost: first out of what is still held (unit, core, tax in that order), the rest is our loss. */
export function disputeLost(cents: Cents, holds: Holds): Entry {
  const unit = Math.min(cents, holds.unitCents);
  const core = Math.min(cents - unit, holds.coreCents);
  const tax = Math.min(cents - unit - core, holds.taxCents);
  return entry('dispute_lost', [
    debit('hold', unit, 'unit'),
    debit('hold', core, 'core'),
    debit('tax', tax),
    debit('loss', cents - unit - core - tax),
    credit('dispute', cents),
  ]);
}
