// The terms a new seller account starts with, for its owner to change.
import type { SellerTerms } from '../../shared/accounts/seller-contract';

/**
 * The codes are those of the condition checklist, so that a grade and its deduction speak of the same fault. Window and
 * amounts are of the order that is common practice in the trade.
 */
export const FIRST_TERMS: SellerTerms = {
  windowDays: 45,
  depositCents: 40_000,
  schedule: [
    { code: 'pan', label: 'Pan missing', cents: 4_000 },
    { code: 'plug', label: 'Plug missing or broken', cents: 3_000 },
    { code: 'converter', label: 'Converter missing', cents: 8_500 },
    { code: 'threads', label: 'Stripped thread', cents: 5_000 },
    { code: 'ears', label: 'Bellhousing ear broken', cents: 15_000 },
    { code: 'case_whole', label: 'Crack or weld in the case', cents: 18_000 },
    { code: 'turns', label: 'Does not turn by hand', cents: 12_000 },
    { code: 'assembled', label: 'Apart in a box', cents: 40_000 },
    { code: 'no_hole', label: 'Hole through the case', cents: 40_000 },
    { code: 'no_water', label: 'Water or rust inside', cents: 40_000 },
    { code: 'family_matches', label: 'Not the family the code says', cents: 40_000 },
  ],
  returnFreight: 'seller',
  shipDays: 5,
  graceDays: 3,
  outright: true,
};
