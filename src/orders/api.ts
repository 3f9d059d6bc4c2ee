// The orders' questions and answers on the page: one query for each thing read, one mutation for each thing done.
import {
  infiniteQueryOptions,
  queryOptions,
  useMutation,
  useQueryClient,
  type QueryClient,
} from '@tanstack/react-query';
import type { z } from 'zod';
import type { Endpoint } from '../../shared/kernel/endpoint';
import type { idParams } from '../../shared/kernel/fields';
import {
  findByTag,
  getOrder,
  listOrders,
  openCheckoutAgain,
  reserve,
  type order as orderSchema,
  type Order,
  type OrderSummary,
} from '../../shared/orders/contract';
import { call, ProblemError } from '../http/client';
import { sayStop } from '../ui/notices';
import { useRequestKey } from './request-key';

export type ListFilter = Readonly<
  Partial<Pick<z.input<NonNullable<typeof listOrders.query>>, 'as' | 'sellerId' | 'state' | 'core' | 'open'>>
>;

const keys = {
  all: ['orders'] as const,
  list: (filter: ListFilter) => ['orders', 'list', filter] as const,
  one: (id: string) => ['orders', 'one', id] as const,
  tag: (code: string) => ['orders', 'tag', code] as const,
};

export const orderQuery = (id: string) =>
  queryOptions({
    queryKey: keys.one(id),
    queryFn: ({ signal }) => call(getOrder, { params: { id }, signal }),
  });

const PAGE = 24;
/** The longest page the server gives. */
const WHOLE_PAGE = 100;
/** A yard's open orders are read whole, so that the queue and its sums are true; this many pages at most. */
const WHOLE_PAGES = 20;

export const ordersQuery = (filter: ListFilter) =>
  infiniteQueryOptions({
    queryKey: keys.list(filter),
    queryFn: ({ signal, pageParam }) =>
      call(listOrders, {
        query: { ...filter, limit: PAGE, ...(pageParam ? { cursor: pageParam } : {}) },
        signal,
      }),
    initialPageParam: '',
    getNextPageParam: (last) => last.next ?? undefined,
  });

async function readWhole(filter: ListFilter, signal: AbortSignal): Promise<OrderSummary[]> {
  const items: OrderSummary[] = [];
  let cursor: string | null = null;
  for (let page = 0; page < WHOLE_PAGES; page += 1) {
    const answer: { items: OrderSummary[]; next: string | null } = await call(listOrders, {
      query: { ...filter, limit: WHOLE_PAGE, ...(cursor ? { cursor } : {}) },
      signal,
    });
    items.push(...answer.items);
    cursor = answer.next;
    if (cursor === null) break;
  }
  return items;
}

/** Every order of a filter, for queues and sums. */
export const wholeOrdersQuery = (filter: ListFilter) =>
  queryOptions({
    queryKey: [...keys.list(filter), 'whole'],
    queryFn: ({ signal }) => readWhole(filter, signal),
  });

export const tagQuery = (code: string) =>
  queryOptions({
    queryKey: keys.tag(code),
    queryFn: ({ signal }) => call(findByTag, { params: { code }, signal }),
  });

/** What is known of an order changes lists, cases and money too. */
export async function refreshOrder(client: QueryClient, id: string): Promise<void> {
  await Promise.all([
    client.invalidateQueries({ queryKey: keys.one(id) }),
    client.invalidateQueries({ queryKey: ['orders', 'list'] }),
    client.invalidateQueries({ queryKey: ['cases'] }),
    client.invalidateQueries({ queryKey: ['money'] }),
    client.invalidateQueries({ queryKey: ['messages', id] }),
  ]);
}

type OrderEndpoint<B extends z.ZodType> = Endpoint<
  typeof idParams,
  z.ZodType<Record<string, never>>,
  B,
  typeof orderSchema
>;

export const hasMovedOn = (error: unknown): boolean =>
  error instanceof ProblemError && error.problem.status === 409;

/**
 * Takes one action on an order. Nothing is shown as done before the server says so; where the order moved on meanwhile,
 * it is read again and the reader is told.
 */
export function useOrderAction<B extends z.ZodType>(endpoint: OrderEndpoint<B>, orderId: string) {
  const client = useQueryClient();
  const keyFor = useRequestKey();
  return useMutation({
    mutationFn: (body: z.input<B>): Promise<Order> =>
      call(endpoint, { params: { id: orderId }, body, idempotencyKey: keyFor(body) }),
    onSuccess: (order) => client.setQueryData(orderQuery(orderId).queryKey, order),
    onError: (error) => {
      if (hasMovedOn(error)) sayStop('The order has moved on. Here it is as it stands now.');
    },
    onSettled: () => refreshOrder(client, orderId),
  });
}

export function useReserve() {
  const client = useQueryClient();
  const keyFor = useRequestKey();
  return useMutation({
    mutationFn: (body: z.input<NonNullable<typeof reserve.body>>) =>
      call(reserve, { body, idempotencyKey: keyFor(body) }),
    onSuccess: ({ order }) => {
      client.setQueryData(orderQuery(order.id).queryKey, order);
      return client.invalidateQueries({ queryKey: ['orders', 'list'] });
    },
  });
}

export function useOpenCheckout(orderId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(openCheckoutAgain, { params: { id: orderId } }),
    onError: (error) => {
      if (hasMovedOn(error)) void refreshOrder(client, orderId);
    },
  });
}
