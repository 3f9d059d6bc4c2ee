// Refunds, transfers, reversals, disputes, balance and tax through the provider's SDK.
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { taxOn } from '../../fakes/payments/resources/tax-calculations';
import { control, givenOpenAccount, givenPaid, givenPayments, refusal, type Given } from './payments-given';

let given: Given;
beforeAll(async () => {
  given = await givenPayments();
});
afterAll(() => given.close());

const available = async (each: Given = given): Promise<number> =>
  (await each.stripe.balance.retrieve()).available[0]?.amount ?? 0;

describe('when a charge is refunded in parts', () => {
  test('then the parts may reach exactly the charge, and one cent more is refused', async () => {
    const { stripe, hooks } = given;
    const { intent } = await givenPaid(given, 65_000);
    const first = await stripe.refunds.create({
      payment_intent: intent,
      amount: 13_800,
      metadata: { key: 'k1' },
    });
    expect(first).toMatchObject({
      object: 'refund',
      amount: 13_800,
      status: 'succeeded',
      metadata: { key: 'k1' },
    });
    const above = await refusal(stripe.refunds.create({ payment_intent: intent, amount: 51_201 }));
    expect([above.statusCode, above.param]).toEqual([400, 'amount']);
    await stripe.refunds.create({ payment_intent: intent, amount: 51_200 });
    const charge = (await stripe.charges.list({ payment_intent: intent })).data[0];
    expect(charge).toMatchObject({ amount_refunded: 65_000, refunded: true });
    const none = await refusal(stripe.refunds.create({ charge: charge?.id, amount: 1 }));
    expect(none.code).toBe('charge_already_refunded');
    expect((await stripe.refunds.list({ payment_intent: intent })).data.map((each) => each.amount)).toEqual([
      51_200, 13_800,
    ]);
    await hooks.until('charge.refunded', 2);
    expect(hooks.types().filter((type) => type === 'refund.created')).toHaveLength(2);
  });

  test('then a refund that the bank sends back is failed and its money is on the balance again', async () => {
    const { stripe, fake, hooks } = given;
    const { intent } = await givenPaid(given);
    const before = await available();
    const refund = await stripe.refunds.create({ payment_intent: intent, amount: 9_000 });
    expect(await available()).toBe(before - 9_000);
    await control(fake, `/_fail_refund/${refund.id}`);
    for (const type of ['refund.updated', 'charge.refund.updated', 'refund.failed']) await hooks.until(type);
    const failed = await stripe.refunds.retrieve(refund.id, { expand: ['failure_balance_transaction'] });
    expect(failed).toMatchObject({
      status: 'failed',
      failure_balance_transaction: { type: 'refund_failure', net: 9_000 },
    });
    expect(await available()).toBe(before);
  });

  test('then a payment that does not exist is named', async () => {
    const error = await refusal(given.stripe.refunds.create({ payment_intent: 'pi_none' }));
    expect([error.code, error.param]).toEqual(['resource_missing', 'payment_intent']);
  });
});

