// Operations on one object: put, get with ranges and conditions, head, copy, delete.
import { md5Hex } from './checksums';
import { StorageError } from './errors';
import type { StoredObject } from './objects';
import { headerOf, splitPath, verifiedBody, type StorageAnswer, type StorageRequest } from './request';
import { document } from './xml';

const KEPT_HEADERS = ['content-type', 'cache-control', 'content-disposition', 'content-language', 'expires'];
const LONGEST_KEY_BYTES = 1024;

const OVERRIDES: Readonly<Record<string, string>> = {
  'response-content-type': 'content-type',
  'response-content-disposition': 'content-disposition',
  'response-cache-control': 'cache-control',
  'response-content-language': 'content-language',
  'response-content-encoding': 'content-encoding',
  'response-expires': 'expires',
};

function describedBy(request: StorageRequest): Pick<StoredObject, 'headers' | 'userMetadata'> {
  const { asked } = request;
  const headers: Record<string, string> = { 'content-type': 'application/octet-stream' };
  for (const name of KEPT_HEADERS) {
    const value = headerOf(asked, name);
    if (value !== null) headers[name] = value;
  }
  // aws-chunked is how the body travels, not how the object is encoded.
  const encoding = (headerOf(asked, 'content-encoding') ?? '')
    .split(',')
    .map((each) => each.trim())
    .filter((each) => each !== '' && each !== 'aws-chunked');
  if (encoding.length > 0) headers['content-encoding'] = encoding.join(',');
  const userMetadata = Object.keys(asked.headers)
    .filter((name) => name.startsWith('x-amz-meta-'))
    .map((name): [string, string] => [name.slice('x-amz-meta-'.length), headerOf(asked, name) ?? '']);
  return { headers, userMetadata: Object.fromEntries(userMetadata) };
}

function checkWritable(request: StorageRequest): void {
  const { objects, bucket, key } = request;
  objects.needBucket(bucket);
  if (Buffer.byteLength(key) > LONGEST_KEY_BYTES)
    throw new StorageError('KeyTooLongError', 'Your key is too long');
  const existing = objects.get(bucket, key);
  if (headerOf(request.asked, 'if-none-match') === '*' && existing !== undefined)
    throw new StorageError(
      'PreconditionFailed',
      'At least one of the pre-conditions you specified did not hold',
    );
}

export function putObject(request: StorageRequest): StorageAnswer {
  const { asked, objects, bucket, key } = request;
  checkWritable(request);
  if (headerOf(asked, 'content-length') === null && headerOf(asked, 'x-amz-decoded-content-length') === null)
    throw new StorageError('MissingContentLength', 'You must provide the Content-Length HTTP header.');
  const { data, checksums } = verifiedBody(request);
  const etag = `"${md5Hex(data)}"`;
  objects.put({ bucket, key, etag, checksums, ...describedBy(request) }, data);
  return { status: 200, headers: { etag, ...checksums } };
}

export async function copyObject(request: StorageRequest, source: string): Promise<StorageAnswer> {
  const { asked, objects, bucket, key } = request;
  checkWritable(request);
  const from = splitPath(source.split('?versionId=')[0] ?? '');
  objects.needBucket(from.bucket);
  const original = objects.get(from.bucket, from.key);
  if (original === undefined)
    throw new StorageError('NoSuchKey', 'The specified key does not exist.', { Key: from.key });
  const replaced = headerOf(asked, 'x-amz-metadata-directive') === 'REPLACE';
  if (!replaced && from.bucket === bucket && from.key === key)
    throw new StorageError('InvalidRequest', 'This copy request changes nothing.');
  const { etag, checksums, headers, userMetadata } = original;
  const described = replaced ? describedBy(request) : { headers, userMetadata };
  const stored = objects.put({ bucket, key, etag, checksums, ...described }, await objects.read(original));
  const lastModified = new Date(stored.modifiedAtMs).toISOString();
  return { status: 200, body: document('CopyObjectResult', { ETag: etag, LastModified: lastModified }) };
}

