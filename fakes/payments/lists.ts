// Lists as the provider pages them: newest first, by the id of the last one seen.
import { z } from 'zod';
import { integer, expandParam } from './form-decode';
import { badParam, missing } from './errors';

const createdParam = z.union([
  integer,
  z.strictObject({
    gt: integer.optional(),
    gte: integer.optional(),
    lt: integer.optional(),
    lte: integer.optional(),
  }),
]);

/** The parameters that every list takes. */
export const listParams = {
  limit: integer.refine((value) => value >= 1 && value <= 100, 'must be between 1 and 100').default(10),
  starting_after: z.string().optional(),
  ending_before: z.string().optional(),
  created: createdParam.optional(),
  expand: expandParam,
};

interface Paging {
  readonly limit: number;
  readonly starting_after?: string | undefined;
  readonly ending_before?: string | undefined;
  readonly created?: z.output<typeof createdParam> | undefined;
}

interface ListAnswer<T> {
  readonly object: 'list';
  readonly data: T[];
  readonly has_more: boolean;
  readonly url: string;
}

function inSpan(created: number, span: Paging['created']): boolean {
  if (span === undefined) return true;
  if (typeof span === 'number') return created === span;
  return (
    (span.gt === undefined || created > span.gt) &&
    (span.gte === undefined || created >= span.gte) &&
    (span.lt === undefined || created < span.lt) &&
    (span.lte === undefined || created <= span.lte)
  );
}

/** @param oldestFirst all records that the filters let through, in the order they were made */
export function pageOf<T extends { id: string; created?: number }>(
  oldestFirst: readonly T[],
  paging: Paging,
  url: string,
): ListAnswer<T> {
  const items = oldestFirst.filter((item) => inSpan(item.created ?? 0, paging.created)).reverse();
  const { limit, starting_after: after, ending_before: before } = paging;
  if (after !== undefined && before !== undefined)
    throw badParam(
      'Give only one of starting_after and ending_before.',
      'parameter_invalid',
      'ending_before',
    );
  const indexOf = (id: string, param: string): number => {
    const index = items.findIndex((item) => item.id === id);
    if (index < 0) throw missing('object', id, param);
    return index;
  };
  if (before !== undefined) {
    const end = indexOf(before, 'ending_before');
    const start = Math.max(0, end - limit);
    return { object: 'list', data: items.slice(start, end), has_more: start > 0, url };
  }
  const start = after === undefined ? 0 : indexOf(after, 'starting_after') + 1;
  return {
    object: 'list',
    data: items.slice(start, start + limit),
    has_more: start + limit < items.length,
    url,
  };
}
