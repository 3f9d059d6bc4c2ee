// A core that has been sent but not taken in yet: what should come, and the button that says it is here.
import { useState } from 'react';
import type { Order } from '../../../shared/orders/contract';
import type { ListingPage } from '../../../shared/listings/page';
import { paths } from '../../paths';
import { Button, ButtonLink } from '../../ui/button';
import { Panel } from '../../ui/sheet';
import { ReceiveDialog } from '../actions/plain-actions';
import { Cautions } from '../cautions';
import { CAUTIONS } from '../view/next-step';
import { CoreSide } from './core-tag';

interface TakeInProps {
  readonly order: Order;
  readonly unit: ListingPage | null;
}

export function TakeIn({ order, unit }: TakeInProps) {
  const [asking, setAsking] = useState(false);
  const mayReceive = order.next.some((step) => step.action === 'receive');
  return (
    <div className="desk desk-two">
      <CoreSide order={order} unit={unit} />
      <Panel label="Take it in" className="panel-body">
        <h2>{mayReceive ? 'Take it in' : 'Somebody with dock duty takes it in'}</h2>
        <ol className="next-steps">
          <li>Look it over before signing.</li>
          <li>Write damage on the carrier’s paper.</li>
          <li>Then say it is here.</li>
        </ol>
        <Cautions lines={CAUTIONS.receive ?? []} />
        <div className="next-actions">
          {mayReceive && (
            <Button look="go" size="yard" full onClick={() => setAsking(true)}>
              The core is at the dock
            </Button>
          )}
          <ButtonLink full to={paths.order.to({ id: order.id })}>
            The whole order
          </ButtonLink>
        </div>
      </Panel>
      {asking && <ReceiveDialog order={order} onClose={() => setAsking(false)} />}
    </div>
  );
}
