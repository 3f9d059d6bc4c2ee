import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { at, list, number, text } from '../support/client';
import {
  givenCatalogue,
  givenListing,
  givenPerson,
  givenYard,
  type Person,
  type Yard,
} from '../support/given';
import { startTestServer, type TestServer } from '../support/server';
import { deliver, grade, sendBack, startStory, type Story } from '../support/story';

let server: TestServer;
let yard: Yard;
let builder: Person;
let admin: Person;

beforeAll(async () => {
  server = await startTestServer();
  await givenCatalogue(server);
  yard = await givenYard(server);
  builder = await givenPerson(server, 'Ines Abara');
  admin = await givenPerson(server, 'Admin', { admin: true });
});
afterAll(() => server.close());

const paidStory = async (over: Record<string, unknown> = {}): Promise<Story> => {
  const story = await startStory(server, { builder, yard, listing: await givenListing(server, yard) }, over);
  await story.pay();
  return story;
};

const states = async (story: Story): Promise<[string, string]> => {
  const seen = await story.see();
  return [text(seen.body, 'outbound', 'state'), text(seen.body, 'core', 'state')];
};

/** What came in = refunded + paid out + fee + tax + held, and nothing is negative. */
async function expectBalanced(story: Story): Promise<void> {
  const money = (await story.see()).body;
  const of = (key: string): number => number(money, 'money', key);
  const ledger = await admin.client.get(`/api/admin/ledger?orderId=${story.orderId}`);
  const captured = list(ledger.body, 'entries')
    .filter((entry) => text(entry, 'event').startsWith('captured'))
    .flatMap((entry) => list(entry, 'postings'))
    .filter((posting) => text(posting, 'account') === 'provider')
    .reduce<number>((sum, posting) => sum + number(posting, 'debitCents'), 0);
  expect(of('refundedCents') + of('paidOutCents') + of('feeCents') + of('taxCents') + of('heldCents')).toBe(
    captured,
  );
  for (const entry of list(ledger.body, 'entries')) {
    const sum = list(entry, 'postings').reduce<number>(
      (a, p) => a + number(p, 'debitCents') - number(p, 'creditCents'),
      0,
    );
    expect(sum, text(entry, 'event')).toBe(0);
  }
}

describe('an exchange, end to end', () => {
  test('goes from reservation to a settled deposit, every cent accounted for', async () => {
    const story = await paidStory();
    expect(await states(story)).toEqual(['paid', 'held']);
    const paid = (await story.see()).body;
    expect(number(paid, 'money', 'heldCents')).toBe(number(paid, 'money', 'totalCents'));
    await deliver(story);
    expect(await states(story)).toEqual(['delivered', 'due']);
    await story.must(builder, 'accept');
    await server.settle();
    await expectBalanced(story);
    await sendBack(story);
    const graded = await grade(story, ['pan', 'plug']);
    expect(number(graded.body, 'core', 'toBuilderCents')).toBe(53_000);
    await story.must(builder, 'agree');
    await server.settle();
    expect(await states(story)).toEqual(['accepted', 'settled']);
    const end = (await story.see()).body;
    expect(number(end, 'money', 'heldCents')).toBe(0);
    expect(number(end, 'money', 'refundedCents')).toBe(53_000);
    expect(number(end, 'money', 'onTheWayCents')).toBe(0);
    await expectBalanced(story);
    const state: unknown = await (await fetch(`${server.payments.url}/_state`)).json();
    expect(JSON.stringify(state)).toContain(story.orderId);
  });

  test('writes to whoever is not looking', async () => {
    const story = await paidStory();
    await server.settle();
    const mails = server.mail.messages(builder.email).map((mail) => mail.subject);
    const number = text((await story.see()).body, 'number');
    expect(mails.filter((subject) => subject.startsWith(`Order ${number}: paid`))).toHaveLength(1);
    expect(
      server.mail.messages(yard.dock.email).some((mail) => mail.subject.startsWith(`Order ${number}: paid`)),
    ).toBe(true);
    expect(server.mail.messages(yard.lister.email).some((mail) => mail.subject.includes(number))).toBe(false);
  });
});

