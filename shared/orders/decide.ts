// Decides a step: pure, with the time as a value. What comes out is everything the server must do, or a fault in words.
import type { Cents } from '../kernel/money';
import * as ledger from '../money/ledger';
import {
  AGREE_BUSINESS_DAYS,
  businessDeadline,
  calendarDeadline,
  coreClocks,
  CLOCKS,
  GRADE_BUSINESS_DAYS,
  INSPECTION_BUSINESS_DAYS,
  TRANSIT_NUDGE_DAYS,
  type ClockName,
  type ClockStart,
} from './clocks';
import type { OrderFacts, Step } from './facts';
import { rowsFrom, rowsOf, type FlowMail, type FlowRow } from './flow';
import { GUARDS, type Fault } from './guards';
import { isSettlementFault, settleCore, type Deduction } from './settlement';
import { CORE_FINAL, type CoreState, type Leg, type OutboundState, type Who } from './states';

export interface Effect {
  readonly kind: 'refund' | 'transfer' | 'expire_checkout';
  /** What it is for; with the order's id and payment this makes the idempotency key. */
  readonly meaning: string;
  readonly cents: Cents;
}

export interface Changes {
  readonly dueAt?: Date;
  readonly otherCoreAllowed?: true;
  readonly grade?: string;
  readonly deductions?: readonly Deduction[];
}

export interface Decision {
  readonly row: FlowRow;
  readonly actedBy: Who;
  readonly outbound: OutboundState;
  readonly core: CoreState | null;
  readonly entries: readonly ledger.Entry[];
  readonly effects: readonly Effect[];
  readonly starts: readonly ClockStart[];
  readonly stops: readonly ClockName[];
  readonly mails: readonly FlowMail[];
  readonly changes: Changes;
  readonly listing: 'release' | 'withdraw' | 'sell' | 'retake' | null;
  readonly opensCase: 'refusal' | 'contest' | null;
  readonly closesCase: boolean;
}

export const isFault = (value: Decision | Fault): value is Fault => 'code' in value;

const CORE_CLOCKS = CLOCKS.filter((clock) => clock.startsWith('core_'));

/** Every clock a row stops, with `core_clocks` written out. */
export const stoppedBy = (row: FlowRow): ClockName[] =>
  row.stops.flatMap((name) => (name === 'core_clocks' ? CORE_CLOCKS : [name]));

/** A hand-over has two rows, one per way of delivery; every other action has one row from a state. */
const fitsDelivery = (row: FlowRow, facts: OrderFacts): boolean =>
  row.action !== 'hand_over' || (row.to === 'collected') === (facts.delivery === 'pickup');

function chooseRow(facts: OrderFacts, roles: readonly Who[], step: Step, leg?: Leg): FlowRow | Fault {
  const allowed = rowsOf(step.action, roles);
  if (allowed.length === 0) return { code: 'forbidden', detail: 'This is not for your role on this order.' };
  const here = rowsFrom(facts).find(
    (row) => allowed.includes(row) && fitsDelivery(row, facts) && (leg === undefined || row.leg === leg),
  );
  return here ?? { code: 'wrong_state', detail: 'The order has moved on. Look at it again.' };
}

const versionOf = (step: Step): number | null => ('input' in step ? step.input.version : null);

const dueAfter = (facts: OrderFacts, now: Date): Date => calendarDeadline(now, facts.windowDays, facts.zone);

/** Hand-over to the builder or delivery starts the return window of an exchange. */
const startsWindow = (facts: OrderFacts, row: FlowRow): boolean =>
  facts.core === 'held' && (row.to === 'delivered' || row.to === 'collected');

function nextCore(facts: OrderFacts, row: FlowRow): CoreState | null {
  if (facts.core === null) return null;
  if (row.leg === 'core') return row.to === 'same' ? facts.core : row.to;
  if (startsWindow(facts, row)) return 'due';
  if (row.action === 'pay') return 'held';
  const undone = row.to === 'cancelled' || row.to === 'settled';
  return undone && !CORE_FINAL.includes(facts.core) ? 'released' : facts.core;
}

function clockAt(name: ClockName, facts: OrderFacts, now: Date): ClockStart {
  switch (name) {
    case 'ship_by':
      return { clock: name, at: businessDeadline(now, facts.shipDays + facts.graceDays, facts.zone) };
    case 'inspection':
      return { clock: name, at: businessDeadline(now, INSPECTION_BUSINESS_DAYS, facts.zone) };
    case 'grade_by':
      return { clock: name, at: businessDeadline(now, GRADE_BUSINESS_DAYS, facts.zone) };
    case 'agree_by':
      return { clock: name, at: businessDeadline(now, AGREE_BUSINESS_DAYS, facts.zone) };
    case 'transit_nudge':
      return { clock: name, at: calendarDeadline(now, TRANSIT_NUDGE_DAYS, facts.zone) };
    default:
      throw new RangeError(`${name} is not started by name`);
  }
}

function startsOf(facts: OrderFacts, row: FlowRow, changes: Changes, now: Date): ClockStart[] {
  const named = row.starts
    .filter((name): name is ClockName => name !== 'core_clocks')
    .map((name) => clockAt(name, facts, now));
  const moved = row.starts.includes('core_clocks') || startsWindow(facts, row);
  return moved && changes.dueAt ? [...named, ...coreClocks(now, changes.dueAt, facts.zone)] : named;
}

