// Stands for a moment while a page's code, or who is signed in, arrives.
import { Page } from '../shell/layout';
import { WaitingState } from '../ui/waiting-state';

export function WaitingPage() {
  return (
    <Page>
      <div className="pt-44">
        <WaitingState words="Opening the page" />
      </div>
    </Page>
  );
}
