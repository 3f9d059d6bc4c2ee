// Health, the OpenAPI document and the demo clock.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { at } from '../kernel/fields';

export const live = endpoint({
  method: 'GET',
  path: '/api/health/live',
  summary: 'The process answers',
  access: 'public',
  answer: z.object({ status: z.literal('ok') }),
});

export const ready = endpoint({
  method: 'GET',
  path: '/api/health/ready',
  summary: 'Database, storage, mail and payments answer',
  access: 'public',
  answer: z.object({ status: z.literal('ok') }),
});

const DURATION = /^P(?=\d|T\d)(?:(\d+)W)?(?:(\d+)D)?(?:T(?=\d)(?:(\d+)H)?(?:(\d+)M)?(?:(\d+)S)?)?$/;

/**
 * Milliseconds of an ISO 8601 duration made of weeks, days, hours, minutes and seconds ("P7D", "PT30M").
 * @returns null for anything else (months and years have no fixed length)
 */
export function durationMs(text: string): number | null {
  const match = DURATION.exec(text);
  if (!match) return null;
  const [weeks, days, hours, minutes, seconds] = match.slice(1).map((part) => Number(part ?? 0));
  const inDays = (weeks ?? 0) * 7 + (days ?? 0);
  return (((inDays * 24 + (hours ?? 0)) * 60 + (minutes ?? 0)) * 60 + (seconds ?? 0)) * 1000;
}

const MAX_ADVANCE_MS = 400 * 86_400_000;

export const readClock = endpoint({
  method: 'GET',
  path: '/api/demo/clock',
  summary: 'What time the demo thinks it is',
  access: 'public',
  answer: z.object({ now: at }),
});

export const advanceClock = endpoint({
  method: 'POST',
  path: '/api/demo/clock',
  summary: 'Move the demo forward in time and run what falls due',
  access: 'public',
  body: z.strictObject({
    advance: z
      .string()
      .max(40)
      .refine((text) => {
        const ms = durationMs(text);
        return ms !== null && ms > 0 && ms <= MAX_ADVANCE_MS;
      }, 'Give a duration such as P7D or PT30M, at most 400 days'),
  }),
  answer: z.object({ now: at }),
});
