// The tag of the core on the desk: what should be here, from whom, and what is held for it; and how it left the builder.
import { Images } from 'lucide-react';
import { useState } from 'react';
import { formatTag } from '../../../shared/kernel/tag-code';
import type { ListingPage } from '../../../shared/listings/page';
import type { Order } from '../../../shared/orders/contract';
import { Button } from '../../ui/button';
import { CodePlate } from '../../ui/code-plate';
import { Money } from '../../ui/money';
import { PageTitle } from '../../ui/page-title';
import { PhotoBox } from '../../ui/photo-box';
import { SectionHead } from '../../ui/sheet';
import { ShotTile } from '../../ui/shot-tile';
import { TagCard, Wire } from '../../ui/tag-card';
import { newestOf, photosFor, toBoxPhoto } from '../photos/order-photos';
import { returnShots } from '../return-shots';
import { dayIn } from '../view/moments';

interface CoreTagProps {
  readonly order: Order;
  readonly unit: ListingPage | null;
}

export function CoreTag({ order, unit }: CoreTagProps) {
  const { core } = order;
  const should = core?.otherCoreAllowed
    ? 'A different unit, as you agreed'
    : (unit?.family.name ?? order.title);
  return (
    <TagCard holeAtTop className="core-tag">
      <PageTitle title={`Core of order ${order.number}`} className="num" />
      {core?.tagCode && <p className="code text-h3 mt-6">{formatTag(core.tagCode)}</p>}
      {core?.caseCode && (
        <p className="mt-10">
          <CodePlate groups={[core.caseCode]} size="small" />
        </p>
      )}
      <dl>
        <dt className="lab">What should be here</dt>
        <dd>{should}</dd>
        <dt className="lab">From</dt>
        <dd>{order.builderName}</dd>
        <dt className="lab">Deposit held</dt>
        <dd>
          <Money cents={order.money.heldCoreCents} tone="held" />
        </dd>
      </dl>
    </TagCard>
  );
}

/** The shots of the builder before it was sent, to lay beside what is on the desk. */
export function AsSent({ order, unit }: CoreTagProps) {
  const [open, setOpen] = useState<number | null>(null);
  const photos = photosFor(order, 'core');
  const shots = returnShots(unit?.kind ?? null).flatMap((shot) => {
    const photo = newestOf(photos, shot.code);
    return photo ? [{ shot, photo }] : [];
  });
  const shown = shots.length > 0 ? shots.map((one) => one.photo) : photos;
  if (shown.length === 0) return null;
  return (
    <section className="as-sent">
      <SectionHead title="As it left the builder" note={dayIn(order, order.core?.sentAt ?? null)} level={3} />
      <ul className="as-sent-tiles">
        {shown.map((photo, index) => {
          const shot = shots[index]?.shot;
          return (
            <li key={photo.id}>
              <ShotTile
                number={shot?.number ?? index + 1}
                label={shot?.name ?? 'Photo'}
                src={photo.thumbUrl}
                alt={`${shot?.name ?? 'Photo'}, as it left the builder`}
                onPress={() => setOpen(index)}
              />
            </li>
          );
        })}
      </ul>
      <Button className="as-sent-button" full icon={Images} onClick={() => setOpen(0)}>
        {shown.length} {shown.length === 1 ? 'photo' : 'photos'} as it left the builder
      </Button>
      <PhotoBox
        photos={shown.map((photo, index) => ({
          ...toBoxPhoto(order, photo),
          label: shots[index]?.shot.name ?? 'Photo',
        }))}
        index={open}
        onIndex={setOpen}
      />
    </section>
  );
}

export function CoreSide({ order, unit }: CoreTagProps) {
  return (
    <Wire>
      <CoreTag order={order} unit={unit} />
      <AsSent order={order} unit={unit} />
    </Wire>
  );
}
