// Keeping photos: bytes before the row, the same bytes once, nothing lost to a crash and nothing left behind.
import { createHash } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { isRefusal } from '../../server/http/refusal';
import { findPhoto, linkPhoto, storePhoto, sweepPhotos, unlinkPhoto } from '../../server/photos/for-others';
import {
  objectKey,
  UPLOADS_PER_DAY,
  type IncomingPhoto,
  type PhotoDeps,
} from '../../server/photos/store-photo';
import { givenPhotos, type Given } from './given-photos';
import { quarters } from './pictures';

let given: Given;
beforeEach(async () => {
  given = await givenPhotos();
});
afterEach(() => given.close());

const picture = (side = 200): Promise<Buffer> => quarters(side, side).jpeg().toBuffer();
const incoming = (bytes: Buffer, more: Partial<IncomingPhoto> = {}): IncomingPhoto => ({
  bytes,
  ownerUserId: 'usr_1',
  sellerId: null,
  purpose: 'listing',
  shot: 'left',
  ...more,
});

async function keep(bytes: Buffer, more: Partial<IncomingPhoto> = {}) {
  const row = await storePhoto(given.deps, incoming(bytes, more));
  if (isRefusal(row)) throw new Error(row.detail);
  return row;
}

const puts = async (): Promise<number> => (await given.pool.query('select 1 from photo_puts')).rows.length;

describe('a photo that is kept', () => {
  test('when it is stored, then its three sizes lie under its content hash and match what is recorded', async () => {
    const bytes = await picture();
    const row = await keep(bytes);
    expect(row.sha256).toBe(createHash('sha256').update(bytes).digest('hex'));
    expect(await given.objects()).toEqual(
      ['large', 'medium', 'small'].map(
        (size) => `photos/v1/${row.sha256.slice(0, 2)}/${row.sha256}/${size}.webp`,
      ),
    );
    const large = await given.deps.storage.get(objectKey(row.sha256, 'large'));
    expect(
      createHash('sha256')
        .update(large ?? Buffer.alloc(0))
        .digest('hex'),
    ).toBe(row.storedSha256);
    expect(await puts()).toBe(0);
  });

  test('when the same bytes come again, then there are two photos over one set of objects', async () => {
    const bytes = await picture();
    const [first, second] = [await keep(bytes), await keep(bytes, { shot: 'right' })];
    expect(second.id).not.toBe(first.id);
    expect([second.widthPx, second.storedSha256]).toEqual([first.widthPx, first.storedSha256]);
    expect((await given.objects()).length).toBe(3);
  });

  test('when it is refused, then no row and no object stay', async () => {
    expect(isRefusal(await storePhoto(given.deps, incoming(Buffer.from('no picture'))))).toBe(true);
    expect((await given.pool.query('select 1 from photos')).rows).toEqual([]);
    expect([await puts(), await given.objects()]).toEqual([0, []]);
  });
});

describe('when storage fails', () => {
  test('then there is no row, and a second try keeps it', async () => {
    const bytes = await picture();
    await given.fault({ match: 'PutObject', kind: 'status', code: 500, times: 20 });
    await expect(storePhoto(given.deps, incoming(bytes))).rejects.toThrow();
    expect((await given.pool.query('select 1 from photos')).rows).toEqual([]);
    const again = await keepWhenItWorks(bytes);
    expect(await findPhoto(given.deps.db, again.id)).not.toBeNull();
  });

  test('then what a broken-off upload left in storage is swept after an hour', async () => {
    const sha = 'c'.repeat(64);
    await given.deps.storage.put(objectKey(sha, 'large'), Buffer.from('half'), 'image/webp');
    await given.pool.query(`insert into photo_puts (id, sha256, started_at) values ('pho_x', $1, $2)`, [
      sha,
      given.deps.clock.now(),
    ]);
    await sweepPhotos(given.deps);
    expect((await given.objects()).length).toBe(1);
    given.pass(1.1);
    await sweepPhotos(given.deps);
    expect([await puts(), await given.objects()]).toEqual([0, []]);
  });
});

async function keepWhenItWorks(bytes: Buffer) {
  for (let attempt = 0; attempt < 10; attempt += 1) {
    try {
      return await keep(bytes);
    } catch {
      // The faults set before may still have a few turns left.
    }
  }
  throw new Error('never kept');
}

