// Links to the list of units with a question in them.
import { paths } from '../../paths';
import { unitQuery, writeQuery } from './search-url';
import type { z } from 'zod';

export function unitsPath(query: z.input<typeof unitQuery>): string {
  const search = writeQuery(unitQuery.parse(query)).toString();
  return search ? `${paths.results.to()}?${search}` : paths.results.to();
}
