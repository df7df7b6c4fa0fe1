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

/** Column by column, each from the items that its unknown strains. Every diagonal entry is there, be it zero. */
export function assemble(
  rows: StrainRows,
  stiffnesses: Stiffnesses,
  reduction: Reduction,
  points: Int32Array,
): SymmetricMatrix {
  const { size } = reduction;
  const users = findUsers(rows, size);
  const starts = new Int32Array(size + 1);
  const place = new Int32Array(size).fill(-1);
  let capacity = size;
  for (let i = 0; i < rows.count; i++) {
    const terms = rows.starts[i + 1]! - rows.starts[i]!;
    capacity += (terms * (terms + 1)) / 2;
  }
  capacity = Math.min(capacity, (size * (size + 1)) / 2);
  const entryRows = new Int32Array(capacity);
  const values = new Float64Array(capacity);
  let filled = 0;
  for (let column = 0; column < size; column++) {
    // Find the rows of the column, in ascending order.
    const start = filled;
    place[column] = filled;
    entryRows[filled++] = column;
    for (let u = users.starts[column]!; u < users.starts[column + 1]!; u++) {
      const item = users.items[u]!;
      for (let k = rows.starts[item]!; k < rows.starts[item + 1]!; k++) {
        const row = rows.unknowns[k]!;
        if (row <= column || place[row]! >= start) continue;
        place[row] = filled;
        entryRows[filled++] = row;
      }
    }
    const sorted = entryRows.subarray(start, filled);
    if (sorted.length < 32) insertionSort(sorted);
    else sorted.sort();
    for (let k = start; k < filled; k++) place[entryRows[k]!] = k;

    // Add up what each item gives.
    for (let u = users.starts[column]!; u < users.starts[column + 1]!; u++) {
      const item = users.items[u]!;
      const own = users.terms[u]!;
      const length = rows.lengthening[own]! * stiffnesses.axial[item]!;
      const a = rows.startTurning[own]!;
      const b = rows.endTurning[own]!;
      const startMoment = a * stiffnesses.own[item]! + b * stiffnesses.other[item]!;
      const endMoment = b * stiffnesses.own[item]! + a * stiffnesses.other[item]!;
      for (let k = rows.starts[item]!; k < rows.starts[item + 1]!; k++) {
        const row = rows.unknowns[k]!;
        if (row < column) continue;
        values[place[row]!]! +=
          length * rows.lengthening[k]! + startMoment * rows.startTurning[k]! + endMoment * rows.endTurning[k]!;
      }
    }
    starts[column + 1] = filled;
  }
  return { size, starts, rows: entryRows.slice(0, filled), values: values.slice(0, filled), points };
}

/** By unknown: the items that it strains, and its term in each. */
function findUsers(rows: StrainRows, size: number) {
  const terms = rows.starts[rows.count]!;
  const starts = new Int32Array(size + 1);
  for (let k = 0; k < terms; k++) starts[rows.unknowns[k]! + 1]!++;
  for (let unknown = 0; unknown < size; unknown++) starts[unknown + 1]! += starts[unknown]!;
  const next = starts.slice(0, size);
  const items = new Int32Array(terms);
  const places = new Int32Array(terms);
  for (let item = 0; item < rows.count; item++) {
    for (let k = rows.starts[item]!; k < rows.starts[item + 1]!; k++) {
      const at = next[rows.unknowns[k]!]!++;
      items[at] = item;
      places[at] = k;
    }
  }
  return { starts, items, terms: places };
}

function insertionSort(values: Int32Array): void {
  for (let i = 1; i < values.length; i++) {
    const value = values[i]!;
    let k = i;
    while (k > 0 && values[k - 1]! > value) {
      values[k] = values[k - 1]!;
      k--;
    }
    values[k] = value;
  }
}
