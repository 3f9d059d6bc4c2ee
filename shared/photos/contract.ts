// Photos on the wire: how one is shown, and the address its three sizes are served from.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { at, id } from '../kernel/fields';

export const PHOTO_SIZES = ['large', 'medium', 'small'] as const;
export const photoSize = z.enum(PHOTO_SIZES);
export type PhotoSize = z.infer<typeof photoSize>;

/** The longest side of each size, in pixels. */
export const SIZE_PX: Readonly<Record<PhotoSize, number>> = { large: 1600, medium: 800, small: 320 };

export const MAX_PHOTO_BYTES = 20 * 1024 * 1024;
export const MAX_PHOTO_PIXELS = 60_000_000;

export const photoUrls = z.object({ large: z.string(), medium: z.string(), small: z.string() });
export type PhotoUrls = z.infer<typeof photoUrls>;

export const photo = z.object({
  id,
  shot: z.string().nullable(),
  position: z.number().int(),
  urls: photoUrls,
  /** Of the large size, upright. */
  widthPx: z.number().int(),
  heightPx: z.number().int(),
  /** As the camera wrote it; null where it didn't. */
  takenAt: at.nullable(),
  /** Of the bytes as they were sent, for evidence. */
  sha256: z.string(),
  /** A stand-in drawn by code, to be labelled so. */
  drawn: z.boolean(),
  createdAt: at,
});
export type Photo = z.infer<typeof photo>;

/** The three addresses of a photo; they never change their content. */
export const urlsOf = (photoId: string): PhotoUrls => ({
  large: `/api/photos/${photoId}/large`,
  medium: `/api/photos/${photoId}/medium`,
  small: `/api/photos/${photoId}/small`,
});

export const getPhoto = endpoint({
  method: 'GET',
  path: '/api/photos/:id/:size',
  summary: 'One size of a photo as WebP: open to all for a unit on offer, otherwise for the parties only.',
  access: 'public',
  params: z.strictObject({ id, size: photoSize }),
});
