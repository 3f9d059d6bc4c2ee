// Pictures made for tests: four coloured quarters, so that a turn shows, with the metadata a phone writes.
import sharp, { type Sharp } from 'sharp';

const QUARTERS = [
  { colour: '#d01818', left: 0, top: 0 },
  { colour: '#18a018', left: 1, top: 0 },
  { colour: '#1830c8', left: 0, top: 1 },
  { colour: '#e8d020', left: 1, top: 1 },
];

/** Red, green / blue, yellow; `width` x `height` as the sensor has them, before any turn. */
export const quarters = (width: number, height: number): Sharp =>
  sharp({ create: { width, height, channels: 3, background: '#000000' } }).composite(
    QUARTERS.map(({ colour, left, top }) => ({
      input: {
        create: { width: width / 2, height: height / 2, channels: 3 as const, background: colour },
      },
      left: (left * width) / 2,
      top: (top * height) / 2,
    })),
  );

/** A phone's JPEG: lying sensor, orientation 6 (turn right by 90 degrees), capture time and place. */
export const phoneJpeg = (offset: string | null = '-06:00'): Promise<Buffer> =>
  quarters(2000, 1500)
    .jpeg({ quality: 90 })
    .withExif({
      IFD0: { Make: 'Invented', Model: 'Phone' },
      IFD2: {
        DateTimeOriginal: '2026:03:02 10:41:07',
        ...(offset ? { OffsetTimeOriginal: offset } : {}),
      },
      IFD3: {
        GPSLatitudeRef: 'N',
        GPSLatitude: '43/1 36/1 0/1',
        GPSLongitudeRef: 'W',
        GPSLongitude: '116/1 12/1 0/1',
      },
    })
    .withMetadata({ orientation: 6 })
    .toBuffer();

/** The name of the colour at a place, given as shares of width and height. */
export async function colourAt(picture: Buffer, x: number, y: number): Promise<string> {
  const { data, info } = await sharp(picture).removeAlpha().raw().toBuffer({ resolveWithObject: true });
  const at = (Math.floor(y * info.height) * info.width + Math.floor(x * info.width)) * info.channels;
  const [r = 0, g = 0, b = 0] = data.subarray(at, at + 3);
  if (r > 150 && g > 150) return 'yellow';
  if (r > 150) return 'red';
  if (b > 120) return 'blue';
  return g > 100 ? 'green' : 'black';
}

/** The first bytes of an HEIC file as phones write it: an ISO container of brand heic. */
export const heicBytes = (): Buffer =>
  Buffer.concat([
    Buffer.from([0, 0, 0, 24]),
    Buffer.from('ftypheic', 'latin1'),
    Buffer.from([0, 0, 0, 0]),
    Buffer.from('mif1heic', 'latin1'),
    Buffer.alloc(400),
  ]);
