// Solving with an eliminated set of equilibrium equations: forces for loads, states of self-balance for redundants, and,
// the other way about, movements for strains.
import type { Elimination } from './elimination.ts';

/**
 * Balances `load` (by rows; used up) with the columns kept: kept · x + load = 0. Adds x, by columns, to `result`.
 * The elimination must have full rank.
 */
export function balance(elimination: Elimination, load: Float64Array, result: Float64Array): void {
  const { rank, rowOfPivot, lower } = elimination;
  const { starts, indices, values } = lower;
  for (let pivot = 0; pivot < rank; pivot++) {
    const factor = load[rowOfPivot[pivot]!]!;
    if (factor === 0) continue;
    const end = starts[pivot + 1]!;
    for (let entry = starts[pivot]!; entry < end; entry++) load[indices[entry]!]! -= factor * values[entry]!;
  }
  substituteBack(elimination, load, rank, result);
}

/**
 * Adds to `result`, by columns, the state of self-balance that holds one unit of redundant number `index` and none of
 * the others. `scratch`, by rows, must be zero, and is so again afterwards.
 */
export function selfBalance(
  elimination: Elimination,
  index: number,
  scratch: Float64Array,
  result: Float64Array,
): void {
  const { rowOfPivot, redundants, redundant } = elimination;
  let end = 0;
  for (let entry = redundant.starts[index]!; entry < redundant.starts[index + 1]!; entry++) {
    const pivot = redundant.indices[entry]!;
    scratch[rowOfPivot[pivot]!] = redundant.values[entry]!;
    end = Math.max(end, pivot + 1);
  }
  result[redundants[index]!]! += 1;
  substituteBack(elimination, scratch, end, result);
}

/**
 * The other way about: the movements u, by rows, that give each column kept the strain that `strains` has for it,
 * keptᵀ · u = strain.
 */
export function movementsFrom(elimination: Elimination, strains: Float64Array): Float64Array {
  const { rank, rowCount, rowOfPivot, columnOfPivot, pivots, lower, upper } = elimination;
  const movements = new Float64Array(rowCount);
  for (let pivot = 0; pivot < rank; pivot++) {
    let sum = strains[columnOfPivot[pivot]!]!;
    for (let entry = upper.starts[pivot]!; entry < upper.starts[pivot + 1]!; entry++) {
      sum -= upper.values[entry]! * movements[rowOfPivot[upper.indices[entry]!]!]!;
    }
    movements[rowOfPivot[pivot]!] = sum / pivots[pivot]!;
  }
  for (let pivot = rank - 1; pivot >= 0; pivot--) {
    let sum = movements[rowOfPivot[pivot]!]!;
    for (let entry = lower.starts[pivot]!; entry < lower.starts[pivot + 1]!; entry++) {
      sum -= lower.values[entry]! * movements[lower.indices[entry]!]!;
    }
    movements[rowOfPivot[pivot]!] = sum;
  }
  return movements;
}

/** Of the pivots before `end`; leaves `load` zero at their rows. */
function substituteBack(elimination: Elimination, load: Float64Array, end: number, result: Float64Array): void {
  const { rowOfPivot, columnOfPivot, pivots, upper } = elimination;
  const { starts, indices, values } = upper;
  for (let pivot = end - 1; pivot >= 0; pivot--) {
    const row = rowOfPivot[pivot]!;
    const factor = load[row]!;
    if (factor === 0) continue;
    load[row] = 0;
    const value = -factor / pivots[pivot]!;
    result[columnOfPivot[pivot]!]! += value;
    for (let entry = starts[pivot]!; entry < starts[pivot + 1]!; entry++) {
      load[rowOfPivot[indices[entry]!]!]! += value * values[entry]!;
    }
  }
}
