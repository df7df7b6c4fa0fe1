// The symbolic half of the factorisation: which freedoms are eliminated together, in which order, and where every
// number will stand. It depends on the pattern of the matrix only, and serves every matrix of that pattern.

import type { SymmetricMatrix } from './symmetric-matrix.ts';

/**
 * The plan of a multifrontal elimination (Duff and Reid, The multifrontal solution of indefinite sparse symmetric
 * linear equations, ACM Transactions on Mathematical Software 9, 1983). A front eliminates neighbouring pivots that
 * reach the same rows, and hands the rest to its parent. Positions count in the order of elimination.
 */
export interface Symbolic {
  readonly size: number;
  /** `order[position]` is the freedom eliminated there. */
  readonly order: Int32Array;
  /** `positions[freedom]`, the inverse of `order`. */
  readonly positions: Int32Array;
  /** Number of fronts; children come before their parent. */
  readonly fronts: number;
  /** Front f eliminates the positions from `pivotStarts[f]` up to `pivotStarts[f + 1]`. */
  readonly pivotStarts: Int32Array;
  /** The positions that the pivots of front f reach beyond themselves, ascending: `rows[rowStarts[f]]` up to `rows[rowStarts[f + 1]]`. */
  readonly rowStarts: Int32Array;
  readonly rows: Int32Array;
  /** As `rows`: where each of them stands in the parent front, its pivots first, then its rows. */
  readonly places: Int32Array;
  /** The parent of each front, −1 for a root. */
  readonly parents: Int32Array;
  /** Where the panel of each front starts among the panels; fronts + 1. A panel is (pivots + rows) × pivots, by rows. */
  readonly panelStarts: Int32Array;
  /** `targets[k]` is the place among the panels of entry k of the matrix. */
  readonly targets: Int32Array;
  /** Pivots and rows of the tallest front. */
  readonly tallest: number;
  /** Numbers in the largest panel. */
  readonly largestPanel: number;
  /** Numbers that the remainders waiting for their parents occupy at most. */
  readonly stack: number;
}

/** Plans the factorisation of every matrix with the pattern of this one. */
export function analyseSymbolic(matrix: SymmetricMatrix): Symbolic {
  return singleFront(matrix);
}

/** All freedoms in one dense front, in the order they come: for a small matrix less work than to look for zeros. */
function singleFront(matrix: SymmetricMatrix): Symbolic {
  const { size, starts, rows } = matrix;
  const order = new Int32Array(size);
  for (let k = 0; k < size; k++) order[k] = k;
  const targets = new Int32Array(rows.length);
  for (let column = 0; column < size; column++) {
    for (let k = starts[column]!; k < starts[column + 1]!; k++) targets[k] = rows[k]! * size + column;
  }
  const none = new Int32Array(0);
  return {
    size,
    order,
    positions: order,
    fronts: 1,
    pivotStarts: Int32Array.of(0, size),
    rowStarts: Int32Array.of(0, 0),
    rows: none,
    places: none,
    parents: Int32Array.of(-1),
    panelStarts: Int32Array.of(0, size * size),
    targets,
    tallest: size,
    largestPanel: size * size,
    stack: 0,
  };
}
