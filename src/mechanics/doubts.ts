// Where a solution goes beyond what linear analysis may be trusted with: movements that are not small, compression past
// the elastic critical force; and members that take no part at all. Whether and how to warn is left to others.

import type { Load, Structure } from '../model/structure.ts';
import { movementAt } from './field.ts';
import { measure } from './measure.ts';
import { bound } from './polynomial.ts';
import { sizesOf } from './rounding.ts';
import type { Analysis, Solution } from './solution.ts';

/** A part of a member between points where it is supported, meets another member, or ends. */
export interface Stretch {
  readonly member: number;
  /** Distances along the member, m. */
  readonly start: number;
  readonly end: number;
  /** Points. */
  readonly from: number;
  readonly to: number;
}

export interface LargeMovement {
  readonly stretch: Stretch;
  /** The larger of what it bends out of the line through its ends, and of how far one end moves across to the other, m. */
  readonly movement: number;
  /** The movement over the length of the stretch. */
  readonly slope: number;
}

export interface SlenderCompression {
  readonly stretch: Stretch;
  /** The largest compression on it, N. */
  readonly force: number;
  /** π² EI / L² of the stretch, pinned at both ends (Euler), N. */
  readonly critical: number;
}

export interface Doubts {
  /** The stretch that moves most beside its own length, undefined where none moves. */
  readonly movement: LargeMovement | undefined;
  /** Stretches pressed harder than their elastic critical force, the worst first. Those of no known EI are left out. */
  readonly compressions: readonly SlenderCompression[];
}

/** Worked once a solution. */
export function doubtsOf(structure: Structure, solution: Solution): Doubts {
  let doubts = found.get(solution);
  if (doubts === undefined) {
    doubts = {
      movement: largestMovement(structure, solution),
      compressions: slenderCompressions(structure, solution),
    };
    found.set(solution, doubts);
  }
  return doubts;
}

const found = new WeakMap<Solution, Doubts>();

function largestMovement(structure: Structure, solution: Solution): LargeMovement | undefined {
  let worst: LargeMovement | undefined;
  for (const stretch of stretchesOf(structure)) {
    const { member, start, end, from, to } = stretch;
    const [a, b] = [structure.points[from]!, structure.points[to]!];
    const length = Math.hypot(b.x - a.x, b.y - a.y);
    const { legs } = structure.members[member]!;
    const field = solution.members[member]!;
    const [first, last] = [movementAt(field, legs, start), movementAt(field, legs, end)];
    const across = ((b.x - a.x) * (last.y - first.y) - (b.y - a.y) * (last.x - first.x)) / length;
    const along = { start, end };
    const bow = measure(structure, solution, { kind: 'sag', along: [member], stretch: along, reversed: false }, 'size');
    const movement = Math.max(Math.abs(across), Math.abs(bow.value));
    if (movement > 0 && movement / length > (worst?.slope ?? 0))
      worst = { stretch, movement, slope: movement / length };
  }
  return worst;
}

function slenderCompressions(structure: Structure, solution: Solution): readonly SlenderCompression[] {
  const slender: SlenderCompression[] = [];
  for (const stretch of stretchesOf(structure)) {
    // A bar that is said to pull only is tested for itself.
    const critical =
      structure.members[stretch.member]!.only === 'pulls' ? undefined : criticalForce(structure, stretch);
    if (critical === undefined) continue;
    const { member, start, end } = stretch;
    const { value } = measure(
      structure,
      solution,
      { kind: 'compression', along: [member], stretch: { start, end } },
      'size',
    );
    if (value > critical) slender.push({ stretch, force: value, critical });
  }
  return slender.sort((a, b) => b.force / b.critical - a.force / a.critical);
}

/** Members and bars in which no case causes any force, though some case loads the structure; empty where none does. */
export function idleMembers({ structure, cases }: Analysis): readonly number[] {
  const loaded = cases.filter(solution => sizesOf(solution).force > 0);
  if (loaded.length === 0) return [];
  const acted = new Set(structure.loads.flatMap(load => actedOn(load)));
  return structure.members
    .map((_, member) => member)
    .filter(member => !acted.has(member) && loaded.every(solution => isIdle(solution, member)));
}

/** Members that a load names, whatever its size. */
function actedOn(load: Load): readonly number[] {
  if ('members' in load) return load.members;
  return 'member' in load ? [load.member] : [];
}

/** In the order of the members, each along its travel. Worked once a structure. */
function stretchesOf(structure: Structure): readonly Stretch[] {
  let stretches = known.get(structure);
  if (stretches === undefined) {
    stretches = findStretches(structure);
    known.set(structure, stretches);
  }
  return stretches;
}

const known = new WeakMap<Structure, readonly Stretch[]>();

function findStretches({ points, members, supports }: Structure): Stretch[] {
  const meeting = new Int32Array(points.length);
  for (const { legs } of members) {
    const reached = new Set(legs.flatMap(({ from, to }) => [from, to]));
    for (const point of reached) meeting[point]!++;
  }
  const ends = new Uint8Array(points.length);
  for (let point = 0; point < points.length; point++) ends[point] = meeting[point]! > 1 ? 1 : 0;
  for (const { point } of supports) ends[point] = 1;
  const stretches: Stretch[] = [];
  members.forEach(({ legs, length }, member) => {
    let [start, from] = [0, legs[0]!.from];
    legs.forEach((leg, index) => {
      const last = index === legs.length - 1;
      if (!last && ends[leg.to] === 0) return;
      const end = last ? length : leg.start + leg.length;
      stretches.push({ member, start, end, from, to: leg.to });
      [start, from] = [end, leg.to];
    });
  });
  return stretches;
}

/** With the least EI of its legs; undefined where one has none. */
function criticalForce({ members, sections }: Structure, { member, start, end }: Stretch): number | undefined {
  let least = Number.POSITIVE_INFINITY;
  for (const leg of members[member]!.legs) {
    if (leg.start + leg.length / 2 < start || leg.start + leg.length / 2 > end) continue;
    const stiffness = sections[leg.section]!.bendingStiffness;
    if (stiffness === undefined) return undefined;
    least = Math.min(least, stiffness);
  }
  return (Math.PI ** 2 * least) / (end - start) ** 2;
}

/** Forces smaller than this beside the largest of the case are none. */
const NO_FORCE = 1e-9;

function isIdle(solution: Solution, member: number): boolean {
  const { force, moment } = sizesOf(solution);
  return solution.members[member]!.pieces.every(
    ({ start, end, axialForce, shearForce, bendingMoment }) =>
      bound(axialForce, end - start) <= NO_FORCE * force &&
      bound(shearForce, end - start) <= NO_FORCE * force &&
      bound(bendingMoment, end - start) <= NO_FORCE * moment,
  );
}
