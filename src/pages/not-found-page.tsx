// There is nothing at this address, or it is not yours to see.
import { paths } from '../paths';
import { Page } from '../shell/layout';
import { AxleRear } from '../ui/art/axle-rear';
import { ButtonLink } from '../ui/button';
import { PageTitle } from '../ui/page-title';

export function NotFoundPage() {
  return (
    <Page>
      <div className="state mt-44">
        <AxleRear thin label={null} />
        <PageTitle title="This tag is not on any rack" />
        <p>The unit may be sold, the page may not be yours to see, or the address is mistyped.</p>
        <div className="state-actions">
          <ButtonLink look="go" size="big" to={paths.results.to()}>
            Find a core
          </ButtonLink>
          <ButtonLink size="big" to={paths.orders.to()}>
            Go to my orders
          </ButtonLink>
        </div>
      </div>
    </Page>
  );
}
