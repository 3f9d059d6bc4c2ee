// A photo's row as it leaves the server.
import { urlsOf, type Photo } from '../../shared/photos/contract';
import type { PhotoRow } from './queries';

export const presentPhoto = (row: PhotoRow): Photo => ({
  id: row.id,
  shot: row.shot,
  position: row.position,
  urls: urlsOf(row.id),
  widthPx: row.widthPx,
  heightPx: row.heightPx,
  takenAt: row.takenAt?.toISOString() ?? null,
  sha256: row.sha256,
  drawn: row.drawn,
  createdAt: row.createdAt.toISOString(),
});
