// The movement that a structure resists least: what a structure that is nearly unstable almost does freely.

import { describeMovement } from './mechanisms.ts';
import { scatteredVector } from './orthogonal.ts';
import { expand } from './reduction.ts';
import type { Mechanism } from './solution.ts';
import type { System } from './system.ts';

/** Rounds of inverse iteration; each gains the ratio of the two softest movements, which is large where it matters. */
const ROUNDS = 6;

/**
 * The vector of the smallest stiffness of the matrix scaled to a diagonal of ones, by inverse iteration from an even
 * start. Undefined where there is no unknown, or a singular pivot.
 */
export function softestMovement(system: System): Mechanism | undefined {
  const { reduction, factorisation, freedoms } = system;
  const { scale } = factorisation.factors;
  const { size } = reduction;
  if (size === 0 || factorisation.singular.length > 0) return undefined;
  // Of the scaled vector x the movement is u = D x; one round is u ← K⁻¹ D⁻² u.
  let movement = scatteredVector(size, 1).map((value, k) => value * scale[k]!);
  for (let round = 0; round < ROUNDS; round++) {
    const solved = factorisation.solve(movement.map((value, k) => value / (scale[k]! * scale[k]!)));
    const largest = solved.reduce((most, value, k) => Math.max(most, Math.abs(value / scale[k]!)), 0);
    if (!(largest > 0 && largest < Number.POSITIVE_INFINITY)) return undefined;
    movement = solved.map(value => value / largest);
  }
  const whole = new Float64Array(freedoms.count);
  expand(reduction, movement, whole);
  return describeMovement(system, 'mechanism', whole);
}
