// The kit's large pictures: both legs of an order, the glass, the split, the pair, the shot list, tables and states.
import { useState } from 'react';
import { TransferCaseSide } from '../../ui/art/transfer-case-side';
import { Button } from '../../ui/button';
import { DataTable, type Column } from '../../ui/data-table';
import { ConfirmDialog, Dialog } from '../../ui/dialog';
import { DepositGlass } from '../../ui/deposit-glass';
import { EmptyState } from '../../ui/empty-state';
import { ErrorState } from '../../ui/error-state';
import { Money } from '../../ui/money';
import { AfterNote, MoneyLines } from '../../ui/money-lines';
import { NextPanel } from '../../ui/next-panel';
import { PairViewer } from '../../ui/pair-viewer';
import { PhotoBox } from '../../ui/photo-box';
import { Section, Sheet } from '../../ui/sheet';
import { ShotTile } from '../../ui/shot-tile';
import { SplitSlider } from '../../ui/split-slider';
import { ProgressRule } from '../../ui/steel-rule';
import { TwoLegRace } from '../../ui/two-leg-race';
import { WaitingState } from '../../ui/waiting-state';
import { BACK, NOW, OUT, PHOTO_RECEIVED, PHOTO_SENT, SHOP, SUMS, ZONE } from './samples';

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

function Shots() {
  const [open, setOpen] = useState<number | null>(null);
  const [pair, setPair] = useState(1);
  const photos = [
    { src: PHOTO_SENT, alt: 'Left side', label: 'Left side' },
    { src: PHOTO_RECEIVED, alt: 'Right side', label: 'Right side' },
  ];
  return (
    <Section title="Shots and pairs">
      <div className="mb-28 grid gap-8 grid-cols-2 desk:grid-cols-5">
        <ShotTile number={1} label="Left side" src={PHOTO_SENT} onPress={() => setOpen(0)} />
        <ShotTile number={3} label="Bell face" state="next" guide="bell" />
        <ShotTile number={5} label="Pan" state="todo" guide="pan" />
        <ShotTile
          number={6}
          label="Code pad"
          state="redo"
          src={PHOTO_RECEIVED}
          reason="Blurred. Shoot again"
        />
        <ShotTile number={7} label="Plug, can’t reach" state="skip" guide="plug" />
        <ShotTile number={2} label="Right side" state="todo" guide="right" />
        <ShotTile number={4} label="Output end" state="todo" guide="output" />
        <ShotTile number={6} label="Code pad" state="todo" guide="code" />
        <ShotTile number={8} label="Worst spot" state="todo" guide="damage" />
        <ShotTile number={9} label="Fluid on rag" state="todo" guide="fluid" />
      </div>
      <PhotoBox photos={photos} index={open} onIndex={setOpen} />
      <PairViewer
        index={pair}
        onIndex={setPair}
        leftTitle="As sent by Abara Driveline"
        rightTitle="As received by Quenby"
        pairs={['Left', 'Right', 'Bell', 'Output', 'Pan', 'Code', 'Plug', 'Ear 4', 'Pallet'].map(
          (label, index) => ({
            key: label,
            number: index + 1,
            label,
            differs: label === 'Bell' || label === 'Ear 4',
            left: {
              src: PHOTO_SENT,
              alt: `${label}, as sent`,
              note: 'Sat 7 Mar, 15:12',
              ring: { x: 0.52, y: 0.4 },
            },
            right: {
              ...(index === 3 ? {} : { src: PHOTO_RECEIVED }),
              alt: `${label}, as received`,
              note: 'Thu 12 Mar, 09:03',
              ring: { x: 0.55, y: 0.42 },
            },
          }),
        )}
      />
    </Section>
  );
}

function States() {
  const [dialog, setDialog] = useState<'plain' | 'confirm' | null>(null);
  const close = () => setDialog(null);
  return (
    <Section title="Empty, failed, waiting">
      <div className="grid gap-28 desk:grid-cols-3">
        <EmptyState
          title="No Brace T2 with 32 splines today"
          drawing={<TransferCaseSide thin label={null} />}
          actions={<Button size="big">Show all 9 Brace T2</Button>}
        >
          <p>Yards pulled 3 last month. Look again tomorrow.</p>
        </EmptyState>
        <ErrorState error={new Error('x')} onRetry={close} />
        <div className="grid content-start gap-28">
          <WaitingState words="Checking joint 3 of 8, plug" done={2} />
          <WaitingState words="Reading the stock" blanks={0} />
          <ProgressRule label="Photos going up" done={4} of={9} />
          <div className="flex gap-10">
            <Button onClick={() => setDialog('plain')}>Open a dialog</Button>
            <Button onClick={() => setDialog('confirm')}>Ask once more</Button>
          </div>
        </div>
      </div>
      <Dialog
        open={dialog === 'plain'}
        onClose={close}
        title="Change the ship-by date"
        description="The builder is told."
      />
      <ConfirmDialog
        open={dialog === 'confirm'}
        onClose={close}
        title="Release $530.00 to Wren Bros?"
        description="Once it is released it cannot be called back."
        confirmWords="Grade B, release $530.00"
        onConfirm={close}
      />
    </Section>
  );
}

export function KitPictures() {
  return (
    <>
      <Orders />
      <Sums />
      <Tables />
      <Shots />
      <States />
    </>
  );
}
