// Builds a code that a pattern allows: for drawings, demo stock and tests of the reader.
import { ALPHABETS, type CodePattern, type Segment } from '../catalogue/code-pattern';
import { dateText } from './built-date';
import { checkCharacter } from './segment-text';

interface Given {
  /** ISO date. */
  readonly builtOn: string;
  /** Chooses one of several texts or characters. */
  readonly pick: (choices: readonly string[]) => string;
}

function textFor(segment: Segment, before: string, { builtOn, pick }: Given): string {
  const shown = dateText(segment, builtOn);
  if (shown !== null) return shown;
  if (segment.values) return pick(Object.keys(segment.values));
  if (segment.kind === 'check') return checkCharacter(before, segment.alphabet);
  return Array.from({ length: segment.length }, () => pick([...ALPHABETS[segment.alphabet]])).join('');
}

/** The code in its groups as they stand on the plate: "K66A 4X D9 09147 03". */
export function composeCode(pattern: CodePattern, given: Given): string {
  let before = '';
  let shown = '';
  for (const segment of pattern.segments) {
    const text = textFor(segment, before, given);
    shown += (segment.gap && shown !== '' ? ' ' : '') + text;
    before += text;
  }
  return shown;
}
