// Long passwords that everybody tries first; shorter ones are refused by their length already (from memory).

const ROOTS = [
  'password',
  'passw0rd',
  'qwerty',
  'qwertyuiop',
  'letmein',
  'welcome',
  'iloveyou',
  'monkey',
  'dragon',
  'football',
  'baseball',
  'sunshine',
  'princess',
  'superman',
  'trustno1',
  'administrator',
  'spragyard',
  'transmission',
  'changeme',
  'whatever',
  'abc123',
  'asdfghjkl',
  'zxcvbnm',
  'starwars',
  'computer',
  'michelle',
  'internet',
  'mustang',
  'shadow',
  'master',
];

const KEYBOARD = [
  '123456789012',
  '1234567890123',
  '012345678901',
  'qwertyuiop12',
  '1q2w3e4r5t6y',
  'qazwsxedcrfv',
  'asdfghjkl123',
];

const strip = (text: string): string => text.toLowerCase().replaceAll(/[^a-z]/g, '');

/** A known word with digits and marks around it, the same few characters over and over, or a run over the keyboard. */
export function isCommonPassword(text: string): boolean {
  const lower = text.toLowerCase();
  if (new Set(lower).size <= 3) return true;
  if (KEYBOARD.some((run) => lower.startsWith(run))) return true;
  const letters = strip(text);
  return ROOTS.some((root) => {
    const word = strip(root);
    return (
      letters === word ||
      (word.length > 0 &&
        letters.length % word.length === 0 &&
        letters === word.repeat(letters.length / word.length) &&
        letters !== '')
    );
  });
}
