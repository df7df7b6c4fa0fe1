// The symbolic half of the factorisation: which freedoms are eliminated together, in which order, and where every
// number will stand. It depends on the pattern of the matrix only, and serves every matrix of that pattern.

import { amalgamate, type Fronts } from './amalgamation.ts';
import { type EliminationTree, eliminationTree, inverse } from './elimination-tree.ts';
import { minimumDegree } from './minimum-degree.ts';
import { freedomsInOrder } from './ordering.ts';
import { type PointGraph, pointGraph } from './point-graph.ts';
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
  /** Number of fronts; the descendants of a front come right before it. */
  readonly fronts: number;
  /** Front f eliminates the positions from `pivotStarts[f]` up to `pivotStarts[f + 1]`. */
  readonly pivotStarts: Int32Array;
  /** The positions that front f reaches beyond its pivots, ascending: `rows[rowStarts[f]]` up to `rows[rowStarts[f + 1]]`. */
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

/** Up to this size one dense front is less work than looking for zeros. */
const smallSize = 60;

/** Plans the factorisation of every matrix with the pattern of this one. */
export function analyseSymbolic(matrix: SymmetricMatrix): Symbolic {
  return matrix.size <= smallSize ? singleFront(matrix) : severalFronts(matrix);
}

/** All freedoms in one dense front, in the order they come. */
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

function severalFronts(matrix: SymmetricMatrix): Symbolic {
  const graph = pointGraph(matrix);
  const tree = eliminationTree(graph, minimumDegree(graph));
  const weights = tree.order.map(node => graph.freedoms[node + 1]! - graph.freedoms[node]!);
  const fronts = amalgamate(tree, weights);
  const nodeOrder = gathered(tree, fronts);
  const order = freedomsInOrder(graph, nodeOrder);
  const positions = inverse(order);
  const pivotStarts = runningSum(fronts.pivots);
  const rowStarts = runningSum(fronts.reach);
  const panelStarts = runningSum(fronts.pivots.map((width, front) => width * (width + fronts.reach[front]!)));
  const rows = rowsOf(graph, nodeOrder, fronts, positions, rowStarts, pivotStarts);
  let tallest = 0;
  let largestPanel = 0;
  for (let front = 0; front < fronts.count; front++) {
    tallest = Math.max(tallest, fronts.pivots[front]! + fronts.reach[front]!);
    largestPanel = Math.max(largestPanel, panelStarts[front + 1]! - panelStarts[front]!);
  }
  return {
    size: matrix.size,
    order,
    positions,
    fronts: fronts.count,
    pivotStarts,
    rowStarts,
    rows,
    places: placesOf(fronts, pivotStarts, rowStarts, rows),
    parents: fronts.parents,
    panelStarts,
    targets: targetsOf(matrix, positions, fronts, pivotStarts, rowStarts, rows, panelStarts),
    tallest,
    largestPanel,
    stack: stackOf(fronts),
  };
}

/** The nodes front by front, those of one front in the order of the tree. */
function gathered(tree: EliminationTree, fronts: Fronts): Int32Array {
  const counts = new Int32Array(fronts.count);
  for (const front of fronts.frontOf) counts[front]!++;
  const next = runningSum(counts);
  const order = new Int32Array(tree.order.length);
  for (let k = 0; k < order.length; k++) order[next[fronts.frontOf[k]!]!++] = tree.order[k]!;
  return order;
}

/** Sums of all before: one more than there are numbers, the last being the sum of all. */
function runningSum(numbers: Int32Array): Int32Array {
  const sums = new Int32Array(numbers.length + 1);
  for (let k = 0; k < numbers.length; k++) sums[k + 1] = sums[k]! + numbers[k]!;
  return sums;
}

/**
 * The rows of every front. Node after node walks up the fronts from its neighbours before it to its own, and is a row
 * of all that it passes; so the rows come out in ascending order.
 */
function rowsOf(
  graph: PointGraph,
  nodeOrder: Int32Array,
  fronts: Fronts,
  positions: Int32Array,
  rowStarts: Int32Array,
  pivotStarts: Int32Array,
): Int32Array {
  const frontAt = frontsOfNodes(graph, nodeOrder, pivotStarts);
  const rows = new Int32Array(rowStarts[fronts.count]!);
  const next = rowStarts.slice();
  const passed = new Int32Array(fronts.count).fill(-1);
  for (const node of nodeOrder) {
    const own = frontAt[node]!;
    const first = positions[graph.freedoms[node]!]!;
    const count = graph.freedoms[node + 1]! - graph.freedoms[node]!;
    passed[own] = node;
    for (let m = graph.starts[node]!; m < graph.starts[node + 1]!; m++) {
      let front = frontAt[graph.neighbours[m]!]!;
      if (front > own) continue;
      for (; passed[front] !== node; front = fronts.parents[front]!) {
        passed[front] = node;
        let at = next[front]!;
        for (let k = 0; k < count; k++) rows[at++] = first + k;
        next[front] = at;
      }
    }
  }
  return rows;
}

