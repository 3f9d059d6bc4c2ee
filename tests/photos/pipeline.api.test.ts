// What the upload pipeline makes of real files: upright, stripped, three sizes, and a clear no to everything else.
import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { isRefusal } from '../../server/http/refusal';
import { processPhoto } from '../../server/photos/pipeline';
import { colourAt, heicBytes, phoneJpeg, quarters } from './pictures';

async function made(bytes: Buffer, zone?: string) {
  const result = await processPhoto(bytes, zone);
  if (isRefusal(result)) throw new Error(`refused: ${result.refusal} ${result.detail}`);
  return result;
}

async function refused(bytes: Buffer) {
  const result = await processPhoto(bytes);
  if (!isRefusal(result)) throw new Error('was taken');
  return result;
}

describe('a photo from a phone', () => {
  test('when the sensor lay on its side, then every size stands upright', async () => {
    const photo = await made(await phoneJpeg());
    expect([photo.widthPx, photo.heightPx]).toEqual([1200, 1600]);
    for (const [size, longest] of [
      ['large', 1600],
      ['medium', 800],
      ['small', 320],
    ] as const) {
      const meta = await sharp(photo.sizes[size]).metadata();
      expect([meta.format, meta.width, meta.height]).toEqual(['webp', (longest * 3) / 4, longest]);
      // A quarter turn to the right brings the lower left (blue) to the upper left, the upper left (red) to the right.
      expect(await colourAt(photo.sizes[size], 0.25, 0.25)).toBe('blue');
      expect(await colourAt(photo.sizes[size], 0.75, 0.25)).toBe('red');
      expect(await colourAt(photo.sizes[size], 0.25, 0.75)).toBe('yellow');
      expect(await colourAt(photo.sizes[size], 0.75, 0.75)).toBe('green');
    }
  });

  test('when it carries place and maker, then no size carries any metadata', async () => {
    const original = await phoneJpeg();
    expect((await sharp(original).metadata()).exif).toBeDefined();
    const photo = await made(original);
    for (const bytes of Object.values(photo.sizes)) {
      const meta = await sharp(bytes).metadata();
      expect([meta.exif, meta.xmp, meta.iptc, meta.orientation]).toEqual([
        undefined,
        undefined,
        undefined,
        undefined,
      ]);
      expect(bytes.includes(Buffer.from('Invented'))).toBe(false);
    }
  });

  test('when the camera wrote its offset, then the capture time is that instant', async () => {
    expect((await made(await phoneJpeg('-06:00'), 'America/New_York')).takenAt?.toISOString()).toBe(
      '2026-03-02T16:41:07.000Z',
    );
  });

  test('when it wrote none, then the seller’s wall clock is meant', async () => {
    expect((await made(await phoneJpeg(null), 'America/Boise')).takenAt?.toISOString()).toBe(
      '2026-03-02T17:41:07.000Z',
    );
  });

  test('when there is no capture time, then there is none to show', async () => {
    expect((await made(await quarters(400, 300).jpeg().toBuffer())).takenAt).toBeNull();
  });
});

describe('other pictures that are taken', () => {
  test.each(['png', 'webp'] as const)(
    'when it is a small %s, then it is taken and never blown up',
    async (format) => {
      const photo = await made(await quarters(400, 300).toFormat(format).toBuffer());
      expect([photo.widthPx, photo.heightPx]).toEqual([400, 300]);
      expect((await sharp(photo.sizes.small).metadata()).width).toBe(320);
    },
  );

  test('when a PNG is see-through, then it stands on white', async () => {
    const clear = await sharp({ create: { width: 64, height: 64, channels: 4, background: '#00000000' } })
      .png()
      .toBuffer();
    const photo = await made(clear);
    const { data } = await sharp(photo.sizes.large).raw().toBuffer({ resolveWithObject: true });
    expect(Math.min(...data)).toBeGreaterThan(250);
  });
});

