import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  formatTag,
  isTagCode,
  luhnCheckCharacter,
  newTagCode,
  normaliseTag,
  TAG_ALPHABET,
} from '../../shared/kernel/tag-code';

test('the published example of Luhn mod N: "abcdef" over its own six letters has the check character "e"', () => {
  expect(luhnCheckCharacter('abcdef', 'abcdef')).toBe('e');
});

test('the published example of Luhn mod 10: 7992739871 has the check digit 3', () => {
  expect(luhnCheckCharacter('7992739871', '0123456789')).toBe('3');
});

test('every single wrong character is caught', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 8 }), fc.integer({ min: 1, max: 31 }), (position, shift) => {
      const code = newTagCode();
      expect(isTagCode(code)).toBe(true);
      const value = TAG_ALPHABET.indexOf(code.charAt(position));
      const wrong =
        code.slice(0, position) + TAG_ALPHABET.charAt((value + shift) % 32) + code.slice(position + 1);
      expect(isTagCode(wrong)).toBe(false);
    }),
  );
});

test('what is printed, keyed or scanned comes back to the code', () => {
  const code = newTagCode();
  expect(normaliseTag(` ${formatTag(code).toLowerCase()} `)).toBe(code);
  expect(normaliseTag(`http://127.0.0.1:4310/t/${code}`)).toBe(code);
});
