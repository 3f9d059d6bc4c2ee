// The next page of a list, asked for by hand so that the foot of the page can be reached.
import type { UseInfiniteQueryResult } from '@tanstack/react-query';
import { Button } from './button';

interface MoreButtonProps {
  readonly query: Pick<UseInfiniteQueryResult, 'hasNextPage' | 'isFetchingNextPage' | 'fetchNextPage'>;
  /** "Show more units" */
  readonly children: string;
  /** How many are shown, and of how many where that is known. */
  readonly shown: number;
  readonly total?: number;
}

export function MoreButton({ query, children, shown, total }: MoreButtonProps) {
  return (
    <div className="mt-18 flex flex-wrap items-center gap-18">
      {query.hasNextPage && (
        <Button
          busy={query.isFetchingNextPage}
          busyWords="Reading more"
          onClick={() => void query.fetchNextPage()}
        >
          {children}
        </Button>
      )}
      <span className="sm mute num" role="status">
        {total === undefined ? `${shown} shown` : `${shown} of ${total} shown`}
      </span>
    </div>
  );
}
