// What other features may use of the code reader.
import { readCode } from '../../shared/reading/read-code';
import type { ReadSegment } from '../../shared/reading/match-pattern';
import { normaliseCode } from '../../shared/reading/segment-text';
import { currentBook, findVariant } from '../catalogue/for-others';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';

/** The variant that a whole code names beyond doubt; null otherwise. */
export async function variantByCode(tx: Tx, text: string): Promise<string | null> {
  const reading = readCode(text, await currentBook(tx));
  return reading.verdict === 'sure' ? (reading.candidates[0]?.variantId ?? null) : null;
}

export interface CodeTakenApart {
  readonly text: string;
  readonly segments: ReadSegment[];
  readonly builtOn: string | null;
}

/** The code taken apart as that variant bears it; null where it can't be one of its codes. */
export async function takeCodeApart(tx: Tx, text: string, variantId: string): Promise<CodeTakenApart | null> {
  const book = await currentBook(tx);
  const own = readCode(
    text,
    book.filter((entry) => entry.variantId === variantId),
  );
  const [found] = own.candidates;
  if (!found || !own.whole) return null;
  return { text: normaliseCode(text), segments: [...found.segments], builtOn: found.builtOn };
}

/** The family a whole code names, even where several of its variants bear such a code; null when it can't be told. */
export async function familyOfCode(deps: Pick<Deps, 'db'>, text: string): Promise<string | null> {
  const { candidates, whole } = readCode(text, await currentBook(deps.db));
  const [only, ...others] = new Set(candidates.map((one) => one.familyId));
  return whole && only !== undefined && others.length === 0 ? only : null;
}

export async function familyOfVariant(deps: Pick<Deps, 'db'>, variantId: string): Promise<string | null> {
  return (await findVariant(deps.db, variantId))?.familyId ?? null;
}
