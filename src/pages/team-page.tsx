// The team of a seller account.
import { TeamView } from '../accounts/yard/team-view';
import { PageHead } from '../ui/page-title';
import { WithSeller } from './with-seller';
import { YardTabs } from './yard-tabs';

export function TeamPage() {
  return (
    <WithSeller>
      {(seller) => (
        <>
          <PageHead
            title="Team"
            under={<span className="sm mute">{seller.name}</span>}
            right={<YardTabs />}
          />
          <TeamView
            key={seller.id}
            sellerId={seller.id}
            sellerName={seller.name}
            isOwner={seller.duties.includes('owner')}
          />
        </>
      )}
    </WithSeller>
  );
}
