// The objects of a payment as they travel and as they are kept: only fields that the provider's API gives in answers.
import { z } from 'zod';

const metadata = z.record(z.string(), z.string());
const text = z.string();
const maybe = z.string().nullable();
const count = z.number().int();

export const sessionShape = z.object({
  id: text,
  object: z.literal('checkout.session'),
  amount_subtotal: count,
  amount_total: count,
  cancel_url: maybe,
  client_reference_id: maybe,
  created: count,
  currency: text,
  customer: z.null(),
  customer_details: z.object({ email: maybe, name: maybe }).nullable(),
  customer_email: maybe,
  expires_at: count,
  livemode: z.literal(false),
  locale: maybe,
  metadata,
  mode: z.literal('payment'),
  payment_intent: maybe,
  payment_method_types: z.array(text),
  payment_status: z.enum(['unpaid', 'paid', 'no_payment_required']),
  status: z.enum(['open', 'complete', 'expired']),
  submit_type: maybe,
  success_url: text,
  total_details: z.object({ amount_discount: count, amount_shipping: count, amount_tax: count }),
  ui_mode: z.literal('hosted_page'),
  url: maybe,
});

const lineItemShape = z.object({
  id: text,
  object: z.literal('item'),
  amount_discount: count,
  amount_subtotal: count,
  amount_tax: count,
  amount_total: count,
  currency: text,
  description: text,
  price: z.object({
    id: text,
    object: z.literal('price'),
    currency: text,
    product: text,
    type: z.literal('one_time'),
    unit_amount: count,
  }),
  quantity: count,
});

/** What a session will make of its payment, and its lines: kept beside it, since its answer does not hold them. */
export const sessionPlanShape = z.object({
  lineItems: z.array(lineItemShape),
  intent: z.object({
    description: maybe,
    metadata,
    receipt_email: maybe,
    transfer_group: maybe,
  }),
});

const cardError = z.object({
  type: z.literal('card_error'),
  code: text,
  decline_code: text.optional(),
  message: text,
  charge: text.optional(),
});

export const paymentIntentShape = z.object({
  id: text,
  object: z.literal('payment_intent'),
  amount: count,
  amount_capturable: count,
  amount_received: count,
  canceled_at: count.nullable(),
  cancellation_reason: maybe,
  capture_method: z.literal('automatic'),
  client_secret: text,
  confirmation_method: z.literal('automatic'),
  created: count,
  currency: text,
  customer: z.null(),
  description: maybe,
  last_payment_error: cardError.nullable(),
  latest_charge: maybe,
  livemode: z.literal(false),
  metadata,
  payment_method: maybe,
  payment_method_types: z.array(text),
  receipt_email: maybe,
  status: z.enum(['requires_payment_method', 'succeeded', 'canceled']),
  transfer_group: maybe,
});

export const chargeShape = z.object({
  id: text,
  object: z.literal('charge'),
  amount: count,
  amount_captured: count,
  amount_refunded: count,
  balance_transaction: maybe,
  captured: z.boolean(),
  created: count,
  currency: text,
  customer: z.null(),
  description: maybe,
  disputed: z.boolean(),
  failure_code: maybe,
  failure_message: maybe,
  livemode: z.literal(false),
  metadata,
  outcome: z.object({ network_status: text, reason: maybe, seller_message: text, type: text }),
  paid: z.boolean(),
  payment_intent: text,
  payment_method: maybe,
  payment_method_details: z.object({
    type: z.literal('card'),
    card: z.object({ brand: text, country: text, exp_month: count, exp_year: count, last4: text }),
  }),
  receipt_email: maybe,
  refunded: z.boolean(),
  status: z.enum(['succeeded', 'failed']),
  transfer_group: maybe,
});

export const refundShape = z.object({
  id: text,
  object: z.literal('refund'),
  amount: count,
  balance_transaction: maybe,
  charge: text,
  created: count,
  currency: text,
  failure_balance_transaction: text.optional(),
  failure_reason: text.optional(),
  metadata,
  payment_intent: maybe,
  reason: maybe,
  receipt_number: z.null(),
  source_transfer_reversal: z.null(),
  status: z.enum(['pending', 'succeeded', 'failed']),
  transfer_reversal: z.null(),
});

export const disputeShape = z.object({
  id: text,
  object: z.literal('dispute'),
  amount: count,
  balance_transactions: z.array(text),
  charge: text,
  created: count,
  currency: text,
  evidence_details: z.object({
    due_by: count,
    has_evidence: z.boolean(),
    past_due: z.boolean(),
    submission_count: count,
  }),
  is_charge_refundable: z.boolean(),
  livemode: z.literal(false),
  metadata,
  payment_intent: maybe,
  reason: text,
  status: z.enum(['needs_response', 'under_review', 'won', 'lost']),
});

export type Session = z.output<typeof sessionShape>;
export type LineItem = z.output<typeof lineItemShape>;
export type PaymentIntent = z.output<typeof paymentIntentShape>;
export type Charge = z.output<typeof chargeShape>;
export type Refund = z.output<typeof refundShape>;
export type Dispute = z.output<typeof disputeShape>;
