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
  for (let base = 0; base < x.length; base += inverses.length) {
    for (let k = 0; k < inverses.length; k++) x[base + k]! *= inverses[k]!;
  }
  solveBackward(factors, x, count);
}

/** Replaces each right side, in positions of elimination and one after the other, by the solution of Lᵀ x = b. */
export function solveBackward(factors: Factors, x: Float64Array, count: number): void {
  const { symbolic, panels } = factors;
  const { size, fronts, pivotStarts, panelStarts, rowStarts, rows } = symbolic;
  for (let front = fronts - 1; front >= 0; front--) {
    const first = pivotStarts[front]!;
    const width = pivotStarts[front + 1]! - first;
    const start = panelStarts[front]!;
    const rowsEnd = rowStarts[front + 1]!;
    for (let side = 0; side < count; side++) {
      const base = side * size;
      const pivots = base + first;
      let at = start + width * width;
      let r = rowStarts[front]!;
      // Three rows at a time, so that every unknown is fetched and put back once for three.
      for (; r + 3 <= rowsEnd; r += 3, at += 3 * width) {
        const x0 = x[base + rows[r]!]!;
        const x1 = x[base + rows[r + 1]!]!;
        const x2 = x[base + rows[r + 2]!]!;
        const at1 = at + width;
        const at2 = at1 + width;
        for (let t = 0; t < width; t++) {
          x[pivots + t]! -= panels[at + t]! * x0 + panels[at1 + t]! * x1 + panels[at2 + t]! * x2;
        }
      }
      for (; r < rowsEnd; r++, at += width) {
        const value = x[base + rows[r]!]!;
        for (let t = 0; t < width; t++) x[pivots + t]! -= panels[at + t]! * value;
      }
      for (let i = width - 1; i > 0; i--) {
        const value = x[pivots + i]!;
        const row = start + i * width;
        for (let t = 0; t < i; t++) x[pivots + t]! -= panels[row + t]! * value;
      }
    }
  }
}

/** Replaces each right side by the solution of L x = b. */
function solveForward(factors: Factors, x: Float64Array, count: number): void {
  const { symbolic, panels } = factors;
  const { size, fronts, pivotStarts, panelStarts, rowStarts, rows } = symbolic;
  for (let front = 0; front < fronts; front++) {
    const first = pivotStarts[front]!;
    const width = pivotStarts[front + 1]! - first;
    const rowsEnd = rowStarts[front + 1]!;
    for (let side = 0; side < count; side++) {
      const base = side * size;
      const pivots = base + first;
      let at = panelStarts[front]!;
      for (let i = 0; i < width; i++, at += width) {
        let sum = 0;
        for (let t = 0; t < i; t++) sum += panels[at + t]! * x[pivots + t]!;
        x[pivots + i]! -= sum;
      }
      let r = rowStarts[front]!;
      for (; r + 3 <= rowsEnd; r += 3, at += 3 * width) {
        const at1 = at + width;
        const at2 = at1 + width;
        let sum0 = 0;
        let sum1 = 0;
        let sum2 = 0;
        for (let t = 0; t < width; t++) {
          const value = x[pivots + t]!;
          sum0 += panels[at + t]! * value;
          sum1 += panels[at1 + t]! * value;
          sum2 += panels[at2 + t]! * value;
        }
        x[base + rows[r]!]! -= sum0;
        x[base + rows[r + 1]!]! -= sum1;
        x[base + rows[r + 2]!]! -= sum2;
      }
      for (; r < rowsEnd; r++, at += width) {
        let sum = 0;
        for (let t = 0; t < width; t++) sum += panels[at + t]! * x[pivots + t]!;
        x[base + rows[r]!]! -= sum;
      }
    }
  }
}
