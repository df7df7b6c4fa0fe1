// What of a solution is rounding: values so small beside the largest of their kind count as zero, so that a roller shows
// no thrust of 1e-13 N and a reaction that is nil does not fail to be at least 0.

import { bound, type Polynomial } from './polynomial.ts';
import type { FieldPiece, Solution } from './solution.ts';

/** Kinds of quantity that are compared with each other. */
export type Kind = 'force' | 'moment' | 'movement' | 'rotation';

/**
 * Values smaller than this beside the largest of their kind are rounding. Balanced to some 1e-14 and integrated over a few
 * terms, zeros come out below; a real value so small has no digit in common with what was computed.
 */
const ROUNDING = 1e-12;

/** The value, or 0 where it is rounding. */
export function rounded(solution: Solution, kind: Kind, value: number): number {
  // Adding 0 turns −0 into 0.
  return Math.abs(value) <= ROUNDING * sizesOf(solution)[kind] ? 0 : value + 0;
}

/** Values of a kind that are no larger are rounding. */
export function roundingIn(solution: Solution, kind: Kind): number {
  return ROUNDING * sizesOf(solution)[kind];
}

/** A difference between two sides of a place that is no jump: each side may err, and was integrated on its own. */
export function sameValue(solution: Solution, kind: Kind, a: number, b: number): boolean {
  return Math.abs(a - b) <= 100 * ROUNDING * sizesOf(solution)[kind];
}

/** The largest of each kind in a solution: N, N m, m, rad. */
export type Sizes = Readonly<Record<Kind, number>>;

const known = new WeakMap<Solution, Sizes>();

/** Looking at every piece once a solution is enough. */
export function sizesOf(solution: Solution): Sizes {
  let sizes = known.get(solution);
  if (sizes === undefined) {
    sizes = findSizes(solution);
    known.set(solution, sizes);
  }
  return sizes;
}

/** By what went into the solution, and by the sums of the polynomials' terms, as these are what is rounded. */
function findSizes(solution: Solution): Sizes {
  let force = solution.largest?.force ?? 0;
  let moment = solution.largest?.moment ?? 0;
  let movement = 0;
  let rotation = 0;
  const largest = (piece: FieldPiece, polynomial: Polynomial) => bound(polynomial, piece.end - piece.start);
  for (const { pieces } of solution.members) {
    for (const piece of pieces) {
      force = Math.max(force, largest(piece, piece.axialForce), largest(piece, piece.shearForce));
      moment = Math.max(moment, largest(piece, piece.bendingMoment));
      movement = Math.max(movement, largest(piece, piece.transverseMovement), largest(piece, piece.axialMovement));
      rotation = Math.max(rotation, largest(piece, piece.rotation));
    }
  }
  for (const reaction of solution.reactions) {
    force = Math.max(force, Math.abs(reaction.x), Math.abs(reaction.y));
    moment = Math.max(moment, Math.abs(reaction.moment));
  }
  return { force, moment, movement, rotation };
}
