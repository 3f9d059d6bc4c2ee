// The shot list as tiles to press: each shot is taken in its place, and shooting again replaces what was there.
import { useRef, useState } from 'react';
import type { Order } from '../../../shared/orders/contract';
import type { PhotoPurpose } from '../../../shared/orders/states';
import { ShotTile } from '../../ui/shot-tile';
import type { ReturnShot } from '../return-shots';
import { newestOf, photosFor } from './order-photos';
import { PendingPhotos } from './pending-photos';
import { PHOTO_TYPES } from './photo-types';
import { usePhotoUploads } from './use-photo-uploads';

interface ShotShelfProps {
  readonly order: Order;
  readonly purpose: PhotoPurpose;
  readonly shots: readonly ReturnShot[];
}

export function ShotShelf({ order, purpose, shots }: ShotShelfProps) {
  const input = useRef<HTMLInputElement>(null);
  const [shooting, setShooting] = useState<string | null>(null);
  const uploads = usePhotoUploads(order.id, purpose);
  const photos = photosFor(order, purpose);
  const waits = new Set(uploads.pending.map((one) => one.shot));
  const next = shots.find((shot) => !newestOf(photos, shot.code) && !waits.has(shot.code));

  function shoot(code: string) {
    setShooting(code);
    input.current?.click();
  }
  return (
    <div className="grid gap-14">
      <input
        ref={input}
        className="vh"
        type="file"
        accept={PHOTO_TYPES}
        tabIndex={-1}
        aria-hidden="true"
        onChange={(event) => {
          uploads.add([...(event.target.files ?? [])].slice(0, 1), shooting);
          event.target.value = '';
        }}
      />
      <ul className="grid grid-cols-3 gap-6 tablet:grid-cols-5 desk:gap-8">
        {shots.map((shot) => {
          const photo = newestOf(photos, shot.code);
          return (
            <li key={shot.code}>
              <ShotTile
                number={shot.number}
                label={shot.name}
                state={photo ? 'taken' : shot === next ? 'next' : 'todo'}
                {...(photo ? { src: photo.thumbUrl, alt: `${shot.name}, taken` } : { guide: shot.guide })}
                onPress={() => shoot(shot.code)}
              />
            </li>
          );
        })}
      </ul>
      {next && (
        <p role="status">
          Next: <b className="b">{next.name}</b>. {next.instruction}
        </p>
      )}
      <PendingPhotos uploads={uploads} />
    </div>
  );
}
