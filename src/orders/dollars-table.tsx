// Where each dollar is: sum, amount, where it is now, what moves it, and the proof; the last row adds up to what was paid.
import { Link } from 'react-router-dom';
import type { Order } from '../../shared/orders/contract';
import { Sprag } from '../ui/art/sprag';
import { DataTable, type Column } from '../ui/data-table';
import { Money } from '../ui/money';
import { Section, Sheet } from '../ui/sheet';
import { formatCents } from '../../shared/kernel/money';
import { dollarsOf, type DollarRow } from './view/dollars';
import { dayIn } from './view/moments';
import { builderAs } from './view/sides';

function Where({ row }: { readonly row: DollarRow }) {
  if (row.state === 'held') {
    return (
      <span className="held inline-flex items-center gap-8">
        <Sprag size={26} /> {row.where}
      </span>
    );
  }
  return <span className={row.state === 'moved' ? 'ok' : 'mute'}>{row.where}</span>;
}

function Proof({ row }: { readonly row: DollarRow }) {
  if (!row.proof) return 'Not yet';
  const { href, label } = row.proof;
  return href.startsWith('#') ? (
    <a className="link" href={href}>
      {label}
    </a>
  ) : (
    <Link className="link" to={href}>
      {label}
    </Link>
  );
}

const COLUMNS: readonly Column<DollarRow>[] = [
  { head: 'Sum', cell: (row) => row.sum, phone: 'name' },
  {
    head: 'Amount',
    cell: (row) => <Money cents={row.cents} {...(row.state === 'held' ? { tone: 'held' as const } : {})} />,
    number: true,
    phone: 'amount',
  },
  { head: 'Where it is now', cell: (row) => <Where row={row} /> },
  { head: 'What moves it', cell: (row) => row.moves, phone: 'labelled' },
  { head: 'Proof', cell: (row) => <Proof row={row} />, phone: 'labelled' },
];

function paidWords(order: Order): string {
  const day = dayIn(order, order.outbound.paidAt);
  const total = formatCents(order.money.totalCents);
  return day ? `${builderAs(order)} paid ${total} on ${day}` : `${total} to pay`;
}

export function DollarsTable({ order }: { readonly order: Order }) {
  const dollars = dollarsOf(order);
  return (
    <Section title="Where each dollar is" note={paidWords(order)}>
      <Sheet>
        <DataTable
          caption="Where each dollar is"
          columns={COLUMNS}
          rows={dollars.rows}
          rowKey={(row) => row.key}
          rowTone={(row) => (row.state === 'held' ? 'held' : undefined)}
          sum={['All of it', <Money key="all" cents={dollars.totalCents} />, dollars.summary]}
        />
      </Sheet>
    </Section>
  );
}
