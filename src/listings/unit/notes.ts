// The yard's notes: a first line short enough for the tag is written there by hand, the rest stands under the photos.

const HAND_WORDS_MAX = 8;
const HAND_LETTERS_MAX = 60;

export interface Notes {
  /** At most eight words; empty where the first line is longer. */
  readonly hand: string;
  readonly rest: string;
}

export function splitNotes(notes: string): Notes {
  const text = notes.trim();
  const end = /[.!\n]/.exec(text);
  const first = (end ? text.slice(0, end.index + (end[0] === '\n' ? 0 : 1)) : text).trim();
  const short = first.split(/\s+/).length <= HAND_WORDS_MAX && first.length <= HAND_LETTERS_MAX;
  if (first === '' || !short) return { hand: '', rest: text };
  return { hand: first, rest: text.slice(first.length).trim() };
}
