// The code on a tag wired to a unit: eight characters nobody mixes up, and a check character for keying by hand.

/** Digits and letters without I, L, O and U. */
export const TAG_ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const LENGTH = 8;

/**
 * Check character by Luhn's algorithm for any alphabet ("Luhn mod N", a generalisation of ISO/IEC 7812-1 annex B).
 * It catches every single wrong character and nearly every swap of neighbours.
 * @throws RangeError for a character outside the alphabet
 */
export function luhnCheckCharacter(text: string, alphabet: string): string {
  const size = alphabet.length;
  let factor = 2;
  let sum = 0;
  for (let i = text.length - 1; i >= 0; i -= 1) {
    const value = alphabet.indexOf(text.charAt(i));
    if (value < 0) throw new RangeError(`"${text.charAt(i)}" is not in the alphabet`);
    const addend = factor * value;
    sum += Math.floor(addend / size) + (addend % size);
    factor = factor === 2 ? 1 : 2;
  }
  return alphabet.charAt((size - (sum % size)) % size);
}

/** A new tag code: 40 random bits and the check character, nine characters in all. */
export function newTagCode(): string {
  const bytes = globalThis.crypto.getRandomValues(new Uint8Array(LENGTH));
  const body = Array.from(bytes, (byte) => TAG_ALPHABET.charAt(byte % 32)).join('');
  return body + luhnCheckCharacter(body, TAG_ALPHABET);
}

/** What a person keyed or a scanner read: the last part of an address, upper case, without dashes and spaces. */
export const normaliseTag = (text: string): string =>
  (text.trim().split('/').pop() ?? '').toUpperCase().replaceAll(/[^A-Z0-9]/g, '');

/** Has this the form of a tag code, with the right check character? */
export function isTagCode(text: string): boolean {
  if (text.length !== LENGTH + 1) return false;
  if (![...text].every((character) => TAG_ALPHABET.includes(character))) return false;
  return luhnCheckCharacter(text.slice(0, LENGTH), TAG_ALPHABET) === text.charAt(LENGTH);
}

/** For print: "AB12-CD34-E". */
export const formatTag = (code: string): string => code.replace(/(.{4})(?=.)/g, '$1-');
