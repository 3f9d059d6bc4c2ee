// The papers of an order, and the photos that prove it: at sale, packed, and of the core.
import { FileText, Images } from 'lucide-react';
import { useState } from 'react';
import type { Order } from '../../shared/orders/contract';
import { PHOTO_PURPOSES } from '../../shared/orders/states';
import { Icon } from '../ui/icon';
import { PhotoBox, type Photo } from '../ui/photo-box';
import { Section } from '../ui/sheet';
import { photosFor, PURPOSE_TITLES, toBoxPhoto } from './photos/order-photos';

interface Album {
  readonly key: string;
  readonly label: string;
  readonly photos: readonly Photo[];
}

function albumsOf(order: Order): Album[] {
  const atSale = order.listingPhotos.map((photo, index) => ({
    src: photo.url,
    alt: `${order.title}, at sale, ${photo.shot ?? `photo ${index + 1}`}`,
    label: photo.shot ?? `Photo ${index + 1}`,
    note: `${order.sellerName}, at sale`,
  }));
  const ofOrder = PHOTO_PURPOSES.map((purpose) => ({
    key: purpose,
    label: PURPOSE_TITLES[purpose],
    photos: photosFor(order, purpose).map((photo) => toBoxPhoto(order, photo)),
  }));
  return [{ key: 'sale', label: 'At sale', photos: atSale }, ...ofOrder].filter(
    (album) => album.photos.length > 0,
  );
}

const countWords = (album: Album): string =>
  `${album.label}, ${album.photos.length} ${album.photos.length === 1 ? 'photo' : 'photos'}`;

export function OrderPapers({ order }: { readonly order: Order }) {
  const [open, setOpen] = useState<{ readonly album: Album; readonly index: number } | null>(null);
  return (
    <Section title="Papers" className="mt-0">
      <ul className="doc-list" id="photos">
        {order.documents.map((paper) => (
          <li key={paper.name}>
            <a href={paper.url} target="_blank" rel="noreferrer">
              <Icon of={FileText} /> {paper.label}
            </a>
          </li>
        ))}
        {albumsOf(order).map((album) => (
          <li key={album.key}>
            <button type="button" onClick={() => setOpen({ album, index: 0 })}>
              <Icon of={Images} /> {countWords(album)}
            </button>
          </li>
        ))}
      </ul>
      <PhotoBox
        photos={open?.album.photos ?? []}
        index={open?.index ?? null}
        onIndex={(index) => setOpen((old) => (old && index !== null ? { ...old, index } : null))}
      />
    </Section>
  );
}