function find(request: StorageRequest): StoredObject {
  request.objects.needBucket(request.bucket);
  const object = request.objects.get(request.bucket, request.key);
  if (object === undefined)
    throw new StorageError('NoSuchKey', 'The specified key does not exist.', { Key: request.key });
  return object;
}

function answerHeaders(request: StorageRequest, object: StoredObject): Record<string, string> {
  const headers: Record<string, string> = {
    ...object.headers,
    etag: object.etag,
    'last-modified': new Date(object.modifiedAtMs).toUTCString(),
    'accept-ranges': 'bytes',
  };
  for (const [name, value] of Object.entries(object.userMetadata)) headers[`x-amz-meta-${name}`] = value;
  for (const [parameter, name] of Object.entries(OVERRIDES)) {
    const value = request.asked.url.searchParams.get(parameter);
    if (value !== null) headers[name] = value;
  }
  return headers;
}

const etagListed = (list: string, etag: string): boolean =>
  list === '*' ||
  list.split(',').some((each) => each.trim().replace(/^W\//, '') === etag || `"${each.trim()}"` === etag);

/** RFC 9110, 13.2.2: an ETag condition goes before a date. */
function isUnchanged(request: StorageRequest, object: StoredObject): boolean {
  const ifMatch = headerOf(request.asked, 'if-match');
  if (ifMatch !== null && !etagListed(ifMatch, object.etag))
    throw new StorageError(
      'PreconditionFailed',
      'At least one of the pre-conditions you specified did not hold',
    );
  const ifNoneMatch = headerOf(request.asked, 'if-none-match');
  if (ifNoneMatch !== null) return etagListed(ifNoneMatch, object.etag);
  const since = Date.parse(headerOf(request.asked, 'if-modified-since') ?? '');
  return !Number.isNaN(since) && Math.floor(object.modifiedAtMs / 1000) * 1000 <= since;
}

/** First and last byte of a single range, or null when the whole object is to be sent. */
function readRange(range: string | null, bytes: number): { first: number; last: number } | null {
  const parts = /^bytes=(\d*)-(\d*)$/.exec(range ?? '');
  if (parts === null || (parts[1] === '' && parts[2] === '')) return null;
  const [, from = '', to = ''] = parts;
  const first = from === '' ? Math.max(0, bytes - Number(to)) : Number(from);
  const last = from === '' || to === '' ? bytes - 1 : Math.min(Number(to), bytes - 1);
  if (first >= bytes || first > last || (from === '' && Number(to) === 0)) {
    throw new StorageError('InvalidRange', 'The requested range is not satisfiable', {
      ActualObjectSize: String(bytes),
    });
  }
  return { first, last };
}

export async function getObject(request: StorageRequest): Promise<StorageAnswer> {
  const object = find(request);
  const headers = answerHeaders(request, object);
  if (isUnchanged(request, object)) return { status: 304, headers };
  const range = readRange(headerOf(request.asked, 'range'), object.bytes);
  const withBody = request.asked.method === 'GET';
  if (range !== null) {
    const { first, last } = range;
    const ranged = {
      ...headers,
      'content-range': `bytes ${first}-${last}/${object.bytes}`,
      'content-length': String(last - first + 1),
    };
    const part = withBody ? (await request.objects.read(object)).subarray(first, last + 1) : undefined;
    return { status: 206, headers: ranged, body: part };
  }
  const checked =
    headerOf(request.asked, 'x-amz-checksum-mode')?.toUpperCase() === 'ENABLED' ? object.checksums : {};
  return {
    status: 200,
    headers: { ...headers, ...checked, 'content-length': String(object.bytes) },
    body: withBody ? await request.objects.read(object) : undefined,
  };
}

export function deleteObject(request: StorageRequest): StorageAnswer {
  request.objects.needBucket(request.bucket);
  request.objects.remove(request.bucket, request.key);
  return { status: 204 };
}
