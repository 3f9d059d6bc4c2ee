// Words that promise more than a used unit is: "rebuilt" and "new" may only be said where they are true (16 CFR 20).

export interface Claim {
  readonly word: string;
  readonly index: number;
}

const UNIT = '(?:unit|transmission|gearbox|trans|transfer case|t-case|axle|core|assembly)';

/** Each claims that the whole unit was worked over or never used; a new part in it claims nothing. */
const CLAIMS: readonly RegExp[] = [
  /\bre-?built\b/giu,
  /\b(?:fresh|recent|full|complete|professional|stage \d)(?:ly)? re-?build\b/giu,
  /\bre-?man(?:ufactured|d|s)?\b/giu,
  /\bre-?condition(?:ed)?\b/giu,
  /\bover-?hauled\b/giu,
  /\b(?:like|as|good as|brand)[ -]new\b/giu,
  new RegExp(`\\bnew ${UNIT}\\b`, 'giu'),
  /\bnever used\b/giu,
  /\bunused\b/giu,
  /\bnos\b/giu,
];

/** Said of what is to come, or denied, it's no claim: "needs to be rebuilt", "not rebuilt", "ready to rebuild". */
const DENIED =
  /(?:\bnot|\bnever|\bnot a|\bneeds?|\b(?:needs?|has|have|wants?|ought) to be|\b(?:can|must|could|should|will) be|\bneeds? a|\bfor a|\bto|\bno|\bisn['’]t|\bwasn['’]t)[\s-]*$/iu;
const OTHER_MEANING = /^[\s-]*(?:kit|kits|able|manual|it|them|this)\b/iu;

/**
 * The claims of rebuilt, remanufactured, reconditioned or new that a text makes of the unit.
 * Source of the rule: 16 CFR 20.1 and 20.3 (used parts are disclosed as used; "rebuilt" only where dismantled, cleaned
 * and worn parts restored). What counts as a claim here is our own list of words.
 */
export function claimsIn(text: string): Claim[] {
  const found: Claim[] = [];
  for (const pattern of CLAIMS) {
    for (const match of text.matchAll(pattern)) {
      const before = text.slice(0, match.index);
      const after = text.slice(match.index + match[0].length);
      if (DENIED.test(before) || OTHER_MEANING.test(after)) continue;
      found.push({ word: match[0], index: match.index });
    }
  }
  return found.sort((a, b) => a.index - b.index);
}
