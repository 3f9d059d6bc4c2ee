// The catalogue's questions on the page.
import { queryOptions } from '@tanstack/react-query';
import {
  catalogueCounts,
  listAdapters,
  listFamilies,
  listVehicles,
  readFamily,
  type FamilySummary,
} from '../../shared/catalogue/contract';
import type { Adapter } from '../../shared/catalogue/adapter';
import type { VehicleModel } from '../../shared/catalogue/vehicle';
import { call } from '../http/client';

/** The catalogue changes when an admin imports, not while somebody looks at it. */
const KEEP_MS = 300_000;
/** The longest page the server gives. */
const WHOLE_PAGE = 100;

interface Answer<Item> {
  readonly items: Item[];
  readonly next: string | null;
}

/** Follows the pages to the end: suggestions must know every family. */
async function readWhole<Item>(
  read: (query: { limit: number; cursor?: string }) => Promise<Answer<Item>>,
): Promise<Item[]> {
  const items: Item[] = [];
  let cursor: string | null = null;
  do {
    const answer: Answer<Item> = await read({ limit: WHOLE_PAGE, ...(cursor ? { cursor } : {}) });
    items.push(...answer.items);
    cursor = answer.next;
  } while (cursor !== null);
  return items;
}

export const familiesQuery = () =>
  queryOptions({
    queryKey: ['catalogue', 'families'],
    queryFn: ({ signal }): Promise<FamilySummary[]> =>
      readWhole((query) => call(listFamilies, { query, signal })),
    staleTime: KEEP_MS,
  });

export const familyQuery = (id: string) =>
  queryOptions({
    queryKey: ['catalogue', 'family', id],
    queryFn: ({ signal }) => call(readFamily, { params: { id }, signal }),
    staleTime: KEEP_MS,
  });

export const countsQuery = () =>
  queryOptions({
    queryKey: ['catalogue', 'counts'],
    queryFn: ({ signal }) => call(catalogueCounts, { signal }),
    staleTime: KEEP_MS,
  });

export const adaptersQuery = () =>
  queryOptions({
    queryKey: ['catalogue', 'adapters'],
    queryFn: ({ signal }): Promise<Adapter[]> => readWhole((query) => call(listAdapters, { query, signal })),
    staleTime: KEEP_MS,
  });

export const vehiclesQuery = () =>
  queryOptions({
    queryKey: ['catalogue', 'vehicles'],
    queryFn: ({ signal }): Promise<VehicleModel[]> =>
      readWhole((query) => call(listVehicles, { query, signal })),
    staleTime: KEEP_MS,
  });