/** By nodes of the graph: the front that eliminates it. */
function frontsOfNodes(graph: PointGraph, nodeOrder: Int32Array, pivotStarts: Int32Array): Int32Array {
  const result = new Int32Array(nodeOrder.length);
  let front = 0;
  let position = 0;
  for (const node of nodeOrder) {
    while (position >= pivotStarts[front + 1]!) front++;
    result[node] = front;
    position += graph.freedoms[node + 1]! - graph.freedoms[node]!;
  }
  return result;
}

/** Every row of a front is a pivot of its parent or a row of it; both lists ascend, so one pass finds them all. */
function placesOf(fronts: Fronts, pivotStarts: Int32Array, rowStarts: Int32Array, rows: Int32Array): Int32Array {
  const places = new Int32Array(rows.length);
  for (let front = 0; front < fronts.count; front++) {
    const parent = fronts.parents[front]!;
    if (parent < 0) continue;
    const firstPivot = pivotStarts[parent]!;
    const afterPivots = pivotStarts[parent + 1]!;
    const offset = afterPivots - firstPivot - rowStarts[parent]!;
    let at = rowStarts[parent]!;
    for (let k = rowStarts[front]!; k < rowStarts[front + 1]!; k++) {
      const row = rows[k]!;
      if (row < afterPivots) {
        places[k] = row - firstPivot;
        continue;
      }
      while (rows[at]! < row) at++;
      places[k] = at + offset;
    }
  }
  return places;
}

/** Every entry belongs to the front that eliminates the earlier of its two freedoms. */
function targetsOf(
  matrix: SymmetricMatrix,
  positions: Int32Array,
  fronts: Fronts,
  pivotStarts: Int32Array,
  rowStarts: Int32Array,
  rows: Int32Array,
  panelStarts: Int32Array,
): Int32Array {
  const frontAt = new Int32Array(matrix.size);
  for (let front = 0; front < fronts.count; front++) frontAt.fill(front, pivotStarts[front]!, pivotStarts[front + 1]!);
  const targets = new Int32Array(matrix.rows.length);
  // The place of a row in a front, kept from one entry to the next: neighbouring entries often share it.
  let front = -1;
  let later = -1;
  let place = -1;
  for (let column = 0; column < matrix.size; column++) {
    const columnPosition = positions[column]!;
    for (let k = matrix.starts[column]!; k < matrix.starts[column + 1]!; k++) {
      const rowPosition = positions[matrix.rows[k]!]!;
      const pivot = Math.min(rowPosition, columnPosition);
      const row = Math.max(rowPosition, columnPosition);
      if (frontAt[pivot]! !== front || row !== later) {
        front = frontAt[pivot]!;
        later = row;
        const width = pivotStarts[front + 1]! - pivotStarts[front]!;
        place =
          row < pivotStarts[front + 1]!
            ? row - pivotStarts[front]!
            : width + indexOf(rows, rowStarts[front]!, rowStarts[front + 1]!, row) - rowStarts[front]!;
      }
      const first = pivotStarts[front]!;
      targets[k] = panelStarts[front]! + place * (pivotStarts[front + 1]! - first) + pivot - first;
    }
  }
  return targets;
}

/** Where a number stands that is known to be in an ascending stretch of an array. */
function indexOf(ascending: Int32Array, start: number, end: number, sought: number): number {
  let low = start;
  let high = end - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (ascending[middle]! < sought) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** The remainder of a front stands on those of its children until they are added up, then takes their place. */
function stackOf(fronts: Fronts): number {
  const waiting = new Float64Array(fronts.count);
  let top = 0;
  let highest = 0;
  for (let front = 0; front < fronts.count; front++) {
    const own = (fronts.reach[front]! * (fronts.reach[front]! + 1)) / 2;
    highest = Math.max(highest, top + own);
    top += own - waiting[front]!;
    const parent = fronts.parents[front]!;
    if (parent >= 0) waiting[parent]! += own;
  }
  return highest;
}
