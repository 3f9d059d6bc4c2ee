// Opaque ids: a prefix that says what it is, then 16 random bytes that cannot be guessed; newer ids sort later.

const ALPHABET = '0123456789abcdefghjkmnpqrstvwxyz';

export type IdPrefix =
  | 'usr'
  | 'slr'
  | 'lst'
  | 'pho'
  | 'ord'
  | 'cas'
  | 'prp'
  | 'msg'
  | 'ent'
  | 'fx'
  | 'tml'
  | 'ddl'
  | 'not'
  | 'don'
  | 'evt'
  | 'inv'
  | 'rig'
  | 'req';

/** `ord_` + 10 characters of time (milliseconds, base 32) + 16 random characters (80 bits). */
export function newId(prefix: IdPrefix, nowMs: number = Date.now()): string {
  let time = '';
  let rest = nowMs;
  for (let i = 0; i < 10; i += 1) {
    time = ALPHABET.charAt(rest % 32) + time;
    rest = Math.floor(rest / 32);
  }
  const bytes = globalThis.crypto.getRandomValues(new Uint8Array(16));
  const random = Array.from(bytes, (byte) => ALPHABET.charAt(byte % 32)).join('');
  return `${prefix}_${time}${random}`;
}
