// Starts the work that no request waits for: the outbox, the provider's events, the clocks, the nightly jobs.
import { drainOnce } from './background-work';
import type { Deps } from './deps';
import { startOutbox } from './jobs/outbox';
import { tidy } from './jobs/tidy';
import { fireDeadline, sweepDeadlines } from './orders/fire';
import { sweepPhotos } from './photos/for-others';

export async function startBackground(deps: Deps): Promise<{ stop(): Promise<void> }> {
  await deps.queue.start();
  await deps.queue.work('deadline', async (data) => {
    await deps.demoClock?.refresh();
    const id = data['deadlineId'];
    if (id) await fireDeadline(deps, id);
  });
  // A job may be early by a hair, or wait for something frozen: this finds what is still due.
  await deps.queue.every('sweep', '* * * * *', async () => {
    await deps.demoClock?.refresh();
    await sweepDeadlines(deps);
  });
  await deps.queue.every('tidy', '17 3 * * *', async () => {
    await tidy(deps);
    await sweepPhotos(deps);
  });
  const outbox = await startOutbox(deps, () => drainOnce(deps));
  return {
    stop: async () => {
      await outbox.stop();
      await deps.queue.stop();
    },
  };
}