describe('the sweep', () => {
  test('when a photo belongs to nothing for a day, then it goes, and its objects a week later', async () => {
    const photo = await keep(await picture());
    given.pass(23);
    await sweepPhotos(given.deps);
    expect(await findPhoto(given.deps.db, photo.id)).not.toBeNull();
    given.pass(2);
    expect(await sweepPhotos(given.deps)).toEqual({ unlinked: 1, deleted: 0 });
    expect(await findPhoto(given.deps.db, photo.id)).toBeNull();
    expect((await given.objects()).length).toBe(3);
    given.pass(7 * 24 + 1);
    expect(await sweepPhotos(given.deps)).toEqual({ unlinked: 0, deleted: 1 });
    expect(await given.objects()).toEqual([]);
  });

  test('when a photo is tied to an order too, then taking it off the listing leaves it for the order', async () => {
    const photo = await keep(await picture());
    await linkPhoto(given.deps.db, photo.id, 'listing', 'lst_1');
    await linkPhoto(given.deps.db, photo.id, 'order', 'ord_1');
    await unlinkPhoto(given.deps.db, photo.id, 'listing', 'lst_1', given.deps.clock.now());
    given.pass(30 * 24);
    await sweepPhotos(given.deps);
    expect(await findPhoto(given.deps.db, photo.id)).not.toBeNull();
    await unlinkPhoto(given.deps.db, photo.id, 'order', 'ord_1', given.deps.clock.now());
    expect(await findPhoto(given.deps.db, photo.id)).toBeNull();
  });

  test('when one of two photos over the same bytes goes, then the objects stay for the other', async () => {
    const bytes = await picture();
    const [kept, gone] = [await keep(bytes), await keep(bytes)];
    await linkPhoto(given.deps.db, kept.id, 'listing', 'lst_1');
    given.pass(25);
    await sweepPhotos(given.deps);
    given.pass(8 * 24);
    expect((await sweepPhotos(given.deps)).deleted).toBe(1);
    expect(await findPhoto(given.deps.db, gone.id)).toBeNull();
    expect((await given.objects()).length).toBe(3);
  });

  test('when a sweep is removing the objects just as the same bytes come again, then the new photo has its objects', async () => {
    const bytes = await picture();
    const old = await keep(bytes);
    await given.pool.query(`update photos set removed_at = $2 where id = $1`, [
      old.id,
      new Date(given.deps.clock.now().getTime() - 30 * 86_400_000),
    ]);
    const { storage } = given.deps;
    const uploads: ReturnType<typeof keep>[] = [];
    const slow: PhotoDeps = {
      ...given.deps,
      storage: {
        ...storage,
        // The upload starts when the sweep has decided, and has time to finish before the sweep goes on.
        remove: async (key) => {
          if (uploads.length === 0) uploads.push(keep(bytes));
          await new Promise((resolve) => setTimeout(resolve, 300));
          await storage.remove(key);
        },
      },
    };
    await sweepPhotos(slow);
    expect(uploads.length).toBe(1);
    const [photo] = await Promise.all(uploads);
    expect(await storage.exists(objectKey(photo?.sha256 ?? '', 'large'))).toBe(true);
    expect((await given.objects()).length).toBe(3);
  });
});

describe('the quota', () => {
  test('when a person has sent a day’s share, then the next waits; drawn stand-ins do not count', async () => {
    await given.pool.query(
      `insert into photos (id, owner_user_id, purpose, sha256, stored_sha256, width_px, height_px, bytes, created_at)
       select 'pho_' || i, 'usr_1', 'listing', repeat('a', 64), repeat('b', 64), 1, 1, 1, $1 from generate_series(1, $2::int) i`,
      [given.deps.clock.now(), UPLOADS_PER_DAY],
    );
    const answer = await storePhoto(given.deps, incoming(await picture()));
    expect(answer).toMatchObject({ refusal: 'too_many', retryAfterSeconds: 3_600 });
    expect(isRefusal(await storePhoto(given.deps, incoming(await picture(), { drawn: true })))).toBe(false);
    given.pass(25);
    expect(isRefusal(await storePhoto(given.deps, incoming(await picture())))).toBe(false);
  });
});
