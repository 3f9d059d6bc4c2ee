// Dates and times as the product writes them: "Wed 25 Mar 2026", "Wed 25 Mar", 24 hours, and the zone where it matters.

const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
const DAY_MS = 24 * HOUR_MS;

/** An ISO 8601 instant. */
export type Instant = string;

type Parts = Readonly<Partial<Record<Intl.DateTimeFormatPartTypes, string>>>;

function partsOf(at: Instant, zone: string | undefined): Parts {
  const format = new Intl.DateTimeFormat('en-US', {
    weekday: 'short',
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
    timeZoneName: 'short',
    ...(zone ? { timeZone: zone } : {}),
  });
  return Object.fromEntries(format.formatToParts(new Date(at)).map((part) => [part.type, part.value]));
}

/** "Wed 25 Mar 2026". `zone` is an IANA name; the reader's own when left out. */
export function formatDay(at: Instant, zone?: string): string {
  const part = partsOf(at, zone);
  return `${part.weekday} ${part.day} ${part.month} ${part.year}`;
}

/** "Wed 25 Mar". */
export function formatShortDay(at: Instant, zone?: string): string {
  const part = partsOf(at, zone);
  return `${part.weekday} ${part.day} ${part.month}`;
}

/** "14:05". */
export function formatTime(at: Instant, zone?: string): string {
  const part = partsOf(at, zone);
  return `${part.hour}:${part.minute}`;
}

/** "Wed 25 Mar 2026, 14:05 MDT". */
export function formatDayTime(at: Instant, zone?: string): string {
  return `${formatDay(at, zone)}, ${formatTime(at, zone)} ${partsOf(at, zone).timeZoneName}`;
}

/** Days since 1970 of the calendar day that an instant falls on in a zone. */
function calendarDay(at: Instant, zone: string | undefined): number {
  const part = partsOf(at, zone);
  return Math.floor(Date.parse(`${part.day} ${part.month} ${part.year} 00:00:00 GMT`) / DAY_MS);
}

/** Calendar days from now to a deadline in its zone: 0 is today, below 0 is late. */
export const daysBetween = (now: Instant, dueAt: Instant, zone?: string): number =>
  calendarDay(dueAt, zone) - calendarDay(now, zone);

const plural = (count: number, word: string): string => `${count} ${word}${count === 1 ? '' : 's'}`;

function span(ms: number, days: number): string {
  if (days >= 1 && ms >= DAY_MS / 2) return plural(days, 'day');
  if (ms >= HOUR_MS) return plural(Math.floor(ms / HOUR_MS), 'hour');
  return plural(Math.max(1, Math.floor(ms / MINUTE_MS)), 'minute');
}

/** "9 days left", "6 hours left", "2 days late", counted in the deadline's zone. */
export function timeLeftWords(now: Instant, dueAt: Instant, zone?: string): string {
  const ms = Date.parse(dueAt) - Date.parse(now);
  const days = Math.abs(daysBetween(now, dueAt, zone));
  return ms >= 0 ? `${span(ms, days)} left` : `${span(-ms, days)} late`;
}
