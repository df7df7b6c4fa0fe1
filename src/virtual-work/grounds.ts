// What holds each point: the restraints of all supports at it, however many and however askew, brought to at most two
// movements at right angles and one rotation, each with one reaction.
import type { Restraint, Structure } from '../model/structure.ts';

/** One unknown reaction: what the ground does to the structure. */
export interface Ground {
  readonly point: number;
  /** A unit vector for a force, or (0, 0) for a couple. */
  readonly x: number;
  readonly y: number;
  /** 1 for an anticlockwise couple, else 0. */
  readonly moment: 0 | 1;
  /** Movement of the point against the ground for a unit reaction: 0 where held, m/N or rad/(N m) where sprung. */
  readonly flexibility: number;
}

/** In the order of the points that they first appear for in `structure.supports`. */
export function groundsOf(structure: Structure): Ground[] {
  const restraints = new Map<number, Restraint[]>();
  for (const support of structure.supports) {
    const known = restraints.get(support.point);
    if (known) known.push(...support.restraints);
    else restraints.set(support.point, [...support.restraints]);
  }
  return [...restraints].flatMap(([point, list]) => [...movementGrounds(point, list), ...rotationGround(point, list)]);
}

/** Two directions closer than this (sine of the angle between) count as one. */
const PARALLEL = 1e-9;

interface Direction {
  readonly x: number;
  readonly y: number;
  readonly stiffness: number;
}

function movementGrounds(point: number, restraints: readonly Restraint[]): Ground[] {
  const held: Direction[] = [];
  const springs: Direction[] = [];
  for (const { freedom, stiffness } of restraints) {
    if (freedom.kind !== 'movement' || stiffness === 0) continue;
    (stiffness < Infinity ? springs : held).push({ x: freedom.x, y: freedom.y, stiffness });
  }
  const ground = (x: number, y: number, flexibility: number): Ground => ({ point, x, y, moment: 0, flexibility });
  const first = held[0];
  if (!first) return springGrounds(springs, ground);
  if (held.some(other => !parallel(first, other))) return [ground(1, 0, 0), ground(0, 1, 0)];
  // Free to move at right angles to the held direction only, against the springs' stiffness that way.
  let stiffness = 0;
  for (const spring of springs) {
    if (!parallel(first, spring)) stiffness += spring.stiffness * (first.x * spring.y - first.y * spring.x) ** 2;
  }
  const grounds = [ground(first.x, first.y, 0)];
  if (stiffness > 0) grounds.push(ground(-first.y, first.x, 1 / stiffness));
  return grounds;
}

/** Springs alone: along the one direction that they share, or along the principal directions of their stiffness. */
function springGrounds(
  springs: readonly Direction[],
  ground: (x: number, y: number, flexibility: number) => Ground,
): Ground[] {
  const first = springs[0];
  if (!first) return [];
  let xx = 0;
  let xy = 0;
  let yy = 0;
  for (const { x, y, stiffness } of springs) {
    xx += stiffness * x * x;
    xy += stiffness * x * y;
    yy += stiffness * y * y;
  }
  if (springs.every(spring => parallel(first, spring))) return [ground(first.x, first.y, 1 / (xx + yy))];
  const angle = xy === 0 ? 0 : Math.atan2(2 * xy, xx - yy) / 2;
  return [angle, angle + Math.PI / 2].map(turn => {
    const x = angle === 0 ? Number(turn === 0) : Math.cos(turn);
    const y = angle === 0 ? Number(turn !== 0) : Math.sin(turn);
    let stiffness = 0;
    for (const spring of springs) stiffness += spring.stiffness * (spring.x * x + spring.y * y) ** 2;
    return ground(x, y, 1 / stiffness);
  });
}

function parallel(a: Direction, b: Direction): boolean {
  return Math.abs(a.x * b.y - a.y * b.x) <= PARALLEL;
}

function rotationGround(point: number, restraints: readonly Restraint[]): Ground[] {
  let stiffness = 0;
  for (const restraint of restraints) if (restraint.freedom.kind === 'rotation') stiffness += restraint.stiffness;
  return stiffness > 0 ? [{ point, x: 0, y: 0, moment: 1, flexibility: 1 / stiffness }] : [];
}
