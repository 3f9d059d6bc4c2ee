// Which lines of a seller's deduction schedule concern a kind of unit: an axle has no pan plug to lose.
import type { UnitKind } from '../catalogue/kinds';
import { effectOf, isQuestion } from '../listings/condition';
import type { ScheduleItem } from '../listings/terms';

/** The lines whose fault the kind's checklist asks for, and those in the seller's own words; the order stays. */
export const scheduleForKind = (kind: UnitKind, schedule: readonly ScheduleItem[]): ScheduleItem[] =>
  schedule.filter((line) => effectOf(kind, line.code) !== null || !isQuestion(line.code));
