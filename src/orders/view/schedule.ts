// What the yard must find in a returned core, grade by grade, from the schedule on the order.
import { formatCents, type Cents } from '../../../shared/kernel/money';
import type { Order } from '../../../shared/orders/contract';
import type { UnitKind } from '../../../shared/catalogue/kinds';
import { returnByGrade } from '../../../shared/listings/terms';

export interface GradeRow {
  readonly grade: 'A' | 'B' | 'C' | 'D';
  readonly finds: string;
  /** "$600.00", "$445.00 to $570.00" */
  readonly back: string;
}

const FINDS: Readonly<Record<GradeRow['grade'], string>> = {
  A: 'Complete, case whole, nothing missing',
  B: 'Small parts missing',
  C: 'Case damaged but usable',
  D: 'Not a core: wrong family, apart, holed',
};

const range = (least: Cents, most: Cents): string =>
  least === most ? formatCents(most) : `${formatCents(least)} to ${formatCents(most)}`;

const taken = (lines: readonly { readonly label: string; readonly cents: Cents }[]): string =>
  lines.map((line) => `${line.label} ${formatCents(-line.cents)}`).join(', ');

/** @param kind of the unit; the grades follow from its checklist */
export function gradeRows(
  order: Pick<Order, 'money' | 'schedule' | 'returnFreight'>,
  kind: UnitKind,
): GradeRow[] {
  const examples = returnByGrade(kind, {
    depositCents: order.money.depositCents,
    windowDays: 0,
    schedule: [...order.schedule],
    returnFreight: order.returnFreight,
  });
  return examples
    .filter((one) => one.grade === 'A' || one.lines.length > 0)
    .map((one) => ({
      grade: one.grade,
      finds: one.lines.length > 0 ? `${FINDS[one.grade]}: ${taken(one.lines)}` : FINDS[one.grade],
      back: range(one.leastCents, one.mostCents),
    }));
}
