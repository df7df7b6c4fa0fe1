// Sparse elimination of the equations of equilibrium: unknowns are taken in an order of preference, and each that the
// ones before it cannot already balance becomes part of the primary structure. The others are the redundants.
// Left-looking, column by column: J. R. Gilbert and T. Peierls, Sparse partial pivoting in time proportional to
// arithmetic operations, SIAM J. Sci. Stat. Comput. 9 (1988), 862–874.
import { SparseColumns } from './sparse-columns.ts';

export interface Columns {
  readonly rowCount: number;
  readonly maximumEntries: number;
  /** Writes the column's entries, no row twice; returns how many. */
  entries(column: number, rows: Int32Array, values: Float64Array): number;
}

/**
 * Factors of the columns kept: pivot k stands in row `rowOfPivot[k]` of column `columnOfPivot[k]`. Column k of `lower`:
 * what stands below it, divided by it, by rows not yet taken; of `upper`: what stands above it, by earlier pivots. A
 * redundant's column is a combination of the columns kept: column i of `redundant`, by pivots.
 */
export interface Elimination {
  readonly rowCount: number;
  readonly rank: number;
  readonly rowOfPivot: Int32Array;
  readonly columnOfPivot: Int32Array;
  readonly pivots: Float64Array;
  readonly lower: SparseColumns;
  readonly upper: SparseColumns;
  readonly redundants: readonly number[];
  readonly redundant: SparseColumns;
}

/**
 * Below this share of a column's largest entry, what is left of it counts as nothing, and the column as balanced by the
 * others: some 1e5 roundings, and far less than the smallest slope that a structure can rely on.
 */
const BALANCED = 1e-11;
/**
 * How much must be left of a column before it is kept: first only what the primary structure lacks plainly, then what it
 * lacks at all. A shallow pair of bars is so passed over while something better is at hand.
 */
const THRESHOLDS = [0.05, 1e-4, BALANCED];
/** Entries this small relative to their column are rounding, as that of the cosine of a right angle. */
const ROUNDING = 1e-15;

/**
 * `groups`: the columns, the most wanted first; within a group, a column that adds little is put off to its end.
 * `effort`: the multiplications after which to give up (then undefined).
 */
export function eliminate(
  columns: Columns,
  groups: readonly (readonly number[])[],
  effort: number,
): Elimination | undefined {
  const eliminator = new Eliminator(columns);
  for (const group of groups) {
    let waiting = group;
    for (const threshold of THRESHOLDS) {
      const later: number[] = [];
      for (const column of waiting) {
        if (!eliminator.take(column, threshold)) later.push(column);
        if (eliminator.spent > effort) return undefined;
      }
      waiting = later;
    }
  }
  return eliminator;
}

/** An elimination under way. */
class Eliminator implements Elimination {
  readonly rowCount: number;
  rank = 0;
  readonly rowOfPivot: Int32Array;
  readonly columnOfPivot: Int32Array;
  readonly pivots: Float64Array;
  readonly lower: SparseColumns;
  readonly upper: SparseColumns;
  readonly redundants: number[] = [];
  readonly redundant = new SparseColumns();
  /** Multiplications so far, and rows visited. */
  spent = 0;

  readonly #columns: Columns;
  /** −1 for a row not yet taken. */
  readonly #pivotOfRow: Int32Array;
  readonly #rows: Int32Array;
  readonly #values: Float64Array;
  /** The column in work, by rows: zero outside `take`. */
  readonly #work: Float64Array;
  /** The column's number at the rows that it touches. */
  readonly #met: Int32Array;
  #round = 0;
  /** Rows touched that are not yet taken. */
  readonly #open: Int32Array;
  #openCount = 0;
  /** Pivots touched, from `#top` on, each before all those that it feeds. */
  readonly #reached: Int32Array;
  #top = 0;
  /** The way down to the pivot in work, and the next entry of each pivot's column to follow. */
  readonly #path: Int32Array;
  readonly #next: Int32Array;

  constructor(columns: Columns) {
    const { rowCount, maximumEntries } = columns;
    this.rowCount = rowCount;
    this.rowOfPivot = new Int32Array(rowCount);
    this.columnOfPivot = new Int32Array(rowCount);
    this.pivots = new Float64Array(rowCount);
    this.lower = new SparseColumns();
    this.upper = new SparseColumns();
    this.#columns = columns;
    this.#pivotOfRow = new Int32Array(rowCount).fill(-1);
    this.#rows = new Int32Array(maximumEntries);
    this.#values = new Float64Array(maximumEntries);
    this.#work = new Float64Array(rowCount);
    this.#met = new Int32Array(rowCount);
    this.#open = new Int32Array(rowCount);
    this.#reached = new Int32Array(rowCount);
    this.#path = new Int32Array(rowCount);
    this.#next = new Int32Array(rowCount);
  }

