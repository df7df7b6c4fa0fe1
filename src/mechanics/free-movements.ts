// The movements that strain nothing: decided by geometry alone, without the stiffnesses, so that neither soft parts nor
// units nor size have a say in it.

import { factorise } from './factorisation.ts';
import { norm, orthonormalise, scatteredVector, separate } from './orthogonal.ts';
import { assemble } from './stiffness.ts';
import type { StrainRows } from './strains.ts';
import type { SymmetricMatrix } from './symmetric-matrix.ts';
import { pointsOf, type System } from './system.ts';

/**
 * A movement is free when the strains it causes, all together, are no larger than this beside the movement itself.
 * Strains count as lengthening over the length of the leg and turning against the chord, each times the size of the
 * structure; rotations count times the size. Both sums are root of squares, so that neither units nor orientation matter.
 *
 * From below: in a free movement strains are rounding, ε × size / length of the shortest leg, some 1e-12 where legs are
 * a ten-thousandth of the structure. From above: the softest movement of a beam of n legs in a row strains about 1 / n, and
 * three hinges that lie off one line by a share h of their distance strain about h. A structure so nearly loose that
 * this is 1e-9 could not be solved in sixteen digits, as its condition is the square.
 */
export const FREE_STRAIN = 1e-9;

/**
 * Whether some unknown moves almost nothing: its stiffness may be rounding, which a matrix scaled to a diagonal of ones
 * does not show. Strains as in `FREE_STRAIN`.
 */
export function hasIdleUnknown(system: System): boolean {
  const { reduction, rows, legs } = system;
  const strains = new Float64Array(reduction.size);
  for (let i = 0; i < rows.count; i++) {
    for (let k = rows.starts[i]!; k < rows.starts[i + 1]!; k++) {
      const unknown = rows.unknowns[k]!;
      const turning = Math.max(Math.abs(rows.startTurning[k]!), Math.abs(rows.endTurning[k]!));
      const arm = isMovement(system, unknown) && i < legs.count ? legs.length[i]! : 1;
      strains[unknown] = Math.max(strains[unknown]!, Math.abs(rows.lengthening[k]!), turning * arm);
    }
  }
  return strains.some(strain => strain < IDLE);
}

/** Far above rounding, far below a leg that is square to a movement. */
const IDLE = 1e-6;

/**
 * Movements outside `known` (by unknown, free themselves) that are free, by unknown; at most about `limit`.
 *
 * v ← v − F⁻¹ S v takes from a scattered vector all that strains, S being the stiffness of unit weights and F its factors
 * with a trace added to the diagonal: what is free stays exactly, and the rest shrinks by the trace over its own
 * stiffness each round. S v comes from the strains themselves, as in iterative refinement, so that rounding in F
 * slows this down but does not falsify it. Several vectors at once are then turned among each other until their
 * strains are independent (Hestenes, Inversion of matrices by biorthogonalization, 1958), which tells the free from the soft.
 */
export function findFreeMovements(system: System, known: readonly Float64Array[], limit: number): Float64Array[] {
  const { reduction, rows, freedoms } = system;
  const { size } = reduction;
  if (known.length >= size) return [];
  const weights = unitWeights(system);
  const scale = new Float64Array(size);
  for (let k = 0; k < size; k++) scale[k] = isMovement(system, k) ? 1 : freedoms.size;
  const matrix = assemble(
    rows,
    { ...weights, other: new Float64Array(rows.count) },
    reduction,
    pointsOf(reduction, freedoms),
  );
  const factorisation = factorise(withTrace(matrix, scale));
  const basis: Float64Array[] = [];
  for (const vector of known) addTo(basis, vector, scale, []);
  const found: Float64Array[] = [];
  const shed = (v: Float64Array, strains: Float64Array) => {
    const strained = factorisation.solve(gatherStrains(rows, weights, strains, size));
    return v.map((value, k) => value - strained[k]!);
  };

  for (let seed = 1; found.length < limit; ) {
    let block: Float64Array[] = [];
    for (let k = 0; k < BLOCK && basis.length + block.length < size; k++) {
      addTo(block, scatteredVector(size, seed++), scale, basis);
    }
    let strains = block.map(v => strainsOf(rows, weights, v));
    for (let round = 0; round < ROUNDS && strains.some(strain => norm(strain) > CLEAN); round++) {
      const next: Float64Array[] = [];
      block.forEach((v, i) => {
        addTo(next, shed(v, strains[i]!), scale, basis);
      });
      block = next;
      strains = block.map(v => strainsOf(rows, weights, v));
    }
    separate(strains, block);
    const free = block.filter((_, k) => norm(strains[k]!) <= FREE_STRAIN);
    found.push(...free);
    basis.push(...free);
    if (free.length === 0 || free.length < block.length) break;
  }
  return found;
}

