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
