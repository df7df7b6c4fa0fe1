// What is held and what is sprung at each supported point: the restraints of all supports there, taken together.

import type { Restraint, Structure } from '../model/structure.ts';

export interface PointSupport {
  readonly point: number;
  /** Index of the first support there; reactions are told at it. */
  readonly support: number;
  /** Directions in which the ground holds the point. */
  readonly held: Span;
  /** Directions in which ground or springs resist. */
  readonly resisted: Span;
  readonly rotationHeld: boolean;
  readonly rotationResisted: boolean;
  readonly springs: readonly Restraint[];
}

/** The directions that some unit vectors span: none, those of one line (x, y), or the whole plane. */
export interface Span {
  readonly rank: 0 | 1 | 2;
  readonly x: number;
  readonly y: number;
}

export const NO_DIRECTION: Span = { rank: 0, x: 0, y: 0 };

/** By point. */
export function collectSupports(structure: Structure): ReadonlyMap<number, PointSupport> {
  const found = new Map<number, PointSupport>();
  structure.supports.forEach(({ point, restraints }, support) => {
    let entry = found.get(point) ?? unsupported(point, support);
    for (const restraint of restraints) entry = withRestraint(entry, restraint);
    found.set(point, entry);
  });
  return found;
}

/** The part of a vector that lies in the span. */
export function project(span: Span, x: number, y: number): readonly [x: number, y: number] {
  if (span.rank === 0) return [0, 0];
  if (span.rank === 2) return [x, y];
  const share = span.x * x + span.y * y;
  return [span.x * share, span.y * share];
}

/** The span with one more unit vector. */
export function extend(span: Span, x: number, y: number): Span {
  if (span.rank === 0) return { rank: 1, x, y };
  if (span.rank === 2 || Math.abs(span.x * y - span.y * x) <= PARALLEL) return span;
  return { rank: 2, x: 1, y: 0 };
}

/** Two unit vectors whose cross product is smaller than this point the same way: angles are written to a millionth of a degree at most. */
const PARALLEL = 1e-9;

function unsupported(point: number, support: number): PointSupport {
  return {
    point,
    support,
    held: NO_DIRECTION,
    resisted: NO_DIRECTION,
    rotationHeld: false,
    rotationResisted: false,
    springs: [],
  };
}

function withRestraint(support: PointSupport, restraint: Restraint): PointSupport {
  const { freedom, stiffness } = restraint;
  if (stiffness === 0) return support;
  const held = stiffness === Number.POSITIVE_INFINITY;
  const springs = held ? support.springs : [...support.springs, restraint];
  if (freedom.kind === 'rotation') {
    return { ...support, springs, rotationHeld: support.rotationHeld || held, rotationResisted: true };
  }
  return {
    ...support,
    springs,
    held: held ? extend(support.held, freedom.x, freedom.y) : support.held,
    resisted: extend(support.resisted, freedom.x, freedom.y),
  };
}
