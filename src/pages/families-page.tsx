// The code book: every family of units, narrowed by kind and words that the address holds.
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { unitKind } from '../../shared/catalogue/kinds';
import { countsQuery } from '../catalogue/api';
import { FamilyList, type FamilyFilter } from '../catalogue/family-list';
import { Page } from '../shell/layout';
import { PageHead } from '../ui/page-title';

export function FamiliesPage() {
  const [search, setSearch] = useSearchParams();
  const { data: counts } = useQuery(countsQuery());
  const filter: FamilyFilter = {
    kind: unitKind.safeParse(search.get('kind')).data ?? null,
    words: search.get('q') ?? '',
  };
  const change = ({ kind, words }: FamilyFilter): void =>
    setSearch({ ...(kind ? { kind } : {}), ...(words ? { q: words } : {}) }, { replace: true });
  return (
    <Page>
      <PageHead
        title="Code book"
        under={
          counts && (
            <span className="mute">
              {counts.families} units of {counts.makers} makers in {counts.variants} variants
            </span>
          )
        }
      />
      <FamilyList filter={filter} onFilter={change} />
    </Page>
  );
}
