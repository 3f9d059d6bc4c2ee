// The kit's order and money pictures: both legs, the next step, the glass, the split, the table of dollars.
import { useState } from 'react';
import { Button } from '../../ui/button';
import { DataTable, type Column } from '../../ui/data-table';
import { DepositGlass } from '../../ui/deposit-glass';
import { Money } from '../../ui/money';
import { AfterNote, MoneyLines } from '../../ui/money-lines';
import { NextPanel } from '../../ui/next-panel';
import { Section, Sheet } from '../../ui/sheet';
import { SplitSlider } from '../../ui/split-slider';
import { TwoLegRace } from '../../ui/two-leg-race';
import { BACK, NOW, OUT, SHOP, SUMS, ZONE } from './samples';

function Orders() {
  return (
    <Section title="An order, both legs">
      <div className="grid gap-28 desk:grid-cols-[minmax(0,1fr)_372px]">
        <TwoLegRace out={OUT} back={BACK} shop={SHOP} yard="Quenby" sums={SUMS} />
        <NextPanel
          title="Next: send the core back"
          clock={{
            dueAt: '2026-03-26T05:59:59Z',
            startedAt: '2026-02-23T15:00:00Z',
            now: NOW,
            zone: ZONE,
            lead: 'Pickup by',
          }}
          steps={[
            'Drain it and plug the lines.',
            'Print the core tag, wire it to an ear.',
            'Take the same nine shots on the pallet.',
          ]}
          actions={
            <>
              <Button look="go" size="big" full>
                Book the core pickup
              </Button>
              <Button full>Print core tag 4452-C</Button>
            </>
          }
        />
      </div>
      <div className="mt-28">
        <TwoLegRace
          out={OUT.map((step, index) => ({
            ...step,
            state: index < 2 ? 'proved' : index === 2 ? 'now' : 'todo',
          }))}
          back={null}
          shop={{ ...SHOP, label: 'Not there yet', state: 'todo' }}
          yard="Quenby Dismantlers"
          sums={SUMS.slice(0, 2)}
        />
      </div>
      <div className="mt-28">
        <TwoLegRace
          out={OUT}
          back={BACK.map((step, index) => ({
            ...step,
            when: 'Fri 3 Apr',
            state: index < 3 ? 'proved' : 'stopped',
          }))}
          shop={SHOP}
          yard="Quenby Dismantlers"
          sums={SUMS}
        />
      </div>
    </Section>
  );
}

function Sums() {
  const [left, setLeft] = useState(46_750);
  return (
    <Section title="Money">
      <div className="grid gap-28 desk:grid-cols-3">
        <Sheet pad>
          <MoneyLines
            lines={[
              { label: 'Unit, exchange price', cents: 145_000 },
              {
                label: 'Deposit, held by Spragyard',
                cents: 60_000,
                note: 'Comes back when your core is graded',
                state: 'held',
              },
            ]}
            total={{ label: 'Pay today', cents: 205_000 }}
          />
          <div className="mt-14">
            <AfterNote
              label="Cost after a grade A core"
              note="Return freight paid by the yard"
              cents={145_000}
            />
          </div>
        </Sheet>
        <Sheet pad>
          <DepositGlass depositCents={60_000} toYardCents={7_000} yardName="Quenby" builderName="Wren Bros" />
        </Sheet>
        <Sheet pad>
          <SplitSlider
            totalCents={60_000}
            leftCents={left}
            onChange={setLeft}
            leftLabel="Back to Abara"
            rightLabel="To Quenby"
            flags={[
              { label: 'Quenby’s ask', leftCents: 32_000, place: 'above' },
              { label: 'Abara’s ask', leftCents: 60_000, place: 'above' },
              { label: 'Ear shared, no pan', leftCents: 44_000, place: 'below' },
            ]}
          />
        </Sheet>
      </div>
    </Section>
  );
}

interface Dollar {
  readonly sum: string;
  readonly cents: number;
  readonly where: string;
  readonly moves: string;
  readonly held?: boolean;
}

const DOLLARS: readonly Dollar[] = [
  {
    sum: 'Unit, exchange price',
    cents: 145_000,
    where: 'Released to Quenby, 24 Feb',
    moves: 'You checked the unit',
  },
  { sum: 'Freight to you', cents: 21_840, where: 'Paid to carrier, 23 Feb', moves: 'Delivered' },
  {
    sum: 'Core deposit',
    cents: 60_000,
    where: 'Held by Spragyard',
    moves: 'Yard grades your core',
    held: true,
  },
];

const COLUMNS: readonly Column<Dollar>[] = [
  { head: 'Sum', cell: (row) => row.sum, phone: 'name' },
  {
    head: 'Amount',
    cell: (row) => <Money cents={row.cents} tone={row.held ? 'held' : undefined} />,
    number: true,
    phone: 'amount',
  },
  { head: 'Where it is now', cell: (row) => <span className={row.held ? 'held' : 'ok'}>{row.where}</span> },
  { head: 'What moves it', cell: (row) => row.moves, phone: 'labelled' },
];

function Tables() {
  return (
    <Section title="Where each dollar is" note="You paid $2,268.40 on 16 Feb">
      <Sheet>
        <DataTable
          caption="Where each dollar is"
          columns={COLUMNS}
          rows={DOLLARS}
          rowKey={(row) => row.sum}
          rowTone={(row) => (row.held ? 'held' : undefined)}
          sum={['All of it', <Money key="all" cents={226_840} />, '$1,668.40 moved on, $600.00 held']}
        />
      </Sheet>
    </Section>
  );
}

export function KitOrders() {
  return (
    <>
      <Orders />
      <Sums />
      <Tables />
    </>
  );
}
