// The return terms as they were when the builder paid: what each grade sends home, or the plain deductions.
import type { UnitKind } from '../../shared/catalogue/kinds';
import { formatCents } from '../../shared/kernel/money';
import type { Order } from '../../shared/orders/contract';
import { GradeSquare } from '../ui/grade-square';
import { Money } from '../ui/money';
import { Section } from '../ui/sheet';
import { gradeRows } from './view/schedule';

interface TermsTableProps {
  readonly order: Order;
  /** Null while it isn't known; then the deductions stand as a list. */
  readonly kind: UnitKind | null;
}

export function TermsTable({ order, kind }: TermsTableProps) {
  const deposit = formatCents(order.money.depositCents);
  const title = order.role === 'seller' ? 'What you must find' : 'What the yard must find';
  const payer = order.returnFreight === 'seller' ? order.sellerName : order.builderName;
  return (
    <Section title={title} className="mt-0">
      <p className="sm">
        Grade A sends all {deposit} home. {payer} pays the return freight. These are the terms at payment;
        they never change after.
      </p>
      <ul className="rows mt-10">
        {kind
          ? gradeRows(order, kind).map((row) => (
              <li key={row.grade} className="row-grade">
                <GradeSquare grade={row.grade} size="small" />
                <span>{row.finds}</span>
                <b className="b num r">{row.back}</b>
              </li>
            ))
          : order.schedule.map((line) => (
              <li key={line.code} className="row-pair">
                <span>{line.label}</span>
                <Money cents={-line.cents} />
              </li>
            ))}
      </ul>
    </Section>
  );
}
