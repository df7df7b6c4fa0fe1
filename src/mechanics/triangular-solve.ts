// Substitution with the factors: L x = b forwards and Lᵀ x = b backwards, for several right sides at once, so that each
// number of L is fetched once for all of them.

import type { Symbolic } from './symbolic.ts';

/** The factors of a matrix that is scaled to a diagonal of ones. */
export interface Factors {
  readonly symbolic: Symbolic;
  /** L, panel by panel; its unit diagonal is not stored. */
  readonly panels: Float64Array;
  /** D by positions of elimination, as found; singular pivots included. */
  readonly pivots: Float64Array;
  /** 1 / D, 0 where the pivot is singular. */
  readonly inverses: Float64Array;
  /** By freedoms: 1 / √|diagonal|, 1 where the diagonal is 0. The factorised matrix is scale × matrix × scale. */
  readonly scale: Float64Array;
}

/** Replaces each right side, in positions of elimination and one after the other, by the solution of L D Lᵀ x = b. */
export function substitute(factors: Factors, x: Float64Array, count: number): void {
  const { inverses } = factors;
  solveForward(factors, x, count);
  for (let k = 0; k < x.length; k++) x[k]! *= inverses[k % inverses.length]!;
  solveBackward(factors, x, count);
}

function solveForward(factors: Factors, x: Float64Array, count: number): void {
  const { symbolic, panels } = factors;
  const { size, fronts, pivotStarts, panelStarts, rowStarts, rows } = symbolic;
  for (let front = 0; front < fronts; front++) {
    const first = pivotStarts[front]!;
    const width = pivotStarts[front + 1]! - first;
    for (let side = 0; side < count; side++) {
      const base = side * size;
      const pivots = base + first;
      let at = panelStarts[front]!;
      for (let i = 0; i < width; i++, at += width) {
        let sum = 0;
        for (let t = 0; t < i; t++) sum += panels[at + t]! * x[pivots + t]!;
        x[pivots + i]! -= sum;
      }
      for (let r = rowStarts[front]!; r < rowStarts[front + 1]!; r++, at += width) {
        let sum = 0;
        for (let t = 0; t < width; t++) sum += panels[at + t]! * x[pivots + t]!;
        x[base + rows[r]!]! -= sum;
      }
    }
  }
}

/** Replaces each right side, in positions of elimination and one after the other, by the solution of Lᵀ x = b. */
export function solveBackward(factors: Factors, x: Float64Array, count: number): void {
  const { symbolic, panels } = factors;
  const { size, fronts, pivotStarts, panelStarts, rowStarts, rows } = symbolic;
  for (let front = fronts - 1; front >= 0; front--) {
    const first = pivotStarts[front]!;
    const width = pivotStarts[front + 1]! - first;
    for (let side = 0; side < count; side++) {
      const base = side * size;
      const pivots = base + first;
      let at = panelStarts[front]! + width * width;
      for (let r = rowStarts[front]!; r < rowStarts[front + 1]!; r++, at += width) {
        const value = x[base + rows[r]!]!;
        for (let t = 0; t < width; t++) x[pivots + t]! -= panels[at + t]! * value;
      }
      for (let i = width - 1; i > 0; i--) {
        const value = x[pivots + i]!;
        const row = panelStarts[front]! + i * width;
        for (let t = 0; t < i; t++) x[pivots + t]! -= panels[row + t]! * value;
      }
    }
  }
}
