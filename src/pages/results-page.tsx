// The list of units on sale; its address holds the whole question.
import { UnitsBrowser } from '../listings/search/units-browser';
import { Page } from '../shell/layout';

export function ResultsPage() {
  return (
    <Page wired>
      <UnitsBrowser />
    </Page>
  );
}
