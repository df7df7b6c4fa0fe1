// Sparse LDLᵀ of a stiffness matrix: the numbers, front by front as the symbolic plan lays them out. What freedoms of no
// stiffness mean for the structure is left to others; here they are marked, and the rest is solved without them.

import { eliminate, updateRemainder } from './dense-front.ts';
import { analyseSymbolic, type Symbolic } from './symbolic.ts';
import type { SymmetricMatrix } from './symmetric-matrix.ts';
import { type Factors, solveBackward, substitute } from './triangular-solve.ts';

/**
 * The factorisation of a symmetric matrix. Pivots are those of the matrix scaled to a diagonal of ones, so that in a
 * positive definite matrix each lies between 0 and 1 and tells how much of a freedom's own stiffness is left when the
 * freedoms eliminated before it move as they like.
 */
export class Factorisation {
  readonly size: number;
  readonly factors: Factors;
  /** A pivot of this size or less counts as zero. */
  readonly tolerance: number;
  /** Of all pivots, singular ones included, sign kept; 1 for an empty matrix. */
  readonly smallestPivot: number;
  readonly largestPivot: number;
  /** Pivots below −tolerance; none in a stiffness matrix whose stiffnesses are all positive. */
  readonly negativePivots: number;
  /** Freedoms with a singular pivot, in the order of elimination. A structure may be free although there are none. */
  readonly singular: Int32Array;

  constructor(factors: Factors, tolerance: number) {
    this.factors = factors;
    this.tolerance = tolerance;
    const { pivots, symbolic } = factors;
    this.size = symbolic.size;
    let smallest = pivots.length === 0 ? 1 : Number.POSITIVE_INFINITY;
    let largest = pivots.length === 0 ? 1 : Number.NEGATIVE_INFINITY;
    let negative = 0;
    const singular: number[] = [];
    for (let position = 0; position < pivots.length; position++) {
      const pivot = pivots[position]!;
      if (pivot < smallest) smallest = pivot;
      if (pivot > largest) largest = pivot;
      if (!(Math.abs(pivot) > tolerance)) singular.push(symbolic.order[position]!);
      else if (pivot < 0) negative++;
    }
    this.smallestPivot = smallest;
    this.largestPivot = largest;
    this.negativePivots = negative;
    this.singular = Int32Array.from(singular);
  }

  /** The pivot met when this freedom was eliminated. */
  pivotOf(freedom: number): number {
    return this.factors.pivots[this.factors.symbolic.positions[freedom]!]!;
  }

  /**
   * Solves matrix × x = rhs, for one right side or for several, one after the other in the array. A singular freedom is
   * held: its x is 0, and what stands on its right side goes unanswered.
   */
  solve(rhs: Float64Array): Float64Array {
    const { factors, size } = this;
    const { order } = factors.symbolic;
    const { scale } = factors;
    const count = rhs.length === 0 ? 0 : rhs.length / size;
    if (!Number.isInteger(count)) {
      throw new Error(`A right side of ${rhs.length} numbers does not fit a matrix of ${size} rows`);
    }
    const x = new Float64Array(rhs.length);
    for (let start = 0; start < x.length; start += size) {
      for (let k = 0; k < size; k++) x[start + k] = rhs[start + order[k]!]! * scale[order[k]!]!;
    }
    substitute(factors, x, count);
    const result = new Float64Array(rhs.length);
    for (let start = 0; start < x.length; start += size) {
      for (let k = 0; k < size; k++) result[start + order[k]!] = x[start + k]! * scale[order[k]!]!;
    }
    return result;
  }

  /**
   * How the structure moves when a singular freedom moves by 1: no other singular freedom moves, and the freedoms
   * eliminated before follow without resistance. Multiplied by the matrix it gives 0, but for rounding and for what
   * the singular pivot was short of zero.
   */
  movementOf(singularFreedom: number): Float64Array {
    const { symbolic, scale } = this.factors;
    const { order, positions } = symbolic;
    const x = new Float64Array(this.size);
    x[positions[singularFreedom]!] = 1;
    solveBackward(this.factors, x, 1);
    const result = new Float64Array(this.size);
    const unit = 1 / scale[singularFreedom]!;
    for (let k = 0; k < this.size; k++) result[order[k]!] = x[k]! * scale[order[k]!]! * unit;
    return result;
  }
}

/**
 * The size up to which a pivot of the scaled matrix counts as zero.
 *
 * A pivot is 1 less a sum of terms l²d, none negative and together at most 1, so that each addition errs by at most
 * half of ε. In one front there are at most as many terms as the front is tall; between fronts sums are added up pair
 * by pair, which the 8 allows for. A pivot that is exactly 0 thus comes out no larger than this where the free movement
 * is about even. Where it is larger by a factor at other freedoms than at the one met last, the rounding of the pivot
 * grows with its square: a frame of 100 × 100 joints that floats ends in pivots of 1e-7. So a small pivot shows that
 * something is free, and none shows that nothing is; that is for `nullSpace` to say.
 */
