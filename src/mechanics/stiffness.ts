// Assembly: the sparse symmetric matrix of a sum of squares of strains, each with its stiffness.

import type { Reduction } from './reduction.ts';
import type { StrainRows } from './strains.ts';
import type { SymmetricMatrix } from './symmetric-matrix.ts';

/**
 * What an item answers strains with: `axial` for its lengthening; `own` for the turning of an end at that end, `other` for
 * the turning of the other end. By item.
 */
export interface Stiffnesses {
  readonly axial: Float64Array;
  readonly own: Float64Array;
  readonly other: Float64Array;
}

/**
 * Row by row, so that every column gets its rows in ascending order: once to count them, once to fill them. Every diagonal
 * entry is there, be it zero.
 */
export function assemble(
  rows: StrainRows,
  stiffnesses: Stiffnesses,
  reduction: Reduction,
  points: Int32Array,
): SymmetricMatrix {
  const { size } = reduction;
  const users = findUsers(rows, size);
  const starts = countEntries(rows, users, size);
  const entryRows = new Int32Array(starts[size]!);
  const values = new Float64Array(starts[size]!);
  const next = starts.slice(0, size);
  for (let row = 0; row < size; row++) {
    entryRows[next[row]!++] = row;
    for (let u = users.starts[row]!; u < users.starts[row + 1]!; u++) {
      const item = users.items[u]!;
      const own = users.terms[u]!;
      const length = rows.lengthening[own]! * stiffnesses.axial[item]!;
      const a = rows.startTurning[own]!;
      const b = rows.endTurning[own]!;
      const startMoment = a * stiffnesses.own[item]! + b * stiffnesses.other[item]!;
      const endMoment = b * stiffnesses.own[item]! + a * stiffnesses.other[item]!;
      for (let k = rows.starts[item]!; k < rows.starts[item + 1]!; k++) {
        const column = rows.unknowns[k]!;
        if (column > row) continue;
        // The latest entry of the column is that of this row, if it has one already.
        let place = next[column]! - 1;
        if (place < starts[column]! || entryRows[place] !== row) {
          place = next[column]!++;
          entryRows[place] = row;
        }
        values[place]! +=
          length * rows.lengthening[k]! + startMoment * rows.startTurning[k]! + endMoment * rows.endTurning[k]!;
      }
    }
  }
  return { size, starts, rows: entryRows, values, points };
}

/** By unknown: the items that it strains, and its term in each. */
interface Users {
  readonly starts: Int32Array;
  readonly items: Int32Array;
  readonly terms: Int32Array;
}

function findUsers(rows: StrainRows, size: number): Users {
  const count = rows.starts[rows.count]!;
  const starts = new Int32Array(size + 1);
  for (let k = 0; k < count; k++) starts[rows.unknowns[k]! + 1]!++;
  for (let unknown = 0; unknown < size; unknown++) starts[unknown + 1]! += starts[unknown]!;
  const next = starts.slice(0, size);
  const items = new Int32Array(count);
  const terms = new Int32Array(count);
  for (let item = 0; item < rows.count; item++) {
    for (let k = rows.starts[item]!; k < rows.starts[item + 1]!; k++) {
      const at = next[rows.unknowns[k]!]!++;
      items[at] = item;
      terms[at] = k;
    }
  }
  return { starts, items, terms };
}

/** Where each column starts; size + 1. */
function countEntries(rows: StrainRows, users: Users, size: number): Int32Array {
  const starts = new Int32Array(size + 1);
  const latest = new Int32Array(size).fill(-1);
  for (let row = 0; row < size; row++) {
    latest[row] = row;
    starts[row + 1]!++;
    for (let u = users.starts[row]!; u < users.starts[row + 1]!; u++) {
      const item = users.items[u]!;
      for (let k = rows.starts[item]!; k < rows.starts[item + 1]!; k++) {
        const column = rows.unknowns[k]!;
        if (column >= row || latest[column] === row) continue;
        latest[column] = row;
        starts[column + 1]!++;
      }
    }
  }
  for (let column = 0; column < size; column++) starts[column + 1]! += starts[column]!;
  return starts;
}