describe('what the clocks do', () => {
  test('an unpaid reservation lapses after 30 minutes, and the unit can be reserved again', async () => {
    const listing = await givenListing(server, yard);
    const story = await startStory(server, { builder, yard, listing });
    server.clock.advance(31 * 60_000);
    await server.settle();
    expect(await states(story)).toEqual(['cancelled', 'released']);
    const again = await startStory(server, { builder, yard, listing });
    expect(await states(again)).toEqual(['awaiting_payment', 'held']);
  });

  test('a unit that is not shipped in time is refunded whole', async () => {
    const story = await paidStory();
    server.clock.advance(20 * 86_400_000);
    await server.settle();
    expect(await states(story)).toEqual(['cancelled', 'released']);
    const money = (await story.see()).body;
    expect(number(money, 'money', 'refundedCents')).toBe(number(money, 'money', 'totalCents'));
    await expectBalanced(story);
  });

  test('silence accepts the unit, then lets the return lapse to the seller', async () => {
    const story = await paidStory();
    await deliver(story);
    server.clock.advance(9 * 86_400_000);
    await server.settle();
    expect(await states(story)).toEqual(['accepted', 'due']);
    server.clock.advance(60 * 86_400_000);
    await server.settle();
    expect(await states(story)).toEqual(['accepted', 'lapsed']);
    await expectBalanced(story);
    const reminders = server.mail
      .messages(builder.email)
      .filter((mail) => /left for your old unit/.test(mail.subject));
    expect(reminders.length).toBeGreaterThanOrEqual(1);
  });

  test('a core nobody grades is released whole, a grade nobody answers counts as agreed', async () => {
    const ungraded = await paidStory();
    await deliver(ungraded);
    await sendBack(ungraded);
    server.clock.advance(12 * 86_400_000);
    await server.settle();
    expect((await states(ungraded))[1]).toBe('settled');
    expect(number((await ungraded.see()).body, 'money', 'refundedCents')).toBe(60_000);

    const silent = await paidStory();
    await deliver(silent);
    await sendBack(silent);
    await grade(silent, ['ears'], 'C');
    server.clock.advance(8 * 86_400_000);
    await server.settle();
    expect((await states(silent))[1]).toBe('settled');
    expect(number((await silent.see()).body, 'money', 'refundedCents')).toBe(36_000);
    await expectBalanced(silent);
  });
});

