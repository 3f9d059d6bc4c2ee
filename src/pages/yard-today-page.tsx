// A yard's day: jobs in the order that frees money or a carrier, the deposits still open, the newest stock.
import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { Camera } from 'lucide-react';
import { useServerNow } from '../http/server-now';
import { payoutsQuery } from '../money/api';
import { wholeOrdersQuery } from '../orders/api';
import { workQueue } from '../orders/view/work-queue';
import { OpenDeposits } from '../orders/yard/open-deposits';
import { sellerQuery } from '../orders/yard/seller-api';
import { StockSummary } from '../orders/yard/stock-summary';
import { WorkList } from '../orders/yard/work-list';
import { paths } from '../paths';
import { AutomaticSide } from '../ui/art/automatic-side';
import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/empty-state';
import { FourStates } from '../ui/four-states';
import { PageHead } from '../ui/page-title';
import { Section } from '../ui/sheet';
import type { OwnSeller } from './use-seller';
import { WithSeller } from './with-seller';
import { dayTitle, jobCount } from './day-title';

function Jobs({ seller, now }: { readonly seller: OwnSeller; readonly now: string }) {
  const query = useQuery(wholeOrdersQuery({ as: 'seller', sellerId: seller.id, open: 'true' }));
  return (
    <Section title="Do these in order" note="Sorted by what holds up money or a carrier" className="mt-0">
      <FourStates
        query={query}
        waiting="Reading the jobs"
        isEmpty={(orders) => workQueue(orders, now).length === 0}
        empty={
          <EmptyState
            title="Nothing waits on you"
            drawing={<AutomaticSide thin label={null} />}
            actions={
              <ButtonLink look="go" size="big" to={paths.newListing.to()}>
                List a unit
              </ButtonLink>
            }
          >
            <p>Jobs come here when an order is paid or a core comes back.</p>
          </EmptyState>
        }
      >
        {(orders) => <WorkList jobs={workQueue(orders, now)} now={now} />}
      </FourStates>
    </Section>
  );
}

function Deposits({ seller, now }: { readonly seller: OwnSeller; readonly now: string }) {
  const query = useInfiniteQuery(payoutsQuery(seller.id));
  const zone = useQuery(sellerQuery(seller.id)).data?.timeZone ?? 'UTC';
  return (
    <FourStates query={query} waiting="Reading the deposits">
      {(data) => <OpenDeposits deposits={data.pages[0]?.deposits ?? []} now={now} zone={zone} />}
    </FourStates>
  );
}

function Today({ seller }: { readonly seller: OwnSeller }) {
  const now = useServerNow();
  const zone = useQuery(sellerQuery(seller.id)).data?.timeZone;
  const orders = useQuery(wholeOrdersQuery({ as: 'seller', sellerId: seller.id, open: 'true' })).data;
  const title = dayTitle(now, zone);
  const jobs = orders ? workQueue(orders, now).length : null;
  return (
    <>
      <PageHead
        title={jobs === null ? title : `${title}: ${jobCount(jobs)}`}
        right={
          <ButtonLink size="big" icon={Camera} to={paths.newListing.to()}>
            List a unit
          </ButtonLink>
        }
      />
      <div className="yard-top">
        <Jobs seller={seller} now={now} />
        <Deposits seller={seller} now={now} />
      </div>
      <StockSummary sellerId={seller.id} />
    </>
  );
}

export function YardTodayPage() {
  return <WithSeller>{(seller) => <Today key={seller.id} seller={seller} />}</WithSeller>;
}
