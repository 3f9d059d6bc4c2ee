// What the next panel offers, in every reachable pair of states, to each side.
import { describe, expect, it } from 'vitest';
import { PERSON_ACTIONS } from '../../shared/orders/actions';
import { FLOW } from '../../shared/orders/flow';
import type { Order } from '../../shared/orders/contract';
import { FORWARD, nextOf, type NextMove } from '../../src/orders/view/next-step';
import { seenBy, walk } from './walk';

const places = [
  ...walk({ terms: 'exchange', method: 'freight' }),
  ...walk({ terms: 'exchange', method: 'pickup' }),
  ...walk({ terms: 'outright', method: 'freight' }),
];
const ROLES: readonly Order['role'][] = ['builder', 'seller', 'admin'];
const cases = ROLES.flatMap((role) =>
  places.map(([key, place]) => ({ role, key, order: seenBy(place.order, role) })),
);

const actionOf = (move: NextMove): string | null => {
  if (move.kind === 'action') return move.action;
  return move.kind === 'book_return' || move.kind === 'grade' ? move.kind : null;
};

describe.each(cases)('$role at $key', ({ order }) => {
  const view = nextOf(order);
  const offered = [...(view.red ? [view.red] : []), ...view.plain];

  it('when it is drawn, then every action that may be taken has a button, once, and no other has', () => {
    const actions = offered.map((button) => actionOf(button.move)).filter((one) => one !== null);
    expect([...actions].sort()).toEqual(order.next.map((one) => one.action).sort());
  });

  it('when something leads on, then there is one red button; when nothing does, the panel says what is waited for', () => {
    const leads = order.next.some((one) => FORWARD.some((action) => action === one.action));
    const pays = order.role === 'builder' && order.outbound.state === 'awaiting_payment';
    expect(view.red !== null).toBe(leads || pays || order.caseId !== null);
    expect(view.waiting === null).toBe(view.red !== null);
  });

  it('when it counts down, then to a time after it began', () => {
    if (!view.clock) return;
    expect(Date.parse(view.clock.dueAt)).toBeGreaterThan(Date.parse(view.clock.startedAt));
  });
});

describe('the buttons of the flow table', () => {
  it('when all of it is walked, then every action of a person is offered to somebody', () => {
    const offered = new Set(cases.flatMap(({ order }) => order.next.map((one) => one.action)));
    const byPeople = FLOW.map((row) => row.action).filter((action) =>
      PERSON_ACTIONS.some((one) => one === action),
    );
    expect([...new Set(byPeople)].filter((action) => !offered.has(action))).toEqual([]);
  });

  it.each([
    ['builder', 'delivered/due', 'Accept it, release $1,668.40'],
    ['builder', 'accepted/due', 'Book the core return'],
    ['builder', 'accepted/booked', 'The core is on its way'],
    ['builder', 'accepted/graded', 'Agree, $560.00 back to you'],
    ['seller', 'paid/held', 'Packed and tagged'],
    ['seller', 'packed/held', 'Hand it to the carrier'],
    ['seller', 'accepted/coming_back', 'The core is at the dock'],
    ['seller', 'accepted/at_dock', 'Grade the core'],
    ['builder', 'awaiting_payment/held', 'Pay $2,359.03'],
    ['builder', 'refused/due', 'Open the case'],
    ['admin', 'accepted/contested', 'Settle the case'],
  ] as const)('when the %s looks at %s, then the red button says “%s”', (role, key, words) => {
    const found = cases.find((one) => one.role === role && one.key === key);
    expect(found && nextOf(found.order).red?.label).toBe(words);
  });
});
