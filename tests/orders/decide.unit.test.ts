import { describe, expect, test } from 'vitest';
import { decide, isFault, type Decision } from '../../shared/orders/decide';
import type { OrderFacts, Step } from '../../shared/orders/facts';
import type { Leg, Who } from '../../shared/orders/states';
import { AMOUNTS, NOW, TOTAL, facts } from './given';

const taken = (given: OrderFacts, roles: Who[], step: Step, leg?: Leg): Decision => {
  const result = decide(given, roles, step, NOW, leg);
  if (isFault(result)) throw new Error(`${result.code}: ${result.detail}`);
  return result;
};
const refused = (given: OrderFacts, roles: Who[], step: Step): string => {
  const result = decide(given, roles, step, NOW);
  return isFault(result) ? result.code : 'taken';
};
const paths = (given: OrderFacts, roles: Who[], step: Step): string[] => {
  const result = decide(given, roles, step, NOW);
  return isFault(result) ? (result.errors ?? []).map((one) => one.path) : [];
};
const sum = (decision: Decision, account: string): number =>
  decision.entries
    .flatMap((e) => e.postings)
    .filter((p) => p.account === account)
    .reduce((a, p) => a + p.cents, 0);

const v = { version: 3 };
const photos = (over: Partial<OrderFacts['photos']>): OrderFacts['photos'] => ({
  ...facts().photos,
  ...over,
});

describe('paying', () => {
  const waiting = facts({ outbound: 'awaiting_payment', holds: { unitCents: 0, coreCents: 0, taxCents: 0 } });

  test('holds unit and deposit apart, sets tax aside and starts the shipping clock', () => {
    const decision = taken(waiting, ['provider'], { action: 'pay', amountCents: TOTAL, currency: 'usd' });
    expect(decision.outbound).toBe('paid');
    expect(sum(decision, 'provider')).toBe(TOTAL);
    expect(sum(decision, 'hold')).toBe(-(AMOUNTS.priceCents + AMOUNTS.freightCents + AMOUNTS.depositCents));
    expect(sum(decision, 'tax')).toBe(-AMOUNTS.taxCents);
    expect(decision.stops).toEqual(['reserve_lapse']);
    // Eight business days after 4 March 2026 is 16 March; the day ends at 23:59:59.999 in Chicago (UTC-5 by then).
    expect(decision.starts).toEqual([{ clock: 'ship_by', at: new Date('2026-03-17T04:59:59.999Z') }]);
  });

  test.each([
    ['a cent less', TOTAL - 1, 'usd'],
    ['a cent more', TOTAL + 1, 'usd'],
    ['another currency', TOTAL, 'cad'],
  ])('%s than asked is not taken', (_what, amountCents, currency) => {
    expect(refused(waiting, ['provider'], { action: 'pay', amountCents, currency })).toBe('invalid');
  });

  test('a late payment takes the unit again only while it is still on sale', () => {
    const late = facts({ outbound: 'cancelled', core: 'released', holds: waiting.holds });
    const step: Step = { action: 'pay', amountCents: TOTAL, currency: 'usd' };
    expect(refused(late, ['provider'], step)).toBe('wrong_state');
    const decision = taken({ ...late, listingLive: true }, ['provider'], step);
    expect([decision.outbound, decision.core, decision.listing]).toEqual(['paid', 'held', 'retake']);
  });

  test('nobody but the provider can pay', () => {
    const step: Step = { action: 'pay', amountCents: TOTAL, currency: 'usd' };
    for (const who of ['builder', 'seller', 'dock', 'admin'] as const)
      expect(refused(waiting, [who], step)).toBe('forbidden');
  });
});

