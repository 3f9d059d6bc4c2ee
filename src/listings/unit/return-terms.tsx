// What comes back for the old unit at each grade, worked to the cent from the yard's own deductions.
import { formatCents } from '../../../shared/kernel/money';
import type { ListingPage } from '../../../shared/listings/page';
import { DataTable, type Column } from '../../ui/data-table';
import { GradeSquare } from '../../ui/grade-square';
import { Section } from '../../ui/sheet';

type Exchange = NonNullable<ListingPage['terms']['exchange']>;
type Example = Exchange['examples'][number];

function linesWords(example: Example): string {
  return example.lines.map((line) => `${line.label} ${formatCents(-line.cents)}`).join(', ');
}

function backWords({ leastCents, mostCents }: Example): string {
  if (leastCents === mostCents) return formatCents(mostCents);
  return `${formatCents(leastCents)} to ${formatCents(mostCents)}`;
}

const COLUMNS: readonly Column<Example>[] = [
  {
    head: 'Core grade',
    phone: 'name',
    cell: (example) => <GradeSquare grade={example.grade} size="small" />,
  },
  {
    head: 'What the yard must find',
    cell: (example) => (
      <>
        {example.rule}
        {example.lines.length > 0 && <span className="sm mute block num">{linesWords(example)}</span>}
      </>
    ),
  },
  {
    head: 'Back to you',
    number: true,
    phone: 'amount',
    cell: (example) => <span className="b num">{backWords(example)}</span>,
  },
];

export function ReturnTerms({ unit }: { readonly unit: ListingPage }) {
  const { exchange } = unit.terms;
  if (!exchange) return null;
  const payer = exchange.returnFreight === 'seller' ? 'The yard pays' : 'You pay';
  return (
    <Section title="What you get back for your core" note="Set by the yard. Fixed once you pay.">
      <div className="sheet">
        <DataTable
          caption="What comes back of the deposit at each grade"
          columns={COLUMNS}
          rows={exchange.examples}
          rowKey={(example) => example.grade}
        />
      </div>
      <p className="sm mute mt-10">
        Of the {formatCents(exchange.depositCents)} deposit. Send the core within{' '}
        <b className="b">{exchange.windowDays} days</b> of delivery. {payer} the freight back. Every deduction
        needs a photo. If you disagree, the money stays held until a person settles it.
      </p>
    </Section>
  );
}
