// Who is given a photo, and how it is cached: open for a unit on offer, otherwise for its people only.
import http from 'node:http';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { isRefusal } from '../../server/http/refusal';
import { linkPhoto, storePhoto } from '../../server/photos/for-others';
import { givenWorld, type World } from '../listings/given-drafts';
import type { Client } from '../support/client';
import { colourAt, quarters } from './pictures';

let world: World;
let photoId: string;

beforeAll(async () => {
  world = await givenWorld();
  const photo = await storePhoto(world.server.deps, {
    bytes: await quarters(400, 400).jpeg().toBuffer(),
    ownerUserId: world.yard.lister.id,
    sellerId: world.yard.id,
    purpose: 'listing',
    shot: 'left',
  });
  if (isRefusal(photo)) throw new Error(photo.detail);
  photoId = photo.id;
  await world.pool.query(
    `insert into listings (id, seller_id, variant_id, family_id, kind, title, case_code, code_key, tag_code, grade, state, status,
       price_cents, outright, outright_cents, total_cents, freight, zip, photo_count, cover_photo_id, created_at, updated_at,
       published_at, listed_at)
     values ('lst_1', $2, 'var_k66a', 'fam_66a', 'automatic', 'Keld 66A', 'K66A', 'K66A', 'TAG1', 'B', 'pulled', 'draft',
       100, true, 100, 100, '{}', '83702', 1, $1, now(), now(), now(), now())`,
    [photoId, world.yard.id],
  );
  await linkPhoto(world.server.deps.db, photoId, 'listing', 'lst_1');
});
afterAll(() => world.close());
const status = (value: string) =>
  world.pool.query(`update listings set status = $1 where id = 'lst_1'`, [value]);
beforeEach(async () => {
  await status('live');
});

/** The client of the tests reads text; a picture is bytes. */
async function fetchAs(
  client: Client,
  path: string,
): Promise<{ status: number; headers: Headers; bytes: Buffer }> {
  const cookie = [...client.cookies()].map(([name, value]) => `${name}=${value}`).join('; ');
  const answer = await fetch(world.server.baseUrl + path, { headers: { cookie } });
  return { status: answer.status, headers: answer.headers, bytes: Buffer.from(await answer.arrayBuffer()) };
}

const look = async (client: Client, size = 'small') =>
  (await fetchAs(client, `/api/photos/${photoId}/${size}`)).status;

/** Over plain HTTP: fetch sends "no-cache" with every condition of the caller's, which asks for the bytes after all. */
const conditional = (url: string, etag: string): Promise<{ status: number | undefined; bytes: number }> =>
  new Promise((resolve, reject) => {
    http
      .get(url, { headers: { 'if-none-match': etag } }, (answer) => {
        let bytes = 0;
        answer.on('data', (chunk: Buffer) => {
          bytes += chunk.byteLength;
        });
        answer.on('end', () => resolve({ status: answer.statusCode, bytes }));
      })
      .on('error', reject);
  });

describe('a photo of a unit', () => {
  test.each(['live', 'reserved', 'sold'])(
    'when the unit is %s, then anybody is given it, to be kept for good',
    async (is) => {
      await status(is);
      const answer = await fetchAs(world.visitor, `/api/photos/${photoId}/small`);
      expect(answer.status).toBe(200);
      expect(Object.fromEntries(answer.headers)).toMatchObject({
        'content-type': 'image/webp',
        'x-content-type-options': 'nosniff',
        'cache-control': 'public, max-age=31536000, immutable',
      });
      expect(await colourAt(answer.bytes, 0.25, 0.25)).toBe('red');
    },
  );

  test.each(['draft', 'withdrawn'])(
    'when the unit is %s, then only its seller’s people and an admin are',
    async (is) => {
      await status(is);
      const { yard, other } = world;
      const strangers = [world.visitor, world.builder, other.lister.client];
      const people = [yard.lister.client, yard.dock.client, world.admin];
      expect(await Promise.all(strangers.map((client) => look(client)))).toEqual([404, 404, 404]);
      expect(await Promise.all(people.map((client) => look(client)))).toEqual([200, 200, 200]);
      const mine = await fetchAs(world.lister, `/api/photos/${photoId}/small`);
      expect(mine.headers.get('cache-control')).toBe('private, no-cache');
    },
  );

  test('when the browser has it already, then it is told so without the bytes', async () => {
    const first = await fetchAs(world.visitor, `/api/photos/${photoId}/medium`);
    const ask = (etag: string) => conditional(`${world.server.baseUrl}/api/photos/${photoId}/medium`, etag);
    expect(await ask(first.headers.get('etag') ?? '')).toEqual({ status: 304, bytes: 0 });
    expect((await ask('"another"')).status).toBe(200);
  });

  test('when a size or photo does not exist, then 404', async () => {
    expect(await look(world.visitor, 'huge')).toBe(404);
    expect(await look(world.visitor, '..%2f..%2fetc%2fpasswd')).toBe(404);
    expect((await fetchAs(world.visitor, '/api/photos/pho_none/small')).status).toBe(404);
  });

  test('when it belongs to an object whose feature says nothing, then it is not given', async () => {
    const other = await storePhoto(world.server.deps, {
      bytes: await quarters(100, 100).png().toBuffer(),
      ownerUserId: world.builderId,
      sellerId: null,
      purpose: 'core',
      shot: null,
    });
    if (isRefusal(other)) throw new Error(other.detail);
    await linkPhoto(world.server.deps.db, other.id, 'message', 'msg_1');
    const given = async (client: Client) => (await fetchAs(client, `/api/photos/${other.id}/small`)).status;
    expect([await given(world.visitor), await given(world.lister), await given(world.builder)]).toEqual([
      404, 404, 200,
    ]);
  });
});
