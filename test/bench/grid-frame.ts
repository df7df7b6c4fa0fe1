// Stiffness matrices of frames of square bays for tests and benchmarks, written entry by entry in closed form and
// apart from the project's own assembly.

import type { SymmetricMatrix } from '../../src/mechanics/symmetric-matrix.ts';

/** Of every member: m, N, N m². */
export const length = 4;
export const axialStiffness = 1.9e9;
export const bendingStiffness = 4.2e7;

/**
 * A frame of storeys × columns joints, three freedoms each (x, y, rotation), Euler-Bernoulli: a beam between neighbours
 * of a storey, a column under every joint. The lowest columns stand in fixed bases, or there are none (a floating frame).
 */
export function gridFrame(storeys: number, columns: number, bases: 'fixed' | 'none' = 'fixed'): SymmetricMatrix {
  const size = 3 * storeys * columns;
  const entries = Array.from({ length: size }, () => new Map<number, number>());
  const add = (row: number, column: number, value: number) => {
    if (row < column || value === 0) return;
    const entry = entries[column]!;
    entry.set(row, (entry.get(row) ?? 0) + value);
  };
  const addElement = (from: number, to: number, block: readonly (readonly number[])[]) => {
    const freedoms = [0, 1, 2].map(k => from + k).concat([0, 1, 2].map(k => to + k));
    for (let i = 0; i < 6; i++) {
      // Freedoms below 0 are those of a base.
      if (freedoms[i]! < 0) continue;
      for (let j = 0; j < 6; j++) if (freedoms[j]! >= 0) add(freedoms[i]!, freedoms[j]!, block[i]![j]!);
    }
  };
  const beam = element(1, 0);
  const column = element(0, 1);
  for (let storey = 0; storey < storeys; storey++) {
    for (let bay = 0; bay < columns; bay++) {
      const joint = 3 * (storey * columns + bay);
      if (storey > 0) addElement(joint - 3 * columns, joint, column);
      else if (bases === 'fixed') addElement(-3, joint, column);
      if (bay > 0) addElement(joint - 3, joint, beam);
    }
  }
  return fromColumns(entries, 3);
}

/** A matrix from the entries of its lower triangle, column by column; as many freedoms a point as told. */
export function fromColumns(
  columns: readonly ReadonlyMap<number, number>[],
  freedomsPerPoint: number,
): SymmetricMatrix {
  const starts = new Int32Array(columns.length + 1);
  const rows: number[] = [];
  const values: number[] = [];
  for (const [column, entries] of columns.entries()) {
    for (const [row, value] of [...entries].sort((a, b) => a[0] - b[0])) {
      rows.push(row);
      values.push(value);
    }
    starts[column + 1] = rows.length;
  }
  return {
    size: columns.length,
    starts,
    rows: Int32Array.from(rows),
    values: Float64Array.from(values),
    points: Int32Array.from(columns, (_, freedom) => Math.floor(freedom / freedomsPerPoint)),
  };
}

/** The stiffness of one element along (cosine, sine), in global axes: x, y, rotation of its start, then of its end. */
function element(cosine: number, sine: number): number[][] {
  const a = axialStiffness / length;
  const b = (12 * bendingStiffness) / length ** 3;
  const c = (6 * bendingStiffness) / length ** 2;
  const d = (4 * bendingStiffness) / length;
  const xx = a * cosine ** 2 + b * sine ** 2;
  const yy = a * sine ** 2 + b * cosine ** 2;
  const xy = (a - b) * cosine * sine;
  const xr = -c * sine;
  const yr = c * cosine;
  return [
    [xx, xy, xr, -xx, -xy, xr],
    [xy, yy, yr, -xy, -yy, yr],
    [xr, yr, d, -xr, -yr, d / 2],
    [-xx, -xy, -xr, xx, xy, -xr],
    [-xy, -yy, -yr, xy, yy, -yr],
    [xr, yr, d / 2, -xr, -yr, d],
  ];
}
