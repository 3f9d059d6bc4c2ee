// Photos of one purpose on an order: what is there, what is still needed, and the button to take more.
import { useState } from 'react';
import type { Order } from '../../../shared/orders/contract';
import type { PhotoPurpose } from '../../../shared/orders/states';
import { ErrorMessage, fieldId } from '../../ui/form/field';
import { PhotoButton } from '../../ui/form/photo-button';
import { PhotoBox } from '../../ui/photo-box';
import { ShotTile } from '../../ui/shot-tile';
import { PendingPhotos } from './pending-photos';
import { photosFor, toBoxPhoto } from './order-photos';
import { usePhotoUploads } from './use-photo-uploads';

interface PhotoShelfProps {
  readonly order: Order;
  readonly purpose: PhotoPurpose;
  /** "Packing photos" */
  readonly title: string;
  readonly hint: string;
  readonly needed: number;
  readonly error?: string | undefined;
  readonly name?: string;
  readonly yard?: boolean;
}

const countWords = (have: number, needed: number): string =>
  have >= needed ? `${have} taken` : `${have} of ${needed} taken`;

export function PhotoShelf(props: PhotoShelfProps) {
  const { order, purpose, title, hint, needed, error, name = 'photos', yard = false } = props;
  const [open, setOpen] = useState<number | null>(null);
  const uploads = usePhotoUploads(order.id, purpose);
  const photos = photosFor(order, purpose);
  return (
    <div className="f gap-10" data-field="" id={fieldId(name)} tabIndex={-1}>
      <div className="flex items-baseline justify-between gap-10">
        <span className="f-label" data-field-label="">
          {title}
        </span>
        <span className="sm mute num" role="status">
          {countWords(photos.length, needed)}
        </span>
      </div>
      <span className="f-hint">{hint}</span>
      {photos.length > 0 && (
        <ul className="grid grid-cols-3 gap-6">
          {photos.map((photo, index) => (
            <li key={photo.id}>
              <ShotTile
                number={index + 1}
                label={`Photo`}
                src={photo.thumbUrl}
                alt={`${title}, photo ${index + 1}`}
                onPress={() => setOpen(index)}
              />
            </li>
          ))}
        </ul>
      )}
      <PendingPhotos uploads={uploads} />
      <PhotoButton
        multiple
        size={yard ? 'yard' : 'normal'}
        full
        onFiles={(files) => uploads.add(files, null)}
      >
        {photos.length === 0 ? 'Take a photo' : 'Take another'}
      </PhotoButton>
      {error && <ErrorMessage id={`${fieldId(name)}-error`}>{error}</ErrorMessage>}
      <PhotoBox photos={photos.map((one) => toBoxPhoto(order, one))} index={open} onIndex={setOpen} />
    </div>
  );
}
