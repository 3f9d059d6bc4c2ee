// One verified request to the object store, and the answer that an operation gives to it.
import type { Asked } from '../http';
import { unchunk } from './aws-chunked';
import { checkedChecksums } from './checksums';
import { StorageError } from './errors';
import type { Objects } from './objects';
import { decodePath, sha256, type Verified } from './sigv4';

export interface StorageRequest {
  readonly asked: Asked;
  readonly objects: Objects;
  readonly bucket: string;
  readonly key: string;
  readonly maxObjectBytes: number;
  readonly verified: Verified;
}

export interface StorageAnswer {
  readonly status: number;
  readonly headers?: Readonly<Record<string, string>>;
  readonly body?: Buffer | string;
}

export const headerOf = (asked: Asked, name: string): string | null => {
  const value = asked.headers[name];
  return typeof value === 'string' ? value : null;
};

/** Path style: `/bucket/key/with/slashes`. */
export function splitPath(rawPath: string): { bucket: string; key: string } {
  const path = decodePath(rawPath).replace(/^\//, '');
  const slash = path.indexOf('/');
  return slash < 0 ? { bucket: path, key: '' } : { bucket: path.slice(0, slash), key: path.slice(slash + 1) };
}

/** The body as it was meant, its hash, length and checksums verified. */
export function verifiedBody(request: StorageRequest): { data: Buffer; checksums: Record<string, string> } {
  const { asked, verified } = request;
  const chunked = verified.payload.startsWith('STREAMING-');
  const { data, trailers } = chunked ? unchunk(asked.body, verified) : { data: asked.body, trailers: {} };
  const length = headerOf(asked, 'x-amz-decoded-content-length');
  if (length !== null && Number(length) !== data.byteLength)
    throw new StorageError('IncompleteBody', 'The body is not as long as x-amz-decoded-content-length says.');
  if (data.byteLength > request.maxObjectBytes)
    throw new StorageError('EntityTooLarge', 'Your proposed upload exceeds the maximum allowed size.');
  if (/^[0-9a-f]{64}$/.test(verified.payload) && sha256(data) !== verified.payload)
    throw new StorageError(
      'XAmzContentSHA256Mismatch',
      'The provided x-amz-content-sha256 does not match what was computed.',
    );
  const late = new Map(Object.entries(trailers));
  const named = (name: string): string | null =>
    headerOf(asked, name) ?? late.get(name) ?? asked.url.searchParams.get(name);
  return { data, checksums: checkedChecksums(data, named) };
}
