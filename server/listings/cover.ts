// The two columns of a listing that follow from its photos.
import type { ShotPhoto } from './queries';

/** The first in order stands for the unit in lists. */
export const coverOf = (
  shots: readonly ShotPhoto[],
): { coverPhotoId: string | null; photoCount: number } => ({
  coverPhotoId: shots[0]?.photo.id ?? null,
  photoCount: shots.length,
});
