// Short notices at the foot of the page: something was done, or something stopped. They never hold the only word on it.
import { Check, OctagonX, X } from 'lucide-react';
import { Toast } from 'radix-ui';
import { useSyncExternalStore } from 'react';
import { Icon } from './icon';

interface Notice {
  readonly id: number;
  readonly tone: 'done' | 'stop';
  readonly words: string;
}

const DONE_MS = 6_000;
/** A refusal stays until it is read. */
const STOP_MS = 30_000;

let notices: readonly Notice[] = [];
let lastId = 0;
const listeners = new Set<() => void>();

function change(next: readonly Notice[]): void {
  notices = next;
  for (const listener of listeners) listener();
}

function say(tone: Notice['tone'], words: string): void {
  lastId += 1;
  change([...notices.slice(-2), { id: lastId, tone, words }]);
}

/** "Listing published" */
export const sayDone = (words: string): void => say('done', words);
/** "Not sent. No signal" */
export const sayStop = (words: string): void => say('stop', words);

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Stands once, in the layout. */
export function Notices() {
  const shown = useSyncExternalStore(subscribe, () => notices);
  const drop = (id: number) => change(notices.filter((notice) => notice.id !== id));
  return (
    <Toast.Provider label="Notice" swipeDirection="right">
      {shown.map((notice) => (
        <Toast.Root
          key={notice.id}
          className={notice.tone === 'stop' ? 'notice notice-stop' : 'notice'}
          type={notice.tone === 'stop' ? 'foreground' : 'background'}
          duration={notice.tone === 'stop' ? STOP_MS : DONE_MS}
          onOpenChange={(open) => !open && drop(notice.id)}
        >
          <Icon of={notice.tone === 'stop' ? OctagonX : Check} />
          <Toast.Description>{notice.words}</Toast.Description>
          <Toast.Close className="notice-close" aria-label="Close notice">
            <Icon of={X} />
          </Toast.Close>
        </Toast.Root>
      ))}
      <Toast.Viewport className="notices" />
    </Toast.Provider>
  );
}