describe('cancelling a paid order', () => {
  test('gives everything back, tax too, and puts the unit on sale again', () => {
    const decision = taken(facts(), ['builder'], { action: 'cancel', input: v });
    expect(decision.effects).toEqual([{ kind: 'refund', meaning: 'cancel', cents: TOTAL }]);
    expect([decision.outbound, decision.core, decision.listing]).toEqual([
      'cancelled',
      'released',
      'release',
    ]);
  });

  test('a seller says why, and may say that the unit is not to be had', () => {
    expect(paths(facts(), ['seller'], { action: 'cancel', input: v })).toEqual(['reason']);
    const input = { ...v, reason: 'The forks went through the case', cannotSupply: true };
    expect(taken(facts(), ['seller'], { action: 'cancel', input }).listing).toBe('withdraw');
    // The builder's word about the seller's stock counts for nothing.
    expect(taken(facts(), ['builder'], { action: 'cancel', input }).listing).toBe('release');
  });

  test('is too late once it is packed', () => {
    expect(refused(facts({ outbound: 'packed' }), ['builder'], { action: 'cancel', input: v })).toBe(
      'wrong_state',
    );
  });
});

describe('packing and handing over', () => {
  const input = { ...v, tagCode: 'AB12CD34E', drained: true as const, plugged: true as const };

  test('needs the right tag and three photos', () => {
    expect(paths(facts(), ['dock'], { action: 'pack', input: { ...input, tagCode: 'ZZZZ' } })).toEqual([
      'tagCode',
    ]);
    expect(
      paths(facts({ photos: photos({ pack: ['a', 'b'] }) }), ['dock'], { action: 'pack', input }),
    ).toEqual(['photos']);
    expect(
      taken(facts({ photos: photos({ pack: ['a', 'b', 'c'] }) }), ['dock'], { action: 'pack', input })
        .outbound,
    ).toBe('packed');
  });

  test('an owner without the dock duty does not pack', () => {
    expect(
      refused(facts({ photos: photos({ pack: ['a', 'b', 'c'] }) }), ['seller'], { action: 'pack', input }),
    ).toBe('forbidden');
  });

  test('freight needs carrier and number; pickup needs the code that the builder brings', () => {
    const packed = facts({ outbound: 'packed' });
    expect(paths(packed, ['dock'], { action: 'hand_over', input: v })).toEqual(['carrier']);
    expect(
      paths(packed, ['dock'], { action: 'hand_over', input: { ...v, carrier: 'Redline Freight' } }),
    ).toEqual(['tracking']);
    const sent = { ...v, carrier: 'Redline Freight', tracking: 'PRO 77' };
    expect(taken(packed, ['dock'], { action: 'hand_over', input: sent }).outbound).toBe('in_transit');
    const pickup = { ...packed, delivery: 'pickup' as const };
    expect(paths(pickup, ['dock'], { action: 'hand_over', input: { ...v, pickupCode: '000000' } })).toEqual([
      'pickupCode',
    ]);
    const collected = taken(pickup, ['dock'], {
      action: 'hand_over',
      input: { ...v, pickupCode: '482 913' },
    });
    expect([collected.outbound, collected.core]).toEqual(['collected', 'due']);
  });
});

describe('delivery', () => {
  test('starts five business days of inspection and the return window, both in the seller’s zone', () => {
    const decision = taken(facts({ outbound: 'in_transit' }), ['builder'], { action: 'deliver', input: v });
    expect([decision.outbound, decision.core]).toEqual(['delivered', 'due']);
    const at = Object.fromEntries(decision.starts.map((one) => [one.clock, one.at.toISOString()]));
    expect(at['inspection']).toBe('2026-03-12T04:59:59.999Z');
    // 45 days after 4 March is 18 April; daylight saving began in between.
    expect(decision.changes.dueAt?.toISOString()).toBe('2026-04-19T04:59:59.999Z');
    expect(at['core_lapse']).toBe('2026-04-26T04:59:59.999Z');
    expect(at['core_reminder_21']).toBe('2026-03-28T14:00:00.000Z');
    expect(decision.mails.map((one) => one.template)).toContain('core_due');
  });

  test('of an outright sale starts no window', () => {
    const decision = taken(facts({ outbound: 'in_transit', core: null }), ['carrier'], {
      action: 'deliver',
      input: v,
    });
    expect(decision.starts.map((one) => one.clock)).toEqual(['inspection']);
    expect(decision.core).toBeNull();
  });
});

