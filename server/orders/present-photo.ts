// A photo of an order as both sides see it.
import type { Order } from '../../shared/orders/contract';
import { PHOTO_PURPOSES, type PhotoPurpose } from '../../shared/orders/states';
import { photoUrls, type PhotoRow } from '../photos/for-others';
import type { OrderRow } from './load';

const purposeOf = (text: string): PhotoPurpose | undefined => PHOTO_PURPOSES.find((one) => one === text);

/** Null for a picture that was never taken for an order. */
export function presentOrderPhoto(photo: PhotoRow, order: OrderRow): Order['photos'][number] | null {
  const purpose = purposeOf(photo.purpose);
  if (!purpose) return null;
  const urls = photoUrls(photo.id);
  return {
    id: photo.id,
    purpose,
    shot: photo.shot,
    url: urls.large,
    thumbUrl: urls.small,
    takenAt: photo.takenAt?.toISOString() ?? null,
    addedAt: photo.createdAt.toISOString(),
    by: photo.ownerUserId === order.builderId ? 'builder' : 'seller',
  };
}
