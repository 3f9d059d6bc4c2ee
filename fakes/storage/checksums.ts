// The checksums that an upload may carry: verified before anything is stored, and given back on request.
import { createHash } from 'node:crypto';
import { crc32 } from 'node:zlib';
import { StorageError } from './errors';

const CRC32C_TABLE = Array.from({ length: 256 }, (_, byte) => {
  let value = byte;
  // Castagnoli polynomial, reflected (RFC 3720, appendix B.4).
  for (let bit = 0; bit < 8; bit += 1) value = value & 1 ? (value >>> 1) ^ 0x82f63b78 : value >>> 1;
  return value >>> 0;
});

/** CRC-32C of RFC 3720. */
export function crc32c(data: Buffer): number {
  let value = 0xffffffff;
  for (const byte of data) value = (CRC32C_TABLE[(value ^ byte) & 0xff] ?? 0) ^ (value >>> 8);
  return (value ^ 0xffffffff) >>> 0;
}

function word(value: number): string {
  const bytes = Buffer.alloc(4);
  bytes.writeUInt32BE(value >>> 0);
  return bytes.toString('base64');
}

const digest = (name: string) => (data: Buffer) => createHash(name).update(data).digest('base64');

const ALGORITHMS: Readonly<Record<string, (data: Buffer) => string>> = {
  'x-amz-checksum-crc32': (data) => word(crc32(data)),
  'x-amz-checksum-crc32c': (data) => word(crc32c(data)),
  'x-amz-checksum-sha1': digest('sha1'),
  'x-amz-checksum-sha256': digest('sha256'),
};

export const md5Hex = (data: Buffer): string => createHash('md5').update(data).digest('hex');

/**
 * The checksums among these headers, each verified.
 * @param named looks up a header, a trailer or a query parameter by its lower-case name
 * @throws StorageError BadDigest when one does not fit the bytes
 */
export function checkedChecksums(
  data: Buffer,
  named: (name: string) => string | null,
): Record<string, string> {
  const md5 = named('content-md5');
  if (md5 !== null) {
    if (Buffer.from(md5, 'base64').byteLength !== 16)
      throw new StorageError('InvalidDigest', 'The Content-MD5 you specified was invalid.');
    if (md5 !== digest('md5')(data))
      throw new StorageError('BadDigest', 'The Content-MD5 you specified did not match what we received.');
  }
  const found: Record<string, string> = {};
  for (const [name, compute] of Object.entries(ALGORITHMS)) {
    const given = named(name);
    if (given === null) continue;
    if (given !== compute(data))
      throw new StorageError(
        'BadDigest',
        `The ${name.replace('x-amz-checksum-', '').toUpperCase()} you specified did not match what we received.`,
      );
    found[name] = given;
  }
  return found;
}