describe('what is refused', () => {
  test('when it is HEIC, then the answer says how to change the camera', async () => {
    const answer = await refused(heicBytes());
    expect(answer.refusal).toBe('unsupported_media');
    expect(answer.detail).toMatch(/JPEG/);
    expect(answer.detail).toMatch(/Formats/);
  });

  test.each([
    [
      'an SVG',
      Buffer.from(
        '<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>',
      ),
    ],
    ['a page', Buffer.from('<!doctype html><script>alert(1)</script>')],
    ['a program', Buffer.concat([Buffer.from('MZ'), Buffer.alloc(600, 7)])],
    ['a PDF', Buffer.from('%PDF-1.7\n1 0 obj\n<<>>\nendobj\n')],
    ['text', Buffer.from('left-side.jpg')],
  ])('when it is %s under a photo’s name, then its content decides', async (_what, bytes) => {
    expect((await refused(bytes)).refusal).toBe('unsupported_media');
  });

  test('when it is a GIF, then it is not taken', async () => {
    const gif = await sharp({ create: { width: 8, height: 8, channels: 3, background: '#ff0000' } })
      .gif()
      .toBuffer();
    expect((await refused(gif)).refusal).toBe('unsupported_media');
  });

  test('when it is over 20 MB, then it is too large; at 20 MB it is looked at', async () => {
    const jpeg = await quarters(64, 64).jpeg().toBuffer();
    const padded = (size: number): Buffer => Buffer.concat([jpeg, Buffer.alloc(size - jpeg.byteLength)]);
    expect((await refused(padded(20 * 1024 * 1024 + 1))).refusal).toBe('too_large');
    expect(isRefusal(await processPhoto(padded(20 * 1024 * 1024)))).toBe(false);
  });

  test('when it has more than 60 megapixels, then it is refused by its size; with 60 it is taken', async () => {
    const flat = (width: number, height: number): Promise<Buffer> =>
      sharp({ create: { width, height, channels: 3, background: '#808080' } })
        .jpeg({ quality: 40 })
        .toBuffer();
    const answer = await refused(await flat(10_001, 6_000));
    expect([answer.refusal, answer.detail]).toEqual(['invalid', expect.stringContaining('60 megapixels')]);
    expect((await made(await flat(10_000, 6_000))).widthPx).toBe(1600);
  });

  test('when it was cut off on the way, then it says so and does not store half a picture', async () => {
    const whole = await phoneJpeg();
    const answer = await refused(whole.subarray(0, Math.floor(whole.byteLength * 0.6)));
    expect([answer.refusal, answer.detail]).toEqual(['invalid', expect.stringContaining('broken')]);
    const png = await quarters(600, 400).png({ compressionLevel: 0 }).toBuffer();
    expect((await refused(png.subarray(0, 50_000))).refusal).toBe('invalid');
  });

  test('when it moves, then a still is asked for', async () => {
    const still = (grey: number): Promise<Buffer> =>
      sharp({ create: { width: 40, height: 40, channels: 3, background: { r: grey, g: grey, b: grey } } })
        .png()
        .toBuffer();
    const stills = await Promise.all([10, 120, 240].map(still));
    const frames = await sharp(stills, { join: { animated: true } })
      .webp()
      .toBuffer();
    expect((await refused(frames)).detail).toMatch(/moves/);
  });

  test('when bytes are changed at random, then every answer is a picture or a refusal, never a crash', async () => {
    const whole = await quarters(320, 240).jpeg().toBuffer();
    let seed = 42;
    const next = (below: number): number => {
      seed = (Math.imul(seed, 1_103_515_245) + 12_345) >>> 0;
      return Math.floor((seed / 2 ** 32) * below);
    };
    let taken = 0;
    for (let round = 0; round < 150; round += 1) {
      const bytes = Buffer.from(whole);
      for (let hit = 0; hit <= next(12); hit += 1) bytes[next(bytes.byteLength)] = next(256);
      const answer = await processPhoto(
        bytes.subarray(0, next(4) === 0 ? next(bytes.byteLength) : undefined),
      );
      if (!isRefusal(answer)) taken += 1;
      else expect(['invalid', 'unsupported_media']).toContain(answer.refusal);
    }
    expect(taken).toBeGreaterThan(0);
    expect(taken).toBeLessThan(150);
  });
});
