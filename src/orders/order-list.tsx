// A list of orders as a table: which unit, with whom, where it stands, what is next and by when, and what is held.
import { Link } from 'react-router-dom';
import type { OrderSummary } from '../../shared/orders/contract';
import { paths } from '../paths';
import { DataTable, type Column } from '../ui/data-table';
import { DueBy } from '../ui/due-chip';
import { Flag } from '../ui/flag';
import { Money } from '../ui/money';
import { Sheet } from '../ui/sheet';
import { stateOf } from './view/state-words';

interface OrderListProps {
  readonly caption: string;
  readonly orders: readonly OrderSummary[];
  /** The server's time. */
  readonly now: string;
}

function Unit({ order }: { readonly order: OrderSummary }) {
  return (
    <span className="unit-cell">
      {order.photoUrl && <img src={order.photoUrl} alt="" width="60" height="45" loading="lazy" />}
      <span>
        <Link className="link" to={paths.order.to({ id: order.id })}>
          {order.title}
        </Link>
        <span className="sm mute num block">Order {order.number}</span>
      </span>
    </span>
  );
}

function NextCell({ order, now }: { readonly order: OrderSummary; readonly now: string }) {
  const [first] = order.next;
  if (!order.deadlineAt) return first ? first.label : <span className="mute">Nothing for you now</span>;
  return (
    <span className="grid gap-4">
      {first && <span>{first.label}</span>}
      <DueBy dueAt={order.deadlineAt} startedAt={order.updatedAt} now={now} />
    </span>
  );
}

const columns = (now: string): readonly Column<OrderSummary>[] => [
  { head: 'Unit', cell: (order) => <Unit order={order} />, phone: 'name' },
  {
    head: 'With',
    cell: (order) => (order.role === 'builder' ? order.sellerName : order.builderName),
    phone: 'labelled',
  },
  {
    head: 'State',
    cell: (order) => {
      const { words, tone } = stateOf(order);
      return <Flag tone={tone}>{words}</Flag>;
    },
  },
  { head: 'Next', cell: (order) => <NextCell order={order} now={now} /> },
  {
    head: 'Held',
    cell: (order) =>
      order.heldCents > 0 ? <Money cents={order.heldCents} tone="held" /> : <Money cents={0} />,
    number: true,
    phone: 'amount',
  },
];

export function OrderList({ caption, orders, now }: OrderListProps) {
  return (
    <Sheet>
      <DataTable caption={caption} columns={columns(now)} rows={orders} rowKey={(order) => order.id} />
    </Sheet>
  );
}
