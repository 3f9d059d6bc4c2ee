// The most to pay today for the unit, price and deposit together.
import { useState } from 'react';
import { Button } from '../../ui/button';
import { MoneyInput } from '../../ui/form/money-input';
import type { UnitQuery } from './search-url';

interface PriceCapProps {
  readonly query: UnitQuery;
  readonly onAsk: (query: UnitQuery) => void;
}

function Cap({ query, onAsk }: PriceCapProps) {
  const [cents, setCents] = useState<number | null>(query.maxCents ?? null);
  return (
    <form
      className="facet"
      aria-label="Price"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        onAsk({ ...query, maxCents: cents ?? undefined });
      }}
    >
      <h3 className="facet-title">Pay today, up to</h3>
      <div className="facet-pair">
        <MoneyInput label="Up to, in dollars" labelHidden value={cents} onChange={setCents} />
        <Button type="submit">Set</Button>
      </div>
      <p className="xs mute">Price and deposit together, before freight and tax.</p>
    </form>
  );
}

/** A cap from elsewhere (the back button) starts the field anew. */
export const PriceCap = (props: PriceCapProps) => <Cap key={props.query.maxCents ?? 'none'} {...props} />;