describe('what the database and the rules refuse', () => {
  test('a step out of turn is 409, a step of somebody else’s role 403, a stranger sees nothing', async () => {
    const story = await paidStory();
    const stranger = await givenPerson(server, 'Stranger');
    expect((await story.act(builder, 'accept')).status).toBe(409);
    expect(
      (await story.act(builder, 'pack', { tagCode: story.listing.tagCode, drained: true, plugged: true }))
        .status,
    ).toBe(403);
    expect(
      (await story.act(yard.lister, 'pack', { tagCode: story.listing.tagCode, drained: true, plugged: true }))
        .status,
    ).toBe(403);
    expect((await stranger.client.get(`/api/orders/${story.orderId}`)).status).toBe(404);
    expect((await story.act(stranger, 'cancel')).status).toBe(404);
  });

  test('an unbalanced entry, a changed posting and a negative hold are refused by the database itself', async () => {
    const story = await paidStory();
    const { pool } = server.database;
    const unbalanced = pool.query(
      `with e as (insert into ledger_entries (id, key, event, order_id, at) values ('ent_x', 'x', 'accepted', $1, now()) returning id)
       insert into ledger_postings (entry_id, account, order_id, cents) select id, 'fee', $1, -5 from e`,
      [story.orderId],
    );
    await expect(unbalanced).rejects.toThrow(/out of balance/);
    await expect(
      pool.query(`update ledger_postings set cents = cents + 1 where order_id = $1`, [story.orderId]),
    ).rejects.toThrow(/append-only/);
    await expect(
      pool.query(`delete from ledger_entries where order_id = $1`, [story.orderId]),
    ).rejects.toThrow(/append-only/);
    await expect(pool.query('truncate order_timeline')).rejects.toThrow(/append-only/);
    const overdrawn = pool.query(
      `with e as (insert into ledger_entries (id, key, event, order_id, at) values ('ent_y', 'y', 'accepted', $1, now()) returning id)
       insert into ledger_postings (entry_id, account, order_id, leg, cents)
       select e.id, p.account, $1, p.leg, p.cents from e, (values ('hold', 'core', 60001::bigint), ('fee', null, -60001)) as p(account, leg, cents)`,
      [story.orderId],
    );
    await expect(overdrawn).rejects.toThrow(/ledger_balances_not_negative/);
    const second = pool.query(
      `insert into orders select (jsonb_populate_record(o, '{"id":"ord_second","number":"9","core_tag_code":"X","checkout_session_id":null,"payment_intent_id":null}')).*
       from orders o where o.id = $1`,
      [story.orderId],
    );
    await expect(second).rejects.toThrow(/orders_one_live_per_listing/);
  });

  test('fifty builders reserve one unit at once: one 201 and 49 of 409', async () => {
    const listing = await givenListing(server, yard);
    const answers = await Promise.all(
      Array.from({ length: 50 }, async () => {
        const client = builder.client;
        return client.post('/api/orders', {
          listingId: listing.id,
          terms: 'exchange',
          delivery: {
            method: 'pickup',
            name: 'Ines',
            line1: '1 Lane',
            city: 'Boise',
            region: 'ID',
            zip: '83702',
          },
        });
      }),
    );
    const statuses = answers.map((answer) => answer.status);
    expect(statuses.filter((status) => status === 201)).toHaveLength(1);
    expect(statuses.filter((status) => status === 409)).toHaveLength(49);
  });

  test('the same Idempotency-Key reserves once and plays the answer back', async () => {
    const listing = await givenListing(server, yard);
    const body = {
      listingId: listing.id,
      terms: 'exchange',
      delivery: { method: 'pickup', name: 'I', line1: '1', city: 'B', region: 'ID', zip: '83702' },
    };
    const first = await builder.client.post('/api/orders', body, { 'idempotency-key': 'k-1' });
    const again = await builder.client.post('/api/orders', body, { 'idempotency-key': 'k-1' });
    expect([first.status, again.status]).toEqual([201, 201]);
    expect(text(again.body, 'order', 'id')).toBe(text(first.body, 'order', 'id'));
    const other = await builder.client.post(
      '/api/orders',
      { ...body, terms: 'outright' },
      { 'idempotency-key': 'k-1' },
    );
    expect(other.status).toBe(409);
  });

  test('a webhook that comes twice, or with a wrong signature, changes nothing', async () => {
    const bad = await fetch(`${server.baseUrl}/api/payments/webhook`, {
      method: 'POST',
      body: '{}',
      headers: { 'stripe-signature': 't=1,v1=00' },
    });
    expect(bad.status).toBe(400);
    const story = await paidStory();
    await server.database.pool.query('update provider_events set applied_at = null');
    await server.settle();
    const seen = await story.see();
    expect(at(seen.body, 'outbound', 'state')).toBe('paid');
    await expectBalanced(story);
  });
});

describe('cases', () => {
  test('a refusal freezes both legs and opens a case', async () => {
    const story = await paidStory();
    await deliver(story);
    expect((await story.act(builder, 'refuse', { reason: 'Cracked ear' })).status).toBe(422);
    await story.photo(builder, 'refuse');
    await story.must(builder, 'refuse', { reason: 'Cracked ear' });
    expect(text((await story.see()).body, 'caseId')).toMatch(/^cas_/);
    server.clock.advance(90 * 86_400_000);
    await server.settle();
    expect(await states(story)).toEqual(['refused', 'due']);
    await expectBalanced(story);
  });
});
