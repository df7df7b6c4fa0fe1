// How an unstable structure can move: its free movements in the fewest and simplest terms, each told as a rigid body or as
// a mechanism, with the points and members that take part.

import { findFreeMovements } from './free-movements.ts';
import { expand } from './reduction.ts';
import { findParts, jointsThatTurn, type Part, rigidMovements } from './rigid-bodies.ts';
import type { Mechanism } from './solution.ts';
import type { System } from './system.ts';

/** More than this many ways to move are not listed. */
export const MAX_MECHANISMS = 12;

/** Empty where the structure is stable; at most `MAX_MECHANISMS`. */
export function findMechanisms(system: System): readonly Mechanism[] {
  const rigid: { movement: Float64Array; part: Part }[] = [];
  const turning = jointsThatTurn(system);
  for (const part of findParts(system)) {
    for (const movement of rigidMovements(system, part, turning)) rigid.push({ movement, part });
    if (rigid.length >= MAX_MECHANISMS) break;
  }
  const mechanisms = rigid
    .slice(0, MAX_MECHANISMS)
    .map(({ movement }) => describeMovement(system, 'rigid-body', movement));
  if (rigid.length >= MAX_MECHANISMS) return mechanisms;

  const { reduction, freedoms } = system;
  const known = rigid.map(({ movement }) => Float64Array.from(reduction.freedoms, f => movement[f]!));
  const free = findFreeMovements(system, known, MAX_MECHANISMS).map(solution => {
    const movement = new Float64Array(freedoms.count);
    expand(reduction, solution, movement);
    return movement;
  });
  holdStill(system, rigid, free);
  simplify(system, free);
  for (const movement of free) mechanisms.push(describeMovement(system, 'mechanism', movement));
  return mechanisms.slice(0, MAX_MECHANISMS);
}

/** Takes from the movements of mechanisms what moves a part as a whole: one leg of each part that is free to stays still. */
function holdStill(
  system: System,
  rigid: readonly { readonly movement: Float64Array; readonly part: Part }[],
  free: readonly Float64Array[],
): void {
  const { first } = system.freedoms;
  const { from, to } = system.legs;
  const movements = rigid.map(({ movement }) => movement.slice());
  movements.forEach((movement, k) => {
    const { leg, points } = rigid[k]!.part;
    const held = leg < 0 ? [points[0]!] : [from[leg]!, to[leg]!];
    const candidates = held.flatMap(p => [first[p]!, first[p]! + 1]);
    const pivot = largestOf(movement, candidates);
    if (pivot < 0) return;
    for (const other of [...movements, ...free]) if (other !== movement) eliminate(other, movement, pivot);
  });
}

/**
 * Gauss-Jordan elimination among the movements: each has a point that it alone moves, so that they are told apart by as
 * few points as possible.
 */
function simplify(system: System, free: readonly Float64Array[]): void {
  const movements: number[] = [];
  const rotations: number[] = [];
  const { first, point, count } = system.freedoms;
  for (let f = 0; f < count; f++) (f - first[point[f]!]! < 2 ? movements : rotations).push(f);
  const waiting = new Set(free);
  while (waiting.size > 0) {
    let chosen: Float64Array | undefined;
    let pivot = -1;
    for (const candidates of [movements, rotations]) {
      for (const vector of waiting) {
        const place = largestOf(vector, candidates);
        if (place < 0) continue;
        if (chosen === undefined || Math.abs(vector[place]!) > Math.abs(chosen[pivot]!) * (1 + EQUAL)) {
          chosen = vector;
          pivot = place;
        }
      }
      if (chosen !== undefined) break;
    }
    if (chosen === undefined) return;
    waiting.delete(chosen);
    const size = Math.abs(chosen[pivot]!);
    for (let f = 0; f < chosen.length; f++) chosen[f]! /= size;
    for (const other of free) if (other !== chosen) eliminate(other, chosen, pivot);
  }
}

/** Entries smaller than this beside the largest movement are rounding. */
const STILL = 1e-7;

/** Sizes that differ by less, relatively, are equal; the first of them counts. */
const EQUAL = 1e-9;

/** The candidate where the vector is largest, the first among equals; −1 where it is zero at all. */
function largestOf(vector: Float64Array, candidates: readonly number[]): number {
  let place = -1;
  let largest = STILL * vector.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  for (const f of candidates) {
    if (Math.abs(vector[f]!) <= largest * (1 + EQUAL)) continue;
    place = f;
    largest = Math.abs(vector[f]!);
  }
  return place;
}

function eliminate(vector: Float64Array, by: Float64Array, pivot: number): void {
  const factor = vector[pivot]! / by[pivot]!;
  if (factor === 0) return;
  for (let f = 0; f < vector.length; f++) vector[f]! -= factor * by[f]!;
  vector[pivot] = 0;
}

/** A movement by freedom in the terms of points and members. */
export function describeMovement(system: System, kind: Mechanism['kind'], movement: Float64Array): Mechanism {
  const { structure, legs, freedoms } = system;
  const { first, startRotation, endRotation, size } = freedoms;
  const { movements, still } = globalMovements(system, movement);
  const turns = (f: number) => size * Math.abs(movement[f]!) > still;

  const points: number[] = [];
  const turning: number[] = [];
  for (let p = 0; p < structure.points.length; p++) {
    if (movements[2 * p] !== 0 || movements[2 * p + 1] !== 0) points.push(p);
    else for (let f = first[p]! + 2; f < first[p + 1]!; f++) if (turns(f) && turning.at(-1) !== p) turning.push(p);
  }
  const moving = new Set(points);
  const members = new Set<number>();
  for (let e = 0; e < legs.count; e++) {
    const bends = legs.bending[e] !== 0;
    const moves = moving.has(legs.from[e]!) || moving.has(legs.to[e]!);
    if (moves || (bends && (turns(startRotation[e]!) || turns(endRotation[e]!)))) members.add(legs.member[e]!);
  }
  return { kind, movements, points, members: [...members], turning };
}

/**
 * By point, x and y, the largest being 1 and pointing to the right or down, as a load would push it; none where something
 * turns in place and the movements beside it are rounding. `still`: what of `movement` is rounding.
 */
function globalMovements(system: System, movement: Float64Array) {
  const { structure, freedoms } = system;
  const { first, point, axisX, axisY, size } = freedoms;
  const movements = new Float64Array(2 * structure.points.length);
  let largest = 0;
  let sign = 1;
  for (let p = 0; p < structure.points.length; p++) {
    const f = first[p]!;
    if (f === first[p + 1]) continue;
    const x = axisX[p]! * movement[f]! - axisY[p]! * movement[f + 1]!;
    const y = axisY[p]! * movement[f]! + axisX[p]! * movement[f + 1]!;
    movements[2 * p] = x;
    movements[2 * p + 1] = y;
    const length = Math.hypot(x, y);
    if (length <= largest * (1 + EQUAL)) continue;
    largest = length;
    sign = Math.abs(x) >= Math.abs(y) ? Math.sign(x) : -Math.sign(y);
  }
  let turned = 0;
  for (let f = 0; f < movement.length; f++) {
    if (f - first[point[f]!]! >= 2) turned = Math.max(turned, size * Math.abs(movement[f]!));
  }
  if (largest <= STILL * turned) return { movements: movements.fill(0), still: STILL * turned };
  const still = STILL * largest;
  for (let k = 0; k < movements.length; k++) {
    movements[k] = Math.abs(movements[k]!) <= still ? 0 : (sign * movements[k]!) / largest;
  }
  return { movements, still };
}
