// The seller account the yard's pages speak of: its zone counts for all its deadlines.
import { queryOptions } from '@tanstack/react-query';
import { getSeller } from '../../../shared/accounts/seller-contract';
import { call } from '../../http/client';

export const sellerQuery = (id: string) =>
  queryOptions({
    queryKey: ['orders', 'seller', id],
    queryFn: ({ signal }) => call(getSeller, { params: { id }, signal }),
    staleTime: 300_000,
  });
