// Every list and page that asks the server draws four states: waiting, failed, empty, full.
import type { UseInfiniteQueryResult, UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { ErrorState, errorWords } from './error-state';
import { WaitingState } from './waiting-state';

type AnyQuery<Data> = Pick<
  UseQueryResult<Data> | UseInfiniteQueryResult<Data>,
  'data' | 'error' | 'isPending' | 'isFetching' | 'refetch'
>;

interface FourStatesProps<Data> {
  readonly query: AnyQuery<Data>;
  /** "Reading the stock" */
  readonly waiting: string;
  readonly isEmpty?: (data: Data) => boolean;
  readonly empty?: ReactNode;
  /** Instead of the usual black block, for errors the page has its own words for; `null` falls back. */
  readonly failed?: (error: Error) => ReactNode;
  readonly children: (data: Data) => ReactNode;
}

function StaleNote({ error, onRetry }: { readonly error: Error; readonly onRetry: () => void }) {
  return (
    <div className="refresh-note" role="status">
      <span className="sm">This may be out of date. {errorWords(error).detail}</span>
      <button type="button" className="link" onClick={onRetry}>
        Try again
      </button>
    </div>
  );
}

export function FourStates<Data>({
  query,
  waiting,
  isEmpty,
  empty,
  failed,
  children,
}: FourStatesProps<Data>) {
  const { data, error } = query;
  const retry = () => void query.refetch();
  if (data === undefined) {
    if (error) return failed?.(error) ?? <ErrorState error={error} onRetry={retry} />;
    return <WaitingState words={waiting} />;
  }
  return (
    <>
      {error && <StaleNote error={error} onRetry={retry} />}
      {empty !== undefined && isEmpty?.(data) ? empty : children(data)}
    </>
  );
}
