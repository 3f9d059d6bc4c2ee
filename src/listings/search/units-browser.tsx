// The list of units with its filters: what the address asks for, drawn.
import { useInfiniteQuery } from '@tanstack/react-query';
import { FourStates } from '../../ui/four-states';
import { MoreButton } from '../../ui/more-button';
import { PageHead } from '../../ui/page-title';
import { Wire } from '../../ui/tag-card';
import { FacetPanel } from './facet-panel';
import { NarrowBar } from './narrow-bar';
import { NoMatch } from './no-match';
import { ResultTag } from './result-tag';
import { matchedWords, resultsTitle } from './results-title';
import { unitsQuery } from './search-api';
import { SearchWords } from './search-words';
import { SortChoice, SortSelect } from './sort-select';
import { useUnitQuery } from './use-unit-query';

export function UnitsBrowser() {
  const { query, ask } = useUnitQuery();
  const units = useInfiniteQuery(unitsQuery(query));
  const first = units.data?.pages[0];
  const title = resultsTitle(query, first?.total);
  const panel = <FacetPanel query={query} facets={first?.facets} onAsk={ask} />;
  return (
    <>
      <PageHead title={title} right={<SearchWords query={query} onAsk={ask} />} />
      <div className="results">
        <section aria-label="Units" aria-busy={units.isPlaceholderData || undefined}>
          <div className="results-top">
            <p className="sm mute" role="status">
              {first ? matchedWords(query, first.matched) || 'Used cores from yards and builders.' : ''}
            </p>
            <SortSelect query={query} onAsk={ask} />
          </div>
          <FourStates
            query={units}
            waiting="Looking through the yards"
            isEmpty={(data) => data.pages.every((page) => page.items.length === 0)}
            empty={<NoMatch query={query} />}
          >
            {(data) => {
              const cards = data.pages.flatMap((page) => page.items);
              return (
                <>
                  <Wire className="results-list">
                    {cards.map((card) => (
                      <ResultTag key={card.id} card={card} />
                    ))}
                  </Wire>
                  <MoreButton
                    query={units}
                    shown={cards.length}
                    {...(first?.total.exact ? { total: first.total.value } : {})}
                  >
                    Show more units
                  </MoreButton>
                </>
              );
            }}
          </FourStates>
        </section>
        <aside className="results-facets" aria-label="Narrow the list">
          {panel}
        </aside>
      </div>
      <NarrowBar
        query={query}
        showWords={first ? `Show ${title}` : 'Show the list'}
        filters={panel}
        sort={<SortChoice query={query} onAsk={ask} />}
      />
    </>
  );
}
