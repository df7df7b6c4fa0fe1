// A sparse symmetric matrix in typed arrays.

/** The lower triangle, diagonal included, by columns: entry k of column j stands in row `rows[k]`, `starts[j] ≤ k < starts[j + 1]`, rows ascending. */
export interface SymmetricMatrix {
  readonly size: number;
  /** Int32, size + 1. */
  readonly starts: Int32Array;
  readonly rows: Int32Array;
  readonly values: Float64Array;
  /** The point that each freedom belongs to, size; freedoms of one point are neighbours. The ordering works on points. */
  readonly points: Int32Array;
}

/** Matrix × x, for one vector or for several, one after the other in the array. */
export function multiply(matrix: SymmetricMatrix, x: Float64Array): Float64Array {
  const { size, starts, rows, values } = matrix;
  const product = new Float64Array(x.length);
  const count = size === 0 ? 0 : x.length / size;
  for (let side = 0; side < count; side++) {
    const base = side * size;
    for (let column = 0; column < size; column++) {
      const own = x[base + column]!;
      let sum = 0;
      for (let k = starts[column]!; k < starts[column + 1]!; k++) {
        const row = rows[k]!;
        const value = values[k]!;
        sum += value * x[base + row]!;
        // The entry above the diagonal, which is not stored.
        if (row !== column) product[base + row]! += value * own;
      }
      product[base + column]! += sum;
    }
  }
  return product;
}
