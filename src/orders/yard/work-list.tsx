// The yard's queue as rows: the first is framed and has the red button; each says what waits on it and by when.
import { Flag as FlagIcon, PackageCheck, ScanBarcode, Truck, type LucideIcon } from 'lucide-react';
import clsx from 'clsx';
import { ButtonLink } from '../../ui/button';
import { DueBy, DueChip } from '../../ui/due-chip';
import { Icon } from '../../ui/icon';
import type { Job, JobKind } from '../view/work-queue';

const ICONS: Readonly<Record<JobKind, LucideIcon>> = {
  grade: PackageCheck,
  hand_over: Truck,
  pack: PackageCheck,
  case: FlagIcon,
  answer: FlagIcon,
  receive: ScanBarcode,
};

interface WorkListProps {
  readonly jobs: readonly Job[];
  /** The server's time. */
  readonly now: string;
}

export function WorkList({ jobs, now }: WorkListProps) {
  return (
    <ol className="queue">
      {jobs.map((job, index) => (
        <li key={job.key} className={clsx(index === 0 && 'queue-first')}>
          <span className="queue-mark">
            <Icon of={ICONS[job.kind]} />
          </span>
          <div>
            <b>{job.title}</b>
            <span className="sm mute">{job.detail}</span>
          </div>
          {job.dueAt ? (
            <DueBy dueAt={job.dueAt} startedAt={job.startedAt} now={now} soonHours={48} />
          ) : (
            <DueChip words="No deadline" />
          )}
          <ButtonLink
            look={index === 0 ? 'go' : 'plain'}
            to={job.to}
            aria-label={`${job.button}: ${job.title}`}
          >
            {job.button}
          </ButtonLink>
        </li>
      ))}
    </ol>
  );
}
