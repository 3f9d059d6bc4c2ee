// The objects of the balance and of connected accounts as they travel and as they are kept.
import { z } from 'zod';

const metadata = z.record(z.string(), z.string());
const text = z.string();
const maybe = z.string().nullable();
const count = z.number().int();

export const balanceTransactionShape = z.object({
  id: text,
  object: z.literal('balance_transaction'),
  amount: count,
  available_on: count,
  balance_type: z.literal('payments'),
  created: count,
  currency: text,
  description: maybe,
  exchange_rate: z.null(),
  fee: count,
  fee_details: z.array(z.object({ amount: count, currency: text, description: text, type: text })),
  net: count,
  reporting_category: text,
  source: maybe,
  type: text,
});

export const transferShape = z.object({
  id: text,
  object: z.literal('transfer'),
  amount: count,
  amount_reversed: count,
  balance_transaction: maybe,
  created: count,
  currency: text,
  description: maybe,
  destination: text,
  livemode: z.literal(false),
  metadata,
  reversed: z.boolean(),
  source_transaction: maybe,
  source_type: z.literal('card'),
  transfer_group: maybe,
});

export const transferReversalShape = z.object({
  id: text,
  object: z.literal('transfer_reversal'),
  amount: count,
  balance_transaction: maybe,
  created: count,
  currency: text,
  destination_payment_refund: z.null(),
  metadata,
  source_refund: z.null(),
  transfer: text,
});

export const accountShape = z.object({
  id: text,
  object: z.literal('account'),
  business_type: maybe,
  capabilities: z.record(text, z.enum(['active', 'inactive', 'pending'])),
  charges_enabled: z.boolean(),
  country: text,
  created: count,
  default_currency: text,
  details_submitted: z.boolean(),
  email: maybe,
  metadata,
  payouts_enabled: z.boolean(),
  requirements: z.object({
    currently_due: z.array(text),
    disabled_reason: maybe,
    eventually_due: z.array(text),
    past_due: z.array(text),
    pending_verification: z.array(text),
  }),
  type: z.literal('express'),
});

export const accountLinkShape = z.object({
  id: text,
  account: text,
  refreshUrl: text,
  returnUrl: text,
  expiresAt: count,
});

export const payoutShape = z.object({
  id: text,
  object: z.literal('payout'),
  amount: count,
  arrival_date: count,
  automatic: z.boolean(),
  balance_transaction: maybe,
  created: count,
  currency: text,
  description: maybe,
  livemode: z.literal(false),
  metadata,
  method: z.literal('standard'),
  status: z.literal('paid'),
  type: z.literal('bank_account'),
});

/** Whose payout it was: null for the platform's own. */
export const payoutOwnerShape = z.object({ account: maybe });

export type BalanceTransaction = z.output<typeof balanceTransactionShape>;
export type Transfer = z.output<typeof transferShape>;
export type TransferReversal = z.output<typeof transferReversalShape>;
export type Account = z.output<typeof accountShape>;
export type AccountLink = z.output<typeof accountLinkShape>;
export type Payout = z.output<typeof payoutShape>;