describe('when money is sent to a seller', () => {
  test('then an account that is not complete is refused, and one that is gets it', async () => {
    const { stripe, fake, hooks } = given;
    await givenPaid(given);
    const account = await stripe.accounts.create({
      type: 'express',
      country: 'US',
      email: 'yard@example.com',
    });
    expect([account.charges_enabled, account.payouts_enabled]).toEqual([false, false]);
    const transfer = { amount: 40_000, currency: 'usd', destination: account.id, transfer_group: 'order-7' };
    const early = await refusal(stripe.transfers.create(transfer));
    expect(early.code).toBe('insufficient_capabilities_for_transfer');

    const link = await stripe.accountLinks.create({
      account: account.id,
      type: 'account_onboarding',
      return_url: 'http://127.0.0.1:9/payouts',
      refresh_url: 'http://127.0.0.1:9/again',
    });
    expect(await (await fetch(link.url)).text()).toContain('Complete the account');
    const done = await fetch(link.url, { method: 'POST', redirect: 'manual' });
    expect([done.status, done.headers.get('location')]).toEqual([303, 'http://127.0.0.1:9/payouts']);
    const { payload } = await hooks.until('account.updated');
    expect(JSON.parse(payload)).toMatchObject({
      account: account.id,
      data: { object: { id: account.id, charges_enabled: true, payouts_enabled: true } },
    });

    const sent = await stripe.transfers.create(transfer);
    expect(sent).toMatchObject({
      object: 'transfer',
      amount: 40_000,
      destination: account.id,
      reversed: false,
    });
    expect((await stripe.transfers.list({ transfer_group: 'order-7' })).data.map((each) => each.id)).toEqual([
      sent.id,
    ]);
    const theirs = await stripe.balance.retrieve({}, { stripeAccount: account.id });
    expect(theirs.available[0]?.amount).toBe(40_000);
    await hooks.until('transfer.created');
    await control(fake, `/_onboard/${account.id}`, { restricted: true });
    expect((await stripe.accounts.retrieve(account.id)).payouts_enabled).toBe(false);
  });

  test('then more than is available is refused, exactly what is available is not', async () => {
    const poor = await givenPayments();
    try {
      const destination = await givenOpenAccount(poor);
      await givenPaid(poor, 65_000);
      const error = await refusal(
        poor.stripe.transfers.create({ amount: 65_001, currency: 'usd', destination }),
      );
      expect([error.statusCode, error.code]).toEqual([400, 'balance_insufficient']);
      await poor.stripe.transfers.create({ amount: 65_000, currency: 'usd', destination });
      expect(await available(poor)).toBe(0);
    } finally {
      await poor.close();
    }
  });

  test('then a charge that is still pending can be sent only by naming it as the source', async () => {
    const slow = await givenPayments({ availableDelayMs: 3_600_000, feeBps: 290 });
    try {
      const destination = await givenOpenAccount(slow);
      const { intent } = await givenPaid(slow, 65_000);
      const balance = await slow.stripe.balance.retrieve();
      expect([balance.available[0]?.amount, balance.pending[0]?.amount]).toEqual([0, 65_000 - 1_885]);
      const send = { amount: 65_000, currency: 'usd', destination };
      expect((await refusal(slow.stripe.transfers.create(send))).code).toBe('balance_insufficient');
      const source = (await slow.stripe.charges.list({ payment_intent: intent })).data[0]?.id;
      const sent = await slow.stripe.transfers.create({ ...send, source_transaction: source });
      expect([sent.source_transaction, sent.transfer_group]).toEqual([source, 'order-1']);
      const again = await refusal(
        slow.stripe.transfers.create({ ...send, amount: 1, source_transaction: source }),
      );
      expect(again.code).toBe('balance_insufficient');
    } finally {
      await slow.close();
    }
  });

  test('then it can be taken back in parts, but not what the seller has been paid out', async () => {
    const { stripe, hooks } = given;
    const destination = await givenOpenAccount(given);
    await givenPaid(given);
    const { id } = await stripe.transfers.create({ amount: 30_000, currency: 'usd', destination });
    const part = await stripe.transfers.createReversal(id, { amount: 10_000 });
    expect(part).toMatchObject({ object: 'transfer_reversal', amount: 10_000, transfer: id });
    await hooks.until('transfer.reversed');
    expect((await refusal(stripe.transfers.createReversal(id, { amount: 20_001 }))).statusCode).toBe(400);
    await stripe.payouts.create({ amount: 15_000, currency: 'usd' }, { stripeAccount: destination });
    expect((await stripe.payouts.list({}, { stripeAccount: destination })).data[0]?.amount).toBe(15_000);
    expect((await refusal(stripe.transfers.createReversal(id, { amount: 20_000 }))).code).toBe(
      'balance_insufficient',
    );
    await stripe.transfers.createReversal(id, { amount: 5_000 });
    const after = await stripe.transfers.retrieve(id);
    expect([after.amount_reversed, after.reversals.data.length, after.reversed]).toEqual([15_000, 2, false]);
  });

  test('then a closed account is gone, and one that is owed money cannot be closed', async () => {
    const { stripe } = given;
    const destination = await givenOpenAccount(given);
    await givenPaid(given);
    const { id } = await stripe.transfers.create({ amount: 500, currency: 'usd', destination });
    expect((await refusal(stripe.accounts.del(destination))).statusCode).toBe(400);
    await stripe.transfers.createReversal(id);
    expect((await stripe.accounts.del(destination)).deleted).toBe(true);
    const gone = await refusal(stripe.transfers.create({ amount: 500, currency: 'usd', destination }));
    expect([gone.code, gone.param]).toEqual(['resource_missing', 'destination']);
  });
});

