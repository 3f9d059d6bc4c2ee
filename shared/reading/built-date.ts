// Build dates in case codes: the year by one or two figures, the day by its number in the year.
import type { CodePattern, Segment } from '../catalogue/code-pattern';
import { couldBe } from './segment-text';

const MS_PER_DAY = 86_400_000;

const MONTHS = 'January February March April May June July August September October November December'.split(
  ' ',
);

const dateOf = (year: number, day: number): string =>
  new Date(Date.UTC(year, 0, 1) + (day - 1) * MS_PER_DAY).toISOString().slice(0, 10);

const daysIn = (year: number): number => (Date.UTC(year + 1, 0, 1) - Date.UTC(year, 0, 1)) / MS_PER_DAY;

const yearOf = (date: string): number => Number(date.slice(0, 4));

/** Number of the day in its year, 1 January = 1. */
export const dayOfYear = (date: string): number =>
  (Date.parse(date) - Date.UTC(yearOf(date), 0, 1)) / MS_PER_DAY + 1;

/** "27 May", without the year. */
export const dayAndMonth = (date: string): string =>
  `${Number(date.slice(8, 10))} ${MONTHS[Number(date.slice(5, 7)) - 1] ?? ''}`;

const dayText = (day: number): string => String(day).padStart(3, '0');

/** What a segment shows of a date; null for a segment that shows none. */
export function dateText(segment: Segment, date: string): string | null {
  switch (segment.kind) {
    case 'year_digit':
      return date.slice(3, 4);
    case 'year_two':
      return date.slice(2, 4);
    case 'day_of_year':
      return dayText(dayOfYear(date));
    default:
      return null;
  }
}

export interface Span {
  readonly builtFrom: string;
  readonly builtTo: string;
}

export interface Piece {
  readonly segment: Segment;
  readonly typed: string;
}

const showsDate = (segment: Segment): boolean => dateText(segment, '2000-01-01') !== null;

/** Does the code show the build date at all? */
export const hasDate = (pattern: CodePattern): boolean => pattern.segments.some(showsDate);

const DAYS = Array.from({ length: 366 }, (_, index) => index + 1);

/** Days of the year that the typed pieces leave open. */
function openDays(pieces: readonly Piece[]): number[] {
  const typed = pieces.filter(({ segment }) => segment.kind === 'day_of_year').map((piece) => piece.typed);
  return DAYS.filter((day) => typed.every((text) => couldBe(text, dayText(day))));
}

/** Every day of the span that the typed pieces could show, in order. */
export function possibleDates(pieces: readonly Piece[], span: Span): string[] {
  const yearPieces = pieces.filter(
    ({ segment }) => segment.kind === 'year_digit' || segment.kind === 'year_two',
  );
  const days = openDays(pieces);
  const found: string[] = [];
  for (let year = yearOf(span.builtFrom); year <= yearOf(span.builtTo); year += 1) {
    const first = dateOf(year, 1);
    if (!yearPieces.every(({ segment, typed }) => couldBe(typed, dateText(segment, first) ?? ''))) continue;
    const dates = days.filter((day) => day <= daysIn(year)).map((day) => dateOf(year, day));
    found.push(...dates.filter((date) => date >= span.builtFrom && date <= span.builtTo));
  }
  return found;
}
