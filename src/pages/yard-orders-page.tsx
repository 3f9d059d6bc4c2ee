// A yard's orders.
import { OrdersBrowser } from '../orders/orders-browser';
import { paths } from '../paths';
import { AutomaticSide } from '../ui/art/automatic-side';
import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/empty-state';
import { PageHead } from '../ui/page-title';
import { WithSeller } from './with-seller';

export function YardOrdersPage() {
  return (
    <WithSeller>
      {(seller) => (
        <>
          <PageHead title="Orders" />
          <OrdersBrowser
            key={seller.id}
            as="seller"
            sellerId={seller.id}
            empty={
              <EmptyState
                title="No order is open"
                drawing={<AutomaticSide thin label={null} />}
                actions={
                  <ButtonLink look="go" size="big" to={paths.newListing.to()}>
                    List a unit
                  </ButtonLink>
                }
              >
                <p>An order stands here from the payment until its core is settled.</p>
              </EmptyState>
            }
          />
        </>
      )}
    </WithSeller>
  );
}
