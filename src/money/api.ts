// Money's questions: a seller's payouts; for admins the ledger, the reconciliation and what is stuck.
import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  readHealth,
  readLedger,
  readPayouts,
  readReconciliation,
  retryEffect,
  startOnboarding,
} from '../../shared/money/contract';
import { call } from '../http/client';

const withCursor = (cursor: string): { cursor?: string } => (cursor ? { cursor } : {});

export const payoutsQuery = (sellerId: string) =>
  infiniteQueryOptions({
    queryKey: ['money', 'payouts', sellerId],
    queryFn: ({ signal, pageParam }) =>
      call(readPayouts, { query: { sellerId, limit: 24, ...withCursor(pageParam) }, signal }),
    initialPageParam: '',
    getNextPageParam: (last) => last.next ?? undefined,
  });

export const ledgerQuery = (orderId: string) =>
  infiniteQueryOptions({
    queryKey: ['money', 'ledger', orderId],
    queryFn: ({ signal, pageParam }) =>
      call(readLedger, {
        query: { limit: 24, ...(orderId ? { orderId } : {}), ...withCursor(pageParam) },
        signal,
      }),
    initialPageParam: '',
    getNextPageParam: (last) => last.next ?? undefined,
  });

export const reconciliationQuery = queryOptions({
  queryKey: ['money', 'reconciliation'],
  queryFn: ({ signal }) => call(readReconciliation, { signal }),
});

export const healthQuery = queryOptions({
  queryKey: ['money', 'health'],
  queryFn: ({ signal }) => call(readHealth, { signal }),
});

export function useRetryEffect() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (key: string) => call(retryEffect, { body: { key } }),
    onSettled: () => client.invalidateQueries({ queryKey: healthQuery.queryKey }),
  });
}

export function useStartOnboarding() {
  return useMutation({
    mutationFn: (sellerId: string) => call(startOnboarding, { body: { sellerId } }),
  });
}
