// One order, for either side of it.
import { useQuery } from '@tanstack/react-query';
import { MessageSquare } from 'lucide-react';
import { useParams } from 'react-router-dom';
import type { Order } from '../../shared/orders/contract';
import { CORE_FINAL, OUTBOUND_FINAL } from '../../shared/orders/states';
import { useServerNow } from '../http/server-now';
import { orderQuery } from '../orders/api';
import { OrderView } from '../orders/order-view';
import { codeGroups, unitQuery } from '../orders/unit-api';
import { Page } from '../shell/layout';
import { ButtonAnchor } from '../ui/button';
import { CodePlate } from '../ui/code-plate';
import { FourStates } from '../ui/four-states';
import { PageHead } from '../ui/page-title';
import { NotFoundPage } from './not-found-page';
import { isMissing } from './is-missing';

const isOpen = (order: Order): boolean =>
  !OUTBOUND_FINAL.includes(order.outbound.state) ||
  (order.core !== null && !CORE_FINAL.includes(order.core.state));

/** The other side acts at any time, and what it did should show without a reload. */
const LOOK_AGAIN_MS = 20_000;

function OrderBody({ order }: { readonly order: Order }) {
  const now = useServerNow();
  const unit = useQuery(unitQuery(order.listingId)).data;
  const from = order.role === 'seller' ? `sold to ${order.builderName}` : `from ${order.sellerName}`;
  return (
    <>
      <PageHead
        title={`Order ${order.number}, ${order.title}`}
        under={
          <>
            <CodePlate groups={codeGroups(order.caseCode, unit)} size="small" />
            <span className="sm mute">{from}</span>
          </>
        }
        right={
          <ButtonAnchor href="#messages" icon={MessageSquare} size="small">
            {order.role === 'builder' ? 'Write to the yard' : 'Write to the builder'}
          </ButtonAnchor>
        }
      />
      <OrderView order={order} now={now} kind={unit?.kind ?? null} messages={null} />
    </>
  );
}

export function OrderPage() {
  const { id = '' } = useParams();
  const query = useQuery({
    ...orderQuery(id),
    refetchInterval: ({ state }) => (state.data && isOpen(state.data) ? LOOK_AGAIN_MS : false),
  });
  if (isMissing(query.error) && !query.data) return <NotFoundPage />;
  return (
    <Page>
      <FourStates query={query} waiting="Reading the order">
        {(order) => <OrderBody order={order} />}
      </FourStates>
    </Page>
  );
}
