// Under the buy panel: when it leaves, how long there is for the core, and what if it isn't as shown.
import { CalendarClock, RotateCcw, Truck } from 'lucide-react';
import type { ListingPage } from '../../../shared/listings/page';
import { Icon } from '../../ui/icon';

export function Promises({ unit }: { readonly unit: ListingPage }) {
  const { exchange } = unit.terms;
  const days = unit.shipDays === 1 ? '1 business day' : `${unit.shipDays} business days`;
  return (
    <ul className="promises">
      <li>
        <Icon of={Truck} />
        <span>
          Leaves {unit.seller.city} within <b className="b">{days}</b> of your payment
        </span>
      </li>
      {exchange && (
        <li>
          <Icon of={CalendarClock} />
          <span>
            Send your core within <b className="b">{exchange.windowDays} days</b> of delivery
          </span>
        </li>
      )}
      <li>
        <Icon of={RotateCcw} />
        <span>Code or photos do not match? Refuse it within five business days. The money stays held.</span>
      </li>
    </ul>
  );
}
