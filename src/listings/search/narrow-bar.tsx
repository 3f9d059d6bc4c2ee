// On phones and tablets the filters and the order wait behind a bar at the foot of the page.
import { ArrowDownWideNarrow, SlidersHorizontal } from 'lucide-react';
import { useState, type ReactNode } from 'react';
import { BottomBar } from '../../ui/bottom-bar';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { filterCount, type UnitQuery } from './search-url';

interface NarrowBarProps {
  readonly query: UnitQuery;
  /** "Show 23 cores" closes the filters. */
  readonly showWords: string;
  readonly filters: ReactNode;
  readonly sort: ReactNode;
}

export function NarrowBar({ query, showWords, filters, sort }: NarrowBarProps) {
  const [open, setOpen] = useState<'filters' | 'sort' | null>(null);
  const close = () => setOpen(null);
  const count = filterCount(query);
  const done = (
    <Button look="ink" size="big" full onClick={close}>
      {showWords}
    </Button>
  );
  return (
    <>
      <BottomBar label="Narrow and sort">
        <Button icon={SlidersHorizontal} onClick={() => setOpen('filters')}>
          Narrow{count > 0 ? ` (${count})` : ''}
        </Button>
        <Button icon={ArrowDownWideNarrow} onClick={() => setOpen('sort')}>
          Sort
        </Button>
      </BottomBar>
      <Dialog open={open === 'filters'} onClose={close} title="Narrow the list" actions={done}>
        {filters}
      </Dialog>
      <Dialog open={open === 'sort'} onClose={close} title="Sort" actions={done}>
        {sort}
      </Dialog>
    </>
  );
}
