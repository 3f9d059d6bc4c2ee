// What time it is to the server: the demo's clock runs ahead of the browser's, and deadlines are counted by the server's.
import { queryOptions, useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
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

const thisMinute = (): number => Math.floor(Date.now() / MINUTE_MS) * MINUTE_MS;

/** The server's time as an ISO 8601 instant, to the minute; it goes on while the page is open. */
export function useServerNow(): string {
  const [minute, setMinute] = useState(thisMinute);
  const lead = useQuery(serverLeadQuery).data ?? 0;
  useEffect(() => {
    const timer = setInterval(() => setMinute(thisMinute()), MINUTE_MS / 4);
    return () => clearInterval(timer);
  }, []);
  return new Date(minute + lead).toISOString();
}
