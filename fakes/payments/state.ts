// Everything the payments stand-in holds, table by table, on one journal.
import { openJournal, type Journal } from '../journal';
import * as balance from './model/balance';
import * as delivery from './model/delivery';
import * as payments from './model/payments';

export type State = ReturnType<typeof openState>;

export function openState(directory: string | undefined) {
  const journal: Journal = openJournal(directory);
  return {
    journal,
    sessions: journal.table('sessions', payments.sessionShape),
    sessionPlans: journal.table('sessionPlans', payments.sessionPlanShape),
    paymentIntents: journal.table('paymentIntents', payments.paymentIntentShape),
    charges: journal.table('charges', payments.chargeShape),
    refunds: journal.table('refunds', payments.refundShape),
    balanceTransactions: journal.table('balanceTransactions', balance.balanceTransactionShape),
    transfers: journal.table('transfers', balance.transferShape),
    transferReversals: journal.table('transferReversals', balance.transferReversalShape),
    accounts: journal.table('accounts', balance.accountShape),
    accountLinks: journal.table('accountLinks', balance.accountLinkShape),
    disputes: journal.table('disputes', payments.disputeShape),
    payouts: journal.table('payouts', balance.payoutShape),
    payoutOwners: journal.table('payoutOwners', balance.payoutOwnerShape),
    events: journal.table('events', delivery.eventShape),
    deliveries: journal.table('deliveries', delivery.deliveryShape),
    idempotency: journal.table('idempotency', delivery.idempotencyShape),
    scheduled: journal.table('scheduled', delivery.scheduledShape),
    taxCalculations: journal.table('taxCalculations', delivery.taxCalculationShape),
  };
}
