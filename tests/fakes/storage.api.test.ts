// The object store's stand-in through the vendor's SDK: bytes in and out, signatures, links, lists.
import {
  CopyObjectCommand,
  CreateBucketCommand,
  DeleteObjectCommand,
  DeleteObjectsCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  ListObjectsV2Command,
  paginateListObjectsV2,
  PutObjectCommand,
  type PutObjectCommandInput,
  type S3Client,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { createHash, randomBytes } from 'node:crypto';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { StorageFake } from '../../fakes/storage/start';
import { BUCKET, clientFor, CREDENTIALS, givenStorage, refusal } from './storage-given';

let fake: StorageFake;
let s3: S3Client;
beforeAll(async () => {
  fake = await givenStorage({ maxObjectBytes: 3_000_000 });
  s3 = clientFor(fake);
});
afterAll(async () => {
  s3.destroy();
  await fake.close();
});

const put = (
  Key: string,
  Body: PutObjectCommandInput['Body'] = 'x',
  more: Partial<PutObjectCommandInput> = {},
) => s3.send(new PutObjectCommand({ Bucket: BUCKET, Key, Body, ...more }));

const get = async (Key: string, more: object = {}): Promise<Buffer> => {
  const answer = await s3.send(new GetObjectCommand({ Bucket: BUCKET, Key, ...more }));
  return Buffer.from((await answer.Body?.transformToByteArray()) ?? []);
};

describe('when an object is put', () => {
  test('then it comes back byte by byte with its ETag, type and metadata, whatever its key', async () => {
    const bytes = randomBytes(200_000);
    for (const key of ['a.jpg', 'units/ä ö/№ 7 (left)+&=?#%.jpg', 'a/../../b', "quote'*!", '日本/写真.jpg']) {
      const stored = await put(key, bytes, {
        ContentType: 'image/jpeg',
        CacheControl: 'private, max-age=60',
        Metadata: { shot: 'left', note: 'rail' },
      });
      expect(stored.ETag).toBe(`"${createHash('md5').update(bytes).digest('hex')}"`);
      expect((await get(key)).equals(bytes)).toBe(true);
      const head = await s3.send(new HeadObjectCommand({ Bucket: BUCKET, Key: key }));
      expect(head).toMatchObject({
        ContentLength: 200_000,
        ContentType: 'image/jpeg',
        CacheControl: 'private, max-age=60',
        Metadata: { shot: 'left', note: 'rail' },
      });
    }
  });

  test('then a stream under the SDK’s default checksums is stored byte-identical, and its checksum is kept', async () => {
    const bytes = randomBytes(1_500_000);
    await put('streamed', Readable.from([bytes.subarray(0, 70_000), bytes.subarray(70_000)]), {
      ContentLength: bytes.byteLength,
    });
    expect((await get('streamed')).equals(bytes)).toBe(true);
    const head = await s3.send(
      new HeadObjectCommand({ Bucket: BUCKET, Key: 'streamed', ChecksumMode: 'ENABLED' }),
    );
    expect(head.ChecksumCRC32).toMatch(/^[A-Za-z0-9+/]{6}==$/);
    expect(head.ContentEncoding).toBeUndefined();
  });

  test.each(['CRC32', 'CRC32C', 'SHA1', 'SHA256'] as const)(
    'then checksum %s is verified on both sides',
    async (ChecksumAlgorithm) => {
      const bytes = randomBytes(5_000);
      await put(`sum-${ChecksumAlgorithm}`, bytes, { ChecksumAlgorithm });
      const back = await get(`sum-${ChecksumAlgorithm}`, { ChecksumMode: 'ENABLED' });
      expect(back.equals(bytes)).toBe(true);
    },
  );

  test('then a checksum or MD5 of other bytes is refused, and nothing is stored', async () => {
    const md5 = createHash('md5').update('other').digest('base64');
    expect(await refusal(put('bad', 'bytes', { ContentMD5: md5 }))).toEqual({
      name: 'BadDigest',
      status: 400,
    });
    expect((await refusal(put('bad', 'bytes', { ChecksumCRC32: 'AAAAAA==' }))).name).toBe('BadDigest');
    expect((await refusal(put('bad', 'bytes', { ContentMD5: 'short' }))).name).toBe('InvalidDigest');
    expect((await refusal(get('bad'))).name).toBe('NoSuchKey');
  });

  test('then one that is too large is refused, and the largest allowed is not', async () => {
    expect(await refusal(put('large', Buffer.alloc(3_000_001)))).toEqual({
      name: 'EntityTooLarge',
      status: 400,
    });
    expect(await refusal(put('large', Buffer.alloc(6_000_000)))).toEqual({
      name: 'EntityTooLarge',
      status: 400,
    });
    await put('large', Buffer.alloc(3_000_000));
  });

  test('then a second put replaces it, unless only a first was wanted', async () => {
    await put('twice', 'one');
    await put('twice', 'two');
    expect((await get('twice')).toString()).toBe('two');
    expect((await refusal(put('twice', 'three', { IfNoneMatch: '*' }))).status).toBe(412);
  });
});

describe('when an object is read', () => {
  test.each([
    ['bytes=0-3', '0123', 'bytes 0-3/10'],
    ['bytes=7-', '789', 'bytes 7-9/10'],
    ['bytes=-2', '89', 'bytes 8-9/10'],
    ['bytes=5-99', '56789', 'bytes 5-9/10'],
  ])('then range %s gives %s', async (Range, text, ContentRange) => {
    await put('digits', '0123456789');
    const answer = await s3.send(new GetObjectCommand({ Bucket: BUCKET, Key: 'digits', Range }));
    expect(await answer.Body?.transformToString()).toBe(text);
    expect([answer.$metadata.httpStatusCode, answer.ContentRange]).toEqual([206, ContentRange]);
  });

  test('then a range behind the end is 416, an unchanged one 304, a missing one 404', async () => {
    const { ETag } = await put('digits', '0123456789');
    expect(await refusal(get('digits', { Range: 'bytes=10-' }))).toEqual({
      name: 'InvalidRange',
      status: 416,
    });
    expect((await refusal(get('digits', { IfNoneMatch: ETag }))).status).toBe(304);
    expect((await refusal(get('digits', { IfMatch: '"other"' }))).status).toBe(412);
    expect(await refusal(get('none'))).toEqual({ name: 'NoSuchKey', status: 404 });
    expect((await refusal(s3.send(new HeadObjectCommand({ Bucket: BUCKET, Key: 'none' })))).name).toBe(
      'NotFound',
    );
    const elsewhere = s3.send(new GetObjectCommand({ Bucket: 'no-bucket', Key: 'none' }));
    expect((await refusal(elsewhere)).name).toBe('NoSuchBucket');
  });

  test('then a copy has the same bytes, and a deleted one is gone, also when deleted twice', async () => {
    await put('from here', 'bytes', { Metadata: { shot: 'left' }, ContentType: 'image/png' });
    await s3.send(
      new CopyObjectCommand({ Bucket: BUCKET, Key: 'copy', CopySource: `${BUCKET}/from%20here` }),
    );
    await s3.send(new DeleteObjectCommand({ Bucket: BUCKET, Key: 'from here' }));
    await s3.send(new DeleteObjectCommand({ Bucket: BUCKET, Key: 'from here' }));
    expect((await get('copy')).toString()).toBe('bytes');
    const head = await s3.send(new HeadObjectCommand({ Bucket: BUCKET, Key: 'copy' }));
    expect([head.ContentType, head.Metadata]).toEqual(['image/png', { shot: 'left' }]);
    expect((await refusal(get('from here'))).name).toBe('NoSuchKey');
  });
});

describe('when a caller is not who it says', () => {
  test('then a wrong secret, an unknown key id and no signature at all are refused', async () => {
    await put('private', 'x');
    const ask = (credentials: typeof CREDENTIALS) =>
      refusal(
        clientFor(fake, { credentials }).send(new GetObjectCommand({ Bucket: BUCKET, Key: 'private' })),
      );
    expect(await ask({ ...CREDENTIALS, secretAccessKey: 'wrong' })).toEqual({
      name: 'SignatureDoesNotMatch',
      status: 403,
    });
    expect(await ask({ ...CREDENTIALS, accessKeyId: 'WHO' })).toEqual({
      name: 'InvalidAccessKeyId',
      status: 403,
    });
    const bare = await fetch(`${fake.url}/${BUCKET}/private`);
    expect([bare.status, await bare.text()]).toEqual([
      403,
      expect.stringContaining('<Code>AccessDenied</Code>'),
    ]);
  });

  test('then a clock that is 16 minutes off is refused', async () => {
    const late = await givenStorage({ now: () => Date.now() + 16 * 60_000 });
    // The SDK corrects its clock from the answer's Date header, which is right here: it stays refused.
    const error = await refusal(clientFor(late).send(new HeadBucketCommand({ Bucket: BUCKET })));
    expect(error.status).toBe(403);
    await late.close();
  });
});

describe('when a link is signed', () => {
  const link = (key: string, options: object = {}, more: object = {}) =>
    getSignedUrl(s3, new GetObjectCommand({ Bucket: BUCKET, Key: key, ...more }), {
      expiresIn: 60,
      ...options,
    });

  test('then it opens the object without credentials, with the headers it asks for, from any page', async () => {
    await put('units/a b.jpg', 'bytes', { ContentType: 'image/jpeg' });
    const url = await link(
      'units/a b.jpg',
      {},
      {
        ResponseContentType: 'application/x-photo',
        ResponseContentDisposition: 'attachment; filename="left.jpg"',
        ResponseCacheControl: 'no-store',
      },
    );
    const answer = await fetch(url, { headers: { origin: 'http://127.0.0.1:4310' } });
    expect([answer.status, await answer.text()]).toEqual([200, 'bytes']);
    expect(answer.headers.get('content-type')).toBe('application/x-photo');
    expect(answer.headers.get('content-disposition')).toBe('attachment; filename="left.jpg"');
    expect(answer.headers.get('cache-control')).toBe('no-store');
    expect(answer.headers.get('access-control-allow-origin')).toBe('*');
    const etag = answer.headers.get('etag') ?? '';
    expect((await fetch(url, { headers: { 'if-none-match': etag } })).status).toBe(304);
    expect((await fetch(url, { method: 'OPTIONS' })).headers.get('access-control-allow-methods')).toContain(
      'GET',
    );
  });

  test('then it ends with its time, and a changed one never works', async () => {
    await put('links', 'bytes');
    const expired = await fetch(await link('links', { signingDate: new Date(Date.now() - 61_000) }));
    expect([expired.status, await expired.text()]).toEqual([
      403,
      expect.stringContaining('Request has expired'),
    ]);
    const url = await link('links');
    for (const changed of [
      url.replace('links', 'digits'),
      url.replace('X-Amz-Expires=60', 'X-Amz-Expires=600'),
      `${url}&versionId=1`,
    ]) {
      const answer = await fetch(changed);
      expect([answer.status, await answer.text()]).toEqual([
        403,
        expect.stringContaining('SignatureDoesNotMatch'),
      ]);
    }
    expect((await fetch(url, { method: 'DELETE' })).status).toBe(403);
    expect((await fetch(url)).status).toBe(200);
  });

  test('then an upload by link is bound to its content type', async () => {
    const plain = clientFor(fake, { requestChecksumCalculation: 'WHEN_REQUIRED' });
    const command = new PutObjectCommand({ Bucket: BUCKET, Key: 'uploaded', ContentType: 'image/webp' });
    const url = await getSignedUrl(plain, command, {
      expiresIn: 60,
      signableHeaders: new Set(['content-type']),
    });
    const upload = (type: string) =>
      fetch(url, { method: 'PUT', body: 'photo', headers: { 'content-type': type } });
    expect((await upload('text/html')).status).toBe(403);
    expect((await upload('image/webp')).status).toBe(200);
    expect((await get('uploaded')).toString()).toBe('photo');
  });
});

describe('when a bucket is listed', () => {
  const bucket = 'listing-test';
  beforeAll(async () => {
    await s3.send(new CreateBucketCommand({ Bucket: bucket }));
    const keys = ['a/1', 'a/2', 'a/b/3', 'b', 'c/4', 'd & <e>', 'ä'];
    for (const Key of keys) await s3.send(new PutObjectCommand({ Bucket: bucket, Key, Body: 'x' }));
  });

  test('then pages follow each other without a gap or an overlap, in byte order', async () => {
    const pages: (string | undefined)[][] = [];
    for await (const page of paginateListObjectsV2({ client: s3, pageSize: 3 }, { Bucket: bucket }))
      pages.push((page.Contents ?? []).map((each) => each.Key));
    expect(pages).toEqual([['a/1', 'a/2', 'a/b/3'], ['b', 'c/4', 'd & <e>'], ['ä']]);
  });

  test('then a delimiter folds keys into prefixes, also across pages', async () => {
    const folded: (string | undefined)[] = [];
    for await (const page of paginateListObjectsV2(
      { client: s3, pageSize: 2 },
      { Bucket: bucket, Delimiter: '/' },
    )) {
      expect(page.KeyCount).toBeLessThanOrEqual(2);
      folded.push(
        ...(page.CommonPrefixes ?? []).map((each) => each.Prefix),
        ...(page.Contents ?? []).map((each) => each.Key),
      );
    }
    expect(folded.sort()).toEqual(['a/', 'b', 'c/', 'd & <e>', 'ä']);
    const inside = await s3.send(new ListObjectsV2Command({ Bucket: bucket, Prefix: 'a/', Delimiter: '/' }));
    expect([inside.Contents?.map((each) => each.Key), inside.CommonPrefixes]).toEqual([
      ['a/1', 'a/2'],
      [{ Prefix: 'a/b/' }],
    ]);
    const after = await s3.send(new ListObjectsV2Command({ Bucket: bucket, StartAfter: 'c/4' }));
    expect(after.Contents?.map((each) => each.Key)).toEqual(['d & <e>', 'ä']);
  });

  test('then many are deleted by one call', async () => {
    const Objects = ['a/1', 'd & <e>', 'never there'].map((Key) => ({ Key }));
    const answer = await s3.send(new DeleteObjectsCommand({ Bucket: bucket, Delete: { Objects } }));
    expect(answer.Deleted).toHaveLength(3);
    const left = await s3.send(new ListObjectsV2Command({ Bucket: bucket }));
    expect(left.Contents?.map((each) => each.Key)).toEqual(['a/2', 'a/b/3', 'b', 'c/4', 'ä']);
    expect((await refusal(s3.send(new HeadBucketCommand({ Bucket: 'no-such-bucket' })))).status).toBe(404);
  });
});

test('when the stand-in is started again, then every object is there, and its files carry no key', async () => {
  const dataDir = mkdtempSync(join(tmpdir(), 'fakes-test-'));
  try {
    const bytes = randomBytes(10_000);
    const first = await givenStorage({ dataDir });
    for (const Body of ['older bytes', bytes])
      await clientFor(first).send(
        new PutObjectCommand({ Bucket: BUCKET, Key: '../../escape', Body, ContentType: 'image/png' }),
      );
    await first.close();
    const files = readdirSync(join(dataDir, 'storage', 'objects'), { recursive: true }).map(String);
    expect(files.filter((name) => name.includes('/'))).toEqual([
      expect.stringMatching(/^[0-9a-f]{2}\/[0-9a-f]{64}-[0-9a-f]{12}$/),
    ]);
    const second = await givenStorage({ dataDir });
    const answer = await clientFor(second).send(
      new GetObjectCommand({ Bucket: BUCKET, Key: '../../escape' }),
    );
    expect(bytes.equals((await answer.Body?.transformToByteArray()) ?? Buffer.alloc(0))).toBe(true);
    expect(answer.ContentType).toBe('image/png');
    await second.close();
  } finally {
    rmSync(dataDir, { recursive: true });
  }
});
