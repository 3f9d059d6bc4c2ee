// What the catalogue holds, for admins: units, adapters and vehicles, each with where it comes from.
import { useState } from 'react';
import { CatalogueRows } from '../catalogue/catalogue-rows';
import { Page } from '../shell/layout';
import { PageHead } from '../ui/page-title';

type Shown = 'families' | 'adapters' | 'vehicles';

export function AdminCataloguePage() {
  const [shown, setShown] = useState<Shown>('families');
  return (
    <Page>
      <PageHead title="Code book" under={<span className="mute">Read only: rows come in by import</span>} />
      <CatalogueRows shown={shown} onShow={setShown} />
    </Page>
  );
}
