// A yard's open deposits by the week their core is due: on its way, still with the builder, or late.
import { addDays, localDate, type LocalDate } from '../../../shared/kernel/calendar';
import type { Cents } from '../../../shared/kernel/money';

export interface OpenDeposit {
  readonly orderId: string;
  readonly orderNumber: string;
  readonly title: string;
  readonly coreState: string;
  readonly cents: Cents;
  readonly dueAt: string | null;
}

export interface DepositWeek {
  /** Monday of the week; null for units not delivered yet, whose return has no date. */
  readonly monday: LocalDate | null;
  readonly movingCents: Cents;
  readonly withBuilderCents: Cents;
  readonly lateCents: Cents;
  readonly totalCents: Cents;
}

const MOVING: readonly string[] = ['coming_back', 'at_dock', 'graded', 'contested'];

const isLate = (deposit: OpenDeposit, now: string): boolean =>
  !MOVING.includes(deposit.coreState) && deposit.dueAt !== null && deposit.dueAt < now;

/** Monday of the week that a calendar day falls in. */
function mondayOf(day: LocalDate): LocalDate {
  const weekday = new Date(`${day}T00:00:00Z`).getUTCDay();
  return addDays(day, -((weekday + 6) % 7));
}

export function depositWeeks(deposits: readonly OpenDeposit[], now: string, zone: string): DepositWeek[] {
  const weeks = new Map<LocalDate | null, OpenDeposit[]>();
  for (const deposit of deposits) {
    const monday = deposit.dueAt ? mondayOf(localDate(new Date(deposit.dueAt), zone)) : null;
    weeks.set(monday, [...(weeks.get(monday) ?? []), deposit]);
  }
  const sum = (list: readonly OpenDeposit[]): Cents => list.reduce((total, one) => total + one.cents, 0);
  return [...weeks.entries()]
    .sort(([a], [b]) => (a ?? '9999').localeCompare(b ?? '9999'))
    .map(([monday, list]) => ({
      monday,
      movingCents: sum(list.filter((one) => MOVING.includes(one.coreState))),
      withBuilderCents: sum(list.filter((one) => !MOVING.includes(one.coreState) && !isLate(one, now))),
      lateCents: sum(list.filter((one) => isLate(one, now))),
      totalCents: sum(list),
    }));
}

export const lateDeposits = (deposits: readonly OpenDeposit[], now: string): OpenDeposit[] =>
  deposits.filter((one) => isLate(one, now));
