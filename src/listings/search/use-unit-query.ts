// The question of the page, kept in its address.
import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { readQuery, writeQuery, type UnitQuery } from './search-url';

export interface Asking {
  readonly query: UnitQuery;
  readonly ask: (query: UnitQuery) => void;
}

export function useUnitQuery(): Asking {
  const [params, setParams] = useSearchParams();
  const query = useMemo(() => readQuery(params), [params]);
  // Each change is a step in the history, so that the back button takes back one filter.
  const ask = useCallback(
    (next: UnitQuery) => setParams(writeQuery(next), { preventScrollReset: true }),
    [setParams],
  );
  return { query, ask };
}
