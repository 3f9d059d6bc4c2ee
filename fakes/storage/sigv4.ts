// Verifies AWS Signature Version 4, in the Authorization header and in presigned queries, as its public documentation has it.
import { createHash, createHmac, timingSafeEqual } from 'node:crypto';
import { StorageError } from './errors';

export interface SignedRequest {
  readonly method: string;
  /** As sent, percent-encoded. */
  readonly rawPath: string;
  readonly query: URLSearchParams;
  readonly headers: Readonly<Record<string, string | string[] | undefined>>;
}

export interface Credentials {
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
}

/** What a verified request was signed with: the seed for the signatures of its chunks. */
export interface Verified {
  readonly signature: string;
  readonly signingKey: Buffer;
  readonly amzDate: string;
  readonly scope: string;
  /** The hash of the body, or one of the markers that stand for it. */
  readonly payload: string;
}

interface Claim {
  readonly credential: string;
  readonly signedHeaders: readonly string[];
  readonly signature: string;
  readonly amzDate: string;
  readonly payload: string;
  readonly presigned: boolean;
}

const ALGORITHM = 'AWS4-HMAC-SHA256';
const MOST_SKEW_MS = 15 * 60 * 1000;
const MOST_EXPIRY_SECONDS = 7 * 24 * 60 * 60;

export const sha256 = (data: string | Buffer): string => createHash('sha256').update(data).digest('hex');

export const hmac = (key: string | Buffer, data: string): Buffer =>
  createHmac('sha256', key).update(data).digest();

