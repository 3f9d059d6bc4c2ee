// How long answers are kept, and when a failed question is asked again.
import { QueryClient } from '@tanstack/react-query';
import { ProblemError } from './client';

const RETRIES = 2;

/** A refusal will not change by asking again; a server or a network that is down may. */
function mayRetry(failures: number, error: Error): boolean {
  if (error instanceof ProblemError && error.problem.status < 500) return false;
  return failures < RETRIES;
}

export const createQueryClient = (): QueryClient =>
  new QueryClient({
    defaultOptions: {
      queries: { retry: mayRetry, staleTime: 15_000, refetchOnWindowFocus: true },
      mutations: { retry: false },
    },
  });
