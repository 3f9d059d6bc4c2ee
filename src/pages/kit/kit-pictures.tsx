// The kit's shot list, pairs of photos, and the states a page can be in.
import { useState } from 'react';
import { TransferCaseSide } from '../../ui/art/transfer-case-side';
import { Button } from '../../ui/button';
import { ConfirmDialog, Dialog } from '../../ui/dialog';
import { EmptyState } from '../../ui/empty-state';
import { ErrorState } from '../../ui/error-state';
import { PairViewer } from '../../ui/pair-viewer';
import { PhotoBox } from '../../ui/photo-box';
import { Section } from '../../ui/sheet';
import { ShotTile } from '../../ui/shot-tile';
import { ProgressRule } from '../../ui/steel-rule';
import { WaitingState } from '../../ui/waiting-state';
import { PHOTO_RECEIVED, PHOTO_SENT } from './samples';

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
      <Shots />
      <States />
    </>
  );
}
