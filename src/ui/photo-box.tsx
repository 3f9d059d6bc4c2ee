// A photo at full size over the page: next, back, larger; arrow keys and Escape work.
import { ArrowLeft, ArrowRight, X, ZoomIn, ZoomOut } from 'lucide-react';
import { Dialog } from 'radix-ui';
import { useState, type KeyboardEvent } from 'react';
import { Button } from './button';
import { Icon } from './icon';
import { useReturnFocus } from './use-return-focus';

export interface Photo {
  readonly src: string;
  /** Shot name, unit and side. */
  readonly alt: string;
  /** "Bell face" */
  readonly label: string;
  /** Who took it and when. */
  readonly note?: string;
}

interface PhotoBoxProps {
  readonly photos: readonly Photo[];
  /** Which one is open; `null` closes the box. */
  readonly index: number | null;
  readonly onIndex: (index: number | null) => void;
}

export function PhotoBox({ photos, index, onIndex }: PhotoBoxProps) {
  const [zoomed, setZoomed] = useState(false);
  const returnFocus = useReturnFocus();
  const photo = index === null ? undefined : photos[index];
  const show = (next: number) => {
    setZoomed(false);
    onIndex((next + photos.length) % photos.length);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (index === null || zoomed) return;
    if (event.key === 'ArrowRight') show(index + 1);
    if (event.key === 'ArrowLeft') show(index - 1);
  };
  return (
    <Dialog.Root open={photo !== undefined} onOpenChange={(open) => !open && onIndex(null)}>
      <Dialog.Portal>
        {photo && index !== null && (
          <Dialog.Content
            {...returnFocus}
            className="photo-box"
            data-holds-page
            aria-describedby={undefined}
            onKeyDown={onKeyDown}
          >
            <div className="photo-box-bar">
              <Dialog.Title className="text-h3">
                {index + 1} of {photos.length}, {photo.label}
                {photo.note && <span className="sm mute block font-body">{photo.note}</span>}
              </Dialog.Title>
              <Dialog.Close className="dialog-close" style={{ margin: 0 }} aria-label="Close photo">
                <Icon of={X} />
              </Dialog.Close>
            </div>
            {/* eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a zoomed photo is scrolled with the arrow keys */}
            <div
              className="photo-box-stage"
              data-zoomed={zoomed || undefined}
              tabIndex={0}
              role="group"
              aria-label="Photo"
            >
              <img src={photo.src} alt={photo.alt} />
            </div>
            <div className="photo-box-bar">
              <Button size="small" icon={ArrowLeft} onClick={() => show(index - 1)}>
                Back
              </Button>
              <Button size="small" icon={zoomed ? ZoomOut : ZoomIn} onClick={() => setZoomed(!zoomed)}>
                {zoomed ? 'Whole photo' : 'Larger'}
              </Button>
              <Button size="small" iconAfter={ArrowRight} onClick={() => show(index + 1)}>
                Next
              </Button>
            </div>
          </Dialog.Content>
        )}
      </Dialog.Portal>
    </Dialog.Root>
  );
}
