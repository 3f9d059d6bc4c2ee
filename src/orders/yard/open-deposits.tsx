// The panel of deposits a yard may still have to give back: the sum, the chart by week, and what is late.
import { Link } from 'react-router-dom';
import { formatCents } from '../../../shared/kernel/money';
import { CORE_GRACE_DAYS } from '../../../shared/orders/clocks';
import { paths } from '../../paths';
import { Money } from '../../ui/money';
import { Section, Sheet } from '../../ui/sheet';
import { depositWeeks, lateDeposits, type OpenDeposit } from '../view/deposit-weeks';
import { DepositChart } from './deposit-chart';

interface OpenDepositsProps {
  readonly deposits: readonly OpenDeposit[];
  /** The server's time. */
  readonly now: string;
  readonly zone: string;
}

function Late({ deposits }: { readonly deposits: readonly OpenDeposit[] }) {
  const [first] = deposits;
  if (!first) return null;
  const count = deposits.length === 1 ? 'One core is late' : `${deposits.length} cores are late`;
  return (
    <p className="sm mt-8">
      {count}:{' '}
      <Link className="link" to={paths.order.to({ id: first.orderId })}>
        order {first.orderNumber}
      </Link>
      . Its {formatCents(first.cents)} comes to you {CORE_GRACE_DAYS} days after the due date if it is not
      sent.
    </p>
  );
}

export function OpenDeposits({ deposits, now, zone }: OpenDepositsProps) {
  const totalCents = deposits.reduce((sum, one) => sum + one.cents, 0);
  const orders = `${deposits.length} ${deposits.length === 1 ? 'order' : 'orders'}`;
  return (
    <Section title="Deposits still open" note="By the week the core is due" className="mt-0">
      <Sheet className="deposit-panel">
        <div className="deposit-figure">
          <Money cents={totalCents} size={28} />
          <span className="sm mute">on {orders}. Held by Spragyard, not by you.</span>
        </div>
        {deposits.length > 0 && (
          <>
            <ul className="chart-key" aria-hidden="true">
              <li>
                <i className="chart-moving" /> Core on its way
              </li>
              <li>
                <i className="chart-builder" /> Still with builder
              </li>
              <li>
                <i className="chart-late" /> Late
              </li>
            </ul>
            <DepositChart weeks={depositWeeks(deposits, now, zone)} />
          </>
        )}
        <Late deposits={lateDeposits(deposits, now)} />
      </Sheet>
    </Section>
  );
}
