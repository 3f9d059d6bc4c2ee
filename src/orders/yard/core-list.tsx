// Cores that are at the dock, on their way, or still owed: one tag each, threaded on the wire.
import type { OrderSummary } from '../../../shared/orders/contract';
import type { CoreState } from '../../../shared/orders/states';
import { paths } from '../../paths';
import { DueBy } from '../../ui/due-chip';
import { Flag } from '../../ui/flag';
import { Money } from '../../ui/money';
import { Section } from '../../ui/sheet';
import { TagCard, TagLink, Wire } from '../../ui/tag-card';
import { stateOf } from '../view/state-words';

interface CoreGroup {
  readonly title: string;
  readonly states: readonly CoreState[];
  readonly none: string;
}

const GROUPS: readonly CoreGroup[] = [
  { title: 'At the dock', states: ['at_dock'], none: 'Nothing waits to be graded.' },
  { title: 'On its way', states: ['coming_back'], none: 'No core is on its way.' },
  {
    title: 'Graded, waits for the builder',
    states: ['graded', 'contested'],
    none: 'No grade waits for an answer.',
  },
  { title: 'Still with the builder', states: ['due', 'booked'], none: 'No core is owed.' },
];

function CoreCard({ order, now }: { readonly order: OrderSummary; readonly now: string }) {
  const { words, tone } = stateOf(order);
  const desk = order.coreState === 'at_dock' || order.coreState === 'coming_back';
  return (
    <TagCard className="core-card">
      <div className="core-card-words">
        <TagLink
          className="unit-name"
          to={desk ? paths.receive.to({ orderId: order.id }) : paths.order.to({ id: order.id })}
        >
          Core {order.number}, {order.title}
        </TagLink>
        <p>From {order.builderName}</p>
        <p className="mt-8 flex flex-wrap items-center gap-14">
          <Flag tone={tone}>{words}</Flag>
          {order.deadlineAt && (
            <DueBy dueAt={order.deadlineAt} startedAt={order.updatedAt} now={now} soonHours={48} />
          )}
        </p>
      </div>
      <p className="core-card-money">
        <Money cents={order.heldCents} size={22} tone="held" />
        <span className="sm mute block">held</span>
      </p>
    </TagCard>
  );
}

interface CoreListProps {
  readonly orders: readonly OrderSummary[];
  /** The server's time. */
  readonly now: string;
}

export function CoreList({ orders, now }: CoreListProps) {
  return GROUPS.map((group) => {
    const here = orders.filter((order) => order.coreState !== null && group.states.includes(order.coreState));
    return (
      <Section key={group.title} title={group.title} note={`${here.length}`}>
        {here.length === 0 ? (
          <p className="mute">{group.none}</p>
        ) : (
          <Wire className="grid gap-14">
            {here.map((order) => (
              <CoreCard key={order.id} order={order} now={now} />
            ))}
          </Wire>
        )}
      </Section>
    );
  });
}
