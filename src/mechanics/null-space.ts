// The movements that a matrix answers with no force, or with none that rounding could tell from zero. Whether they make
// a structure unstable, and how to speak of them, is left to others.

import type { Factorisation } from './factorisation.ts';
import { multiply, type SymmetricMatrix } from './symmetric-matrix.ts';
import { solveBackward, substitute } from './triangular-solve.ts';

export interface NullVector {
  /** By freedoms. */
  readonly movement: Float64Array;
  /** |A v| / |v| of the matrix scaled to a diagonal of ones, with the movement scaled likewise: 0 for none at all, 1 for that of a freedom on its own. */
  readonly residual: number;
}

/**
 * A movement counts as free when its residual is no larger than this.
 *
 * With |v| = 1 and a diagonal of ones, A v of an exactly free movement is what is left of rounding: that of the entries,
 * each a sum of a few stiffnesses that are themselves rounded products, some 4 ε, and that of the product, half of ε
 * for each of the about 15 entries of a row. Their sum over the rows, taken as independent, keeps below 64 ε whatever
 * the size. The softest movement of a real structure is far above it: that of a cantilever in n equal
 * elements has about 0.5 / n⁴, which reaches 64 ε at 2 400 elements in a row.
 */
export const nullTolerance = 64 * Number.EPSILON;

/** Rounds of inverse iteration for one vector; each gains the ratio between the two softest movements. */
const mostRounds = 6;

/** A start that holds less of the softest movement than this share of an even one would be a freak. */
const leastShare = 1e-3;

/** What of a vector lies outside a basis, relative to the vector, is rounding when it is less than this. */
const dependence = 1e-12;

/**
 * A basis of the movements that meet no stiffness: first those of singular freedoms, then those that inverse iteration
 * finds although no pivot became so small. Each freedom weighted by the root of its own stiffness (the diagonal), the
 * movements are orthonormal. Empty when there are none.
 */
export function nullSpace(matrix: SymmetricMatrix, factorisation: Factorisation): readonly NullVector[] {
  const { factors, size } = factorisation;
  // All vectors here are of the scaled matrix, by positions of elimination.
  const basis: Float64Array[] = [];
  for (const freedom of factorisation.singular) {
    const x = new Float64Array(size);
    x[factors.symbolic.positions[freedom]!] = 1;
    solveBackward(factors, x, 1);
    if (orthonormalise(x, basis) > 0) basis.push(x);
  }
  while (basis.length < size) {
    const x = softest(matrix, factorisation, basis);
    if (x === undefined) break;
    basis.push(x);
  }
  return basis.map(x => ({
    movement: toFreedoms(factorisation, x),
    residual: norm(scaledProduct(matrix, factorisation, x)),
  }));
}

/** The softest movement outside the basis by inverse iteration, undefined when it is not a free one. */
function softest(
  matrix: SymmetricMatrix,
  factorisation: Factorisation,
  basis: readonly Float64Array[],
): Float64Array | undefined {
  const { factors, size } = factorisation;
  let best: Float64Array | undefined;
  let bestResidual: number = nullTolerance;
  const x = scatteredVector(size, basis.length + 1);
  if (orthonormalise(x, basis) === 0) return undefined;
  for (let round = 0; round < mostRounds; round++) {
    substitute(factors, x, 1);
    const growth = orthonormalise(x, basis);
    // A free movement grows by at least 1 / nullTolerance, and an even start holds 1 / √size of it.
    if (growth * nullTolerance * Math.sqrt(size) < leastShare) break;
    const residual = norm(scaledProduct(matrix, factorisation, x));
    if (residual <= bestResidual) {
      best = x.slice();
      bestResidual = residual;
    } else if (best !== undefined) break;
  }
  return best;
}

/** Makes a vector of length 1 at right angles to the basis; returns the length found, 0 when nothing but rounding is left. */
function orthonormalise(x: Float64Array, basis: readonly Float64Array[]): number {
  const whole = norm(x);
  // Once more against what rounding left of the first time.
  for (let pass = 0; pass < 2; pass++) {
    for (const vector of basis) {
      let share = 0;
      for (let k = 0; k < x.length; k++) share += x[k]! * vector[k]!;
      for (let k = 0; k < x.length; k++) x[k]! -= share * vector[k]!;
    }
  }
  const length = norm(x);
  if (!(length > whole * dependence)) return 0;
  for (let k = 0; k < x.length; k++) x[k]! /= length;
  return length;
}

/** The scaled matrix × x, by positions of elimination. */
function scaledProduct(matrix: SymmetricMatrix, factorisation: Factorisation, x: Float64Array): Float64Array {
  const { symbolic, scale } = factorisation.factors;
  const product = multiply(matrix, toFreedoms(factorisation, x));
  return Float64Array.from(symbolic.order, freedom => product[freedom]! * scale[freedom]!);
}

/** From the scaled matrix, by positions, to the movement by freedoms. */
function toFreedoms(factorisation: Factorisation, x: Float64Array): Float64Array {
  const { symbolic, scale } = factorisation.factors;
  const movement = new Float64Array(x.length);
  for (let k = 0; k < x.length; k++) movement[symbolic.order[k]!] = x[k]! * scale[symbolic.order[k]!]!;
  return movement;
}

/** Numbers between −1 and 1, the same for the same seed: Park and Miller's generator, Communications of the ACM 31, 1988. */
function scatteredVector(size: number, seed: number): Float64Array {
  let state = seed;
  return Float64Array.from({ length: size }, () => {
    state = (state * 16807) % 2147483647;
    return (2 * state) / 2147483647 - 1;
  });
}

function norm(x: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < x.length; k++) sum += x[k]! * x[k]!;
  return Math.sqrt(sum);
}
