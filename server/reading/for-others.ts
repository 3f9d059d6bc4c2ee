// What other features may use of the code reader.
import { readCode } from '../../shared/reading/read-code';
import { currentBook, findVariant } from '../catalogue/for-others';
import type { Deps } from '../deps';

/** The family a whole code names, even where several of its variants bear such a code; null when it can't be told. */
export async function familyOfCode(deps: Pick<Deps, 'db'>, text: string): Promise<string | null> {
  const { candidates, whole } = readCode(text, await currentBook(deps.db));
  const [only, ...others] = new Set(candidates.map((one) => one.familyId));
  return whole && only !== undefined && others.length === 0 ? only : null;
}

export async function familyOfVariant(deps: Pick<Deps, 'db'>, variantId: string): Promise<string | null> {
  return (await findVariant(deps.db, variantId))?.familyId ?? null;
}
