// A moment in the product's own words, with the exact instant for machines.
import { formatDay, formatDayTime, formatShortDay, formatTime, type Instant } from './dates';

interface WhenProps {
  readonly at: Instant;
  readonly show?: 'day' | 'short-day' | 'time' | 'day-time';
  /** IANA name of the zone that counts (a seller's, for deadlines); the reader's own when left out. */
  readonly zone?: string;
}

const FORMATS = {
  day: formatDay,
  'short-day': formatShortDay,
  time: formatTime,
  'day-time': formatDayTime,
} as const;

export function When({ at, show = 'day', zone }: WhenProps) {
  return (
    <time dateTime={at} className="num">
      {FORMATS[show](at, zone)}
    </time>
  );
}
