// The receiving desk for one core.
import { useQuery } from '@tanstack/react-query';
import { Check } from 'lucide-react';
import { useParams } from 'react-router-dom';
import type { Order } from '../../shared/orders/contract';
import { orderQuery } from '../orders/api';
import { GradeDesk } from '../orders/desk/grade-desk';
import { ScanBar } from '../orders/desk/scan-bar';
import { TakeIn } from '../orders/desk/take-in';
import { GradeResult } from '../orders/grade-result';
import { unitQuery } from '../orders/unit-api';
import { dayIn } from '../orders/view/moments';
import { paths } from '../paths';
import { Page } from '../shell/layout';
import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/empty-state';
import { FourStates } from '../ui/four-states';
import { Icon } from '../ui/icon';
import { PageHead } from '../ui/page-title';
import { isMissing } from './is-missing';
import { NotFoundPage } from './not-found-page';

function scanWords(order: Order): string {
  const due = dayIn(order, order.core?.dueAt ?? null);
  if (order.core?.sentLate) return `Order ${order.number}, sent after ${due ?? 'the due date'}`;
  return due ? `Order ${order.number}, due back by ${due}` : `Order ${order.number}`;
}

function Elsewhere({ order }: { readonly order: Order }) {
  const graded = order.core?.grade !== null && order.core !== null;
  return (
    <>
      <PageHead title={`Core of order ${order.number}`} />
      {graded ? (
        <GradeResult order={order} />
      ) : (
        <EmptyState title="This core is not here">
          <p>It has not been sent yet, or nothing is owed on this order.</p>
        </EmptyState>
      )}
      <p className="mt-18">
        <ButtonLink to={paths.order.to({ id: order.id })}>The whole order</ButtonLink>
      </p>
    </>
  );
}

function Body({ order }: { readonly order: Order }) {
  const unit = useQuery(unitQuery(order.listingId));
  if (order.core?.state === 'coming_back') return <TakeIn order={order} unit={unit.data ?? null} />;
  if (!order.next.some((step) => step.action === 'grade')) return <Elsewhere order={order} />;
  return (
    <FourStates query={unit} waiting="Reading the terms and the checks">
      {(data) => <GradeDesk order={order} unit={data} />}
    </FourStates>
  );
}

export function ReceiveDeskPage() {
  const { orderId = '' } = useParams();
  const query = useQuery(orderQuery(orderId));
  if (isMissing(query.error) && !query.data) return <NotFoundPage />;
  const order = query.data;
  return (
    <Page wired>
      <div className="yard">
        <ScanBar
          key={orderId}
          tag={order?.core?.tagCode ?? null}
          result={
            order && (
              <>
                <Icon of={Check} /> {scanWords(order)}
              </>
            )
          }
        />
        <FourStates query={query} waiting="Reading the order">
          {(data) => <Body key={data.id} order={data} />}
        </FourStates>
      </div>
    </Page>
  );
}
