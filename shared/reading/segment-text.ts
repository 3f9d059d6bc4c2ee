// What may stand in one segment of a case code, and what it means.
import { ALPHABETS, type Alphabet, type Segment } from '../catalogue/code-pattern';

/** A character that cannot be made out. */
export const LOST = '?';

/** Upper case, without the spaces, dashes and dots that people put between the groups of a code. */
export const normaliseCode = (text: string): string => text.toUpperCase().replace(/[\s.\-_/·]/g, '');

/** Could this text, with its lost characters, be that one? */
export const couldBe = (typed: string, full: string): boolean =>
  typed.length === full.length &&
  [...typed].every((character, index) => character === LOST || character === full.charAt(index));

/** Are all characters ones that may stand here, or lost? */
export const fitsAlphabet = (typed: string, alphabet: Alphabet): boolean =>
  [...typed].every((character) => character === LOST || ALPHABETS[alphabet].includes(character));

/** Keys of the segment's table that the text could be; null for a segment without a table. */
export function possibleValues(segment: Segment, typed: string): string[] | null {
  return segment.values ? Object.keys(segment.values).filter((value) => couldBe(typed, value)) : null;
}

const CHECK_ORDER = ALPHABETS.alphanumeric;

/**
 * Check figure of the text before it: places counted from 1 as weights, figures and letters as 0 to 35, the sum modulo
 * the size of the alphabet. It sees one changed character in most places, and most swaps of neighbours.
 */
export function checkCharacter(before: string, alphabet: Alphabet): string {
  const sum = [...before].reduce(
    (total, character, index) => total + (index + 1) * CHECK_ORDER.indexOf(character),
    0,
  );
  const allowed = ALPHABETS[alphabet];
  return allowed.charAt(sum % allowed.length);
}
