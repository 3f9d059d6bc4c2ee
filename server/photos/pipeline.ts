// From bytes that anybody may have sent to three clean WebP pictures: checked by content, turned upright, stripped of metadata.
import { TZDate } from '@date-fns/tz';
import readExif from 'exif-reader';
import { fileTypeFromBuffer } from 'file-type';
import sharp, { type Metadata } from 'sharp';
import {
  MAX_PHOTO_BYTES,
  MAX_PHOTO_PIXELS,
  PHOTO_SIZES,
  SIZE_PX,
  type PhotoSize,
} from '../../shared/photos/contract';
import { invalid, isRefusal, refuse, type Refusal } from '../http/refusal';

export interface ProcessedPhoto {
  readonly sizes: Readonly<Record<PhotoSize, Buffer>>;
  readonly widthPx: number;
  readonly heightPx: number;
  readonly takenAt: Date | null;
}

const TAKEN: readonly string[] = ['image/jpeg', 'image/png', 'image/webp'];
const PHONE_ONLY: readonly string[] = [
  'image/heic',
  'image/heif',
  'image/heic-sequence',
  'image/heif-sequence',
  'image/avif',
];
const BROKEN = 'This picture is broken or was cut off on the way. Shoot it again.';
/** A decoder holds a whole picture; two at a time keep a small server inside its memory. */
const AT_ONCE = 2;
const SECONDS = 30;

let running = 0;
const waiting: (() => void)[] = [];

async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (running >= AT_ONCE) await new Promise<void>((resolve) => waiting.push(resolve));
  else running += 1;
  try {
    return await work();
  } finally {
    const next = waiting.shift();
    if (next) next();
    else running -= 1;
  }
}

/** What the bytes are by their content; the name and the declared type are never looked at. */
async function refuseByContent(bytes: Buffer): Promise<Refusal | null> {
  if (bytes.byteLength === 0) return invalid('file', 'The file is empty. Choose a photo.');
  if (bytes.byteLength > MAX_PHOTO_BYTES) return refuse('too_large', 'Send a photo of at most 20 MB.');
  const found = await fileTypeFromBuffer(bytes);
  if (found && TAKEN.includes(found.mime)) return null;
  if (found && PHONE_ONLY.includes(found.mime)) {
    return refuse(
      'unsupported_media',
      'HEIC photos are not taken. Set your phone’s camera to save JPEG (on many phones: Camera settings, Formats, ' +
        '“Most compatible”) and shoot it again, or send the photo as JPEG.',
    );
  }
  return refuse('unsupported_media', 'Only JPEG, PNG and WebP photos are taken.');
}

/** When the camera says it was taken. Without an offset in the file the clock on the wall of `timeZone` is meant. */
function captureTime(exif: Buffer | undefined, timeZone: string): Date | null {
  if (!exif) return null;
  try {
    const tags = readExif(exif).Photo;
    const wall = tags?.DateTimeOriginal ?? tags?.DateTimeDigitized;
    if (!(wall instanceof Date) || Number.isNaN(wall.getTime())) return null;
    // A camera whose clock was never set says 1970 or 2000-01-01.
    if (wall.getUTCFullYear() < 2001 || wall.getUTCFullYear() > 2100) return null;
    const offset = /^([+-])(\d{2}):(\d{2})$/.exec(String(tags?.OffsetTimeOriginal ?? tags?.OffsetTime ?? ''));
    if (offset) {
      const minutes = (Number(offset[2]) * 60 + Number(offset[3])) * (offset[1] === '-' ? -1 : 1);
      return new Date(wall.getTime() - minutes * 60_000);
    }
    return new Date(
      new TZDate(
        wall.getUTCFullYear(),
        wall.getUTCMonth(),
        wall.getUTCDate(),
        wall.getUTCHours(),
        wall.getUTCMinutes(),
        wall.getUTCSeconds(),
        timeZone,
      ).getTime(),
    );
  } catch {
    // Metadata that can't be read is only a missing time; the picture decides whether the file is taken.
    return null;
  }
}

async function readHeader(bytes: Buffer): Promise<Metadata | Refusal> {
  try {
    const header = await sharp(bytes, { limitInputPixels: false, failOn: 'none' }).metadata();
    if (header.width * header.height > MAX_PHOTO_PIXELS) {
      return invalid('file', 'This picture has more than 60 megapixels. Use a smaller setting.');
    }
    if ((header.pages ?? 1) > 1) return invalid('file', 'This picture moves. Send a still photo.');
    return header;
  } catch {
    return invalid('file', BROKEN);
  }
}

/** One decode to the large size, and from those pixels the three files. */
async function render(bytes: Buffer): Promise<ProcessedPhoto['sizes'] & { width: number; height: number }> {
  const fit = (side: number) => ({
    width: side,
    height: side,
    fit: 'inside' as const,
    withoutEnlargement: true,
  });
  const { data, info } = await sharp(bytes, { limitInputPixels: MAX_PHOTO_PIXELS, failOn: 'error' })
    .timeout({ seconds: SECONDS })
    .autoOrient()
    .resize(fit(SIZE_PX.large))
    .flatten({ background: '#ffffff' })
    .toColourspace('srgb')
    .raw()
    .toBuffer({ resolveWithObject: true });
  const raw = { width: info.width, height: info.height, channels: info.channels };
  const encode = (size: PhotoSize): Promise<Buffer> =>
    sharp(data, { raw }).resize(fit(SIZE_PX[size])).webp({ quality: 80, effort: 2 }).toBuffer();
  const [large, medium, small] = await Promise.all(PHOTO_SIZES.map(encode));
  if (!large || !medium || !small) throw new Error('a size is missing');
  return { large, medium, small, width: info.width, height: info.height };
}

/**
 * Checks and renders one upload.
 * @param timeZone the zone to read a capture time in that comes without an offset
 * @returns the pictures, or a refusal: 413 over 20 MB, 415 not a JPEG, PNG or WebP, 422 broken, moving or over 60 megapixels
 */
export async function processPhoto(bytes: Buffer, timeZone = 'UTC'): Promise<ProcessedPhoto | Refusal> {
  const refused = await refuseByContent(bytes);
  if (refused) return refused;
  return inTurn(async () => {
    const header = await readHeader(bytes);
    if (isRefusal(header)) return header;
    try {
      const { width, height, ...sizes } = await render(bytes);
      return { sizes, widthPx: width, heightPx: height, takenAt: captureTime(header.exif, timeZone) };
    } catch {
      return invalid('file', BROKEN);
    }
  });
}
