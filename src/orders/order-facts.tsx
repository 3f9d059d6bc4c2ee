// Where the unit goes and how: address, carrier and tracking of both legs, for whoever asks "where is it?".
import type { Order } from '../../shared/orders/contract';
import { Section } from '../ui/sheet';
import { dayIn } from './view/moments';

interface Fact {
  readonly label: string;
  readonly words: string;
}

function factsOf(order: Order): Fact[] {
  const { outbound, core } = order;
  const { delivery } = outbound;
  const address = `${delivery.name}, ${delivery.line1}, ${delivery.city}, ${delivery.region} ${delivery.zip}`;
  const maybe = (label: string, words: string | null | undefined): Fact[] =>
    words ? [{ label, words }] : [];
  return [
    { label: delivery.method === 'pickup' ? 'Collected by' : 'Goes to', words: address },
    ...maybe('Carrier', [outbound.carrier, outbound.tracking].filter(Boolean).join(', ')),
    ...maybe('Unit tag', outbound.tagCode),
    ...maybe('Old unit', core?.caseCode),
    ...maybe('Core tag', core?.tagCode),
    ...maybe(
      'Core travels',
      core?.method === 'drop_off'
        ? `Brought by ${order.builderName}, sent ${dayIn(order, core.sentAt) ?? ''}`
        : [core?.carrier, core?.tracking].filter(Boolean).join(', '),
    ),
    ...maybe('Different core', core?.otherCoreAllowed ? `${order.sellerName} takes a different unit` : null),
    { label: 'Days counted in', words: order.zone.replaceAll('_', ' ') },
  ];
}

export function OrderFacts({ order }: { readonly order: Order }) {
  return (
    <Section title="Where it goes" className="mt-0">
      <dl className="rows">
        {factsOf(order).map((fact) => (
          <div key={fact.label} className="row-log">
            <dt className="mute">{fact.label}</dt>
            <dd>{fact.words}</dd>
          </div>
        ))}
      </dl>
    </Section>
  );
}
