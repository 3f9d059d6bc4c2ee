// The builder books the return of the old unit.
import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import type { Order } from '../../shared/orders/contract';
import { orderQuery } from '../orders/api';
import { BookReturnForm, ReturnBooked } from '../orders/book-return-form';
import { paths } from '../paths';
import { Page } from '../shell/layout';
import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/empty-state';
import { FourStates } from '../ui/four-states';
import { PageHead } from '../ui/page-title';
import { isMissing } from './is-missing';
import { NotFoundPage } from './not-found-page';

function Body({ order }: { readonly order: Order }) {
  if (order.core?.state === 'booked') return <ReturnBooked order={order} />;
  if (order.next.some((step) => step.action === 'book_return')) return <BookReturnForm order={order} />;
  return (
    <EmptyState
      title="No return can be booked on this order now"
      actions={
        <ButtonLink size="big" to={paths.order.to({ id: order.id })}>
          Back to the order
        </ButtonLink>
      }
    >
      <p>A core return is booked by the builder once the unit was delivered, and once only.</p>
    </EmptyState>
  );
}

export function BookReturnPage() {
  const { id = '' } = useParams();
  const query = useQuery(orderQuery(id));
  if (isMissing(query.error) && !query.data) return <NotFoundPage />;
  return (
    <Page>
      <PageHead
        title="Book the core return"
        under={
          query.data && (
            <span className="sm mute">
              Order {query.data.number}, {query.data.title}
            </span>
          )
        }
      />
      <FourStates query={query} waiting="Reading the order">
        {(order) => <Body order={order} />}
      </FourStates>
    </Page>
  );
}
