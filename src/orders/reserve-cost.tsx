// What is paid today and what it costs once a grade A core is back, side by side.
import { AfterNote, MoneyLines } from '../ui/money-lines';
import type { ReserveListing } from './reserve-form';
import { costOf } from './view/cost';

interface ReserveCostProps {
  readonly listing: ReserveListing;
  readonly terms: 'exchange' | 'outright';
  readonly method: 'freight' | 'pickup';
  readonly zip: string;
}

function freightWords({ listing, method, zip }: ReserveCostProps): string {
  if (method === 'pickup') return 'No freight: you collect it.';
  const quote = listing.freight;
  if (!quote || quote.toZip !== zip) return 'Type a ZIP code for the freight.';
  return `Freight to ${quote.toZip}, about ${quote.miles.toLocaleString('en-US')} miles, ${quote.daysLow} to ${quote.daysHigh} days. An estimate of ours; what you pay is fixed today.`;
}

export function ReserveCost(props: ReserveCostProps) {
  const { listing, terms, method, zip } = props;
  const quoted = listing.freight?.toZip === zip ? listing.freight.cents : null;
  const cost = costOf({
    terms,
    method,
    priceCents: terms === 'exchange' ? (listing.exchange?.priceCents ?? 0) : (listing.outrightCents ?? 0),
    depositCents: listing.exchange?.depositCents ?? 0,
    freightCents: quoted,
    windowDays: listing.exchange?.windowDays ?? 0,
  });
  const complete = method === 'pickup' || quoted !== null;
  return (
    <div className="grid gap-10" aria-live="polite">
      <MoneyLines
        lines={cost.lines}
        total={{ label: complete ? 'Pay today' : 'Pay today, without freight', cents: cost.todayCents }}
      />
      {cost.afterGradeACents !== null && (
        <AfterNote
          label="Cost after a grade A core"
          note={
            listing.exchange?.returnFreight === 'builder'
              ? 'You pay the return freight on top'
              : 'The yard pays the return freight'
          }
          cents={cost.afterGradeACents}
        />
      )}
      <p className="sm mute">
        {freightWords(props)} Sales tax, where it is due, stands on the payment page before you pay.
      </p>
    </div>
  );
}
