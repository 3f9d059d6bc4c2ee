// Stands for a moment while the first page's code arrives.
import { WaitingState } from '../ui/waiting-state';

export function WaitingPage() {
  return (
    <div className="page pt-44">
      <WaitingState words="Opening the page" />
    </div>
  );
}
