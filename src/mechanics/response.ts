// The response of a prepared structure to loads or to what is imposed without a force: movements of the freedoms, natural forces of the
// legs, and what is left unbalanced.

import { subtractFreeStrains } from './free-strains.ts';
import type { Imposed } from './imposed.ts';
import { axialStiffness, turningStiffness } from './leg-stiffness.ts';
import { expand, gather } from './reduction.ts';
import type { Loading } from './shares.ts';
import { addStrains, subtractForces } from './strains.ts';
import type { System } from './system.ts';
import { addThrusts } from './thrusts.ts';

export interface Response {
  /** By freedom. */
  readonly movement: Float64Array;
  /**
   * Three a leg: axial force (tension positive; of a leg loaded along, its mean as if held at both ends), and the
   * couples that the joints put on its ends, anticlockwise.
   */
  readonly natural: Float64Array;
  /** By freedom: what the ground, springs included, puts on the structure; at a freedom that nothing resists, what is out of balance, reversed. */
  readonly ground: Float64Array;
  /** Largest force out of balance at a freedom that is not held, over the largest load; couples over the size of the structure. */
  readonly residual: number;
  /** The largest force and couple to be balanced, N and N m. */
  readonly largest: { readonly force: number; readonly moment: number };
}

export function respond(system: System, loading: Loading | undefined, imposed: Imposed | undefined): Response {
  const { legs, ends, freedoms, reduction, factorisation, thrusts } = system;
  const state: State = {
    movement: imposed === undefined ? new Float64Array(freedoms.count) : imposed.movement.slice(),
    strains: new Float64Array(3 * legs.count),
    shortenings: new Float64Array(freedoms.springs.length),
    natural: new Float64Array(3 * legs.count),
    unbalanced: new Float64Array(freedoms.count),
  };
  if (imposed !== undefined) {
    addStrains(legs, ends, imposed.movement, state.strains);
    addShortenings(system, imposed.movement, state.shortenings);
    for (let k = 0; k < state.shortenings.length; k++) state.shortenings[k]! -= imposed.springs[k]!;
    if (imposed.strains !== undefined) subtractFreeStrains(legs, imposed.strains, state.strains);
  }
  balance(system, loading, state);
  const loads = largestForces(system, state.unbalanced, false);
  const largest = Math.max(loads.force, loads.moment / freedoms.size);
  if (largest === 0) {
    return { movement: state.movement, natural: state.natural, ground: state.unbalanced, residual: 0, largest: loads };
  }

  // Each step solves for what the one before left. Strains and forces are added up step by step, not worked out from the
  // sum of movements, so that what a small step adds is not lost in the rounding of a large movement.
  let left = Number.POSITIVE_INFINITY;
  let rest = gather(reduction, state.unbalanced);
  for (let step = 0; step < MOST_STEPS; step++) {
    const movement = new Float64Array(freedoms.count);
    expand(reduction, factorisation.solve(rest), movement);
    addStrains(legs, ends, movement, state.strains);
    addShortenings(system, movement, state.shortenings);
    for (let f = 0; f < movement.length; f++) state.movement[f]! += movement[f]!;
    balance(system, loading, state);
    rest = gather(reduction, state.unbalanced);
    const before = left;
    left = largestOf(system, rest) / largest;
    if (step > 0 && (left <= BALANCED || left > 0.5 * before)) break;
  }
  if (thrusts !== undefined) addThrusts(thrusts, legs, ends, state.natural, state.unbalanced);

  const free = largestForces(system, state.unbalanced, true);
  const residual = Math.max(free.force, free.moment / freedoms.size) / largest;
  const ground = state.unbalanced;
  addSpringForces(system, state.shortenings, ground, 1, 'ground');
  for (let f = 0; f < ground.length; f++) ground[f] = 0 - ground[f]!;
  return { movement: state.movement, natural: state.natural, ground, residual, largest: loads };
}

/** Solves at most; the first two are always made, the others only for structures of badly mixed stiffness. */
const MOST_STEPS = 8;

/** What is out of balance, relative to the largest load, that rounding alone explains: some hundred ε. */
const BALANCED = 3e-14;

interface State {
  readonly movement: Float64Array;
  /** Of the legs, three a leg, less what they take on without force: what stiffness answers. */
  readonly strains: Float64Array;
  /** By spring. */
  readonly shortenings: Float64Array;
  readonly natural: Float64Array;
  /** By freedom: loads less what legs and springs answer. */
  readonly unbalanced: Float64Array;
}

function balance(system: System, loading: Loading | undefined, state: State): void {
  const { legs, ends, freedoms } = system;
  const { strains, natural, unbalanced } = state;
  for (let e = 0; e < legs.count; e++) {
    const start = strains[3 * e + 1]!;
    const end = strains[3 * e + 2]!;
    natural[3 * e] = axialStiffness(legs, e) * strains[3 * e]!;
    if (legs.shearing[e] === 0 && legs.freedShear[e] === 0) {
      const bending = (2 * legs.bending[e]!) / legs.length[e]!;
      natural[3 * e + 1] = bending * (2 * start + end);
      natural[3 * e + 2] = bending * (start + 2 * end);
    } else {
      const { own, other } = turningStiffness(legs, e);
      natural[3 * e + 1] = own * start + other * end;
      natural[3 * e + 2] = other * start + own * end;
    }
  }
  if (loading === undefined) unbalanced.fill(0);
  else {
    for (let k = 0; k < natural.length; k++) natural[k]! -= loading.clamped[k]!;
    unbalanced.set(loading.nodal);
  }
  subtractForces(legs, ends, natural, unbalanced);
  if (freedoms.springs.length > 0) addSpringForces(system, state.shortenings, unbalanced, -1, 'all');
}

function addShortenings(system: System, movement: Float64Array, shortenings: Float64Array): void {
  system.freedoms.springs.forEach((spring, k) => {
    spring.freedoms.forEach((freedom, i) => {
      shortenings[k]! += spring.coefficients[i]! * movement[freedom]!;
    });
  });
}

/** `which`: a connection has no part in what the ground does. */
function addSpringForces(
  system: System,
  shortenings: Float64Array,
  force: Float64Array,
  sign: 1 | -1,
  which: 'all' | 'ground',
): void {
  system.freedoms.springs.forEach((spring, k) => {
    if (which === 'ground' && spring.kind === 'connection') return;
    const size = sign * spring.stiffness * shortenings[k]!;
    spring.freedoms.forEach((freedom, i) => {
      force[freedom]! += size * spring.coefficients[i]!;
    });
  });
}

function largestForces(system: System, force: Float64Array, freeOnly: boolean) {
  const { held, first, point } = system.freedoms;
  const largest = { force: 0, moment: 0 };
  for (let f = 0; f < force.length; f++) {
    if (freeOnly && held[f] === 1) continue;
    const value = Math.abs(force[f]!);
    if (f - first[point[f]!]! < 2) largest.force = Math.max(largest.force, value);
    else largest.moment = Math.max(largest.moment, value);
  }
  return largest;
}

/** Of forces on the unknowns; couples count as forces at an arm of the size of the structure. */
function largestOf(system: System, forces: Float64Array): number {
  const { freedoms, reduction } = system;
  const { first, point, size } = freedoms;
  let largest = 0;
  for (let k = 0; k < forces.length; k++) {
    const f = reduction.freedoms[k]!;
    const value = Math.abs(forces[k]!);
    largest = Math.max(largest, f - first[point[f]!]! < 2 ? value : value / size);
  }
  return largest;
}
