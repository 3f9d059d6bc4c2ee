// A page that could not be drawn: a fault of ours, or a new version whose old parts are gone.
import { RotateCw } from 'lucide-react';
import { useRouteError } from 'react-router-dom';
import { ProblemError } from '../http/client';
import { paths } from '../paths';
import { Page } from '../shell/layout';
import { Button, ButtonLink } from '../ui/button';
import { errorWords } from '../ui/error-state';
import { PageTitle } from '../ui/page-title';
import { StopBox } from '../ui/stop-box';
import { NotFoundPage } from './not-found-page';

/** What a browser says when a part of the page is no longer on the server. */
const isOldVersion = (error: unknown): boolean =>
  error instanceof TypeError &&
  /dynamically imported module|module script failed|importing a module/i.test(error.message);

export function BrokenPage() {
  const error = useRouteError();
  if (error instanceof ProblemError && error.problem.status === 404) return <NotFoundPage />;
  const words = isOldVersion(error)
    ? {
        title: 'There is a newer version',
        detail: 'Load the page again to get it. Nothing you saved is lost.',
      }
    : errorWords(error);
  return (
    <Page>
      <div className="state mt-44">
        <PageTitle title={words.title} />
        <StopBox title="The page stopped here">
          <p>{words.detail}</p>
        </StopBox>
        <div className="state-actions">
          <Button look="go" size="big" icon={RotateCw} onClick={() => window.location.reload()}>
            Load again
          </Button>
          <ButtonLink size="big" to={paths.home.to()}>
            Go to the first page
          </ButtonLink>
        </div>
      </div>
    </Page>
  );
}
