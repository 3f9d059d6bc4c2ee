// Where cores come in: scan a tag, or pick the core from what is at the dock and on its way.
import { useQuery } from '@tanstack/react-query';
import { useServerNow } from '../http/server-now';
import { wholeOrdersQuery } from '../orders/api';
import { ScanBar } from '../orders/desk/scan-bar';
import { CoreList } from '../orders/yard/core-list';
import { FourStates } from '../ui/four-states';
import { PageHead } from '../ui/page-title';
import { WithSeller } from './with-seller';
import type { OwnSeller } from './use-seller';

function Receiving({ seller }: { readonly seller: OwnSeller }) {
  const now = useServerNow();
  const query = useQuery(wholeOrdersQuery({ as: 'seller', sellerId: seller.id, open: 'true' }));
  return (
    <div className="yard">
      <PageHead title="Receive a core" />
      <ScanBar />
      <FourStates query={query} waiting="Reading what comes back">
        {(orders) => <CoreList orders={orders} now={now} />}
      </FourStates>
    </div>
  );
}

export function ReceivingPage() {
  return <WithSeller wired>{(seller) => <Receiving key={seller.id} seller={seller} />}</WithSeller>;
}
