// The freedoms of a structure: how each point can move, how its joint and its hinged member ends can turn, and which of
// these the ground holds.

import type { Leg, Structure } from '../model/structure.ts';
import type { Legs } from './legs.ts';
import type { PointSupport } from './supports.ts';

/**
 * Freedoms are numbered point by point: two movements along the point's own axes, then the rotation of the joint, then
 * that of each hinged end of a member. A point that nothing meets has none. Movements in m, rotations in rad.
 */
export interface Freedoms {
  readonly count: number;
  /** First freedom of each point; points + 1. */
  readonly first: Int32Array;
  /** The point of each freedom. */
  readonly point: Int32Array;
  /**
   * By point: the unit vector of the first movement; the second is along the left-hand normal. Global axes, but at a
   * point that is held in one direction the second movement is the one that is held.
   */
  readonly axisX: Float64Array;
  readonly axisY: Float64Array;
  /** By point: the rotation of the joint, −1 where no member end, support or couple takes hold of it. */
  readonly joint: Int32Array;
  /** By leg: the rotation of its ends, that of the joint or, at a hinge or a connection, one of its own; −1 for a bar. */
  readonly startRotation: Int32Array;
  readonly endRotation: Int32Array;
  /** By freedom: 1 where the ground holds it. */
  readonly held: Uint8Array;
  readonly springs: readonly Spring[];
  /** Independent reactions, springs counted. */
  readonly reactions: number;
  /** Diagonal of the box around the points, m: the scale that rotations are compared with movements by. */
  readonly size: number;
}

/**
 * A spring to the ground, or a connection between a joint and the end of a leg: its shortening is the sum of
 * coefficient × freedom, less what the ground moves.
 */
export interface Spring {
  readonly kind: 'movement' | 'rotation' | 'connection';
  readonly point: number;
  /** Two movements; one rotation; of a connection, the rotations of the joint and of the leg's end. */
  readonly freedoms: readonly number[];
  readonly coefficients: readonly number[];
  /** N/m or N m/rad. */
  readonly stiffness: number;
  /** Global direction; both 0 for a rotation. */
  readonly x: number;
  readonly y: number;
}

export function numberFreedoms(
  structure: Structure,
  legs: Legs,
  supports: ReadonlyMap<number, PointSupport>,
): Freedoms {
  const points = structure.points.length;
  const { present, turned } = findUsers(structure, legs, supports);
  const hinged = findHinges(structure, legs);

  // Count, then number: a hinged or connected end takes a rotation of its own, any other takes part in that of the joint,
  // which a connection needs as well.
  const ownRotations = new Int32Array(points);
  for (let e = 0; e < legs.count; e++) {
    if (legs.startTurning[e] !== Number.POSITIVE_INFINITY) hinged.start[e] = turned[legs.from[e]!] = 1;
    if (legs.endTurning[e] !== Number.POSITIVE_INFINITY) hinged.end[e] = turned[legs.to[e]!] = 1;
  }
  for (let e = 0; e < legs.count; e++) {
    if (legs.bending[e] === 0) continue;
    const from = legs.from[e]!;
    const to = legs.to[e]!;
    if (hinged.start[e] === 1) ownRotations[from]!++;
    else turned[from] = 1;
    if (hinged.end[e] === 1) ownRotations[to]!++;
    else turned[to] = 1;
  }
  const first = new Int32Array(points + 1);
  const joint = new Int32Array(points).fill(-1);
  for (let p = 0; p < points; p++) {
    const movements = present[p] === 1 ? 2 : 0;
    if (turned[p] === 1) joint[p] = first[p]! + movements;
    first[p + 1] = first[p]! + movements + turned[p]! + ownRotations[p]!;
  }
  const count = first[points]!;
  const point = new Int32Array(count);
  for (let p = 0; p < points; p++) point.fill(p, first[p]!, first[p + 1]!);

  const startRotation = new Int32Array(legs.count).fill(-1);
  const endRotation = new Int32Array(legs.count).fill(-1);
  for (let e = 0; e < legs.count; e++) {
    if (legs.bending[e] === 0) continue;
    const from = legs.from[e]!;
    const to = legs.to[e]!;
    startRotation[e] = hinged.start[e] === 1 ? first[from + 1]! - ownRotations[from]!-- : joint[from]!;
    endRotation[e] = hinged.end[e] === 1 ? first[to + 1]! - ownRotations[to]!-- : joint[to]!;
  }

  const axisX = new Float64Array(points).fill(1);
  const axisY = new Float64Array(points);
  const held = new Uint8Array(count);
  const springs: Spring[] = [];
  let reactions = 0;
  for (const support of supports.values()) {
    const p = support.point;
    if (present[p] === 0) continue;
    if (support.held.rank === 1) {
      axisX[p] = support.held.y;
      axisY[p] = -support.held.x;
    }
    const x = first[p]!;
    if (support.held.rank === 2) held[x] = 1;
    if (support.held.rank > 0) held[x + 1] = 1;
    if (support.rotationHeld) held[joint[p]!] = 1;
    reactions += support.resisted.rank + (support.rotationResisted ? 1 : 0);
    for (const { freedom, stiffness } of support.springs) {
      if (freedom.kind === 'rotation') {
        springs.push({ kind: 'rotation', point: p, freedoms: [joint[p]!], coefficients: [1], stiffness, x: 0, y: 0 });
        continue;
      }
      const along = freedom.x * axisX[p]! + freedom.y * axisY[p]!;
      const across = freedom.y * axisX[p]! - freedom.x * axisY[p]!;
      springs.push({
        kind: 'movement',
        point: p,
        freedoms: [x, x + 1],
        coefficients: [along, across],
        stiffness,
        x: freedom.x,
        y: freedom.y,
      });
    }
  }
  for (let e = 0; e < legs.count; e++) {
    addConnection(springs, legs.from[e]!, joint[legs.from[e]!]!, startRotation[e]!, legs.startTurning[e]!);
    addConnection(springs, legs.to[e]!, joint[legs.to[e]!]!, endRotation[e]!, legs.endTurning[e]!);
  }
  const size = sizeOf(structure, present);
  return { count, first, point, axisX, axisY, joint, startRotation, endRotation, held, springs, reactions, size };
}

