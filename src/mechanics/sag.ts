// Sag: how far a stretch of a member departs from the chord between its ends, at right angles to it.

import type { MemberStretch } from '../model/question.ts';
import type { Leg, Structure } from '../model/structure.ts';
import { fieldAt, movementAlong } from './field.ts';
import { sum } from './polynomial.ts';
import type { AlongQuantity } from './quantities.ts';
import type { FieldPiece, MemberField } from './solution.ts';

/**
 * The chord runs straight from the start of the stretch to its end and moves with both. A place on a leg off that line
 * (of a member with a bend) is compared with the point of the chord beside it. Positive towards the underside of the
 * way from the start to the end or, `reversed`, of the way back.
 */
export function sagOf(
  structure: Structure,
  field: MemberField,
  member: number,
  stretch: MemberStretch,
  reversed: boolean,
): AlongQuantity {
  const { legs } = structure.members[member]!;
  const start = positionOf(structure, legs, stretch.start);
  const end = positionOf(structure, legs, stretch.end);
  const length = Math.hypot(end.x - start.x, end.y - start.y);
  // A stretch that comes back to its start has no chord; its first leg stands in.
  const closed = length <= 1e-9 * (stretch.end - stretch.start);
  const cosine = closed ? legs[0]!.cosine : (end.x - start.x) / length;
  const sine = closed ? legs[0]!.sine : (end.y - start.y) / length;
  const inverse = closed ? 0 : 1 / length;
  const side = reversed ? -1 : 1;
  const x = side * sine;
  const y = -side * cosine;
  const startMovement = movementTowards(field, legs, stretch.start, x, y);
  const endMovement = movementTowards(field, legs, stretch.end, x, y);
  const rise = endMovement - startMovement;
  const polynomial = (piece: FieldPiece, leg: Leg) => {
    const from = structure.points[leg.from]!;
    const along = piece.start - leg.start;
    const dx = from.x + leg.cosine * along - start.x;
    const dy = from.y + leg.sine * along - start.y;
    const share = (dx * cosine + dy * sine) * inverse;
    const slope = (leg.cosine * cosine + leg.sine * sine) * inverse;
    return sum(movementAlong(piece, leg, x, y), [startMovement + rise * share, rise * slope], 1, -1);
  };
  return { kind: 'movement', polynomial, read: value => value };
}

function positionOf(structure: Structure, legs: readonly Leg[], distance: number) {
  let k = 0;
  while (k < legs.length - 1 && distance > legs[k + 1]!.start) k++;
  const leg = legs[k]!;
  const from = structure.points[leg.from]!;
  const along = distance - leg.start;
  return { x: from.x + leg.cosine * along, y: from.y + leg.sine * along };
}

function movementTowards(field: MemberField, legs: readonly Leg[], distance: number, x: number, y: number): number {
  const { leg, axialMovement, transverseMovement } = fieldAt(field, distance);
  const { cosine, sine } = legs[leg]!;
  return (cosine * x + sine * y) * axialMovement + (cosine * y - sine * x) * transverseMovement;
}
