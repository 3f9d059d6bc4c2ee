// Everything the page of one unit shows, with the freight quote to a ZIP code where one is known.
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { getListing } from '../../../shared/listings/contract';
import { call } from '../../http/client';

export const unitPageQuery = (id: string, zip: string | null) =>
  queryOptions({
    queryKey: ['listings', 'unit', id, zip],
    queryFn: ({ signal }) => call(getListing, { params: { id }, query: zip ? { zip } : {}, signal }),
    // Another ZIP code changes the freight; the page must not blink for it.
    placeholderData: (previous, query) =>
      query?.queryKey[2] === id ? keepPreviousData(previous) : undefined,
    staleTime: 30_000,
  });
