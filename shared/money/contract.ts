// Money on the wire: the ledger, reconciliation and stuck effects for admins; payouts for a seller.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { at, cents, id, page, pageQuery } from '../kernel/fields';
import { ACCOUNTS } from './ledger';

export const ledgerEntry = z.object({
  id,
  at,
  event: z.string(),
  orderId: id,
  orderNumber: z.string().nullable(),
  postings: z.array(
    z.object({
      account: z.enum(ACCOUNTS),
      leg: z.enum(['unit', 'core']).nullable(),
      debitCents: cents,
      creditCents: cents,
    }),
  ),
});

const signed = z.number().int();

export const readLedger = endpoint({
  method: 'GET',
  path: '/api/admin/ledger',
  summary: 'Entries of the ledger, newest first, with balances (of one order with ?orderId=)',
  access: 'admin',
  query: z.object({ ...pageQuery, orderId: z.string().max(64).optional() }),
  answer: z.object({
    entries: z.array(ledgerEntry),
    next: z.string().nullable(),
    balances: z.array(
      z.object({
        account: z.enum(ACCOUNTS),
        leg: z.enum(['unit', 'core']).nullable(),
        debitCents: signed,
        creditCents: signed,
        balanceCents: signed,
      }),
    ),
  }),
});

export const reconciliation = z.object({
  at,
  /** What our ledger says the provider holds for us. */
  ledgerCents: signed,
  /** What the provider's own list of movements adds up to. */
  providerCents: signed,
  movements: z.number().int(),
  differences: z.array(
    z.object({
      kind: z.enum(['missing_at_provider', 'missing_in_ledger', 'amount']),
      objectId: z.string(),
      orderId: z.string().nullable(),
      ledgerCents: signed,
      providerCents: signed,
      cause: z.string(),
    }),
  ),
});
export type Reconciliation = z.output<typeof reconciliation>;

export const readReconciliation = endpoint({
  method: 'GET',
  path: '/api/admin/reconciliation',
  summary: 'Ledger against the provider, item by item, now',
  access: 'admin',
  answer: reconciliation,
});

export const stuckEffect = z.object({
  key: z.string(),
  kind: z.enum(['refund', 'transfer', 'expire_checkout', 'mail']),
  orderId: z.string().nullable(),
  orderNumber: z.string().nullable(),
  state: z.enum(['waiting', 'dead', 'blocked']),
  attempts: z.number().int(),
  lastError: z.string().nullable(),
  createdAt: at,
});

export const readHealth = endpoint({
  method: 'GET',
  path: '/api/admin/health',
  summary: 'Effects that wait, are blocked or were given up; events and clocks that wait',
  access: 'admin',
  answer: z.object({
    effects: z.array(stuckEffect),
    waitingEvents: z.number().int(),
    openClocks: z.number().int(),
    overdueClocks: z.number().int(),
    heldCents: cents,
    owedToSellersCents: cents,
    owedToBuildersCents: cents,
  }),
});

export const retryEffect = endpoint({
  method: 'POST',
  path: '/api/admin/effects/retry',
  summary: 'Try an effect again that was given up',
  access: 'admin',
  body: z.strictObject({ key: z.string().min(1).max(300) }),
  answer: z.object({ state: z.string() }),
});

const sellerQuery = z.object({ sellerId: id });

export const readPayouts = endpoint({
  method: 'GET',
  path: '/api/seller/payouts',
  summary:
    'What was paid out to a seller account, what is due to it, and the deposits it may still have to give back',
  access: 'member',
  query: sellerQuery.extend(pageQuery),
  answer: page(
    z.object({
      id: z.string(),
      orderId: id,
      orderNumber: z.string(),
      title: z.string(),
      why: z.enum(['accepted', 'deposit_to_seller', 'core_settled', 'case_settled']),
      cents,
      state: z.enum(['sent', 'on_the_way', 'waiting_for_sign_up', 'stuck']),
      at,
    }),
  ).extend({
    payoutsEnabled: z.boolean(),
    paidOutCents: cents,
    dueCents: cents,
    /** Held for units on their way; released when accepted. */
    heldUnitCents: cents,
    /** Held deposits by how they stand. */
    deposits: z.array(
      z.object({
        orderId: id,
        orderNumber: z.string(),
        title: z.string(),
        coreState: z.string(),
        cents,
        dueAt: at.nullable(),
      }),
    ),
  }),
});

export const startOnboarding = endpoint({
  method: 'POST',
  path: '/api/seller/payouts/sign-up',
  summary: 'The address of the provider’s page where a seller signs up to be paid',
  access: 'owner',
  body: z.strictObject({ sellerId: id }),
  answer: z.object({ url: z.string() }),
});
