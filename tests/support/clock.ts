// A clock that a test sets.
import type { Clock } from '../../server/clock';

export interface TestClock extends Clock {
  set(at: Date | string): void;
  advance(ms: number): void;
}

export const DAY_MS = 86_400_000;

export function testClock(start: Date | string): TestClock {
  let now = new Date(start);
  return {
    now: () => new Date(now),
    set: (at) => {
      now = new Date(at);
    },
    advance: (ms) => {
      now = new Date(now.getTime() + ms);
    },
  };
}
