// The clocks of an order: what each waits for and when it strikes, in the seller's time zone.
import { addBusinessDays, addDays, endOfDay, localDate } from '../kernel/calendar';
import type { Action, Leg } from './states';

export const CLOCKS = [
  'reserve_lapse',
  'ship_by',
  'transit_nudge',
  'inspection',
  'core_reminder_21',
  'core_reminder_7',
  'core_reminder_1',
  'core_lapse',
  'grade_by',
  'agree_by',
] as const;
export type ClockName = (typeof CLOCKS)[number];

export const RESERVE_MINUTES = 30;
export const INSPECTION_BUSINESS_DAYS = 5;
export const GRADE_BUSINESS_DAYS = 5;
export const AGREE_BUSINESS_DAYS = 3;
export const CORE_GRACE_DAYS = 7;
export const TRANSIT_NUDGE_DAYS = 10;

/** The action a clock takes when it strikes; null = it only sends a mail. */
export const STRIKES: Readonly<Record<ClockName, { leg: Leg; action: Action | null }>> = {
  reserve_lapse: { leg: 'outbound', action: 'expire' },
  ship_by: { leg: 'outbound', action: 'cancel' },
  transit_nudge: { leg: 'outbound', action: null },
  inspection: { leg: 'outbound', action: 'accept' },
  core_reminder_21: { leg: 'core', action: null },
  core_reminder_7: { leg: 'core', action: null },
  core_reminder_1: { leg: 'core', action: null },
  core_lapse: { leg: 'core', action: 'lapse' },
  grade_by: { leg: 'core', action: 'release' },
  agree_by: { leg: 'core', action: 'agree' },
};

export const reserveLapsesAt = (now: Date): Date => new Date(now.getTime() + RESERVE_MINUTES * 60_000);

/** End of the nth business day after today, in the seller's zone. */
export const businessDeadline = (now: Date, days: number, zone: string): Date =>
  endOfDay(addBusinessDays(localDate(now, zone), days), zone);

/** End of the nth calendar day after an instant, in the seller's zone: the return window of PRODUCT's core leg. */
export const calendarDeadline = (from: Date, days: number, zone: string): Date =>
  endOfDay(addDays(localDate(from, zone), days), zone);

export interface ClockStart {
  readonly clock: ClockName;
  readonly at: Date;
}

/** Reminders 21, 7 and 1 days before the due date (those still ahead), and the lapse 7 days of grace after it. */
export function coreClocks(now: Date, dueAt: Date, zone: string): ClockStart[] {
  const reminders = ([21, 7, 1] as const).map((days): ClockStart => {
    // At nine in the morning, so that nobody is written to at midnight.
    const day = addDays(localDate(dueAt, zone), -days);
    return {
      clock: `core_reminder_${days}`,
      at: new Date(endOfDay(day, zone).getTime() - 15 * 3_600_000 + 1),
    };
  });
  return [
    ...reminders.filter((reminder) => reminder.at > now),
    { clock: 'core_lapse', at: calendarDeadline(dueAt, CORE_GRACE_DAYS, zone) },
  ];
}
