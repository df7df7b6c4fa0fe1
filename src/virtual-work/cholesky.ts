// Dense symmetric equations of compatibility: scaled to a unit diagonal, then factored into L Lᵀ.

export interface Cholesky {
  readonly size: number;
  /** By rows, lower triangle: entry (i, j) at i(i + 1)/2 + j. */
  readonly factor: Float64Array;
  /** What each unknown is multiplied by in the scaled equations. */
  readonly scale: Float64Array;
  /** The smallest pivot of the scaled matrix, 1 at best: about the inverse of its condition. */
  readonly smallestPivot: number;
}

/** `matrix`: lower triangle by rows, as `factor`. It is overwritten. */
export function cholesky(matrix: Float64Array, size: number): Cholesky {
  const scale = new Float64Array(size);
  for (let i = 0; i < size; i++) scale[i] = 1 / Math.sqrt(matrix[(i * (i + 1)) / 2 + i]!);
  let smallestPivot = Infinity;
  for (let i = 0; i < size; i++) {
    const rowI = (i * (i + 1)) / 2;
    for (let j = 0; j <= i; j++) {
      const rowJ = (j * (j + 1)) / 2;
      let sum = matrix[rowI + j]! * scale[i]! * scale[j]!;
      for (let k = 0; k < j; k++) sum -= matrix[rowI + k]! * matrix[rowJ + k]!;
      if (j < i) {
        matrix[rowI + j] = sum / matrix[rowJ + j]!;
      } else {
        // Not below zero other than by rounding, and then the caller sees it in the smallest pivot.
        smallestPivot = Math.min(smallestPivot, sum);
        matrix[rowI + i] = Math.sqrt(Math.max(sum, Number.MIN_VALUE));
      }
    }
  }
  return { size, factor: matrix, scale, smallestPivot };
}

/** Solves for `right` in place. */
export function solveCholesky({ size, factor, scale }: Cholesky, right: Float64Array): void {
  for (let i = 0; i < size; i++) {
    const row = (i * (i + 1)) / 2;
    let sum = right[i]! * scale[i]!;
    for (let k = 0; k < i; k++) sum -= factor[row + k]! * right[k]!;
    right[i] = sum / factor[row + i]!;
  }
  for (let i = size - 1; i >= 0; i--) {
    const row = (i * (i + 1)) / 2;
    const value = right[i]! / factor[row + i]!;
    for (let k = 0; k < i; k++) right[k]! -= factor[row + k]! * value;
    right[i] = value * scale[i]!;
  }
}
