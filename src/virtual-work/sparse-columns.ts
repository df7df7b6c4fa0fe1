// A sparse matrix that grows by columns.

/** Column k: `indices` and `values` from `starts[k]` to `starts[k + 1]`. */
export class SparseColumns {
  readonly starts: number[] = [0];
  indices: Int32Array;
  values: Float64Array;
  #size = 0;

  constructor(capacity: number) {
    this.indices = new Int32Array(capacity);
    this.values = new Float64Array(capacity);
  }

  /** Adds an entry to the column begun. */
  add(index: number, value: number): void {
    if (this.#size === this.indices.length) this.#grow();
    this.indices[this.#size] = index;
    this.values[this.#size++] = value;
  }

  /** Ends the column; the next entry begins another. */
  close(): void {
    this.starts.push(this.#size);
  }

  #grow(): void {
    const indices = new Int32Array(2 * this.#size + 16);
    const values = new Float64Array(2 * this.#size + 16);
    indices.set(this.indices);
    values.set(this.values);
    this.indices = indices;
    this.values = values;
  }
}
