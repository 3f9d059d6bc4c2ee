// A seller's money: what was paid out, what is due, what is held on the way, and how it gets to the bank.
import { useInfiniteQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { z } from 'zod';
import { formatCents } from '../../shared/kernel/money';
import type { readPayouts } from '../../shared/money/contract';
import { paths } from '../paths';
import { Button } from '../ui/button';
import { DataTable, type Column } from '../ui/data-table';
import { errorWords } from '../ui/error-state';
import { Flag, type FlagTone } from '../ui/flag';
import { FourStates } from '../ui/four-states';
import { Money } from '../ui/money';
import { MoreButton } from '../ui/more-button';
import { sayStop } from '../ui/notices';
import { Section, Sheet } from '../ui/sheet';
import { When } from '../ui/when';
import { payoutsQuery, useStartOnboarding } from './api';

type Payouts = z.output<NonNullable<typeof readPayouts.answer>>;
type Payout = Payouts['items'][number];
type Deposit = Payouts['deposits'][number];

const WHY: Readonly<Record<Payout['why'], string>> = {
  accepted: 'Unit accepted',
  deposit_to_seller: 'Old unit kept or not sent',
  core_settled: 'Deductions on a core',
  case_settled: 'Case settled',
};

const STATES: Readonly<Record<Payout['state'], { readonly tone: FlagTone; readonly words: string }>> = {
  sent: { tone: 'fits', words: 'Sent to your bank' },
  on_the_way: { tone: 'plain', words: 'On the way' },
  waiting_for_sign_up: { tone: 'stop', words: 'Waits for your sign-up' },
  stuck: { tone: 'stop', words: 'Stuck, we look into it' },
};

const OrderLink = ({ id, number, title }: { id: string; number: string; title: string }) => (
  <>
    <Link className="link" to={paths.order.to({ id })}>
      Order {number}
    </Link>
    <span className="sm mute block">{title}</span>
  </>
);

const COLUMNS: readonly Column<Payout>[] = [
  {
    head: 'Order',
    phone: 'name',
    cell: (row) => <OrderLink id={row.orderId} number={row.orderNumber} title={row.title} />,
  },
  { head: 'Why', cell: (row) => WHY[row.why] },
  { head: 'Decided', phone: 'labelled', cell: (row) => <When at={row.at} /> },
  { head: 'State', cell: (row) => <Flag tone={STATES[row.state].tone}>{STATES[row.state].words}</Flag> },
  { head: 'Amount', number: true, phone: 'amount', cell: (row) => <Money cents={row.cents} /> },
];

const CORE_WORDS: Readonly<Record<string, string>> = {
  held: 'Unit not delivered yet',
  due: 'With the builder',
  booked: 'Return booked',
  coming_back: 'On its way to you',
  at_dock: 'At your dock, to grade',
  graded: 'Graded, builder may answer',
  contested: 'Case open',
};

const DEPOSITS: readonly Column<Deposit>[] = [
  {
    head: 'Order',
    phone: 'name',
    cell: (row) => <OrderLink id={row.orderId} number={row.orderNumber} title={row.title} />,
  },
  { head: 'Core', cell: (row) => CORE_WORDS[row.coreState] ?? row.coreState },
  {
    head: 'Due back',
    phone: 'labelled',
    cell: (row) => (row.dueAt ? <When at={row.dueAt} /> : 'No date yet'),
  },
  { head: 'Deposit', number: true, phone: 'amount', cell: (row) => <Money cents={row.cents} tone="held" /> },
];

function SignUp({ sellerId, isOwner }: { readonly sellerId: string; readonly isOwner: boolean }) {
  const start = useStartOnboarding();
  const go = () =>
    start.mutate(sellerId, {
      onSuccess: ({ url }) => window.location.assign(url),
      onError: (error) => sayStop(errorWords(error).detail),
    });
  return (
    <section className="panel panel-body" aria-label="Sign up to be paid">
      <h2>Next: sign up to be paid</h2>
      <p>
        Money that is due to you waits until the payment provider knows your bank account. It asks who you
        are, as the law wants it; we never see the number.
      </p>
      {isOwner ? (
        <div>
          <Button look="go" size="big" busy={start.isPending} busyWords="Opening the page" onClick={go}>
            Sign up to be paid
          </Button>
        </div>
      ) : (
        <p className="b">An owner of the account has to do it.</p>
      )}
    </section>
  );
}

function Figures({ money }: { readonly money: Payouts }) {
  const depositCents = money.deposits.reduce((sum, one) => sum + one.cents, 0);
  const figures = [
    { label: 'Paid out', cents: money.paidOutCents, note: 'Sent to your bank', tone: 'released' },
    { label: 'Due to you', cents: money.dueCents, note: 'Decided, not sent yet', tone: undefined },
    {
      label: 'Held for units',
      cents: money.heldUnitCents,
      note: 'Yours when accepted, less the fee',
      tone: 'held',
    },
    { label: 'Open deposits', cents: depositCents, note: 'May go back to builders', tone: 'held' },
  ] as const;
  return (
    <dl className="figures">
      {figures.map((one) => (
        <div key={one.label}>
          <dt className="lab">{one.label}</dt>
          <dd>
            <Money cents={one.cents} size={26} {...(one.tone ? { tone: one.tone } : {})} />
            <span className="sm mute block">{one.note}</span>
          </dd>
        </div>
      ))}
    </dl>
  );
}

interface PayoutsViewProps {
  readonly sellerId: string;
  readonly isOwner: boolean;
}

export function PayoutsView({ sellerId, isOwner }: PayoutsViewProps) {
  const query = useInfiniteQuery(payoutsQuery(sellerId));
  return (
    <FourStates query={query} waiting="Reading the money">
      {(data) => {
        const [first] = data.pages;
        const rows = data.pages.flatMap((page) => page.items);
        if (!first) return null;
        return (
          <>
            {!first.payoutsEnabled && <SignUp sellerId={sellerId} isOwner={isOwner} />}
            <Figures money={first} />
            <Section title="Payouts" note={rows.length === 0 ? 'None yet' : undefined}>
              {rows.length === 0 ? (
                <p className="mute">The first payout comes when a builder accepts a unit.</p>
              ) : (
                <Sheet>
                  <DataTable caption="Payouts" columns={COLUMNS} rows={rows} rowKey={(row) => row.id} />
                </Sheet>
              )}
              <MoreButton query={query} shown={rows.length}>
                Show more payouts
              </MoreButton>
            </Section>
            <Section
              title="Deposits still open"
              note={`${formatCents(first.deposits.reduce((sum, one) => sum + one.cents, 0))} held by Spragyard`}
            >
              {first.deposits.length === 0 ? (
                <p className="mute">No deposit is open.</p>
              ) : (
                <Sheet>
                  <DataTable
                    caption="Open deposits"
                    columns={DEPOSITS}
                    rows={first.deposits}
                    rowKey={(row) => row.orderId}
                    rowTone={(row) => (row.coreState === 'at_dock' ? 'attention' : undefined)}
                  />
                </Sheet>
              )}
            </Section>
          </>
        );
      }}
    </FourStates>
  );
}
