// Orders of one side, open or closed, a page at a time.
import { useInfiniteQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useServerNow } from '../http/server-now';
import { Segment } from '../ui/form/segment';
import { FourStates } from '../ui/four-states';
import { MoreButton } from '../ui/more-button';
import { ordersQuery } from './api';
import { OrderList } from './order-list';

type Shown = 'open' | 'closed';

const SHOWN = [
  { value: 'open', label: 'Open' },
  { value: 'closed', label: 'Closed' },
] as const;

interface OrdersBrowserProps {
  readonly as: 'builder' | 'seller' | 'admin';
  readonly sellerId?: string;
  /** What stands there when nothing is open. */
  readonly empty: ReactNode;
}

export function OrdersBrowser({ as, sellerId, empty }: OrdersBrowserProps) {
  const [shown, setShown] = useState<Shown>('open');
  const now = useServerNow();
  const query = useInfiniteQuery(
    ordersQuery({ as, open: shown === 'open' ? 'true' : 'false', ...(sellerId ? { sellerId } : {}) }),
  );
  return (
    <div className="grid gap-18">
      <div className="max-w-lede">
        <Segment legend="Which orders" tight options={SHOWN} value={shown} onChange={setShown} />
      </div>
      <FourStates
        query={query}
        waiting="Reading the orders"
        isEmpty={(data) => data.pages.every((page) => page.items.length === 0)}
        empty={shown === 'open' ? empty : <p className="mute">No closed orders yet.</p>}
      >
        {(data) => {
          const orders = data.pages.flatMap((page) => page.items);
          return (
            <div>
              <OrderList
                caption={`${shown === 'open' ? 'Open' : 'Closed'} orders`}
                orders={orders}
                now={now}
              />
              <MoreButton query={query} shown={orders.length}>
                Show more orders
              </MoreButton>
            </div>
          );
        }}
      </FourStates>
    </div>
  );
}
