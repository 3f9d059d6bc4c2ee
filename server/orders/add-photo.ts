// A photo that proves something on an order: whose side may add which purpose, and when it is too late.
import type { Actor } from '../../shared/accounts/actor';
import type { PhotoPurpose } from '../../shared/orders/states';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { invalid, isRefusal, notFound, refuse, type Refusal } from '../http/refusal';
import type { UploadedFile } from '../http/route';
import { linkPhoto, storePhoto, type PhotoRow } from '../photos/for-others';
import type { OrderRow } from './load';
import { findHead } from './queries';
import { rolesOf, sideOf } from './roles';

/** Photos on one order; more than anybody needs, few enough that nobody fills the store. */
const PHOTOS_MAX = 200;

const OF_BUILDER: readonly PhotoPurpose[] = ['refuse', 'core', 'contest', 'case'];
const OF_DOCK: readonly PhotoPurpose[] = ['pack', 'grade', 'case'];

function allowed(actor: Actor, order: OrderRow, purpose: PhotoPurpose): boolean {
  const roles = rolesOf(actor, order);
  if (roles.includes('builder')) return OF_BUILDER.includes(purpose);
  return (
    (roles.includes('dock') || (purpose === 'case' && roles.includes('seller'))) && OF_DOCK.includes(purpose)
  );
}

export interface AddPhotoInput {
  readonly orderId: string;
  readonly purpose: PhotoPurpose;
  readonly shot: string | undefined;
  readonly file: UploadedFile | null;
  readonly photosNow: number;
}

export async function addOrderPhoto(
  deps: Deps,
  actor: Actor,
  input: AddPhotoInput,
): Promise<{ photo: PhotoRow; order: OrderRow } | Refusal> {
  const head = await findHead(deps.db, input.orderId);
  if (!head || sideOf(actor, head.order) === null) return notFound('order');
  const { order } = head;
  if (!allowed(actor, order, input.purpose))
    return refuse('forbidden', 'This photo is for the other side to take.');
  if (!input.file) return invalid('file', 'Choose a photo');
  if (input.photosNow >= PHOTOS_MAX)
    return invalid('file', `At most ${PHOTOS_MAX} photos belong to an order`);
  const photo = await storePhoto(deps, {
    bytes: input.file.bytes,
    ownerUserId: actor.userId,
    sellerId: sideOf(actor, order) === 'seller' ? order.sellerId : null,
    purpose: input.purpose,
    shot: input.shot ?? null,
  });
  if (isRefusal(photo)) return photo;
  const linked = await transaction(deps.db, (tx) => linkPhoto(tx, photo.id, 'order', order.id));
  return isRefusal(linked) ? linked : { photo, order };
}
