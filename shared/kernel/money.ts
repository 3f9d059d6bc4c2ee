// Money is whole cents of one currency; this file holds the only arithmetic that divides it.

/** Whole US cents. Never a fraction, never a float of dollars. */
export type Cents = number;

/** Basis points: 100 bps = 1 %. */
export type BasisPoints = number;

function requireWhole(value: number, name: string): void {
  if (!Number.isSafeInteger(value)) throw new RangeError(`${name} must be a whole number, got ${value}`);
}

/**
 * A share of an amount in basis points, rounded half to even (banker's rounding, IEEE 754 roundTiesToEven).
 * @param amountCents whole cents, 0 or more
 * @param bps basis points, 0 to 10,000
 * @returns whole cents
 * @throws RangeError when an argument isn't whole or is negative
 */
export function shareOf(amountCents: Cents, bps: BasisPoints): Cents {
  requireWhole(amountCents, 'amountCents');
  requireWhole(bps, 'bps');
  if (amountCents < 0 || bps < 0) throw new RangeError('amountCents and bps must not be negative');
  const product = BigInt(amountCents) * BigInt(bps);
  const quotient = product / 10_000n;
  const remainder = product % 10_000n;
  const roundUp = remainder > 5_000n || (remainder === 5_000n && quotient % 2n === 1n);
  return Number(roundUp ? quotient + 1n : quotient);
}

/**
 * Splits an amount by weights with the largest-remainder rule (Hamilton): floor every share, then hand the missing
 * cents to the largest fractional parts; ties go to the lower index. The shares always add up to the amount.
 * @param amountCents whole cents, 0 or more
 * @param weights whole numbers, 0 or more, not all 0
 * @throws RangeError for an empty list, a negative number or weights that are all 0
 */
export function allocate(amountCents: Cents, weights: readonly number[]): Cents[] {
  requireWhole(amountCents, 'amountCents');
  for (const weight of weights) requireWhole(weight, 'weight');
  const sum = weights.reduce((total, weight) => total + BigInt(weight), 0n);
  if (amountCents < 0 || weights.some((weight) => weight < 0))
    throw new RangeError('nothing may be negative');
  if (sum === 0n) throw new RangeError('at least one weight must be above 0');
  const exact = weights.map((weight, index) => {
    const product = BigInt(amountCents) * BigInt(weight);
    return { index, floor: product / sum, remainder: product % sum };
  });
  let missing = BigInt(amountCents) - exact.reduce((total, share) => total + share.floor, 0n);
  const byRemainder = [...exact].sort((a, b) =>
    a.remainder === b.remainder ? a.index - b.index : a.remainder > b.remainder ? -1 : 1,
  );
  for (const share of byRemainder) {
    if (missing === 0n) break;
    share.floor += 1n;
    missing -= 1n;
  }
  return exact.map((share) => Number(share.floor));
}

/** "$1,450.00"; a negative amount carries the minus sign U+2212. */
export function formatCents(cents: Cents): string {
  requireWhole(cents, 'cents');
  const whole = Math.floor(Math.abs(cents) / 100).toString();
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ',');
  const rest = (Math.abs(cents) % 100).toString().padStart(2, '0');
  return `${cents < 0 ? '\u2212' : ''}$${grouped}.${rest}`;
}

/**
 * Reads what a person types as dollars ("1450", "1,450.5", "$1,450.00") into cents.
 * @returns whole cents, or null when it isn't an amount with at most two decimals
 */
export function parseDollars(text: string): Cents | null {
  const match = /^\s*\$?\s*(\d{1,3}(?:,\d{3})+|\d+)(?:\.(\d{1,2}))?\s*$/.exec(text);
  if (!match?.[1]) return null;
  const cents = Number(match[1].replaceAll(',', '')) * 100 + Number((match[2] ?? '').padEnd(2, '0') || 0);
  return Number.isSafeInteger(cents) ? cents : null;
}
