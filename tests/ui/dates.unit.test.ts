import { describe, expect, it } from 'vitest';
import {
  daysBetween,
  formatDay,
  formatDayTime,
  formatShortDay,
  formatTime,
  timeLeftWords,
} from '../../src/ui/dates';

const BOISE = 'America/Boise';
/** End of Wed 25 Mar 2026 in Boise, which is on daylight time (UTC-6) from Sun 8 Mar 2026. */
const DUE = '2026-03-26T05:59:59Z';

describe('dates', () => {
  it('when an instant is written, then the zone decides the day, in 24 hours', () => {
    expect(formatDay(DUE, BOISE)).toBe('Wed 25 Mar 2026');
    expect(formatShortDay(DUE, BOISE)).toBe('Wed 25 Mar');
    expect(formatTime(DUE, BOISE)).toBe('23:59');
    expect(formatDay(DUE, 'Europe/Berlin')).toBe('Thu 26 Mar 2026');
    expect(formatDayTime('2026-01-05T07:05:00Z', BOISE)).toBe('Mon 5 Jan 2026, 00:05 MST');
    expect(formatDayTime(DUE, BOISE)).toBe('Wed 25 Mar 2026, 23:59 MDT');
  });

  it('when days are counted, then they are calendar days of the zone, also across the change of clocks', () => {
    expect(daysBetween('2026-03-16T15:00:00Z', DUE, BOISE)).toBe(9);
    expect(daysBetween('2026-03-07T18:00:00Z', '2026-03-09T18:00:00Z', BOISE)).toBe(2);
    expect(daysBetween('2026-03-25T06:00:01Z', DUE, BOISE)).toBe(0);
  });

  it('when time is left or gone, then the words say how much', () => {
    expect(timeLeftWords('2026-03-16T15:00:00Z', DUE, BOISE)).toBe('9 days left');
    expect(timeLeftWords('2026-03-25T23:59:59Z', DUE, BOISE)).toBe('6 hours left');
    expect(timeLeftWords('2026-03-26T04:59:30Z', DUE, BOISE)).toBe('1 hour left');
    expect(timeLeftWords('2026-03-26T05:50:00Z', DUE, BOISE)).toBe('9 minutes left');
    expect(timeLeftWords('2026-03-28T05:00:00Z', DUE, BOISE)).toBe('2 days late');
  });
});
