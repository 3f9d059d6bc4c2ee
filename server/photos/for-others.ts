// What other features may use of photos: keep one, tie it to an object, show it, say who may see it.
import type { Actor } from '../../shared/accounts/actor';
import type { Deps } from '../deps';
import type { LinkKind } from './queries';

export { urlsOf as photoUrls } from '../../shared/photos/contract';
export { presentPhoto } from './present';
export { findPhoto, linkPhoto, photosByIds, photosOf, unlinkPhoto, type PhotoRow } from './queries';
export { storePhoto, type IncomingPhoto, type PhotoPurpose } from './store-photo';
export { sweepPhotos } from './sweep-photos';

/** A feature's answer to "may this person see what belongs to that object of mine?" */
export interface PhotoParty {
  readonly kind: LinkKind;
  sight(deps: Deps, objectId: string, actor: Actor | null): Promise<'public' | 'party' | 'no'>;
}