describe('accepting', () => {
  test('pays price and freight less the fee and leaves the deposit held', () => {
    const decision = taken(facts({ outbound: 'delivered', core: 'due' }), ['builder'], {
      action: 'accept',
      input: v,
    });
    expect(decision.effects).toEqual([
      {
        kind: 'transfer',
        meaning: 'accept',
        cents: AMOUNTS.priceCents + AMOUNTS.freightCents - AMOUNTS.feeCents,
      },
    ]);
    expect(sum(decision, 'fee')).toBe(-AMOUNTS.feeCents);
    expect(decision.entries.flatMap((e) => e.postings).some((p) => p.leg === 'core')).toBe(false);
    expect([decision.listing, decision.core]).toEqual(['sell', 'due']);
  });

  test('waits while the card payment is disputed', () => {
    expect(
      refused(facts({ outbound: 'delivered', frozen: true }), ['clock'], { action: 'accept', input: v }),
    ).toBe('wrong_state');
  });
});

describe('refusing', () => {
  const delivered = facts({ outbound: 'delivered', core: 'due' });

  test('needs a photo, opens a case and stops every clock', () => {
    const input = { ...v, reason: 'The case is cracked at the ear' };
    expect(paths(delivered, ['builder'], { action: 'refuse', input })).toEqual(['photos']);
    const decision = taken({ ...delivered, photos: photos({ refuse: ['p'] }) }, ['builder'], {
      action: 'refuse',
      input,
    });
    expect([decision.outbound, decision.core, decision.opensCase]).toEqual(['refused', 'due', 'refusal']);
    expect(decision.entries).toEqual([]);
    expect(decision.stops).toEqual(expect.arrayContaining(['inspection', 'core_lapse', 'core_reminder_7']));
  });

  test('is settled by a split of everything held, to the cent, and ends both legs', () => {
    const refusedNow = { ...delivered, outbound: 'refused' as const };
    const held = AMOUNTS.priceCents + AMOUNTS.freightCents + AMOUNTS.depositCents;
    const settle = (toBuyerCents: number, toSellerCents: number): Step => ({
      action: 'settle',
      toBuyerCents,
      toSellerCents,
    });
    expect(refused(refusedNow, ['admin'], settle(held, 1))).toBe('invalid');
    expect(refused(refusedNow, ['builder'], settle(held, 0))).toBe('forbidden');
    const decision = taken(refusedNow, ['admin'], settle(held - 20_001, 20_001), 'outbound');
    expect([decision.outbound, decision.core]).toEqual(['settled', 'released']);
    expect(decision.effects.find((one) => one.kind === 'transfer')?.cents).toBe(20_001);
    expect(-sum(decision, 'refund')).toBe(held - 20_001 + AMOUNTS.taxCents);
  });

  test('holds the core leg still, but what arrives at the dock is still recorded', () => {
    const coming = { ...delivered, outbound: 'refused' as const, core: 'coming_back' as const };
    expect(taken(coming, ['dock'], { action: 'receive', input: v }).core).toBe('at_dock');
    expect(
      refused({ ...coming, core: 'graded', deductions: [] }, ['builder'], { action: 'agree', input: v }),
    ).toBe('wrong_state');
  });
});

