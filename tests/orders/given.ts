// Order facts with everything filled in, so that a test says only what decides it.
import type { OrderFacts } from '../../shared/orders/facts';
import { totalOf } from '../../shared/money/ledger';

export const AMOUNTS = {
  priceCents: 145_000,
  freightCents: 21_840,
  depositCents: 60_000,
  taxCents: 9_063,
  feeCents: 8_700,
};
export const TOTAL = totalOf(AMOUNTS);

export const SCHEDULE = [
  { code: 'pan', label: 'Pan missing', cents: 4_000 },
  { code: 'plug', label: 'Plug broken', cents: 3_000 },
  { code: 'converter', label: 'Converter missing', cents: 8_500 },
  { code: 'case', label: 'Case cracked', cents: 60_000 },
];

/** Wednesday 4 March 2026, 16:00 in Chicago. */
export const NOW = new Date('2026-03-04T22:00:00Z');

export const facts = (over: Partial<OrderFacts> = {}): OrderFacts => ({
  outbound: 'paid',
  core: 'held',
  version: 3,
  delivery: 'freight',
  amounts: AMOUNTS,
  holds: {
    unitCents: AMOUNTS.priceCents + AMOUNTS.freightCents,
    coreCents: AMOUNTS.depositCents,
    taxCents: AMOUNTS.taxCents,
  },
  schedule: SCHEDULE,
  windowDays: 45,
  zone: 'America/Chicago',
  shipDays: 5,
  graceDays: 3,
  tagCode: 'AB12CD34E',
  pickupCode: '482913',
  dueAt: null,
  otherCoreAllowed: false,
  deductions: null,
  listingLive: false,
  frozen: false,
  photos: { pack: [], refuse: [], core: [], grade: [], contest: [], case: [] },
  coreMatch: null,
  ...over,
});
