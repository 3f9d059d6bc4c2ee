// Deadlines: business days, US federal holidays and the end of a day in a named time zone.
import { TZDate } from '@date-fns/tz';

/** A calendar day without a time, "2026-03-25". */
export type LocalDate = string;

const pad = (value: number): string => value.toString().padStart(2, '0');
const format = (date: Date): LocalDate =>
  `${date.getUTCFullYear()}-${pad(date.getUTCMonth() + 1)}-${pad(date.getUTCDate())}`;

function parts(day: LocalDate): [year: number, month: number, date: number] {
  const match = /^(\d{4})-(\d{2})-(\d{2})$/.exec(day);
  if (!match) throw new RangeError(`not a calendar day: ${day}`);
  return [Number(match[1]), Number(match[2]), Number(match[3])];
}

const utc = (day: LocalDate): Date => {
  const [year, month, date] = parts(day);
  return new Date(Date.UTC(year, month - 1, date));
};

/** Calendar days later (or earlier, with a negative number). */
export function addDays(day: LocalDate, days: number): LocalDate {
  const date = utc(day);
  date.setUTCDate(date.getUTCDate() + days);
  return format(date);
}

/** Whole calendar days from one day to another. */
export const daysBetween = (from: LocalDate, to: LocalDate): number =>
  Math.round((utc(to).getTime() - utc(from).getTime()) / 86_400_000);

/** The calendar day it is in a zone at an instant. */
export function localDate(instant: Date, zone: string): LocalDate {
  const local = new TZDate(instant.getTime(), zone);
  return `${local.getFullYear()}-${pad(local.getMonth() + 1)}-${pad(local.getDate())}`;
}

/** 23:59:59.999 of that day in that zone, as an instant: a day that ends always exists exactly once in US zones. */
export function endOfDay(day: LocalDate, zone: string): Date {
  const [year, month, date] = parts(day);
  return new Date(new TZDate(year, month - 1, date, 23, 59, 59, 999, zone).getTime());
}

function nthWeekday(year: number, month: number, weekday: number, nth: number): Date {
  const first = new Date(Date.UTC(year, month, 1));
  const offset = (weekday - first.getUTCDay() + 7) % 7;
  return new Date(Date.UTC(year, month, 1 + offset + (nth - 1) * 7));
}

function lastWeekday(year: number, month: number, weekday: number): Date {
  const last = new Date(Date.UTC(year, month + 1, 0));
  return new Date(Date.UTC(year, month, last.getUTCDate() - ((last.getUTCDay() - weekday + 7) % 7)));
}

function observed(year: number, month: number, date: number): Date {
  const day = new Date(Date.UTC(year, month, date));
  if (day.getUTCDay() === 6) day.setUTCDate(date - 1);
  else if (day.getUTCDay() === 0) day.setUTCDate(date + 1);
  return day;
}

/**
 * The eleven federal holidays of 5 U.S.C. 6103(a) as observed (Saturday -> Friday, Sunday -> Monday), for holidays
 * whose own date lies in that year. New Year's Day on a Saturday is observed on 31 December of the year before.
 */
export function federalHolidays(year: number): LocalDate[] {
  return [
    observed(year, 0, 1),
    nthWeekday(year, 0, 1, 3),
    nthWeekday(year, 1, 1, 3),
    lastWeekday(year, 4, 1),
    observed(year, 5, 19),
    observed(year, 6, 4),
    nthWeekday(year, 8, 1, 1),
    nthWeekday(year, 9, 1, 2),
    observed(year, 10, 11),
    nthWeekday(year, 10, 4, 4),
    observed(year, 11, 25),
  ].map(format);
}

/** Monday to Friday and not an observed federal holiday. */
export function isBusinessDay(day: LocalDate): boolean {
  const date = utc(day);
  const weekday = date.getUTCDay();
  if (weekday === 0 || weekday === 6) return false;
  const year = date.getUTCFullYear();
  // Next year's list too: its New Year's Day may be observed on 31 December.
  return !federalHolidays(year).includes(day) && !federalHolidays(year + 1).includes(day);
}

/** The nth business day after a day; the day itself doesn't count. */
export function addBusinessDays(day: LocalDate, count: number): LocalDate {
  let current = day;
  let left = count;
  while (left > 0) {
    current = addDays(current, 1);
    if (isBusinessDay(current)) left -= 1;
  }
  return current;
}
