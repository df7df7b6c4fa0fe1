// What one case imposes, without a force: how the ground moves at the supports, as movements of held freedoms and of the
// ground ends of springs, and how heat and lack of fit strain the legs.

import type { Load, Structure } from '../model/structure.ts';
import { type FreeStrains, freeStrains } from './free-strains.ts';
import type { Freedoms } from './freedoms.ts';
import type { Legs } from './legs.ts';
import type { Reduction } from './reduction.ts';

export interface Imposed {
  /** By freedom: that of held freedoms, and what dependent ones follow of it. */
  readonly movement: Float64Array;
  /** By spring: how far the ground moves in its direction. */
  readonly springs: Float64Array;
  /** Undefined where nothing is heated or out of length. */
  readonly strains: FreeStrains | undefined;
}

/** By freedom: 1 where it is held and its support is moved by some load. */
export function findMoved(loads: readonly Load[], freedoms: Freedoms): Uint8Array {
  const moved = new Uint8Array(freedoms.count);
  for (const load of loads) {
    if (load.kind !== 'movement' || load.amount === 0) continue;
    for (let f = freedoms.first[load.point]!; f < freedoms.first[load.point + 1]!; f++) {
      const rotation = f === freedoms.joint[load.point];
      if (freedoms.held[f] === 1 && rotation === (load.freedom.kind === 'rotation')) moved[f] = 1;
    }
  }
  return moved;
}

/** Undefined where the loads impose nothing. */
export function imposedBy(
  structure: Structure,
  loads: readonly Load[],
  legs: Legs,
  freedoms: Freedoms,
  reduction: Reduction,
): Imposed | undefined {
  const strains = freeStrains(structure, loads, legs);
  if (strains === undefined && !loads.some(load => load.kind === 'movement')) return undefined;
  const movement = new Float64Array(freedoms.count);
  const springs = new Float64Array(freedoms.springs.length);
  for (const load of loads) if (load.kind === 'movement') moveGround(load, freedoms, movement, springs);
  for (let f = 0; f < movement.length; f++) if (freedoms.held[f] === 0) movement[f] = 0;
  const imposed = { movement, springs, strains };
  for (const { freedom, moved, value } of reduction.followers) {
    movement[freedom]! += value * givenBy(imposed, legs, moved);
  }
  return imposed;
}

/** The movement of a held freedom or, numbered behind the freedoms, the lengthening of an axially stiff leg. */
export function givenBy({ movement, strains }: Imposed, legs: Legs, moved: number): number {
  if (moved < movement.length) return movement[moved]!;
  const e = moved - movement.length;
  return strains === undefined ? 0 : strains.axial[e]! * legs.length[e]!;
}

/** The ground under a support moves as a whole: each held or sprung direction follows with its part of the movement. */
function moveGround(
  load: Extract<Load, { kind: 'movement' }>,
  freedoms: Freedoms,
  movement: Float64Array,
  springs: Float64Array,
): void {
  const { point, freedom, amount } = load;
  const rotation = freedoms.joint[point]!;
  const first = freedoms.first[point]!;
  const x = freedoms.axisX[point]!;
  const y = freedoms.axisY[point]!;
  if (freedom.kind === 'rotation') {
    if (rotation >= 0) movement[rotation]! += amount;
  } else if (first < freedoms.first[point + 1]!) {
    movement[first]! += amount * (freedom.x * x + freedom.y * y);
    movement[first + 1]! += amount * (freedom.y * x - freedom.x * y);
  }
  freedoms.springs.forEach((spring, k) => {
    if (spring.point !== point || spring.kind === 'connection') return;
    if (freedom.kind === 'movement') springs[k]! += amount * (spring.x * freedom.x + spring.y * freedom.y);
    else if (spring.kind === 'rotation') springs[k]! += amount;
  });
}
