// A yard's page for one of the reader's seller accounts; where there are several it lets the reader choose.
import type { ReactNode } from 'react';
import { Page } from '../shell/layout';
import { Select } from '../ui/form/select';
import { NotFoundPage } from './not-found-page';
import { chooseSeller, useSeller, type OwnSeller } from './use-seller';

interface WithSellerProps {
  readonly wired?: boolean;
  readonly children: (seller: OwnSeller) => ReactNode;
}

export function WithSeller({ wired = false, children }: WithSellerProps) {
  const { seller, others } = useSeller();
  if (!seller) return <NotFoundPage />;
  return (
    <Page wired={wired}>
      {others.length > 1 && (
        <div className="max-w-lede mt-18">
          <Select
            label="Seller account"
            value={seller.id}
            options={others.map((one) => ({ value: one.id, label: one.name }))}
            onChange={(event) => chooseSeller(event.target.value)}
          />
        </div>
      )}
      {children(seller)}
    </Page>
  );
}