/** Vectors worked on at once: more than the movements of a chain of ten thousand legs that are too soft to shrink. */
const BLOCK = 8;
const ROUNDS = 5;

/** Strains at which a free movement has shed all that matters to its description. */
const CLEAN = 1e-3 * FREE_STRAIN;

/** Added to the diagonal, relative to it: above the rounding of a factorisation, below the stiffness of what is not free. */
const TRACE = 1e-12;

/** Added at least, as the square of a strain: what strains less must not shrink, as it may count as free. */
const LEAST_TRACE = 1e-14;

/** Adds what of a vector is at right angles to the set and to the others, made of length 1; nothing where that is rounding. */
function addTo(set: Float64Array[], vector: Float64Array, scale: Float64Array, others: readonly Float64Array[]): void {
  const unit = orthonormalise(vector, scale, [...others, ...set]);
  if (unit !== undefined) set.push(unit);
}

function isMovement({ reduction, freedoms }: System, unknown: number): boolean {
  const f = reduction.freedoms[unknown]!;
  return f - freedoms.first[freedoms.point[f]!]! < 2;
}

interface Weights {
  readonly axial: Float64Array;
  readonly own: Float64Array;
}

/** (size / length)² and size² for legs, so that strains are relative; 1 and size² for springs. */
function unitWeights(system: System): Weights {
  const { legs, freedoms, rows } = system;
  const square = freedoms.size * freedoms.size;
  const axial = new Float64Array(rows.count);
  const own = new Float64Array(rows.count);
  for (let e = 0; e < legs.count; e++) {
    if (legs.axial[e] !== Number.POSITIVE_INFINITY) axial[e] = square / (legs.length[e]! * legs.length[e]!);
    if (legs.bending[e] !== 0) own[e] = square;
  }
  freedoms.springs.forEach((spring, k) => {
    axial[legs.count + k] = spring.kind === 'movement' ? 1 : square;
  });
  return { axial, own };
}

function withTrace(matrix: SymmetricMatrix, scale: Float64Array): SymmetricMatrix {
  const values = matrix.values.slice();
  for (let column = 0; column < matrix.size; column++) {
    // The diagonal entry is the first of its column.
    const diagonal = matrix.starts[column]!;
    values[diagonal]! += Math.max(TRACE * values[diagonal]!, LEAST_TRACE * scale[column]! * scale[column]!);
  }
  return { ...matrix, values };
}

/** Three an item, each times the root of its weight. */
function strainsOf(rows: StrainRows, weights: Weights, v: Float64Array): Float64Array {
  const strains = new Float64Array(3 * rows.count);
  for (let i = 0; i < rows.count; i++) {
    let lengthening = 0;
    let start = 0;
    let end = 0;
    for (let k = rows.starts[i]!; k < rows.starts[i + 1]!; k++) {
      const value = v[rows.unknowns[k]!]!;
      lengthening += rows.lengthening[k]! * value;
      start += rows.startTurning[k]! * value;
      end += rows.endTurning[k]! * value;
    }
    strains[3 * i] = lengthening * Math.sqrt(weights.axial[i]!);
    strains[3 * i + 1] = start * Math.sqrt(weights.own[i]!);
    strains[3 * i + 2] = end * Math.sqrt(weights.own[i]!);
  }
  return strains;
}

/** The transpose of `strainsOf`. */
function gatherStrains(rows: StrainRows, weights: Weights, strains: Float64Array, size: number): Float64Array {
  const gathered = new Float64Array(size);
  for (let i = 0; i < rows.count; i++) {
    const lengthening = strains[3 * i]! * Math.sqrt(weights.axial[i]!);
    const start = strains[3 * i + 1]! * Math.sqrt(weights.own[i]!);
    const end = strains[3 * i + 2]! * Math.sqrt(weights.own[i]!);
    for (let k = rows.starts[i]!; k < rows.starts[i + 1]!; k++) {
      gathered[rows.unknowns[k]!]! +=
        rows.lengthening[k]! * lengthening + rows.startTurning[k]! * start + rows.endTurning[k]! * end;
    }
  }
  return gathered;
}