function changesOf(facts: OrderFacts, row: FlowRow, step: Step, now: Date): Changes {
  if (startsWindow(facts, row)) return { dueAt: dueAfter(facts, now) };
  switch (step.action) {
    case 'extend':
      return { dueAt: calendarDeadline(facts.dueAt ?? now, step.input.days, facts.zone) };
    case 'allow_other_core':
      return { otherCoreAllowed: true };
    case 'grade':
      return { grade: step.input.grade, deductions: step.input.deductions };
    default:
      return {};
  }
}

function moneyOf(
  facts: OrderFacts,
  row: FlowRow,
  step: Step,
): { entries: ledger.Entry[]; effects: Effect[] } {
  const { holds } = facts;
  const none = { entries: [], effects: [] };
  switch (row.money) {
    case 'none':
      return none;
    case 'hold_everything':
      return { entries: [ledger.captured(facts.amounts)], effects: [] };
    case 'refund_everything':
      return withEffects(ledger.cancelled(holds), row.action);
    case 'pay_unit':
      return withEffects(ledger.accepted(holds, facts.amounts.feeCents), row.action);
    case 'deposit_to_seller':
      return withEffects(ledger.depositToSeller(holds), row.action);
    case 'release_core':
      return withEffects(
        ledger.coreSettled({ toBuilderCents: holds.coreCents, toSellerCents: 0 }),
        row.action,
      );
    case 'settle_core': {
      const split = settleCore(holds.coreCents, facts.schedule, facts.deductions ?? []);
      if (isSettlementFault(split))
        throw new RangeError(`graded with ${split.code}, which is not in the schedule`);
      return withEffects(ledger.coreSettled(split), row.action);
    }
    case 'settle_case': {
      if (step.action !== 'settle') return none;
      const covered =
        row.leg === 'outbound' ? holds : { unitCents: 0, coreCents: holds.coreCents, taxCents: 0 };
      const split = { toBuilderCents: step.toBuyerCents, toSellerCents: step.toSellerCents };
      return withEffects(ledger.caseSettled(covered, split), `settle_${row.leg}`);
    }
  }
}

/** What an entry owes to either side leaves through the provider: one refund, one transfer. */
function withEffects(entry: ledger.Entry, meaning: string): { entries: ledger.Entry[]; effects: Effect[] } {
  const owed = (account: 'refund' | 'payable'): Cents =>
    -entry.postings.filter((one) => one.account === account).reduce((sum, one) => sum + one.cents, 0);
  const effects: Effect[] = [];
  if (owed('refund') > 0) effects.push({ kind: 'refund', meaning, cents: owed('refund') });
  if (owed('payable') > 0) effects.push({ kind: 'transfer', meaning, cents: owed('payable') });
  return { entries: entry.postings.length > 0 ? [entry] : [], effects };
}

function listingAfter(row: FlowRow, step: Step, actedBy: Who): Decision['listing'] {
  if (row.leg !== 'outbound') return null;
  if (row.to === 'paid') return row.guards.includes('listing_still_live') ? 'retake' : null;
  if (row.to === 'accepted' || row.to === 'settled') return 'sell';
  if (row.to !== 'cancelled') return null;
  const cannotSupply = step.action === 'cancel' && actedBy === 'seller' && step.input.cannotSupply === true;
  return cannotSupply ? 'withdraw' : 'release';
}

function mailsOf(facts: OrderFacts, row: FlowRow): FlowMail[] {
  const mails = row.mails.filter((mail) => mail.template !== 'pickup_ready' || facts.delivery === 'pickup');
  return startsWindow(facts, row) ? [...mails, { to: 'builder', template: 'core_due' }] : mails;
}

/** Sellers give a reason for a cancellation; nobody else has to. */
function reasonMissing(step: Step, actedBy: Who): Fault | null {
  if (step.action !== 'cancel' || actedBy !== 'seller' || step.input.reason) return null;
  const message = 'Say why, in a sentence the builder will read';
  return { code: 'invalid', detail: message, errors: [{ path: 'reason', message }] };
}

/**
 * Decides one step on an order.
 * @param roles what the asker is on this order
 * @param leg needed only for `settle`, which exists on both legs
 */
export function decide(
  facts: OrderFacts,
  roles: readonly Who[],
  step: Step,
  now: Date,
  leg?: Leg,
): Decision | Fault {
  const row = chooseRow(facts, roles, step, leg);
  if ('code' in row) return row;
  const asked = versionOf(step);
  if (asked !== null && asked !== facts.version) {
    return { code: 'stale_version', detail: 'Somebody changed this order meanwhile. Look at it again.' };
  }
  const actedBy = row.by.find((who) => roles.includes(who)) ?? 'admin';
  for (const guard of row.guards) {
    const fault = GUARDS[guard](facts, step, row);
    if (fault) return fault;
  }
  const noReason = reasonMissing(step, actedBy);
  if (noReason) return noReason;
  const changes = changesOf(facts, row, step, now);
  const money = moneyOf(facts, row, step);
  const endsCheckout = row.action === 'abandon' || row.action === 'expire';
  return {
    row,
    actedBy,
    outbound: row.leg === 'outbound' ? row.to : facts.outbound,
    core: nextCore(facts, row),
    entries: money.entries,
    effects: endsCheckout ? [{ kind: 'expire_checkout', meaning: row.action, cents: 0 }] : money.effects,
    starts: startsOf(facts, row, changes, now),
    stops: stoppedBy(row),
    mails: mailsOf(facts, row),
    changes,
    listing: listingAfter(row, step, actedBy),
    opensCase: row.to === 'refused' ? 'refusal' : row.to === 'contested' ? 'contest' : null,
    closesCase: row.action === 'settle',
  };
}
