// Back from the hosted payment page: waits for the provider's own word, because the way back proves nothing.
import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { Navigate, useParams } from 'react-router-dom';
import { formatCents } from '../../shared/kernel/money';
import type { Order } from '../../shared/orders/contract';
import { orderQuery } from '../orders/api';
import { paths } from '../paths';
import { Page } from '../shell/layout';
import { ButtonLink } from '../ui/button';
import { FourStates } from '../ui/four-states';
import { PageHead } from '../ui/page-title';
import { Sheet } from '../ui/sheet';
import { WaitingState } from '../ui/waiting-state';

const ASK_EVERY_MS = 1_500;
/** After this long something is slow, and the reader should know that nothing is lost. */
const SLOW_AFTER_MS = 30_000;

function useSlow(): boolean {
  const [slow, setSlow] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setSlow(true), SLOW_AFTER_MS);
    return () => clearTimeout(timer);
  }, []);
  return slow;
}

function Waiting({ order }: { readonly order: Order }) {
  const slow = useSlow();
  const total = formatCents(order.money.totalCents);
  return (
    <Sheet pad>
      <div className="grid gap-18">
        <WaitingState words={`Checking that ${total} reached the hold of order ${order.number}`} blanks={0} />
        <ul className="list-disc grid gap-6 pl-20">
          <li>The payment provider tells us itself, signed, that the money is there.</li>
          <li>The amount must match the order to the cent.</li>
          <li>Then all of it is held, and {order.sellerName} is told to pack.</li>
        </ul>
        {slow && (
          <p role="status">
            This takes longer than usual. Nothing is lost: the unit stays yours, and a mail comes when the
            payment is in. You may leave this page.
          </p>
        )}
        <div>
          <ButtonLink to={paths.order.to({ id: order.id })}>Go to the order</ButtonLink>
        </div>
      </div>
    </Sheet>
  );
}

export function CheckoutDonePage() {
  const { id = '' } = useParams();
  const query = useQuery({
    ...orderQuery(id),
    refetchInterval: ({ state }) =>
      state.data?.outbound.state === 'awaiting_payment' ? ASK_EVERY_MS : false,
  });
  const state = query.data?.outbound.state;
  if (state !== undefined && state !== 'awaiting_payment') {
    return <Navigate to={paths.order.to({ id })} replace />;
  }
  return (
    <Page>
      <PageHead title="Back from the bank" />
      <FourStates query={query} waiting="Reading the order">
        {(order) => <Waiting order={order} />}
      </FourStates>
    </Page>
  );
}
