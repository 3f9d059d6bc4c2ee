// What time it is to the server: the demo's clock runs ahead of the browser's, and deadlines are counted by the server's.
import { queryOptions, useQuery } from '@tanstack/react-query';
import { readClock } from '../../shared/system/contract';
import { call, ProblemError } from './client';

const MINUTE_MS = 60_000;

/** Milliseconds that the server is ahead of this browser; outside the demo nobody moves the clock. */
async function readLead(signal: AbortSignal): Promise<number> {
  try {
    const { now } = await call(readClock, { signal });
    return Date.parse(now) - Date.now();
  } catch (error) {
    if (error instanceof ProblemError && error.problem.status === 404) return 0;
    throw error;
  }
}

export const serverLeadQuery = queryOptions({
  queryKey: ['server-lead'],
  queryFn: ({ signal }) => readLead(signal),
  // Without a demo clock the answer is 0 for good.
  staleTime: (query) => (query.state.data === 0 ? Infinity : MINUTE_MS),
});

/** The server's time as an ISO 8601 instant, to the minute. */
export function useServerNow(): string {
  const lead = useQuery(serverLeadQuery).data ?? 0;
  const minute = Math.floor((Date.now() + lead) / MINUTE_MS) * MINUTE_MS;
  return new Date(minute).toISOString();
}