  /** Keeps or frees the unknown; false where what is left of it lies between nothing and `threshold`. */
  take(column: number, threshold: number): boolean {
    const count = this.#columns.entries(column, this.#rows, this.#values);
    this.#reach(count);
    let largest = 0;
    for (let entry = 0; entry < count; entry++) {
      this.#work[this.#rows[entry]!] = this.#values[entry]!;
      largest = Math.max(largest, Math.abs(this.#values[entry]!));
    }
    const negligible = ROUNDING * largest;
    this.#reduce(negligible);
    const row = this.#largestOpen();
    const left = row < 0 ? 0 : Math.abs(this.#work[row]!);
    const balanced = left <= BALANCED * largest;
    const settled = balanced || left > threshold * largest;
    if (settled) {
      this.#store(balanced ? this.redundant : this.upper, negligible);
      if (balanced) this.redundants.push(column);
      else this.#keep(column, row, negligible);
    }
    this.#clear();
    return settled;
  }

  /** Finds the rows and the pivots that the column touches, those of its elimination included, depth first. */
  #reach(count: number): void {
    this.#round++;
    this.#openCount = 0;
    this.#top = this.rowCount;
    for (let entry = 0; entry < count; entry++) this.#follow(this.#rows[entry]!);
  }

  #follow(first: number): void {
    if (!this.#meets(first)) return;
    const { starts, indices } = this.lower;
    const path = this.#path;
    const next = this.#next;
    let depth = 0;
    path[0] = this.#pivotOfRow[first]!;
    next[0] = starts[path[0]!]!;
    while (depth >= 0) {
      const pivot = path[depth]!;
      const end = starts[pivot + 1]!;
      let row = -1;
      while (row < 0 && next[depth]! < end) {
        const below = indices[next[depth]!++]!;
        if (this.#meets(below)) row = below;
      }
      if (row >= 0) {
        depth++;
        path[depth] = this.#pivotOfRow[row]!;
        next[depth] = starts[path[depth]!]!;
      } else {
        this.#reached[--this.#top] = pivot;
        depth--;
      }
    }
  }

  /** Notes the row; true where it is new and taken, so that its pivot is to be followed. */
  #meets(row: number): boolean {
    if (this.#met[row] === this.#round) return false;
    this.#met[row] = this.#round;
    if (this.#pivotOfRow[row]! >= 0) return true;
    this.#open[this.#openCount++] = row;
    return false;
  }

  #reduce(negligible: number): void {
    const { starts, indices, values } = this.lower;
    const work = this.#work;
    for (let at = this.#top; at < this.rowCount; at++) {
      const pivot = this.#reached[at]!;
      const factor = work[this.rowOfPivot[pivot]!]!;
      if (Math.abs(factor) <= negligible) continue;
      const start = starts[pivot]!;
      const end = starts[pivot + 1]!;
      for (let entry = start; entry < end; entry++) work[indices[entry]!]! -= factor * values[entry]!;
      this.spent += end - start;
    }
    this.spent += this.rowCount - this.#top + this.#openCount;
  }

  #largestOpen(): number {
    let row = -1;
    let largest = 0;
    for (let at = 0; at < this.#openCount; at++) {
      const size = Math.abs(this.#work[this.#open[at]!]!);
      if (size <= largest) continue;
      largest = size;
      row = this.#open[at]!;
    }
    return row;
  }

  #store(above: SparseColumns, negligible: number): void {
    for (let at = this.#top; at < this.rowCount; at++) {
      const pivot = this.#reached[at]!;
      const value = this.#work[this.rowOfPivot[pivot]!]!;
      if (Math.abs(value) > negligible) above.add(pivot, value);
    }
    above.close();
  }

  #keep(column: number, row: number, negligible: number): void {
    const value = this.#work[row]!;
    for (let at = 0; at < this.#openCount; at++) {
      const other = this.#open[at]!;
      if (other !== row && Math.abs(this.#work[other]!) > negligible) this.lower.add(other, this.#work[other]! / value);
    }
    this.lower.close();
    this.#pivotOfRow[row] = this.rank;
    this.rowOfPivot[this.rank] = row;
    this.columnOfPivot[this.rank] = column;
    this.pivots[this.rank] = value;
    this.rank++;
  }

  #clear(): void {
    for (let at = this.#top; at < this.rowCount; at++) this.#work[this.rowOfPivot[this.#reached[at]!]!] = 0;
    for (let at = 0; at < this.#openCount; at++) this.#work[this.#open[at]!] = 0;
  }
}
