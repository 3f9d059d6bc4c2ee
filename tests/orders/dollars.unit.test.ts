// Where each dollar is: the rows always add up to what was paid, and what is called held is what the ledger holds.
import { describe, expect, it } from 'vitest';
import { dollarsOf } from '../../src/orders/view/dollars';
import { seenBy, walk } from './walk';

const places = [
  ...walk({ terms: 'exchange', method: 'freight' }),
  ...walk({ terms: 'outright', method: 'pickup' }),
];

describe.each(places)('at %s', (_, place) => {
  const { order } = place;
  const dollars = dollarsOf(order);

  it('when the rows are added, then they come to what the builder pays', () => {
    expect(dollars.rows.reduce((sum, row) => sum + row.cents, 0)).toBe(order.money.totalCents);
  });

  it('when the held rows are added, then they come to what the ledger holds', () => {
    const heldCents = dollars.rows
      .filter((row) => row.state === 'held')
      .reduce((sum, row) => sum + row.cents, 0);
    expect(heldCents).toBe(order.money.heldCents);
  });
});

const exchange = walk({ terms: 'exchange', method: 'freight' });
const order = (key: string) => {
  const place = exchange.get(key);
  if (!place) throw new Error(`${key} cannot be reached`);
  return place.order;
};

describe('the words beside a sum', () => {
  it('when a core was settled with a deduction, then the deposit says both parts', () => {
    const row = dollarsOf(order('accepted/settled contested')).rows.find((one) => one.key === 'deposit');
    expect(row?.where).toBe('$575.00 back to you, $25.00 released to Quenby Dismantlers, Sun 15 Mar');
  });

  it('when the seller looks, then the fee stands beside what was released; the builder is not shown it', () => {
    const rows = (role: 'builder' | 'seller') =>
      dollarsOf(seenBy(order('accepted/due'), role)).rows[0]?.where;
    expect(rows('seller')).toBe('Released to you, less the $87.00 fee, Mon 9 Mar');
    expect(rows('builder')).toBe('Released to Quenby Dismantlers, Mon 9 Mar');
  });

  it('when money is decided but not confirmed, then the last row says that it is on its way', () => {
    const paid = order('accepted/due');
    const money = { ...paid.money, onTheWayCents: 158_140 };
    expect(dollarsOf({ ...paid, money }).summary).toBe(
      '$1,759.03 moved on, $600.00 held. $1,581.40 is on its way through the bank',
    );
  });
});
