// Operations on buckets: make, look, list with prefixes and pages, delete many.
import { StorageError } from './errors';
import type { StoredObject } from './objects';
import { verifiedBody, type StorageAnswer, type StorageRequest } from './request';
import { document, readDeleteRequest } from './xml';

const MOST_KEYS = 1000;

interface Listed {
  readonly contents: StoredObject[];
  readonly prefixes: string[];
  /** The last key or prefix of this page, when there is more. */
  readonly last: string | null;
}

const after = (left: string, right: string): boolean =>
  Buffer.compare(Buffer.from(left), Buffer.from(right)) > 0;

/** @param sorted objects of the bucket in the order of their keys */
function listPage(
  sorted: readonly StoredObject[],
  asked: { prefix: string; delimiter: string; start: string; most: number },
): Listed {
  const contents: StoredObject[] = [];
  const prefixes: string[] = [];
  let last = '';
  for (const object of sorted) {
    if (!object.key.startsWith(asked.prefix)) continue;
    const cut = asked.delimiter === '' ? -1 : object.key.indexOf(asked.delimiter, asked.prefix.length);
    const common = cut < 0 ? null : object.key.slice(0, cut + asked.delimiter.length);
    const name = common ?? object.key;
    if (!after(name, asked.start) || (common !== null && common === prefixes.at(-1))) continue;
    if (contents.length + prefixes.length === asked.most) return { contents, prefixes, last };
    if (common === null) contents.push(object);
    else prefixes.push(common);
    last = name;
  }
  return { contents, prefixes, last: null };
}

const toToken = (key: string): string => Buffer.from(key).toString('base64url');

function startOf(query: URLSearchParams): string {
  const token = query.get('continuation-token');
  if (token === null) return query.get('start-after') ?? '';
  const key = Buffer.from(token, 'base64url').toString('utf8');
  if (toToken(key) !== token)
    throw new StorageError('InvalidArgument', 'The continuation token provided is incorrect');
  return key;
}

export function listObjects(request: StorageRequest): StorageAnswer {
  const { objects, bucket, asked } = request;
  objects.needBucket(bucket);
  const query = asked.url.searchParams;
  if (query.get('list-type') !== '2')
    throw new StorageError('NotImplemented', 'Only version 2 of the listing is known.');
  const most = Number(query.get('max-keys') ?? MOST_KEYS);
  if (!Number.isInteger(most) || most < 0)
    throw new StorageError('InvalidArgument', 'max-keys must be a number from 0 on.');
  const prefix = query.get('prefix') ?? '';
  const delimiter = query.get('delimiter') ?? '';
  const encode = query.get('encoding-type') === 'url' ? encodeURIComponent : (text: string): string => text;
  const page =
    most === 0
      ? { contents: [], prefixes: [], last: null }
      : listPage(objects.list(bucket), {
          prefix,
          delimiter,
          start: startOf(query),
          most: Math.min(most, MOST_KEYS),
        });
  return {
    status: 200,
    body: document('ListBucketResult', {
      Name: bucket,
      Prefix: encode(prefix),
      Delimiter: delimiter === '' ? undefined : encode(delimiter),
      EncodingType: query.get('encoding-type') ?? undefined,
      StartAfter: query.get('start-after') ?? undefined,
      ContinuationToken: query.get('continuation-token') ?? undefined,
      NextContinuationToken: page.last === null ? undefined : toToken(page.last),
      KeyCount: page.contents.length + page.prefixes.length,
      MaxKeys: most,
      IsTruncated: page.last !== null,
      Contents: page.contents.map((object) => ({
        Key: encode(object.key),
        LastModified: new Date(object.modifiedAtMs).toISOString(),
        ETag: object.etag,
        Size: object.bytes,
        StorageClass: 'STANDARD',
      })),
      CommonPrefixes: page.prefixes.map((each) => ({ Prefix: encode(each) })),
    }),
  };
}

export function deleteObjects(request: StorageRequest): StorageAnswer {
  const { objects, bucket } = request;
  objects.needBucket(bucket);
  const { keys, quiet } = readDeleteRequest(verifiedBody(request).data.toString('utf8'));
  for (const key of keys) objects.remove(bucket, key);
  return {
    status: 200,
    body: document('DeleteResult', { Deleted: quiet ? [] : keys.map((Key) => ({ Key })) }),
  };
}

export function makeBucket(request: StorageRequest): StorageAnswer {
  request.objects.makeBucket(request.bucket);
  return { status: 200, headers: { location: `/${request.bucket}` } };
}

export function headBucket(request: StorageRequest): StorageAnswer {
  request.objects.needBucket(request.bucket);
  return { status: 200, headers: { 'x-amz-bucket-region': 'us-east-1' } };
}

export function dropBucket(request: StorageRequest): StorageAnswer {
  request.objects.needBucket(request.bucket);
  request.objects.dropBucket(request.bucket);
  return { status: 204 };
}

export function locateBucket(request: StorageRequest): StorageAnswer {
  request.objects.needBucket(request.bucket);
  return { status: 200, body: document('LocationConstraint', '') };
}

export const listBuckets = (request: StorageRequest): StorageAnswer => ({
  status: 200,
  body: document('ListAllMyBucketsResult', {
    Owner: { ID: 'stand-in', DisplayName: 'stand-in' },
    Buckets: {
      Bucket: request.objects
        .buckets()
        .map((bucket) => ({ Name: bucket.name, CreationDate: new Date(bucket.createdAtMs).toISOString() })),
    },
  }),
});
