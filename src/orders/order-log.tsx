// The order's log, newest first: every step that was taken, by whom, with the reason where one was given.
import type { Order } from '../../shared/orders/contract';
import { formatDayTime } from '../ui/dates';
import { Section } from '../ui/sheet';
import { When } from '../ui/when';
import { builderAs, sellerAs } from './view/sides';

type Entry = Order['timeline'][number];

function whoWords(order: Order, entry: Entry): string {
  switch (entry.by) {
    case 'builder':
      return builderAs(order);
    case 'seller':
    case 'dock':
      return entry.byName ? `${entry.byName}, ${order.sellerName}` : sellerAs(order);
    case 'clock':
      return 'By itself, time was up';
    case 'provider':
      return 'Payment provider';
    case 'carrier':
      return 'Carrier';
    case 'admin':
      return 'Spragyard';
    case 'both':
      return 'Both sides';
  }
}

export function OrderLog({ order }: { readonly order: Order }) {
  const entries = [...order.timeline].reverse();
  return (
    <Section title="Log" className="mt-0">
      <ol className="rows">
        {entries.map((entry, index) => (
          <li key={`${entry.at}-${entry.action}-${index}`} className="row-log">
            <span className="mute" title={formatDayTime(entry.at, order.zone)}>
              <When at={entry.at} show="short-day" zone={order.zone} />
            </span>
            <span>
              {entry.log}
              <span className="sm mute block">{whoWords(order, entry)}</span>
              {entry.note && <q className="sm block">{entry.note}</q>}
            </span>
          </li>
        ))}
      </ol>
    </Section>
  );
}