const encode = (text: string): string =>
  encodeURIComponent(text).replace(/[!'()*]/g, (mark) => `%${mark.charCodeAt(0).toString(16).toUpperCase()}`);

/** @throws StorageError when the path is not percent-encoded UTF-8 */
export function decodePath(rawPath: string): string {
  try {
    return decodeURIComponent(rawPath);
  } catch {
    throw new StorageError('InvalidURI', "Couldn't parse the specified URI.");
  }
}

const single = (value: string | string[] | undefined): string | null =>
  value === undefined ? null : Array.isArray(value) ? value.join(',') : value;

const byText = (left: string, right: string): number => (left < right ? -1 : left > right ? 1 : 0);

function canonicalRequest(request: SignedRequest, signedHeaders: readonly string[], payload: string): string {
  const path = request.rawPath.split('/').map((segment) => encode(decodePath(segment)));
  const query = Array.from(request.query)
    .filter(([name]) => name !== 'X-Amz-Signature')
    .map(([name, value]) => `${encode(name)}=${encode(value)}`)
    .sort(byText);
  const headers = signedHeaders.map((name) => {
    const value = single(request.headers[name]) ?? '';
    return `${name}:${value.trim().replaceAll(/ +/g, ' ')}\n`;
  });
  return [
    request.method,
    path.join('/'),
    query.join('&'),
    headers.join(''),
    signedHeaders.join(';'),
    payload,
  ].join('\n');
}

export function signingKey(secret: string, scope: string): Buffer {
  const [day = '', region = '', service = '', end = ''] = scope.split('/');
  return hmac(hmac(hmac(hmac(`AWS4${secret}`, day), region), service), end);
}

function claimOfHeader(request: SignedRequest, header: string): Claim {
  const parts =
    /^AWS4-HMAC-SHA256\s+Credential=([^,\s]+),\s*SignedHeaders=([^,\s]+),\s*Signature=([0-9a-f]{64})$/.exec(
      header,
    );
  if (parts === null)
    throw new StorageError('AuthorizationHeaderMalformed', 'The authorization header is malformed.');
  const [, credential = '', signedHeaders = '', signature = ''] = parts;
  const payload = single(request.headers['x-amz-content-sha256']);
  const amzDate = single(request.headers['x-amz-date']);
  if (payload === null || amzDate === null)
    throw new StorageError('InvalidRequest', 'x-amz-content-sha256 and x-amz-date are required.');
  return {
    credential,
    signedHeaders: signedHeaders.split(';'),
    signature,
    amzDate,
    payload,
    presigned: false,
  };
}

function claimOfQuery(request: SignedRequest, nowMs: number): Claim {
  const get = (name: string): string => {
    const value = request.query.get(name);
    if (value !== null) return value;
    throw new StorageError('AuthorizationQueryParametersError', `Query-string authentication needs ${name}.`);
  };
  if (get('X-Amz-Algorithm') !== ALGORITHM)
    throw new StorageError(
      'AuthorizationQueryParametersError',
      `X-Amz-Algorithm only supports ${ALGORITHM}.`,
    );
  const amzDate = get('X-Amz-Date');
  const seconds = Number(get('X-Amz-Expires'));
  if (!Number.isInteger(seconds) || seconds < 1 || seconds > MOST_EXPIRY_SECONDS)
    throw new StorageError(
      'AuthorizationQueryParametersError',
      'X-Amz-Expires must be between 1 and 604800 seconds.',
    );
  if (nowMs > timeOf(amzDate) + seconds * 1000) {
    throw new StorageError('AccessDenied', 'Request has expired', {
      'X-Amz-Expires': String(seconds),
      Expires: new Date(timeOf(amzDate) + seconds * 1000).toISOString(),
      ServerTime: new Date(nowMs).toISOString(),
    });
  }
  return {
    credential: get('X-Amz-Credential'),
    signedHeaders: get('X-Amz-SignedHeaders').split(';'),
    signature: get('X-Amz-Signature'),
    amzDate,
    payload:
      request.query.get('X-Amz-Content-Sha256') ??
      single(request.headers['x-amz-content-sha256']) ??
      'UNSIGNED-PAYLOAD',
    presigned: true,
  };
}

/** `20130524T000000Z` as milliseconds. */
function timeOf(amzDate: string): number {
  const parts = /^(\d{4})(\d{2})(\d{2})T(\d{2})(\d{2})(\d{2})Z$/.exec(amzDate);
  if (parts === null) throw new StorageError('AccessDenied', 'The date of the request is malformed.');
  const [year = 0, month = 1, day = 1, hour = 0, minute = 0, second = 0] = parts.slice(1).map(Number);
  return Date.UTC(year, month - 1, day, hour, minute, second);
}

function checkHeaders(request: SignedRequest, claim: Claim): void {
  const unsigned = Object.keys(request.headers).filter(
    (name) =>
      name.startsWith('x-amz-') && !claim.signedHeaders.includes(name) && name !== 'x-amz-content-sha256',
  );
  if (!claim.signedHeaders.includes('host') || unsigned.length > 0) {
    throw new StorageError(
      'AccessDenied',
      'There were headers present in the request which were not signed',
      {
        HeadersNotSigned: unsigned.join(', '),
      },
    );
  }
}

const sameSignature = (left: string, right: string): boolean =>
  left.length === right.length && timingSafeEqual(Buffer.from(left), Buffer.from(right));

/** @throws StorageError when the request is not signed, signed wrongly, too late, or by somebody unknown */
export function verify(request: SignedRequest, known: Credentials, nowMs: number): Verified {
  const header = single(request.headers['authorization']);
  if (header === null && !request.query.has('X-Amz-Signature'))
    throw new StorageError('AccessDenied', 'Access Denied');
  const claim = header === null ? claimOfQuery(request, nowMs) : claimOfHeader(request, header);
  const [accessKeyId = '', ...scopeParts] = claim.credential.split('/');
  const scope = scopeParts.join('/');
  if (accessKeyId !== known.accessKeyId) {
    throw new StorageError('InvalidAccessKeyId', 'The access key id does not exist in our records.', {
      AWSAccessKeyId: accessKeyId,
    });
  }
  if (scopeParts.length !== 4 || scopeParts[0] !== claim.amzDate.slice(0, 8) || scopeParts[2] !== 's3')
    throw new StorageError('AuthorizationHeaderMalformed', 'The credential scope does not fit the request.');
  if (!claim.presigned && Math.abs(nowMs - timeOf(claim.amzDate)) > MOST_SKEW_MS)
    throw new StorageError(
      'RequestTimeTooSkewed',
      'The difference between the request time and the server time is too large.',
    );
  checkHeaders(request, claim);
  const canonical = canonicalRequest(request, claim.signedHeaders, claim.payload);
  const toSign = [ALGORITHM, claim.amzDate, scope, sha256(canonical)].join('\n');
  const key = signingKey(known.secretAccessKey, scope);
  if (!sameSignature(hmac(key, toSign).toString('hex'), claim.signature)) {
    throw new StorageError(
      'SignatureDoesNotMatch',
      'The request signature we calculated does not match the one you provided.',
      {
        StringToSign: toSign,
        CanonicalRequest: canonical,
      },
    );
  }
  return {
    signature: claim.signature,
    signingKey: key,
    amzDate: claim.amzDate,
    scope,
    payload: claim.payload,
  };
}
