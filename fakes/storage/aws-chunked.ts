// Takes apart bodies sent in `aws-chunked` pieces, and checks the chain of chunk signatures where there is one.
import { StorageError } from './errors';
import { hmac, sha256, type Verified } from './sigv4';

interface Unchunked {
  readonly data: Buffer;
  /** Headers that came after the last piece, by lower-case name. */
  readonly trailers: Readonly<Record<string, string>>;
}

const EMPTY_SHA256 = sha256('');

function lineAt(body: Buffer, at: number): { text: string; next: number } {
  const end = body.indexOf('\r\n', at);
  if (end < 0) throw new StorageError('IncompleteBody', 'The chunked body ends too early.');
  return { text: body.toString('latin1', at, end), next: end + 2 };
}

const chunkSignature = (verified: Verified, kind: string, parts: readonly string[]): string =>
  hmac(verified.signingKey, [kind, verified.amzDate, verified.scope, ...parts].join('\n')).toString('hex');

function checkSignature(given: string | undefined, expected: string): void {
  if (given !== expected)
    throw new StorageError('SignatureDoesNotMatch', 'The signature of a chunk does not match its bytes.');
}

function readTrailers(body: Buffer, from: number): Record<string, string> {
  const trailers: Record<string, string> = {};
  for (const line of body.toString('utf8', from).split('\r\n')) {
    const colon = line.indexOf(':');
    if (colon > 0) trailers[line.slice(0, colon).trim().toLowerCase()] = line.slice(colon + 1).trim();
  }
  return trailers;
}

function checkTrailers(
  verified: Verified,
  previous: string,
  trailers: Readonly<Record<string, string>>,
): void {
  const lines = Object.entries(trailers)
    .filter(([name]) => name !== 'x-amz-trailer-signature')
    .sort(([left], [right]) => (left < right ? -1 : 1))
    .map(([name, value]) => `${name}:${value}\n`);
  const expected = chunkSignature(verified, 'AWS4-HMAC-SHA256-TRAILER', [previous, sha256(lines.join(''))]);
  checkSignature(trailers['x-amz-trailer-signature'], expected);
}

/** @param verified the request's own signature; its payload marker says whether the pieces are signed */
export function unchunk(body: Buffer, verified: Verified): Unchunked {
  const signed = verified.payload.startsWith('STREAMING-AWS4-HMAC-SHA256-PAYLOAD');
  const pieces: Buffer[] = [];
  let previous = verified.signature;
  let at = 0;
  for (;;) {
    const head = lineAt(body, at);
    const [, hex = '', given] = /^([0-9a-fA-F]+)(?:;chunk-signature=([0-9a-f]{64}))?$/.exec(head.text) ?? [];
    if (hex === '') throw new StorageError('IncompleteBody', 'A chunk has no length.');
    const length = Number.parseInt(hex, 16);
    const piece = body.subarray(head.next, head.next + length);
    if (piece.byteLength < length)
      throw new StorageError('IncompleteBody', 'A chunk is shorter than it says.');
    if (signed) {
      const expected = chunkSignature(verified, 'AWS4-HMAC-SHA256-PAYLOAD', [
        previous,
        EMPTY_SHA256,
        sha256(piece),
      ]);
      checkSignature(given, expected);
      previous = expected;
    }
    if (length === 0) {
      const trailers = readTrailers(body, head.next);
      if (signed && verified.payload.endsWith('-TRAILER')) checkTrailers(verified, previous, trailers);
      return { data: Buffer.concat(pieces), trailers };
    }
    pieces.push(piece);
    at = head.next + length + 2;
  }
}
