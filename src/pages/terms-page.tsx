// The terms of a seller account.
import { TermsView } from '../accounts/yard/terms-view';
import { PageHead } from '../ui/page-title';
import { WithSeller } from './with-seller';
import { YardTabs } from './yard-tabs';

export function TermsPage() {
  return (
    <WithSeller>
      {(seller) => (
        <>
          <PageHead
            title="Terms"
            under={
              <span className="sm mute">
                {seller.name}. New listings start from these; units on offer keep theirs.
              </span>
            }
            right={<YardTabs />}
          />
          <TermsView key={seller.id} sellerId={seller.id} isOwner={seller.duties.includes('owner')} />
        </>
      )}
    </WithSeller>
  );
}
