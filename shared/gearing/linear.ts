// Solves a handful of linear equations over exact fractions, and says which unknowns they pin down.
import { fraction, isZero, minus, over, times, ZERO, type Fraction } from './fraction';

/** Coefficients of the unknowns, in order, and what they add up to. */
export interface Equation {
  readonly of: readonly Fraction[];
  readonly is: Fraction;
}

export type Solution =
  /** The equations contradict each other. */
  | { readonly outcome: 'contradiction' }
  /** One entry an unknown; null where the equations leave it free. */
  | { readonly outcome: 'solved'; readonly values: readonly (Fraction | null)[] };

const at = (row: readonly Fraction[], index: number): Fraction => row[index] ?? ZERO;

const scale = (row: readonly Fraction[], by: Fraction): Fraction[] => row.map((value) => over(value, by));

const subtract = (row: readonly Fraction[], pivot: readonly Fraction[], factor: Fraction): Fraction[] =>
  row.map((value, index) => minus(value, times(factor, at(pivot, index))));

/** Gauss and Jordan: each pivot row is cleared out of all the others. */
function reduce(rows: Fraction[][], unknowns: number): { rows: Fraction[][]; pivots: number[] } {
  let work = rows;
  const pivots: number[] = [];
  for (let column = 0; column < unknowns; column += 1) {
    const rank = pivots.length;
    const found = work.findIndex((row, index) => index >= rank && !isZero(at(row, column)));
    const chosen = work[found];
    if (!chosen) continue;
    const pivot = scale(chosen, at(chosen, column));
    const others = work.filter((_, index) => index !== found);
    work = others.map((row) => subtract(row, pivot, at(row, column)));
    work.splice(rank, 0, pivot);
    pivots.push(column);
  }
  return { rows: work, pivots };
}

/**
 * Solves the equations exactly.
 * @param unknowns how many there are; each equation gives that many coefficients
 */
export function solveLinear(equations: readonly Equation[], unknowns: number): Solution {
  const { rows, pivots } = reduce(
    equations.map((equation) => [...equation.of, equation.is]),
    unknowns,
  );
  if (rows.some((row, index) => index >= pivots.length && !isZero(at(row, unknowns))))
    return { outcome: 'contradiction' };
  const values: (Fraction | null)[] = Array.from({ length: unknowns }, () => null);
  pivots.forEach((column, index) => {
    const row = rows[index] ?? [];
    const alone = row.slice(0, unknowns).every((value, other) => other === column || isZero(value));
    if (alone) values[column] = fraction(at(row, unknowns).n, at(row, unknowns).d);
  });
  return { outcome: 'solved', values };
}
