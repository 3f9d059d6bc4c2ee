// Every piece of the look on one page, for checking by eye while developing; the built product doesn't have it.
import { Page } from '../shell/layout';
import { PageHead } from '../ui/page-title';
import { CodePlate } from '../ui/code-plate';
import { KitForms } from './kit/kit-forms';
import { KitLook } from './kit/kit-look';
import { KitOrders } from './kit/kit-orders';
import { KitPictures } from './kit/kit-pictures';
import { CODE } from './kit/samples';

export function KitPage() {
  return (
    <Page wired>
      <PageHead
        title="Kit"
        under={
          <>
            <CodePlate groups={CODE} size="small" />
            <span className="sm mute">every piece on one page</span>
          </>
        }
      />
      <KitLook />
      <KitForms />
      <KitOrders />
      <KitPictures />
    </Page>
  );
}
