// The guards that the flow table names: each says in words what is still missing, or nothing.
import type { FieldError, ProblemCode } from '../kernel/problem';
import { formatCents } from '../kernel/money';
import { totalOf } from '../money/ledger';
import type { OrderFacts, Step } from './facts';
import type { FlowRow, GuardName } from './flow';
import { isSettlementFault, settleCore } from './settlement';

export interface Fault {
  readonly code: Extract<ProblemCode, 'forbidden' | 'wrong_state' | 'stale_version' | 'invalid'>;
  readonly detail: string;
  readonly errors?: readonly FieldError[];
}

export const PACKING_PHOTOS_MIN = 3;
export const OLD_UNIT_PHOTOS_MIN = 3;
export const PROOF_PHOTOS_MIN = 1;

const missing = (path: string, message: string): Fault => ({
  code: 'invalid',
  detail: message,
  errors: [{ path, message }],
});

const photosMissing = (have: number, need: number, what: string): Fault | null =>
  have >= need
    ? null
    : missing('photos', `${what}: ${need - have} more ${need - have === 1 ? 'photo' : 'photos'} needed`);

type Guard = (facts: OrderFacts, step: Step, row: FlowRow) => Fault | null;

const amountsMatch: Guard = (facts, step) => {
  if (step.action !== 'pay') return null;
  const total = totalOf(facts.amounts);
  if (step.currency === 'usd' && step.amountCents === total) return null;
  return missing('amountCents', `${formatCents(step.amountCents)} came in, ${formatCents(total)} was asked`);
};

const carrierOrPickupCode: Guard = (facts, step) => {
  if (step.action !== 'hand_over') return null;
  if (facts.delivery === 'pickup') {
    return step.input.pickupCode?.replaceAll(/\D/g, '') === facts.pickupCode
      ? null
      : missing('pickupCode', 'Ask the builder for the pickup code on the order; this is not it');
  }
  if (!step.input.carrier) return missing('carrier', 'Type the carrier, such as the name on the truck');
  if (!step.input.tracking) return missing('tracking', 'Type the tracking or PRO number');
  return null;
};

const sameInternalsOrYes: Guard = (facts) => {
  if (facts.coreMatch === 'same' || facts.otherCoreAllowed) return null;
  return missing(
    'caseCode',
    facts.coreMatch === 'different'
      ? 'This is a different unit inside. Ask the seller to take it as the core first'
      : 'This code does not name one unit. Check it, say which unit it is, or ask the seller to take it',
  );
};

const howItTravels: Guard = (_facts, step) => {
  if (step.action !== 'send' || step.input.method === 'drop_off') return null;
  if (!step.input.carrier) return missing('carrier', 'Type the carrier');
  if (!step.input.tracking) return missing('tracking', 'Type the tracking or PRO number');
  return null;
};

const deductionsFromSchedule: Guard = (facts, step) => {
  if (step.action !== 'grade') return null;
  const split = settleCore(facts.amounts.depositCents, facts.schedule, step.input.deductions);
  if (isSettlementFault(split)) {
    return missing(
      `deductions.${split.index}.code`,
      split.fault === 'twice'
        ? 'This was taken already'
        : 'Only what stands in the order’s schedule may be deducted',
    );
  }
  const unproved = step.input.deductions.findIndex((one) => !facts.photos.grade.includes(one.photoId));
  return unproved < 0 ? null : missing(`deductions.${unproved}.photoId`, 'Take a photo that shows it');
};

const splitAddsUp: Guard = (facts, step, row) => {
  if (step.action !== 'settle') return null;
  const covered = facts.holds.coreCents + (row.leg === 'outbound' ? facts.holds.unitCents : 0);
  const sum = step.toBuyerCents + step.toSellerCents;
  return sum === covered
    ? null
    : missing('toBuyerCents', `The two parts come to ${formatCents(sum)}; ${formatCents(covered)} is held`);
};

export const GUARDS: Readonly<Record<GuardName, Guard>> = {
  amounts_match: amountsMatch,
  listing_still_live: (facts) =>
    facts.listingLive ? null : { code: 'wrong_state', detail: 'The unit is no longer on sale.' },
  tag_scanned: (facts, step) =>
    step.action !== 'pack' || step.input.tagCode === facts.tagCode
      ? null
      : missing('tagCode', 'This is not the tag of the unit sold. Scan the tag wired to it'),
  drained_and_plugged: (_facts, step) =>
    step.action !== 'pack' || (step.input.drained && step.input.plugged)
      ? null
      : missing('drained', 'Drain it and plug every opening first'),
  packing_photos: (facts) => photosMissing(facts.photos.pack.length, PACKING_PHOTOS_MIN, 'Packing'),
  carrier_or_pickup_code: carrierOrPickupCode,
  refusal_photos: (facts) => photosMissing(facts.photos.refuse.length, PROOF_PHOTOS_MIN, 'What is wrong'),
  old_unit_photos: (facts) => photosMissing(facts.photos.core.length, OLD_UNIT_PHOTOS_MIN, 'Old unit'),
  same_internals_or_yes: sameInternalsOrYes,
  how_it_travels: howItTravels,
  deductions_from_schedule: deductionsFromSchedule,
  contest_photos: (facts) =>
    photosMissing(facts.photos.contest.length, PROOF_PHOTOS_MIN, 'Why the grade is wrong'),
  split_adds_up: splitAddsUp,
  not_frozen: (facts) =>
    facts.frozen
      ? {
          code: 'wrong_state',
          detail: 'The card payment is disputed at the bank; nothing moves until that is decided.',
        }
      : null,
};
