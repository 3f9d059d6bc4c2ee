// A seller's money.
import { PayoutsView } from '../money/payouts';
import { PageHead } from '../ui/page-title';
import { WithSeller } from './with-seller';

export function PayoutsPage() {
  return (
    <WithSeller>
      {(seller) => (
        <>
          <PageHead title="Money" under={<span className="sm mute">{seller.name}</span>} />
          <PayoutsView key={seller.id} sellerId={seller.id} isOwner={seller.duties.includes('owner')} />
        </>
      )}
    </WithSeller>
  );
}
