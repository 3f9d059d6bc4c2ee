// Who sells it, and how their deals went so far: figures only where there are any.
import { Link } from 'react-router-dom';
import type { ListingPage } from '../../../shared/listings/page';
import { Section } from '../../ui/sheet';
import { unitsPath } from '../search/units-path';

interface Figure {
  readonly count: string;
  readonly words: string;
}

const KINDS = { yard: 'Salvage yard', rebuilder: 'Rebuilder', private: 'Private seller' } as const;

const percent = (part: number, whole: number): string => `${Math.round((part / whole) * 100)}%`;

function figuresOf(record: NonNullable<ListingPage['seller']['record']>): Figure[] {
  const { sold, depositsSettled, depositsWhole, cases, daysToShip } = record;
  return [
    { count: sold.toLocaleString('en-US'), words: sold === 1 ? 'unit sold here' : 'units sold here' },
    daysToShip === null
      ? { count: '–', words: 'days to ship, not known yet' }
      : { count: `${daysToShip.toFixed(1)} days`, words: 'from paid to picked up' },
    depositsSettled === 0
      ? { count: '–', words: 'no core settled yet' }
      : {
          count: percent(depositsWhole, depositsSettled),
          words: `of deposits back in full, ${depositsWhole} of ${depositsSettled}`,
        },
    { count: String(cases), words: cases === 1 ? 'case' : 'cases' },
  ];
}

export function SellerRecord({ unit }: { readonly unit: ListingPage }) {
  const { seller } = unit;
  return (
    <Section
      title={`${seller.name}, ${seller.city}`}
      note={
        <Link className="link" to={unitsPath({ sellerId: [seller.id] })}>
          All units from this seller
        </Link>
      }
    >
      <p className="mb-10">
        {KINDS[seller.kind]} in {seller.city}, {seller.region}
        {seller.verified ? ', papers checked by Spragyard.' : '. Papers not checked yet.'}
      </p>
      {seller.record ? (
        <ul className="sheet figures">
          {figuresOf(seller.record).map((figure) => (
            <li key={figure.words}>
              <b>{figure.count}</b>
              <span className="sm mute">{figure.words}</span>
            </li>
          ))}
        </ul>
      ) : (
        <p className="sheet sheet-pad">Nothing sold here yet, so there is no record to show.</p>
      )}
    </Section>
  );
}