export function pivotTolerance(symbolic: Symbolic): number {
  return (8 + symbolic.tallest) * Number.EPSILON;
}

/** Factorises a matrix of finite numbers; a plan made for the same pattern is used when given. */
export function factorise(matrix: SymmetricMatrix, symbolic: Symbolic = analyseSymbolic(matrix)): Factorisation {
  const tolerance = pivotTolerance(symbolic);
  const scale = unitDiagonalScale(matrix);
  const panels = assemblePanels(matrix, symbolic, scale);
  const pivots = new Float64Array(symbolic.size);
  const inverses = new Float64Array(symbolic.size);
  eliminateFronts(symbolic, panels, pivots, inverses, tolerance);
  return new Factorisation({ symbolic, panels, pivots, inverses, scale }, tolerance);
}

function unitDiagonalScale(matrix: SymmetricMatrix): Float64Array {
  const { size, starts, rows, values } = matrix;
  const scale = new Float64Array(size);
  for (let column = 0; column < size; column++) {
    // The diagonal, if there is one, is the first entry of its column.
    const first = starts[column]!;
    const diagonal = first < starts[column + 1]! && rows[first] === column ? Math.abs(values[first]!) : 0;
    scale[column] = diagonal > 0 ? 1 / Math.sqrt(diagonal) : 1;
  }
  return scale;
}

function assemblePanels(matrix: SymmetricMatrix, symbolic: Symbolic, scale: Float64Array): Float64Array {
  const { size, starts, rows, values } = matrix;
  const { targets } = symbolic;
  const panels = new Float64Array(symbolic.panelStarts[symbolic.fronts]!);
  for (let column = 0; column < size; column++) {
    const columnScale = scale[column]!;
    for (let k = starts[column]!; k < starts[column + 1]!; k++) {
      panels[targets[k]!]! += values[k]! * columnScale * scale[rows[k]!]!;
    }
  }
  return panels;
}

function eliminateFronts(
  symbolic: Symbolic,
  panels: Float64Array,
  pivots: Float64Array,
  inverses: Float64Array,
  tolerance: number,
): void {
  const { fronts, pivotStarts, panelStarts, rowStarts, places, parents } = symbolic;
  const scaled = new Float64Array(symbolic.largestPanel);
  // The remainders of fronts whose parent is still to come, the latest on top, each a packed lower triangle.
  const stack = new Float64Array(symbolic.stack);
  const waiting = new Int32Array(fronts);
  let waitingCount = 0;
  let top = 0;
  for (let front = 0; front < fronts; front++) {
    const first = pivotStarts[front]!;
    const width = pivotStarts[front + 1]! - first;
    const start = panelStarts[front]!;
    const size = rowStarts[front + 1]! - rowStarts[front]!;
    const length = (size * (size + 1)) / 2;

    // Add up what the children left; they are the latest on the stack.
    let bottom = top;
    stack.fill(0, top, top + length);
    while (waitingCount > 0 && parents[waiting[waitingCount - 1]!] === front) {
      const child = waiting[--waitingCount]!;
      const childSize = rowStarts[child + 1]! - rowStarts[child]!;
      bottom -= (childSize * (childSize + 1)) / 2;
      addRemainder(stack, bottom, places, rowStarts[child]!, childSize, panels, start, width, top);
    }

    const panel = { values: panels, start, height: width + size, width };
    eliminate(panel, scaled, pivots, inverses, first, tolerance);
    if (size === 0) {
      top = bottom;
      continue;
    }
    updateRemainder(panel, scaled, stack, top);
    if (bottom < top) stack.copyWithin(bottom, top, top + length);
    top = bottom + length;
    waiting[waitingCount++] = front;
  }
}

/** Adds the remainder of a child, at `from` on the stack, to its parent: to the panel, and to the remainder at `to`. */
function addRemainder(
  stack: Float64Array,
  from: number,
  places: Int32Array,
  placeStart: number,
  size: number,
  panels: Float64Array,
  panelStart: number,
  width: number,
  to: number,
): void {
  let inPanel = 0;
  while (inPanel < size && places[placeStart + inPanel]! < width) inPanel++;
  let source = from;
  for (let i = 0; i < size; i++) {
    const place = places[placeStart + i]!;
    const panelRow = panelStart + place * width;
    const shared = i < inPanel ? i + 1 : inPanel;
    for (let j = 0; j < shared; j++) panels[panelRow + places[placeStart + j]!]! += stack[source++]!;
    if (i < inPanel) continue;
    const row = place - width;
    const remainderRow = to + (row * (row + 1)) / 2 - width;
    for (let j = inPanel; j <= i; j++) stack[remainderRow + places[placeStart + j]!]! += stack[source++]!;
  }
}
