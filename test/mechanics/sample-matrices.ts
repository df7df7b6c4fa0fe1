// Matrices for the tests of the factorisation, and dense arithmetic to hold it against.

import type { SymmetricMatrix } from '../../src/mechanics/symmetric-matrix.ts';
import { fromColumns } from '../bench/grid-frame.ts';

/** Numbers from 0 to 1, the same for the same seed (Park and Miller, Communications of the ACM 31, 1988). */
export function randomNumbers(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 16807) % 2147483647;
    return state / 2147483647;
  };
}

/** The lower triangle of a dense matrix, zeros left out, as many freedoms a point as told. */
export function fromDense(dense: readonly (readonly number[])[], freedomsPerPoint = 1): SymmetricMatrix {
  const columns = dense.map((_, column) => {
    const entries = new Map<number, number>();
    for (let row = column; row < dense.length; row++) {
      if (row === column || dense[row]![column] !== 0) entries.set(row, dense[row]![column]!);
    }
    return entries;
  });
  return fromColumns(columns, freedomsPerPoint);
}

export function toDense(matrix: SymmetricMatrix): number[][] {
  const dense = Array.from({ length: matrix.size }, () => new Array<number>(matrix.size).fill(0));
  for (let column = 0; column < matrix.size; column++) {
    for (let k = matrix.starts[column]!; k < matrix.starts[column + 1]!; k++) {
      dense[matrix.rows[k]!]![column] = matrix.values[k]!;
      dense[column]![matrix.rows[k]!] = matrix.values[k]!;
    }
  }
  return dense;
}

/**
 * A sparse positive definite matrix: a sum of springs between a few freedoms each, every point with one to four
 * freedoms, and a soft spring to ground everywhere.
 */
export function randomStiffness(points: number, springs: number, seed: number): SymmetricMatrix {
  const random = randomNumbers(seed);
  const pointOf: number[] = [];
  for (let point = 0; point < points; point++) {
    const freedoms = 1 + Math.floor(4 * random());
    for (let k = 0; k < freedoms; k++) pointOf.push(point);
  }
  const size = pointOf.length;
  const dense = Array.from({ length: size }, (_, i) => Array.from({ length: size }, (_, j) => (i === j ? 0.1 : 0)));
  for (let spring = 0; spring < springs; spring++) {
    const ends = [0, 1, 2].map(() => ({ at: Math.floor(size * random()), share: 2 * random() - 1 }));
    for (const a of ends) for (const b of ends) dense[a.at]![b.at]! += a.share * b.share;
  }
  return { ...fromDense(dense), points: Int32Array.from(pointOf) };
}

/** Gaussian elimination with partial pivoting. */
export function denseSolve(matrix: readonly (readonly number[])[], rhs: ArrayLike<number>): number[] {
  const size = matrix.length;
  const a = matrix.map((row, i) => [...row, rhs[i]!]);
  for (let k = 0; k < size; k++) {
    let best = k;
    for (let i = k + 1; i < size; i++) if (Math.abs(a[i]![k]!) > Math.abs(a[best]![k]!)) best = i;
    [a[k], a[best]] = [a[best]!, a[k]!];
    for (let i = k + 1; i < size; i++) {
      const factor = a[i]![k]! / a[k]![k]!;
      for (let j = k; j <= size; j++) a[i]![j]! -= factor * a[k]![j]!;
    }
  }
  const x = new Array<number>(size).fill(0);
  for (let i = size - 1; i >= 0; i--) {
    let sum = a[i]![size]!;
    for (let j = i + 1; j < size; j++) sum -= a[i]![j]! * x[j]!;
    x[i] = sum / a[i]![i]!;
  }
  return x;
}

/** The largest difference over the largest value of the second. */
export function relativeDifference(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let largest = 0;
  let difference = a.length === b.length ? 0 : Number.NaN;
  for (let k = 0; k < b.length; k++) {
    largest = Math.max(largest, Math.abs(b[k]!));
    difference = Math.max(difference, Math.abs(a[k]! - b[k]!));
  }
  return difference === 0 ? 0 : difference / largest;
}
