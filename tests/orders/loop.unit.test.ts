// The picture of an order, in every pair of states that the flow table can reach.
import { describe, expect, it } from 'vitest';
import { CORE_FINAL, OUTBOUND_FINAL } from '../../shared/orders/states';
import type { Order } from '../../shared/orders/contract';
import { loopOf } from '../../src/orders/view/loop';
import { seenBy, walk, type WalkKind } from './walk';

const KINDS: readonly WalkKind[] = [
  { terms: 'exchange', method: 'freight' },
  { terms: 'exchange', method: 'pickup' },
  { terms: 'outright', method: 'freight' },
  { terms: 'outright', method: 'pickup' },
];

const exchange = walk({ terms: 'exchange', method: 'freight' });

function at(key: string, role: Order['role'] = 'builder'): Order {
  const place = exchange.get(key);
  if (!place) throw new Error(`${key} cannot be reached`);
  return seenBy(place.order, role);
}

const words = (steps: ReturnType<typeof loopOf>['out']) =>
  steps.map((step) => [step.state, step.label, step.when, step.money].filter(Boolean).join(' | '));

describe.each(KINDS)('a $terms order by $method', (kind) => {
  const places = [...walk(kind)];

  it.each(places)(
    'when it is %s, then proved steps come first, at most one is live on each leg',
    (_, place) => {
      const loop = loopOf(place.order);
      for (const leg of [loop.out, loop.back ?? []]) {
        const states = leg.map((step) => step.state).join(' ');
        expect(states).toMatch(/^(proved ?)*(now ?|stopped ?)?(todo ?)*$/);
      }
    },
  );

  it.each(places)('when it is %s, then what is drawn as held is what the ledger holds', (_, place) => {
    const heldCents = loopOf(place.order)
      .sums.filter((sum) => sum.state === 'held')
      .reduce((total, sum) => total + sum.cents, 0);
    expect(heldCents).toBe(place.order.money.heldCents);
  });

  it.each(places)('when it is %s, then there are at most three sums', (_, place) => {
    expect(loopOf(place.order).sums.length).toBeLessThanOrEqual(3);
  });

  it.each(places)(
    'when it is %s, then it has a live or stopped step exactly while something is open',
    (_, place) => {
      const { order } = place;
      const loop = loopOf(order);
      const steps = [...loop.out, ...(loop.back ?? [])];
      const coreOpen = order.core !== null && !CORE_FINAL.includes(order.core.state);
      const open = !OUTBOUND_FINAL.includes(order.outbound.state) || coreOpen;
      const live = steps.filter((step) => step.state === 'now' || step.when === 'Case open');
      expect(live.length > 0).toBe(open);
    },
  );

  it.each(places)('when it is %s, then a proved step has its day', (_, place) => {
    const loop = loopOf(place.order);
    const dayless = [...loop.out, ...(loop.back ?? [])].filter((one) => one.state === 'proved' && !one.when);
    expect(dayless).toEqual([]);
  });
});

describe('the flow that can be reached', () => {
  it('when an exchange is walked, then every state of both legs occurs', () => {
    const pairs = [...exchange.keys(), ...walk({ terms: 'exchange', method: 'pickup' }).keys()];
    const seen = (leg: 0 | 1) => new Set(pairs.map((pair) => pair.split('/')[leg]?.split(' ')[0]));
    expect(seen(0).size).toBe(10);
    expect(seen(1).size).toBe(11);
  });
});

describe('the words on the race', () => {
  it('when the unit was accepted and the core is due, then each step says its day and what it moved', () => {
    const loop = loopOf(at('accepted/due'));
    expect(words(loop.out)).toEqual([
      'proved | Paid | Thu 5 Mar | $2,359.03 in',
      'proved | Packed | Fri 6 Mar',
      'proved | Picked up | Sat 7 Mar',
      'proved | Delivered | Sun 8 Mar',
      'proved | Checked | Mon 9 Mar | $1,581.40 to Quenby Dismantlers',
    ]);
    expect(words(loop.back ?? [])).toEqual([
      'now | Tag and book | by Wed 22 Apr',
      'todo | Sent back | by Wed 22 Apr',
      'todo | Received',
      'todo | Graded | within 5 business days',
      'todo | Settled',
    ]);
    expect(loop.sums).toEqual([
      { label: 'Unit and freight', cents: 166_840, where: 'Released to Quenby Dismantlers', state: 'moved' },
      { label: 'Deposit', cents: 60_000, where: 'Held for you', state: 'held' },
      { label: 'Sales tax', cents: 9_063, where: 'Set aside', state: 'moved' },
    ]);
    expect(loop.shop).toEqual({ place: 'Your shop', label: 'Arrived', when: 'Sun 8 Mar', state: 'proved' });
  });

  it('when a grade was agreed, then both parts of the deposit are drawn to the cent', () => {
    const loop = loopOf(at('accepted/settled', 'seller'));
    const deposit = loop.sums.filter((sum) => sum.label.startsWith('Deposit'));
    expect(deposit.reduce((sum, one) => sum + one.cents, 0)).toBe(60_000);
    expect(loop.shop.place).toBe('Builder’s shop');
  });

  it('when the unit is being checked and the core is due already, then only the check is live', () => {
    const loop = loopOf(at('delivered/due'));
    expect(loop.out.at(-1)?.state).toBe('now');
    expect(loop.back?.map((step) => step.state)).toEqual(['todo', 'todo', 'todo', 'todo', 'todo']);
  });

  it('when an order was cancelled after payment, then the step after the payment is stopped and says what went back', () => {
    expect(words(loopOf(at('cancelled/released paid')).out).slice(0, 2)).toEqual([
      'proved | Paid | Thu 5 Mar | $2,359.03 in',
      'stopped | Cancelled | Fri 6 Mar | $2,359.03 back to you',
    ]);
    expect(words(loopOf(at('cancelled/released')).out)[0]).toBe('stopped | Not paid | Thu 5 Mar');
  });

  it('when the core was not graded in time, then no grade looks proved and the whole deposit is back', () => {
    const loop = loopOf(at('accepted/settled ungraded'));
    expect(words(loop.back ?? []).slice(3)).toEqual([
      'proved | Not graded | in time',
      'proved | Settled | Fri 13 Mar | $600.00 to you',
    ]);
  });

  it('when the old unit is kept after booking, then the race stops there and the deposit goes to the seller', () => {
    expect(words(loopOf(at('accepted/kept booked')).back ?? []).slice(0, 2)).toEqual([
      'proved | Tag and book | Tue 10 Mar',
      'stopped | Unit kept | Wed 11 Mar | $600.00 to Quenby Dismantlers',
    ]);
  });

  it('when the bank disputes the payment, then the live step stands still and says so', () => {
    const order = { ...at('packed/held'), frozen: true };
    expect(words(loopOf(order).out)[2]).toBe('stopped | Picked up | Held still, bank dispute');
  });
});
