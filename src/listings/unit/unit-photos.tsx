// The photos by shot: one large, the others small, each with its label; any of them opens at full size.
import { useState } from 'react';
import type { ListingPage } from '../../../shared/listings/page';
import type { Photo } from '../../../shared/photos/contract';
import { formatDayTime } from '../../ui/dates';
import { PhotoBox } from '../../ui/photo-box';
import { ShotTile } from '../../ui/shot-tile';
import { KindDrawing } from '../kind-drawing';
import { guideOf } from '../shot-guides';
import { splitNotes } from './notes';

interface ShownPhoto {
  readonly key: string;
  readonly number: number;
  readonly name: string;
  readonly photo: Photo;
}

/** Each photo under its shot; a second one of a shot keeps the shot's number. */
const shownPhotos = (unit: ListingPage): ShownPhoto[] =>
  unit.shots.flatMap((shot) =>
    shot.photos.map((photo) => ({ key: photo.id, number: shot.number, name: shot.name, photo })),
  );

function noteOf({ photo }: ShownPhoto, unit: ListingPage): string {
  if (photo.drawn) return 'Drawn stand-in, not a photo of this unit';
  const zone = unit.seller.timeZone;
  return photo.takenAt
    ? `${unit.seller.name}. Taken ${formatDayTime(photo.takenAt, zone)}`
    : `${unit.seller.name}. Added ${formatDayTime(photo.createdAt, zone)}`;
}

const altOf = (one: ShownPhoto, unit: ListingPage): string =>
  `${one.name} of ${unit.title}${one.photo.drawn ? ', drawn stand-in' : ''}`;

interface TileProps {
  readonly one: ShownPhoto;
  readonly unit: ListingPage;
  readonly big?: boolean;
  readonly onOpen: () => void;
}

function Tile({ one, unit, big = false, onOpen }: TileProps) {
  return (
    <li className={big ? 'unit-photos-big' : ''}>
      <ShotTile
        number={one.number}
        label={one.name}
        src={big ? one.photo.urls.large : one.photo.urls.small}
        alt={altOf(one, unit)}
        onPress={onOpen}
      />
      {one.photo.drawn && <span className="unit-drawn">Drawn stand-in</span>}
    </li>
  );
}

function Missing({ unit }: { readonly unit: ListingPage }) {
  const missing = unit.shots.filter((shot) => shot.photos.length === 0);
  return missing.map((shot) => (
    <li key={shot.code}>
      <ShotTile number={shot.number} label={shot.name} state="skip" guide={guideOf(unit.kind, shot.code)} />
    </li>
  ));
}

export function UnitPhotos({ unit }: { readonly unit: ListingPage }) {
  const [open, setOpen] = useState<number | null>(null);
  const shown = shownPhotos(unit);
  const taken = unit.shots.filter((shot) => shot.photos.length > 0).length;
  const { rest } = splitNotes(unit.notes);
  if (shown.length === 0)
    return (
      <div className="state">
        <KindDrawing kind={unit.kind} />
        <p>No photos yet.</p>
      </div>
    );
  return (
    <div>
      <ul className="unit-photos" aria-label="Photos by shot">
        {shown.map((one, index) => (
          <Tile key={one.key} one={one} unit={unit} big={index === 0} onOpen={() => setOpen(index)} />
        ))}
        {shown.length < 9 && <Missing unit={unit} />}
      </ul>
      <div className="unit-caption">
        {rest && (
          <p className="unit-says">
            <b className="b">Yard says:</b> {rest}
          </p>
        )}
        <p className="mute sm">
          {taken} of {unit.shots.length} shots
          {shown.some((one) => one.photo.drawn) && '. Drawn stand-ins are marked; they show no real unit'}
        </p>
      </div>
      <PhotoBox
        photos={shown.map((one) => ({
          src: one.photo.urls.large,
          alt: altOf(one, unit),
          label: one.name,
          note: noteOf(one, unit),
        }))}
        index={open}
        onIndex={setOpen}
      />
    </div>
  );
}
