// What the listing of an order's unit still tells: its kind, its shots, its code taken apart.
import { queryOptions } from '@tanstack/react-query';
import { getListing } from '../../shared/listings/contract';
import type { ListingPage } from '../../shared/listings/page';
import { call, ProblemError } from '../http/client';

async function readUnit(id: string, signal: AbortSignal): Promise<ListingPage | null> {
  try {
    return await call(getListing, { params: { id }, signal });
  } catch (error) {
    // A listing that was withdrawn has no page; the order stands without it.
    if (error instanceof ProblemError && error.problem.status === 404) return null;
    throw error;
  }
}

export const unitQuery = (listingId: string) =>
  queryOptions({
    queryKey: ['orders', 'unit', listingId],
    queryFn: ({ signal }) => readUnit(listingId, signal),
    staleTime: 300_000,
  });

/** The case code in its groups for the plate. */
export function codeGroups(caseCode: string, unit: ListingPage | null | undefined): string[] {
  const segments = unit?.code?.segments.map((one) => one.value) ?? [];
  return segments.join('') === caseCode ? segments : [caseCode];
}
