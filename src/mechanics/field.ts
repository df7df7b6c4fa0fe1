// Reading fields along a member: the piece at a place, and the values of everything there.

import type { Leg } from '../model/structure.ts';
import { evaluate, type Polynomial } from './polynomial.ts';
import type { FieldPiece, MemberField } from './solution.ts';

/** Before or behind a place, in the direction of travel. */
export type Side = 'before' | 'after';

/** As in FieldPiece: N, N m, rad, m. */
export interface FieldValues {
  /** Index into the member's legs. */
  readonly leg: number;
  readonly axialForce: number;
  readonly shearForce: number;
  readonly bendingMoment: number;
  readonly rotation: number;
  readonly axialMovement: number;
  readonly transverseMovement: number;
}

/** The six quantities of a piece. */
export type FieldName = Exclude<keyof FieldValues, 'leg'>;

/** At a distance along the member, kept within its ends; where a field jumps, on one side. */
export function fieldAt(field: MemberField, distance: number, side: Side = 'after'): FieldValues {
  const piece = pieceAt(field, distance, side);
  const s = Math.min(Math.max(distance, piece.start), piece.end) - piece.start;
  return {
    leg: piece.leg,
    axialForce: evaluate(piece.axialForce, s),
    shearForce: evaluate(piece.shearForce, s),
    bendingMoment: evaluate(piece.bendingMoment, s),
    rotation: evaluate(piece.rotation, s),
    axialMovement: evaluate(piece.axialMovement, s),
    transverseMovement: evaluate(piece.transverseMovement, s),
  };
}

/**
 * The piece that holds a distance; where two meet, the one before or behind. A distance within a billionth of the member's
 * length of a meeting place is at it.
 */
export function pieceAt(field: MemberField, distance: number, side: Side = 'after'): FieldPiece {
  const { pieces } = field;
  const tolerance = 1e-9 * pieces[pieces.length - 1]!.end;
  // The first piece that ends at or behind the place, or only behind it.
  const bound = side === 'before' ? distance - tolerance : distance + tolerance;
  let low = 0;
  let high = pieces.length - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (pieces[middle]!.end > bound || (side === 'before' && pieces[middle]!.end >= bound)) high = middle;
    else low = middle + 1;
  }
  return pieces[low]!;
}

/** The movement in a global direction (x, y) along a piece. */
export function movementAlong(piece: FieldPiece, leg: Leg, x: number, y: number): Polynomial {
  const along = leg.cosine * x + leg.sine * y;
  const across = leg.cosine * y - leg.sine * x;
  const { axialMovement, transverseMovement } = piece;
  const result: number[] = [];
  for (let power = 0; power < axialMovement.length || power < transverseMovement.length; power++) {
    result.push(along * (axialMovement[power] ?? 0) + across * (transverseMovement[power] ?? 0));
  }
  return result;
}

/** The same as one vector at a place, by global axes; behind it, where a release lets the two sides slide apart. */
export function movementAt(
  field: MemberField,
  legs: readonly Leg[],
  distance: number,
): { readonly x: number; readonly y: number } {
  const { leg, axialMovement, transverseMovement } = fieldAt(field, distance);
  const { cosine, sine } = legs[leg]!;
  return {
    x: cosine * axialMovement - sine * transverseMovement,
    y: sine * axialMovement + cosine * transverseMovement,
  };
}
