// The receiving desk's checks: the checklist of the kind of unit joined to the schedule of the order, the grade, and the sums.
import { checklist, gradeOf, type Grade } from '../../../shared/listings/condition';
import type { UnitKind } from '../../../shared/catalogue/kinds';
import type { Cents } from '../../../shared/kernel/money';
import { isSettlementFault, settleCore, type ScheduleItem } from '../../../shared/orders/settlement';

export type DeskAnswer = 'yes' | 'no';
export type DeskAnswers = Readonly<Partial<Record<string, DeskAnswer>>>;

export interface DeskCheck {
  readonly code: string;
  /** A statement that is good when true. */
  readonly label: string;
  readonly hint: string;
  /** The fault in words, as the deduction reads. */
  readonly fault: string;
  /** What a no takes off; 0 where the terms name no amount for it. */
  readonly costCents: Cents;
}

/** A line of the seller's own has no statement to say yes to, so the fault itself is denied. */
const ownCheck = (item: ScheduleItem): DeskCheck => ({
  code: item.code,
  label: `Free of: ${item.label.toLowerCase()}`,
  hint: '',
  fault: item.label,
  costCents: item.cents,
});

/**
 * Every check of the desk in the order it is worked through: the kind's checklist, then the seller's own lines.
 * @param kind null where it isn't known any more: then the schedule alone is checked
 */
export function deskChecks(kind: UnitKind | null, schedule: readonly ScheduleItem[]): DeskCheck[] {
  const questions = kind ? checklist(kind).filter((one) => one.effect !== 'refused') : [];
  const asked = questions.map((one): DeskCheck => {
    const item = schedule.find((line) => line.code === one.code);
    return {
      code: one.code,
      label: one.label,
      hint: one.hint,
      fault: item?.label ?? one.fault,
      costCents: item?.cents ?? 0,
    };
  });
  const own = schedule.filter((line) => !questions.some((one) => one.code === line.code));
  return [...asked, ...own.map(ownCheck)];
}

export interface DeskResult {
  readonly grade: Grade;
  readonly rule: string;
  /** What brought the grade down. */
  readonly because: readonly string[];
  readonly lines: readonly ScheduleItem[];
  readonly toBuilderCents: Cents;
  readonly toSellerCents: Cents;
  /** The lines came to more than the deposit. */
  readonly capped: boolean;
  readonly open: readonly DeskCheck[];
}

const KIND_UNKNOWN: UnitKind = 'automatic';

/** Grade and split that follow from the answers so far; an open check counts as yes for the sums until it is answered. */
export function deskResult(input: {
  readonly kind: UnitKind | null;
  readonly schedule: readonly ScheduleItem[];
  readonly depositCents: Cents;
  readonly answers: DeskAnswers;
}): DeskResult {
  const { kind, schedule, depositCents, answers } = input;
  const checks = deskChecks(kind, schedule);
  const open = checks.filter((check) => answers[check.code] === undefined);
  const faults = checks.filter((check) => answers[check.code] === 'no' && check.costCents > 0);
  const split = settleCore(depositCents, schedule, faults);
  if (isSettlementFault(split)) throw new RangeError(`${split.code} is not in the schedule`);
  // The number is looked at when a unit is listed; at the dock the code check says whether it is the right unit.
  const given = Object.fromEntries(checks.map((check) => [check.code, answers[check.code] ?? 'yes']));
  const graded = gradeOf(kind ?? KIND_UNKNOWN, { ...(kind ? {} : allYes()), ...given, number_intact: 'yes' });
  // A line of the seller's own stands on no checklist, so it counts as a small part.
  const asked = kind ? checklist(kind).map((one) => one.code) : [];
  const ownFault = faults.some((check) => !asked.includes(check.code));
  const grade = graded.grade === 'A' && ownFault ? 'B' : graded.grade;
  return {
    grade,
    rule: grade === graded.grade ? graded.rule : 'Complete but for what is named below.',
    because: checks.filter((check) => answers[check.code] === 'no').map((check) => check.fault),
    lines: split.lines,
    toBuilderCents: split.toBuilderCents,
    toSellerCents: split.toSellerCents,
    capped: split.capped,
    open,
  };
}

const allYes = (): Record<string, 'yes'> =>
  Object.fromEntries(checklist(KIND_UNKNOWN).map((one) => [one.code, 'yes']));
