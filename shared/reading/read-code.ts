// From what a person can make out of a case code to the variants it can be. Exact, with `?` for a lost character.
import { familyName, type Family } from '../catalogue/family';
import type { UnitKind } from '../catalogue/kinds';
import type { Variant } from '../catalogue/variant';
import {
  matchBeginning,
  matchPattern,
  type Assumed,
  type PatternMatch,
  type ReadSegment,
} from './match-pattern';
import { LOST, normaliseCode } from './segment-text';

/** One variant of the code book, with what reading needs of it. */
export interface BookEntry extends Pick<
  Variant,
  'familyId' | 'modelYears' | 'builtFrom' | 'builtTo' | 'codePatterns'
> {
  readonly variantId: string;
  readonly kind: UnitKind;
  readonly label: string;
}

/** Variants with what they are called, ready to be read against. */
export function codeBook(
  families: readonly Pick<Family, 'id' | 'kind' | 'maker' | 'designation'>[],
  variants: readonly Variant[],
): BookEntry[] {
  const byId = new Map(families.map((family) => [family.id, family]));
  return variants.flatMap((variant) => {
    const family = byId.get(variant.familyId);
    if (!family) return [];
    const { id: variantId, familyId, modelYears, builtFrom, builtTo, codePatterns } = variant;
    const label = `${familyName(family)}, ${variant.label}`;
    return [{ variantId, familyId, kind: family.kind, label, modelYears, builtFrom, builtTo, codePatterns }];
  });
}

export interface Candidate {
  readonly variantId: string;
  readonly familyId: string;
  readonly label: string;
  /** 0 to 1; all candidates together make 1. */
  readonly probability: number;
  readonly segments: readonly ReadSegment[];
  /** ISO date. */
  readonly builtOn: string | null;
  readonly assumed: readonly Assumed[];
  readonly conflicts: readonly string[];
}

export type Verdict = 'sure' | 'likely' | 'cannot_tell';

export interface Reading {
  readonly candidates: readonly Candidate[];
  readonly verdict: Verdict;
  /** False where the text stops before the code does. */
  readonly whole: boolean;
}

export interface ReadOptions {
  readonly kind?: UnitKind;
  /** Model year of the vehicle the unit came out of. */
  readonly donorYear?: number;
}

/** Fewer characters than this say nothing. */
const KNOWN_MIN = 3;
const CANDIDATES_MAX = 24;
/** A unit may lie at the plant so long before the vehicle of that model year is built. */
const LEAD_YEARS = 2;

function conflictsWith(donorYear: number, entry: BookEntry, builtOn: string | null): string[] {
  const conflicts: string[] = [];
  const { from, to } = entry.modelYears;
  if (donorYear < from || donorYear > to)
    conflicts.push(
      `It was fitted in model years ${from} to ${to}, and the donor is a ${donorYear}: the unit may have been swapped in. The stamp counts.`,
    );
  const builtYear = builtOn === null ? null : Number(builtOn.slice(0, 4));
  if (builtYear !== null && builtYear > donorYear)
    conflicts.push(
      `It was built in ${builtYear}, after a ${donorYear} vehicle left the line. The stamp counts.`,
    );
  if (builtYear !== null && builtYear < donorYear - LEAD_YEARS)
    conflicts.push(`It was built in ${builtYear}, long before a ${donorYear} vehicle. The stamp counts.`);
  return conflicts;
}

type Lay = typeof matchPattern;

function firstMatch(entry: BookEntry, text: string, lay: Lay): PatternMatch | null {
  for (const pattern of entry.codePatterns) {
    const match = lay(pattern, text, entry);
    if (match) return match;
  }
  return null;
}

function candidatesOf(text: string, book: readonly BookEntry[], options: ReadOptions, lay: Lay): Candidate[] {
  const found = book
    .filter((entry) => options.kind === undefined || entry.kind === options.kind)
    .flatMap((entry) => {
      const match = firstMatch(entry, text, lay);
      return match ? [{ entry, match }] : [];
    });
  return found.map(({ entry, match }) => ({
    variantId: entry.variantId,
    familyId: entry.familyId,
    label: entry.label,
    probability: 1 / found.length,
    segments: match.segments,
    builtOn: match.builtOn,
    assumed: match.assumed,
    conflicts: options.donorYear === undefined ? [] : conflictsWith(options.donorYear, entry, match.builtOn),
  }));
}

const knownCharacters = (text: string): number => [...text].filter((character) => character !== LOST).length;

/**
 * Reads a case code against the code book.
 * @param text as typed: any case, spaces, dashes and dots anywhere, `?` for a lost character; a code that stops early is
 *   read as far as it goes
 * @returns `sure` for a whole code without a lost character that only one variant can bear; `likely` where one variant
 *   is left all the same; otherwise `cannot_tell`, with the variants that remain
 */
export function readCode(text: string, book: readonly BookEntry[], options: ReadOptions = {}): Reading {
  const code = normaliseCode(text);
  if (knownCharacters(code) < KNOWN_MIN) return { candidates: [], verdict: 'cannot_tell', whole: false };
  const whole = candidatesOf(code, book, options, matchPattern);
  const candidates = whole.length > 0 ? whole : candidatesOf(code, book, options, matchBeginning);
  const exact = whole.length === 1 && !code.includes(LOST);
  const verdict: Verdict = exact ? 'sure' : candidates.length === 1 ? 'likely' : 'cannot_tell';
  return { candidates: candidates.slice(0, CANDIDATES_MAX), verdict, whole: whole.length > 0 };
}
