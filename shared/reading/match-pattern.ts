// Lays one pattern over what was typed: exactly, with `?` for a lost character.
import { patternLength, type CodePattern, type Segment } from '../catalogue/code-pattern';
import { dateText, dayAndMonth, hasDate, possibleDates, type Piece, type Span } from './built-date';
import { checkCharacter, couldBe, fitsAlphabet, LOST, possibleValues } from './segment-text';

export interface ReadSegment {
  readonly name: string;
  readonly value: string;
  readonly meaning: string;
}

export interface Assumed {
  /** Place in the code without spaces, from 0. */
  readonly index: number;
  readonly read: string;
  readonly took: string;
  readonly why: string;
}

export interface PatternMatch {
  readonly segments: readonly ReadSegment[];
  /** Null where the code doesn't show it, or more than one day is possible. */
  readonly builtOn: string | null;
  readonly assumed: readonly Assumed[];
}

function cut(pattern: CodePattern, text: string): Piece[] {
  let start = 0;
  return pattern.segments.map((segment) => {
    const typed = text.slice(start, start + segment.length);
    start += segment.length;
    return { segment, typed };
  });
}

interface Resolved {
  readonly value: string;
  readonly meaning: string;
}

/** The characters that all possible texts have in common; the rest stays lost. */
const common = (texts: readonly string[]): string => {
  const [first = '', ...others] = texts;
  return [...first]
    .map((character, index) =>
      others.every((other) => other.charAt(index) === character) ? character : LOST,
    )
    .join('');
};

function fromTable(segment: Segment, possible: readonly string[]): Resolved {
  const meanings = possible.map((value) => segment.values?.[value] ?? value);
  return {
    value: common(possible),
    meaning: meanings.length === 1 ? (meanings[0] ?? '') : `One of: ${meanings.join('; ')}`,
  };
}

function fromDates(segment: Segment, dates: readonly string[]): Resolved {
  const texts = [...new Set(dates.map((date) => dateText(segment, date) ?? ''))];
  const years = [...new Set(dates.map((date) => date.slice(0, 4)))];
  const value = common(texts);
  if (segment.kind !== 'day_of_year') return { value, meaning: `Built in ${years.join(' or ')}` };
  const [only] = dates;
  return {
    value,
    meaning: dates.length === 1 && only ? `Built on ${dayAndMonth(only)}` : `One of ${texts.length} days`,
  };
}

/** What the segment reads; null where it can't stand here. */
function resolve({ segment, typed }: Piece, before: string, dates: readonly string[]): Resolved | null {
  if (!fitsAlphabet(typed, segment.alphabet)) return null;
  const possible = possibleValues(segment, typed);
  if (possible) return possible.length === 0 ? null : fromTable(segment, possible);
  if (segment.kind === 'check') {
    if (before.includes(LOST)) return { value: typed, meaning: 'Check figure, not checked' };
    const right = checkCharacter(before, segment.alphabet);
    return couldBe(typed, right) ? { value: right, meaning: 'Check figure, right' } : null;
  }
  if (dateText(segment, '2000-01-01') !== null) return fromDates(segment, dates);
  return { value: typed, meaning: segment.kind === 'serial' ? 'Serial number' : segment.name };
}

function assumedIn(start: number, typed: string, { value, meaning }: Resolved): Assumed[] {
  return [...typed].flatMap((read, offset) => {
    const took = value.charAt(offset);
    if (read === took || took === LOST) return [];
    return [{ index: start + offset, read, took, why: `Nothing else can stand here: ${meaning}` }];
  });
}

/**
 * Lays a pattern over a whole code.
 * @param text normalised; as long as the pattern
 * @param span the days on which the variant was built: a date outside it is no match
 */
export function matchPattern(pattern: CodePattern, text: string, span: Span): PatternMatch | null {
  if (text.length !== patternLength(pattern)) return null;
  const pieces = cut(pattern, text);
  // Most patterns fail here, before any date is counted through.
  const fits = ({ segment, typed }: Piece): boolean =>
    fitsAlphabet(typed, segment.alphabet) && possibleValues(segment, typed)?.length !== 0;
  if (!pieces.every(fits)) return null;
  const dates = hasDate(pattern) ? possibleDates(pieces, span) : [];
  if (hasDate(pattern) && dates.length === 0) return null;
  const segments: ReadSegment[] = [];
  const assumed: Assumed[] = [];
  let before = '';
  for (const piece of pieces) {
    const resolved = resolve(piece, before, dates);
    if (!resolved) return null;
    assumed.push(...assumedIn(before.length, piece.typed, resolved));
    segments.push({ name: piece.segment.name, ...resolved });
    before += resolved.value;
  }
  return { segments, builtOn: dates.length === 1 ? (dates[0] ?? null) : null, assumed };
}

/**
 * Lays a pattern over the beginning of a code, for a person who has not typed the rest: only the segments that have
 * begun are told. The first segment must be whole.
 */
export function matchBeginning(pattern: CodePattern, text: string, span: Span): PatternMatch | null {
  const missing = patternLength(pattern) - text.length;
  const first = pattern.segments[0]?.length ?? 0;
  if (missing <= 0 || text.length < first) return null;
  const match = matchPattern(pattern, text + LOST.repeat(missing), span);
  if (!match) return null;
  let start = 0;
  const begun = match.segments.filter((segment) => {
    const typed = start < text.length;
    start += segment.value.length;
    return typed;
  });
  return { ...match, segments: begun, assumed: match.assumed.filter((one) => one.index < text.length) };
}
