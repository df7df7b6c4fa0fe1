// The analysis of a structure: is it stable, how redundant is it, and how does it answer each of its cases.
//
// Plane frames, linear and first order: bending, axial force and, where it is counted, shear by the displacement method,
// with fields exact between loads. Axes, signs and units are those of model/structure.ts and solution.ts.

import type { Load, Structure } from '../model/structure.ts';
import { conditionEstimate } from './condition.ts';
import { fieldsOf } from './fields.ts';
import { hasIdleUnknown } from './free-movements.ts';
import type { FreeStrains } from './free-strains.ts';
import { boundFreedoms } from './freedoms.ts';
import { givenBy, type Imposed, imposedBy } from './imposed.ts';
import { loadingOf } from './loading.ts';
import { findMechanisms } from './mechanisms.ts';
import { type Response, respond } from './response.ts';
import { type Loading, SEGMENT_NUMBERS } from './shares.ts';
import { softestMovement } from './softest.ts';
import type { Analysis, CaseParts, Conflict, Mechanism, Reaction, Solution, Stability } from './solution.ts';
import { project } from './supports.ts';
import { prepareSystem, type System } from './system.ts';

/** A structure with more freedoms is not analysed: a square frame of so many takes about 10 s. */
export const MAX_FREEDOMS = 300_000;

/** Nor is one whose cases have more pieces of field in sum, at about a kilobyte each. */
export const MAX_PIECES = 600_000;

/**
 * A structure whose stiffness matrix is worse conditioned than this may be unstable, and its geometry is looked at; where
 * nothing is free, it is nearly unstable, and what it resists least is found. One that is unstable comes out at 1 / ε
 * or so, or Infinity, and the estimate is short of the truth by a factor of ten at most.
 */
export const SUSPICIOUS_CONDITION = 1e10;

/** Past this condition too few of sixteen digits are left for an answer, whatever the checks say. */
export const MAX_CONDITION = 1e13;

export function analyse(structure: Structure): Analysis {
  if (boundFreedoms(structure) > MAX_FREEDOMS) return unanalysed(structure, 'freedoms');
  const system = prepareSystem(structure);
  if (system === undefined) return unanalysed(structure, 'axially-stiff');
  if (system.segments.count * structure.cases.length > MAX_PIECES) return unanalysed(structure, 'cases');

  const stability = stabilityOf(system);
  if (!stability.stable) return { ...unanalysed(structure), stability };

  const redundancy = redundancyOf(system);
  const byCase = loadsByCase(structure);
  const imposed = byCase.map(loads => imposedBy(structure, loads, system.legs, system.freedoms, system.reduction));
  const conflict = findConflict(system, imposed);
  if (conflict !== undefined) return { structure, stability, redundancy, cases: [], parts: [], conflict };

  const cases: Solution[] = [];
  const parts: (CaseParts | undefined)[] = [];
  byCase.forEach((loads, k) => {
    const loading = loadingOf(structure, loads, system.legs, system.freedoms, system.ends, system.segments);
    const forces = respond(system, loading, undefined);
    const given = imposed[k];
    if (given === undefined) {
      cases.push(solutionOf(system, forces, loading, undefined));
      parts.push(undefined);
      return;
    }
    const moved = respond(system, undefined, given);
    cases.push(solutionOf(system, add(forces, moved), loading, given.strains));
    parts.push({
      forces: solutionOf(system, forces, loading, undefined),
      imposed: solutionOf(system, moved, undefined, given.strains),
    });
  });
  return { structure, stability, redundancy, cases, parts };
}

/** Whether a structure is stable, without its response to loads; undefined where it is too large to say. */
export function findStability(structure: Structure): Stability | undefined {
  if (boundFreedoms(structure) > MAX_FREEDOMS) return undefined;
  const system = prepareSystem(structure);
  return system && stabilityOf(system);
}

function stabilityOf(system: System): Stability {
  const condition = conditionEstimate(system.matrix, system.factorisation);
  const suspicious = condition > SUSPICIOUS_CONDITION;
  const mechanisms = suspicious || hasIdleUnknown(system) ? findMechanisms(system) : [];
  if (mechanisms.length > 0) return unstable(mechanisms);
  const softest = suspicious ? softestMovement(system) : undefined;
  return { stable: true, mechanisms, condition, ...(softest && { softest }) };
}

function unstable(mechanisms: readonly Mechanism[]): Stability {
  return { stable: false, mechanisms, condition: Number.POSITIVE_INFINITY };
}

