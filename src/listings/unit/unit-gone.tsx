// A unit that isn't on sale any more, or never was: what happened, and where to look instead.
import type { ListingStatus } from '../../../shared/listings/page';
import { AutomaticSide } from '../../ui/art/automatic-side';
import { ButtonLink } from '../../ui/button';
import { EmptyState } from '../../ui/empty-state';
import { StopBox } from '../../ui/stop-box';
import { unitsPath } from '../search/units-path';

/** At this address there is no unit that the reader may see. */
export function UnitMissing() {
  return (
    <EmptyState
      title="This unit is not on sale"
      drawing={<AutomaticSide thin label={null} />}
      actions={
        <>
          <ButtonLink look="go" size="big" to={unitsPath({})}>
            Find a core
          </ButtonLink>
        </>
      }
    >
      <p>The yard took it off, or the address is not right. Look for another of its family.</p>
    </EmptyState>
  );
}

const STOPPED: Readonly<Partial<Record<ListingStatus, { title: string; words: string }>>> = {
  reserved: {
    title: 'On hold for another builder',
    words: 'It comes back on sale if the payment does not arrive within 30 minutes of the hold.',
  },
  sold: { title: 'Sold', words: 'Another builder has it. The page stays for the record.' },
  withdrawn: { title: 'Off sale', words: 'The yard took it off. Only its members see this page.' },
};

interface UnitStoppedProps {
  readonly status: ListingStatus;
  readonly familyId: string;
}

/** In place of the buy panel. */
export function UnitStopped({ status, familyId }: UnitStoppedProps) {
  const stopped = STOPPED[status] ?? { title: 'Not on sale', words: '' };
  return (
    <div className="grid gap-14">
      <StopBox title={stopped.title}>
        <p>{stopped.words}</p>
      </StopBox>
      <ButtonLink full size="big" to={unitsPath({ familyId: [familyId] })}>
        Others of this family
      </ButtonLink>
    </div>
  );
}
