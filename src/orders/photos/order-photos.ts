// The photos of an order sorted by what they prove, and said in words: who took it, when, and what it shows.
import type { Order } from '../../../shared/orders/contract';
import type { PhotoPurpose } from '../../../shared/orders/states';
import { formatDayTime } from '../../ui/dates';
import type { Photo } from '../../ui/photo-box';
import type { OrderPhoto } from './use-photo-uploads';

export const photosFor = (order: Pick<Order, 'photos'>, purpose: PhotoPurpose): OrderPhoto[] =>
  order.photos.filter((photo) => photo.purpose === purpose);

/** The newest photo of a shot: shooting again replaces what was there. */
export const newestOf = (photos: readonly OrderPhoto[], shot: string): OrderPhoto | undefined =>
  photos.findLast((photo) => photo.shot === shot);

export const PURPOSE_TITLES: Readonly<Record<PhotoPurpose, string>> = {
  pack: 'Packed',
  refuse: 'Why it was refused',
  core: 'Old unit as sent',
  grade: 'Core as received',
  contest: 'Why the grade was contested',
  case: 'For the case',
};

/** "Sat 7 Mar 2026, 15:12 MDT" as the camera wrote it, or when it was added where the camera said nothing. */
export const takenWords = (order: Pick<Order, 'zone'>, photo: OrderPhoto): string =>
  photo.takenAt
    ? `Taken ${formatDayTime(photo.takenAt, order.zone)}`
    : `Added ${formatDayTime(photo.addedAt, order.zone)}`;

export function toBoxPhoto(order: Order, photo: OrderPhoto): Photo {
  const by = photo.by === 'builder' ? order.builderName : order.sellerName;
  const label = PURPOSE_TITLES[photo.purpose];
  return {
    src: photo.url,
    alt: `${label}: ${order.title}${photo.shot ? `, ${photo.shot}` : ''}`,
    label,
    note: `${by}. ${takenWords(order, photo)}`,
  };
}
