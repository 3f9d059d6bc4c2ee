// Serves photos; each feature that ties photos to its objects says who may see them.
import type { Actor } from '../../shared/accounts/actor';
import { isMember } from '../../shared/accounts/actor';
import { getPhoto } from '../../shared/photos/contract';
import type { Deps } from '../deps';
import { notFound } from '../http/refusal';
import { publicRoute, type Route } from '../http/route';
import type { PhotoParty } from './for-others';
import { findPhoto, linksOf, type PhotoRow } from './queries';
import { objectKey } from './store-photo';

type Sight = 'public' | 'party' | 'no';

async function sightOf(
  deps: Deps,
  parties: readonly PhotoParty[],
  photo: PhotoRow,
  actor: Actor | null,
): Promise<Sight> {
  let best: Sight = 'no';
  if (actor?.isAdmin || actor?.userId === photo.ownerUserId) best = 'party';
  if (actor && photo.sellerId && isMember(actor, photo.sellerId)) best = 'party';
  for (const link of await linksOf(deps.db, photo.id)) {
    const party = parties.find((candidate) => candidate.kind === link.kind);
    const sight = party ? await party.sight(deps, link.id, actor) : 'no';
    if (sight === 'public') return 'public';
    if (sight === 'party') best = 'party';
  }
  return best;
}

export const photoRoutes = (parties: readonly PhotoParty[]): readonly Route[] => [
  publicRoute(getPhoto, async ({ params, actor }, deps) => {
    const photo = await findPhoto(deps.db, params.id);
    if (!photo) return notFound('photo');
    const sight = await sightOf(deps, parties, photo, actor);
    if (sight === 'no') return notFound('photo');
    const bytes = await deps.storage.get(objectKey(photo.sha256, params.size));
    if (!bytes) throw new Error(`photo ${photo.id} has lost its ${params.size} size`);
    return {
      binary: bytes,
      contentType: 'image/webp',
      headers: {
        ETag: `"${photo.sha256.slice(0, 32)}-${params.size}"`,
        // What only the parties may see is asked for again each time, so that a lost right takes effect at once.
        'Cache-Control': sight === 'public' ? 'public, max-age=31536000, immutable' : 'private, no-cache',
        'Content-Disposition': 'inline',
        'Cross-Origin-Resource-Policy': 'same-origin',
      },
    };
  }),
];
