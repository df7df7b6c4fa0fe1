// How far errors can grow: an estimate of the condition of a factorised matrix from a few solutions with it.

import type { Factorisation } from './factorisation.ts';
import type { SymmetricMatrix } from './symmetric-matrix.ts';
import { substitute } from './triangular-solve.ts';

/** More rounds than this improve the estimate hardly ever. */
const mostRounds = 5;

/**
 * The condition ‖A‖ ‖A⁻¹‖ of the matrix scaled to a diagonal of ones, in the 1-norm: an estimate from below, rarely short
 * of the truth by more than a factor of 3. Infinity when a pivot is singular, 1 for an empty matrix.
 */
export function conditionEstimate(matrix: SymmetricMatrix, factorisation: Factorisation): number {
  if (matrix.size === 0) return 1;
  if (factorisation.singular.length > 0) return Number.POSITIVE_INFINITY;
  return norm(matrix, factorisation.factors.scale) * inverseNorm(factorisation);
}

/** The largest sum of absolute values in a column of scale × matrix × scale. */
function norm(matrix: SymmetricMatrix, scale: Float64Array): number {
  const { size, starts, rows, values } = matrix;
  const sums = new Float64Array(size);
  for (let column = 0; column < size; column++) {
    for (let k = starts[column]!; k < starts[column + 1]!; k++) {
      const row = rows[k]!;
      const value = Math.abs(values[k]! * scale[column]! * scale[row]!);
      sums[column]! += value;
      if (row !== column) sums[row]! += value;
    }
  }
  return sums.reduce((largest, sum) => Math.max(largest, sum), 0);
}

/**
 * Climbs to the right side of 1-norm 1 that the inverse answers most strongly (Higham, FORTRAN codes for estimating the
 * one-norm of a real or complex matrix, ACM Transactions on Mathematical Software 14, 1988, algorithm 2: the method of
 * LAPACK's xLACON; the matrix is symmetric, so that it serves for its transpose as well).
 */
function inverseNorm(factorisation: Factorisation): number {
  const { factors, size } = factorisation;
  let x = new Float64Array(size).fill(1 / size);
  substitute(factors, x, 1);
  let estimate = oneNorm(x);
  if (size === 1) return estimate;
  let signs = x.map(signOf);
  let steepest = -1;
  for (let round = 1; round < mostRounds; round++) {
    const slope = signs.slice();
    substitute(factors, slope, 1);
    const next = largestEntry(slope);
    if (steepest >= 0 && Math.abs(slope[steepest]!) === Math.abs(slope[next]!)) break;
    steepest = next;
    x = new Float64Array(size);
    x[steepest] = 1;
    substitute(factors, x, 1);
    const previous = estimate;
    estimate = Math.max(previous, oneNorm(x));
    const previousSigns = signs;
    signs = x.map(signOf);
    if (estimate <= previous || signs.every((sign, k) => sign === previousSigns[k])) break;
  }

  // A right side of alternating signs, for matrices made so that the climb stops early.
  for (let k = 0; k < size; k++) x[k] = (k % 2 === 0 ? 1 : -1) * (1 + k / (size - 1));
  substitute(factors, x, 1);
  return Math.max(estimate, (2 * oneNorm(x)) / (3 * size));
}

function signOf(value: number): number {
  return value < 0 ? -1 : 1;
}

function oneNorm(x: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < x.length; k++) sum += Math.abs(x[k]!);
  return sum;
}

function largestEntry(x: Float64Array): number {
  let best = 0;
  for (let k = 1; k < x.length; k++) if (Math.abs(x[k]!) > Math.abs(x[best]!)) best = k;
  return best;
}
