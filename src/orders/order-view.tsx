// The whole of an order as both sides see it: picture and next step, money, grade, terms, log, papers.
import type { ReactNode } from 'react';
import type { UnitKind } from '../../shared/catalogue/kinds';
import type { Order } from '../../shared/orders/contract';
import { StopBox } from '../ui/stop-box';
import { DollarsTable } from './dollars-table';
import { GradeResult } from './grade-result';
import { NextStep } from './next-step';
import { OrderFacts } from './order-facts';
import { OrderLog } from './order-log';
import { OrderLoop } from './order-loop';
import { OrderPapers } from './order-papers';
import { TermsTable } from './terms-table';

interface OrderViewProps {
  readonly order: Order;
  /** The server's time. */
  readonly now: string;
  readonly kind: UnitKind | null;
  /** Messages between the sides. */
  readonly messages: ReactNode;
}

export function OrderView({ order, now, kind, messages }: OrderViewProps) {
  return (
    <>
      {order.frozen && (
        <div className="mb-18">
          <StopBox title="The bank disputes the card payment">
            <p>What is held stays held, and nothing moves until that is decided.</p>
          </StopBox>
        </div>
      )}
      <div className="order-top">
        <OrderLoop order={order} />
        <NextStep order={order} now={now} />
      </div>
      <DollarsTable order={order} />
      <GradeResult order={order} />
      <div className="order-thirds">
        {order.core && <TermsTable order={order} kind={kind} />}
        <div id="log">
          <OrderLog order={order} />
        </div>
        <div className="grid content-start gap-36">
          <OrderPapers order={order} />
          <OrderFacts order={order} />
        </div>
      </div>
      {messages}
    </>
  );
}