describe('the core coming back', () => {
  const due = facts({
    outbound: 'accepted',
    core: 'due',
    dueAt: new Date('2026-04-19T04:59:59.999Z'),
    holds: { unitCents: 0, coreCents: 60_000, taxCents: 9_063 },
  });
  const book: Step = { action: 'book_return', input: { ...v, caseCode: 'K66A4XD90914703' } };

  test('needs three photos and the same internals, or the seller’s yes', () => {
    expect(paths(due, ['builder'], book)).toEqual(['photos']);
    const shown = { ...due, photos: photos({ core: ['a', 'b', 'c'] }) };
    for (const coreMatch of ['different', 'unknown'] as const) {
      expect(paths({ ...shown, coreMatch }, ['builder'], book)).toEqual(['caseCode']);
      expect(taken({ ...shown, coreMatch, otherCoreAllowed: true }, ['builder'], book).core).toBe('booked');
    }
    expect(taken({ ...shown, coreMatch: 'same' }, ['builder'], book).core).toBe('booked');
  });

  test('sending it stops the clocks, within the grace too', () => {
    const decision = taken({ ...due, core: 'booked' }, ['builder'], {
      action: 'send',
      input: { ...v, method: 'drop_off' },
    });
    expect(decision.core).toBe('coming_back');
    expect(decision.stops).toContain('core_lapse');
  });

  test('more time moves the due date and the clocks', () => {
    const decision = taken(due, ['seller'], { action: 'extend', input: { ...v, days: 14 } });
    expect(decision.core).toBe('due');
    expect(decision.changes.dueAt?.toISOString()).toBe('2026-05-03T04:59:59.999Z');
    expect(decision.starts.find((one) => one.clock === 'core_lapse')?.at.toISOString()).toBe(
      '2026-05-10T04:59:59.999Z',
    );
  });

  test.each(['keep_unit', 'lapse'] as const)('%s gives the deposit to the seller', (action) => {
    const step: Step = action === 'lapse' ? { action } : { action, input: v };
    const decision = taken(due, [action === 'lapse' ? 'clock' : 'builder'], step);
    expect(decision.effects).toEqual([{ kind: 'transfer', meaning: action, cents: 60_000 }]);
  });

  const atDock = { ...due, core: 'at_dock' as const, photos: photos({ grade: ['g1', 'g2'] }) };
  const grade = (deductions: { code: string; photoId: string }[]): Step => ({
    action: 'grade',
    input: { ...v, grade: 'B', deductions },
  });

  test('deductions come from the schedule, once each, each with a photo of this order', () => {
    expect(paths(atDock, ['dock'], grade([{ code: 'paint', photoId: 'g1' }]))).toEqual(['deductions.0.code']);
    expect(
      paths(
        atDock,
        ['dock'],
        grade([
          { code: 'pan', photoId: 'g1' },
          { code: 'pan', photoId: 'g2' },
        ]),
      ),
    ).toEqual(['deductions.1.code']);
    expect(paths(atDock, ['dock'], grade([{ code: 'pan', photoId: 'elsewhere' }]))).toEqual([
      'deductions.0.photoId',
    ]);
    expect(taken(atDock, ['dock'], grade([{ code: 'pan', photoId: 'g1' }])).core).toBe('graded');
  });

  test('agreeing splits the deposit by the schedule', () => {
    const graded = {
      ...atDock,
      core: 'graded' as const,
      deductions: [
        { code: 'pan', photoId: 'g1' },
        { code: 'plug', photoId: 'g2' },
      ],
    };
    const decision = taken(graded, ['clock'], { action: 'agree', input: v });
    expect(decision.effects).toEqual([
      { kind: 'refund', meaning: 'agree', cents: 53_000 },
      { kind: 'transfer', meaning: 'agree', cents: 7_000 },
    ]);
  });

  test('deductions never exceed the deposit', () => {
    const deductions = [
      { code: 'case', photoId: 'g1' },
      { code: 'pan', photoId: 'g2' },
    ];
    const decision = taken({ ...atDock, core: 'graded', deductions }, ['builder'], {
      action: 'agree',
      input: v,
    });
    expect(decision.effects).toEqual([{ kind: 'transfer', meaning: 'agree', cents: 60_000 }]);
  });

  test('not graded in time, it is released whole', () => {
    const decision = taken(atDock, ['clock'], { action: 'release' });
    expect(decision.effects).toEqual([{ kind: 'refund', meaning: 'release', cents: 60_000 }]);
  });

  test('a step made on an old copy is refused', () => {
    expect(refused(due, ['builder'], { action: 'keep_unit', input: { version: 2 } })).toBe('stale_version');
  });
});
