// Nothing answers the question: what to loosen, each as one press, in the order that helps most.
import { ButtonLink } from '../../ui/button';
import { EmptyState } from '../../ui/empty-state';
import { KindDrawing } from '../kind-drawing';
import { filterCount, unitQuery, withoutFilters, type UnitQuery } from './search-url';
import { unitsPath } from './units-path';

interface Loosened {
  readonly words: string;
  readonly query: UnitQuery;
}

const without = (query: UnitQuery, ...keys: readonly (keyof UnitQuery)[]): UnitQuery =>
  unitQuery.parse(
    Object.fromEntries(Object.entries(query).filter(([key]) => !keys.some((one) => one === key))),
  );

/** What can be let go, nearest to the question first. */
export function loosened(query: UnitQuery): Loosened[] {
  const ways: (Loosened | false)[] = [
    query.withinMiles !== undefined && {
      words: `Farther than ${query.withinMiles.toLocaleString('en-US')} miles`,
      query: without(query, 'withinMiles'),
    },
    (query.maxCents !== undefined || query.minCents !== undefined) && {
      words: 'Any price',
      query: without(query, 'maxCents', 'minCents'),
    },
    query.grade !== undefined && { words: 'Any grade', query: without(query, 'grade') },
    query.terms?.length === 1 && { words: 'Exchange or outright', query: without(query, 'terms') },
    query.state !== undefined && { words: 'Pulled or still in the vehicle', query: without(query, 'state') },
    (query.familyId !== undefined || query.variantId !== undefined) && {
      words: 'Any family',
      query: without(query, 'familyId', 'variantId'),
    },
    query.sellerId !== undefined && { words: 'Any yard', query: without(query, 'sellerId') },
    query.kind !== undefined && { words: 'Any kind of unit', query: without(query, 'kind') },
    query.q !== undefined && filterCount(query) > 0 && { words: 'No filters', query: withoutFilters(query) },
  ];
  return ways.filter((way) => way !== false);
}

export function NoMatch({ query }: { readonly query: UnitQuery }) {
  const ways = loosened(query);
  const asked = query.q ? ` for “${query.q}”` : '';
  return (
    <EmptyState
      title={`No unit today${asked}`}
      drawing={<KindDrawing kind={query.kind?.[0] ?? 'automatic'} />}
      actions={
        <>
          {ways.map((way) => (
            <ButtonLink key={way.words} to={unitsPath(way.query)}>
              {way.words}
            </ButtonLink>
          ))}
          <ButtonLink look="ink" to={unitsPath({})}>
            All units
          </ButtonLink>
        </>
      }
    >
      <p>
        {query.q
          ? 'Try the first four characters of the code, or the maker and the family. '
          : 'No yard has one that meets all of this. '}
        {ways.length > 0 && 'Or let go of one thing:'}
      </p>
    </EmptyState>
  );
}