describe('when a charge is disputed', () => {
  test.each([
    ['won', 0],
    ['lost', -65_000],
  ])(
    'then the money leaves at once, and once it is %s the balance has moved by %i',
    async (status, moved) => {
      const { stripe, fake, hooks } = given;
      const { intent } = await givenPaid(given, 65_000);
      const before = await available();
      await control(fake, `/_dispute/${intent}`, { reason: 'fraudulent' });
      await hooks.until('charge.dispute.created');
      expect(await available()).toBe(before - 65_000);
      const [listed] = (await stripe.disputes.list({ payment_intent: intent })).data;
      const dispute = await stripe.disputes.retrieve(listed?.id ?? '');
      expect(dispute).toMatchObject({
        status: 'needs_response',
        amount: 65_000,
        payment_intent: intent,
        reason: 'fraudulent',
      });
      expect((await refusal(stripe.refunds.create({ payment_intent: intent }))).code).toBe('charge_disputed');
      await control(fake, `/_dispute/${dispute.id}/close`, { status });
      await hooks.until('charge.dispute.closed');
      expect((await stripe.disputes.retrieve(dispute.id)).status).toBe(status);
      expect(await available()).toBe(before + moved);
      expect((await stripe.disputes.list({ payment_intent: intent })).data).toHaveLength(1);
    },
  );
});

describe('when the balance is read back', () => {
  test('then every movement is listed page by page, newest first, and the sum is the balance', async () => {
    const own = await givenPayments();
    try {
      for (let cents = 20_000; cents < 27_000; cents += 1_000) await givenPaid(own, cents);
      const { stripe } = own;
      const first = await stripe.balanceTransactions.list({ limit: 3 });
      expect([first.data.map((each) => each.amount), first.has_more]).toEqual([
        [26_000, 25_000, 24_000],
        true,
      ]);
      const second = await stripe.balanceTransactions.list({ limit: 3, starting_after: first.data[2]?.id });
      expect(second.data.map((each) => each.amount)).toEqual([23_000, 22_000, 21_000]);
      const back = await stripe.balanceTransactions.list({ limit: 2, ending_before: second.data[0]?.id });
      expect([back.data.map((each) => each.amount), back.has_more]).toEqual([[25_000, 24_000], true]);
      const all: number[] = [];
      for await (const each of stripe.balanceTransactions.list({ limit: 2 })) all.push(each.net);
      expect(all).toHaveLength(7);
      expect(all.reduce((sum, net) => sum + net, 0)).toBe(await available(own));
      expect((await refusal(stripe.balanceTransactions.list({ limit: 101 }))).param).toBe('limit');
      const charges = await stripe.balanceTransactions.list({ limit: 1, expand: ['data.source'] });
      expect(charges.data[0]?.source).toMatchObject({ object: 'charge', amount: 26_000 });
      expect((await refusal(stripe.balanceTransactions.list({ expand: ['data.colour'] }))).statusCode).toBe(
        400,
      );
    } finally {
      await own.close();
    }
  });
});

describe('when tax is asked for', () => {
  test('then it is the invented rate of the state, rounded line by line, shipping too', async () => {
    const answer = await given.stripe.tax.calculations.create({
      currency: 'usd',
      line_items: [{ amount: 50_025, reference: 'unit', tax_behavior: 'exclusive' }],
      shipping_cost: { amount: 18_333, tax_behavior: 'exclusive' },
      customer_details: {
        address: { country: 'US', state: 'NV', postal_code: '89701' },
        address_source: 'shipping',
      },
      expand: ['line_items'],
    });
    // NV is invented as 6.70 %: 3351.675 and 1228.311 cents.
    expect(answer).toMatchObject({
      object: 'tax.calculation',
      tax_amount_exclusive: 3_352 + 1_228,
      amount_total: 68_358 + 4_580,
    });
    expect(answer.line_items?.data[0]).toMatchObject({ reference: 'unit', amount_tax: 3_352 });
    expect((await given.stripe.tax.calculations.retrieve(String(answer.id))).tax_amount_exclusive).toBe(
      4_580,
    );
  });

  test('then some states have none, and an address without a known state is refused', async () => {
    const ask = (state: string) =>
      given.stripe.tax.calculations.create({
        currency: 'usd',
        line_items: [{ amount: 10_000, reference: 'unit' }],
        customer_details: { address: { country: 'US', state }, address_source: 'shipping' },
      });
    expect((await ask('OR')).tax_amount_exclusive).toBe(0);
    expect((await refusal(ask('ZZ'))).code).toBe('customer_tax_location_invalid');
  });

  test('then half a cent goes away from zero, and tax inside a price comes out of it', () => {
    expect([
      taxOn(50, 500, 'exclusive'),
      taxOn(-50, 500, 'exclusive'),
      taxOn(10_500, 500, 'inclusive'),
    ]).toEqual([3, -3, 500]);
  });
});
