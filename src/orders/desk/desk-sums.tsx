// The grade so far, the deposit glass and the sums: they follow each answer, and the red button says what will be released.
import { formatCents } from '../../../shared/kernel/money';
import type { Order } from '../../../shared/orders/contract';
import { Button } from '../../ui/button';
import { DepositGlass } from '../../ui/deposit-glass';
import { GradeSquare } from '../../ui/grade-square';
import { MoneyLines } from '../../ui/money-lines';
import type { DeskResult } from '../view/desk-checks';

interface DeskSumsProps {
  readonly order: Order;
  readonly result: DeskResult;
  readonly onGrade: () => void;
  readonly onNote: () => void;
}

export const gradeWords = (result: DeskResult): string =>
  `Grade ${result.grade}, release ${formatCents(result.toBuilderCents)}`;

export function DeskSums({ order, result, onGrade, onNote }: DeskSumsProps) {
  const { depositCents } = order.money;
  const openCount = result.open.length;
  return (
    <aside className="panel desk-sums" aria-label="Deposit so far">
      <div className="desk-grade">
        <GradeSquare grade={result.grade} size="desk" />
        <div>
          <h2>Grade {result.grade} core</h2>
          <p className="sm">{openCount > 0 ? `So far. ${openCount} still to check.` : result.rule}</p>
        </div>
      </div>
      <div className="panel-body">
        <DepositGlass
          depositCents={depositCents}
          toYardCents={result.toSellerCents}
          yardName={order.sellerName}
          builderName={order.builderName}
        />
        <MoneyLines
          lines={[
            { label: 'Deposit held', cents: depositCents },
            ...result.lines.map((line) => ({ label: line.label, cents: -line.cents })),
            ...(result.capped
              ? [
                  {
                    label: 'More than the deposit cannot be taken',
                    cents: result.lines.reduce((sum, line) => sum + line.cents, 0) - depositCents,
                  },
                ]
              : []),
          ]}
          total={{ label: `Back to ${order.builderName}`, cents: result.toBuilderCents }}
        />
        <Button look="go" size="yard" full onClick={onGrade}>
          {gradeWords(result)}
        </Button>
        <Button full onClick={onNote}>
          Not what the terms cover
        </Button>
        <p className="xs mute">
          {order.builderName} has 3 business days to disagree. After that the money moves and cannot be called
          back.
        </p>
      </div>
    </aside>
  );
}
