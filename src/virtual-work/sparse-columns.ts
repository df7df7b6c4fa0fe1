// A sparse matrix that grows by columns.

/** Column k: `indices` and `values` from `starts[k]` to `starts[k + 1]`. */
export class SparseColumns {
  readonly starts: number[] = [0];
  readonly indices: number[] = [];
  readonly values: number[] = [];

  /** Adds an entry to the column begun. */
  add(index: number, value: number): void {
    this.indices.push(index);
    this.values.push(value);
  }

  /** Ends the column; the next entry begins another. */
  close(): void {
    this.starts.push(this.indices.length);
  }
}
