// The axial forces of axially stiff legs, which no stiffness gives: they follow from the equilibrium of the points and,
// where that leaves them open, are those of legs that all have one and the same large EA.

import { type Factorisation, factorise } from './factorisation.ts';
import type { Freedoms } from './freedoms.ts';
import { keepsLength, type Legs } from './legs.ts';
import { expand, gather, type Reduction } from './reduction.ts';
import { assemble } from './stiffness.ts';
import { addStrains, type Ends, strainRows, subtractForces } from './strains.ts';

export interface Thrusts {
  /** By leg: 1 / length where axially stiff, else 0. */
  readonly weights: Float64Array;
  /** The movements of the stiff legs' ends, as unknowns of their own. */
  readonly reduction: Reduction;
  readonly factorisation: Factorisation;
}

/**
 * Of all forces N in equilibrium with what the rest of the structure leaves on the points, those of equal EA have the least
 * Σ N² L (Castigliano): they are N = lengthening / L of a framework of the stiff legs alone, EA = 1, under these loads.
 * Its stiffness matrix is singular as a rule; the loads have no part in what it leaves free, as they are balanced there.
 */
export function prepareThrusts(legs: Legs, ends: Ends, freedoms: Freedoms): Thrusts | undefined {
  if (!legs.axial.includes(Number.POSITIVE_INFINITY)) return undefined;
  const count = legs.count + freedoms.springs.length;
  const weights = new Float64Array(count);
  for (let e = 0; e < legs.count; e++) {
    if (keepsLength(legs, e)) weights[e] = 1 / legs.length[e]!;
  }
  const reduction = movementsOfStiffLegs(legs, freedoms, weights);
  const none = new Float64Array(count);
  const rows = strainRows(legs, ends, freedoms, reduction);
  const points = reduction.freedoms.map(freedom => freedoms.point[freedom]!);
  const matrix = assemble(rows, { axial: weights, own: none, other: none }, reduction, points);
  return { weights, reduction, factorisation: factorise(matrix) };
}

/**
 * Adds to the stiff legs' axial forces (every third of the natural forces) what balances the forces left on the freedoms,
 * and takes it from these.
 */
export function addThrusts(
  thrusts: Thrusts,
  legs: Legs,
  ends: Ends,
  natural: Float64Array,
  unbalanced: Float64Array,
): void {
  const { weights, reduction, factorisation } = thrusts;
  // The second round mends what rounding left of the first.
  for (let round = 0; round < 2; round++) {
    const movement = new Float64Array(unbalanced.length);
    expand(reduction, factorisation.solve(gather(reduction, unbalanced)), movement);
    const strains = new Float64Array(natural.length);
    addStrains(legs, ends, movement, strains);
    for (let e = 0; e < legs.count; e++) {
      strains[3 * e]! *= weights[e]!;
      strains[3 * e + 1] = 0;
      strains[3 * e + 2] = 0;
      natural[3 * e]! += strains[3 * e]!;
    }
    subtractForces(legs, ends, strains, unbalanced);
  }
}

function movementsOfStiffLegs(legs: Legs, freedoms: Freedoms, weights: Float64Array): Reduction {
  const { count, first, held } = freedoms;
  const taken = new Uint8Array(count);
  for (let e = 0; e < legs.count; e++) {
    if (weights[e] === 0) continue;
    for (const p of [legs.from[e]!, legs.to[e]!]) {
      for (let f = first[p]!; f < first[p]! + 2; f++) taken[f] = 1 - held[f]!;
    }
  }
  const starts = new Int32Array(count + 1);
  for (let f = 0; f < count; f++) starts[f + 1] = starts[f]! + taken[f]!;
  const size = starts[count]!;
  const own = new Int32Array(size);
  for (let f = 0; f < count; f++) if (taken[f] === 1) own[starts[f]!] = f;
  return {
    size,
    starts,
    unknowns: Int32Array.from({ length: size }, (_, k) => k),
    values: new Float64Array(size).fill(1),
    freedoms: own,
    followers: [],
    closures: [],
  };
}
