// One family of the code book.
import { useQuery } from '@tanstack/react-query';
import { useParams, useSearchParams } from 'react-router-dom';
import { familyQuery } from '../catalogue/api';
import { FamilyDrawing } from '../catalogue/family-drawing';
import { FamilyView } from '../catalogue/family-view';
import { unitWords } from '../catalogue/family-words';
import { paths } from '../paths';
import { Page } from '../shell/layout';
import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/empty-state';
import { FourStates } from '../ui/four-states';
import { PageHead, PageTitle } from '../ui/page-title';
import { isMissing } from './is-missing';

function Missing() {
  return (
    <>
      <PageTitle title="No such unit" className="vh" />
      <div className="mt-44">
        <EmptyState
          title="No such unit in the code book"
          drawing={<FamilyDrawing kind="automatic" />}
          actions={
            <ButtonLink look="go" size="big" to={paths.families.to()}>
              Open the code book
            </ButtonLink>
          }
        />
      </div>
    </>
  );
}

export function FamilyPage() {
  const { id = '' } = useParams();
  const [search] = useSearchParams();
  const query = useQuery(familyQuery(id));
  if (isMissing(query.error)) {
    return (
      <Page>
        <Missing />
      </Page>
    );
  }
  return (
    <Page>
      <FourStates query={query} waiting="Opening the code book">
        {(family) => (
          <>
            <PageHead
              title={family.name}
              under={<span className="mute">{unitWords(family)}</span>}
              right={
                <ButtonLink look="go" size="big" to={paths.results.to({ familyId: family.id })}>
                  Find cores of this family
                </ButtonLink>
              }
            />
            <FamilyView family={family} variantId={search.get('variant')} />
          </>
        )}
      </FourStates>
    </Page>
  );
}