function unanalysed(structure: Structure, tooLarge?: Analysis['tooLarge']): Analysis {
  const analysis = { structure, stability: unstable([]), redundancy: 0, cases: [], parts: [] };
  return tooLarge === undefined ? analysis : { ...analysis, tooLarge };
}

/**
 * Unknown forces, three a leg of a member less what is freed, one a leg of a bar, the moments of connections and the
 * reactions, less the equations of equilibrium.
 */
function redundancyOf(system: System): number {
  const { legs, freedoms } = system;
  let forces = freedoms.reactions;
  for (let e = 0; e < legs.count; e++) {
    forces += legs.bending[e] === 0 ? 1 : 3;
    forces -= Math.sign(legs.freedAxial[e]!) + Math.sign(legs.freedShear[e]!);
  }
  for (const { kind } of freedoms.springs) if (kind === 'connection') forces++;
  return forces - freedoms.count;
}

function loadsByCase(structure: Structure): readonly Load[][] {
  const byCase: Load[][] = structure.cases.map(() => []);
  for (const load of structure.loads) byCase[load.case]!.push(load);
  return byCase;
}

/** Lengthenings smaller than this beside the movements that cause them are rounding. */
const UNSTRETCHED = 1e-9;

function findConflict(system: System, imposed: readonly (Imposed | undefined)[]): Conflict | undefined {
  for (let k = 0; k < imposed.length; k++) {
    const given = imposed[k];
    if (given === undefined) continue;
    for (const { leg, terms } of system.reduction.closures) {
      let amount = 0;
      let largest = 0;
      for (const [moved, value] of terms) {
        const term = value * givenBy(given, system.legs, moved);
        amount += term;
        largest = Math.max(largest, Math.abs(term));
      }
      if (Math.abs(amount) > UNSTRETCHED * largest) return { case: k, member: system.legs.member[leg]!, amount };
    }
  }
  return undefined;
}

function add(a: Response, b: Response): Response {
  return {
    movement: a.movement.map((value, k) => value + b.movement[k]!),
    natural: a.natural.map((value, k) => value + b.natural[k]!),
    ground: a.ground.map((value, k) => value + b.ground[k]!),
    residual: a.residual + b.residual,
    largest: { force: a.largest.force + b.largest.force, moment: a.largest.moment + b.largest.moment },
  };
}

function solutionOf(
  system: System,
  response: Response,
  loading: Loading | undefined,
  free: FreeStrains | undefined,
): Solution {
  const { legs, segments } = system;
  const along = loading ?? {
    segments: new Float64Array(SEGMENT_NUMBERS * segments.count),
    shares: new Float64Array(2 * legs.count),
  };
  return {
    movements: globalMovements(system, response.movement),
    members: fieldsOf(system, along, free, response.movement, response.natural),
    reactions: reactionsOf(system, response.ground),
    applied: loading?.applied ?? { x: 0, y: 0, moment: 0 },
    residual: response.residual,
    largest: response.largest,
  };
}

function globalMovements(system: System, movement: Float64Array): Float64Array {
  const { first, axisX, axisY, joint } = system.freedoms;
  const points = system.structure.points.length;
  const movements = new Float64Array(3 * points);
  for (let p = 0; p < points; p++) {
    const f = first[p]!;
    if (f === first[p + 1]) continue;
    movements[3 * p] = axisX[p]! * movement[f]! - axisY[p]! * movement[f + 1]!;
    movements[3 * p + 1] = axisY[p]! * movement[f]! + axisX[p]! * movement[f + 1]!;
    if (joint[p]! >= 0) movements[3 * p + 2] = movement[joint[p]!]!;
  }
  return movements;
}

/** Where several supports stand at a point, the first tells what all of them do. */
function reactionsOf(system: System, ground: Float64Array): readonly Reaction[] {
  const { structure, freedoms, supports } = system;
  const { first, axisX, axisY, joint } = freedoms;
  return structure.supports.map(({ point: p }, index) => {
    const support = supports.get(p)!;
    const f = first[p]!;
    if (support.support !== index || f === first[p + 1]) return { x: 0, y: 0, moment: 0 };
    const [x, y] = project(
      support.resisted,
      axisX[p]! * ground[f]! - axisY[p]! * ground[f + 1]!,
      axisY[p]! * ground[f]! + axisX[p]! * ground[f + 1]!,
    );
    return { x, y, moment: support.rotationResisted ? ground[joint[p]!]! : 0 };
  });
}
