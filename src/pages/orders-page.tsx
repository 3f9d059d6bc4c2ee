// A builder's orders.
import { OrdersBrowser } from '../orders/orders-browser';
import { paths } from '../paths';
import { Page } from '../shell/layout';
import { AutomaticSide } from '../ui/art/automatic-side';
import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/empty-state';
import { PageHead } from '../ui/page-title';

export function OrdersPage() {
  return (
    <Page>
      <PageHead title="Orders" />
      <OrdersBrowser
        as="builder"
        empty={
          <EmptyState
            title="No order is open"
            drawing={<AutomaticSide thin label={null} />}
            actions={
              <ButtonLink look="go" size="big" to={paths.results.to()}>
                Find a core
              </ButtonLink>
            }
          >
            <p>What you buy stands here until both legs are done: the unit to you, the old one back.</p>
          </EmptyState>
        }
      />
    </Page>
  );
}
