// Asking for units: page after page, and a bare count for the find box.
import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import { searchListings } from '../../../shared/listings/contract';
import { call } from '../../http/client';
import type { UnitQuery } from './search-url';

const PAGE = 24;

/** While the next question is answered the last answer stays on the page, greyed by nothing and moved by nothing. */
export const unitsQuery = (query: UnitQuery) =>
  infiniteQueryOptions({
    queryKey: ['listings', 'search', query],
    queryFn: ({ signal, pageParam }) =>
      call(searchListings, {
        query: { ...query, limit: PAGE, ...(pageParam ? { cursor: pageParam } : {}) },
        signal,
      }),
    initialPageParam: '',
    getNextPageParam: (last) => last.next ?? undefined,
    placeholderData: keepPreviousData,
    staleTime: 30_000,
  });

/** The first few of a question. */
export const firstUnitsQuery = (query: UnitQuery, limit: number) =>
  queryOptions({
    queryKey: ['listings', 'first', limit, query],
    queryFn: ({ signal }) => call(searchListings, { query: { ...query, limit }, signal }),
    staleTime: 30_000,
  });
