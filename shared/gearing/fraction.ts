// Exact fractions: a gear ratio is a ratio of whole teeth, and rounding would hide a gearset that cannot turn.

export interface Fraction {
  readonly n: bigint;
  /** Always positive, with no factor in common with n. */
  readonly d: bigint;
}

const gcd = (a: bigint, b: bigint): bigint => (b === 0n ? (a < 0n ? -a : a) : gcd(b, a % b));

/**
 * Makes a fraction in lowest terms.
 * @throws RangeError when the lower number is 0
 */
export function fraction(n: bigint | number, d: bigint | number = 1): Fraction {
  const top = BigInt(n);
  const bottom = BigInt(d);
  if (bottom === 0n) throw new RangeError('A fraction over 0');
  const common = gcd(top, bottom) * (bottom < 0n ? -1n : 1n);
  return { n: top / common, d: bottom / common };
}

export const ZERO = fraction(0);
export const ONE = fraction(1);

export const plus = (a: Fraction, b: Fraction): Fraction => fraction(a.n * b.d + b.n * a.d, a.d * b.d);
export const times = (a: Fraction, b: Fraction): Fraction => fraction(a.n * b.n, a.d * b.d);
export const negative = (a: Fraction): Fraction => ({ n: -a.n, d: a.d });
export const minus = (a: Fraction, b: Fraction): Fraction => plus(a, negative(b));
/** @throws RangeError when dividing by 0 */
export const over = (a: Fraction, b: Fraction): Fraction => fraction(a.n * b.d, a.d * b.n);
export const isZero = (a: Fraction): boolean => a.n === 0n;
export const toNumber = (a: Fraction): number => Number(a.n) / Number(a.d);
/** "76/31", or "3" where it is whole. */
export const fractionText = (a: Fraction): string => (a.d === 1n ? `${a.n}` : `${a.n}/${a.d}`);