function addConnection(springs: Spring[], point: number, joint: number, end: number, stiffness: number): void {
  if (stiffness === Number.POSITIVE_INFINITY) return;
  springs.push({ kind: 'connection', point, freedoms: [joint, end], coefficients: [-1, 1], stiffness, x: 0, y: 0 });
}

/** Most freedoms that `numberFreedoms` can come to, without an array; at least as many as it will. */
export function boundFreedoms(structure: Structure): number {
  let count = 3 * structure.points.length;
  const turns = structure.hinges.length > 0 || structure.members.some(({ legs }) => legs.some(isConnected));
  if (turns) for (const member of structure.members) count += 2 * member.legs.length;
  return count;
}

function isConnected({ startAttachment, endAttachment }: Leg): boolean {
  return startAttachment?.turning !== undefined || endAttachment?.turning !== undefined;
}

/** Which points move, and at which a joint is turned by a support or a couple even if no member end is fixed to it. */
function findUsers(structure: Structure, legs: Legs, supports: ReadonlyMap<number, PointSupport>) {
  const present = new Uint8Array(structure.points.length);
  const turned = new Uint8Array(structure.points.length);
  for (let e = 0; e < legs.count; e++) {
    present[legs.from[e]!] = 1;
    present[legs.to[e]!] = 1;
  }
  // A loaded point that no member meets takes part, so that its load is held by its support or found to fall.
  for (const load of structure.loads) {
    if ((load.kind !== 'force' && load.kind !== 'couple') || load.at.kind !== 'point') continue;
    present[load.at.point] = 1;
    if (load.kind === 'couple' && load.at.member === undefined) turned[load.at.point] = 1;
  }
  for (const support of supports.values()) {
    if (support.rotationResisted && present[support.point] === 1) turned[support.point] = 1;
  }
  return { present, turned };
}

/** By leg: 1 at an end that a hinge frees. */
function findHinges(structure: Structure, legs: Legs) {
  const start = new Uint8Array(legs.count);
  const end = new Uint8Array(legs.count);
  if (structure.hinges.length === 0) return { start, end };
  const everyMember = new Uint8Array(structure.points.length);
  for (const { point, member } of structure.hinges) {
    if (member === undefined) {
      everyMember[point] = 1;
      continue;
    }
    for (let e = legs.first[member]!; e < legs.first[member + 1]!; e++) {
      if (legs.from[e] === point) start[e] = 1;
      if (legs.to[e] === point) end[e] = 1;
    }
  }
  for (let e = 0; e < legs.count; e++) {
    if (everyMember[legs.from[e]!] === 1) start[e] = 1;
    if (everyMember[legs.to[e]!] === 1) end[e] = 1;
  }
  return { start, end };
}

function sizeOf(structure: Structure, present: Uint8Array): number {
  let left = Number.POSITIVE_INFINITY;
  let right = Number.NEGATIVE_INFINITY;
  let bottom = Number.POSITIVE_INFINITY;
  let top = Number.NEGATIVE_INFINITY;
  for (let p = 0; p < present.length; p++) {
    if (present[p] === 0) continue;
    const { x, y } = structure.points[p]!;
    left = Math.min(left, x);
    right = Math.max(right, x);
    bottom = Math.min(bottom, y);
    top = Math.max(top, y);
  }
  const size = Math.hypot(right - left, top - bottom);
  return size > 0 && size < Number.POSITIVE_INFINITY ? size : 1;
}
