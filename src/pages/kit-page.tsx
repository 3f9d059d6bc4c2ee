// Every piece of the look on one page, for checking by eye while developing; the built product doesn't have it.
import { Page } from '../shell/layout';
import { PageTitle } from '../ui/page-title';

export function KitPage() {
  return (
    <Page>
      <PageTitle title="Kit" />
    </Page>
  );
}
