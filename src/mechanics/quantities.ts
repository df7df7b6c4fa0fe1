// What is measured along members: for each measure a polynomial on every piece of a field, and how its value is read.

import type { ResolvedMeasure } from '../model/question.ts';
import type { Leg, Structure } from '../model/structure.ts';
import { movementAlong } from './field.ts';
import type { Polynomial } from './polynomial.ts';
import type { Kind } from './rounding.ts';
import type { FieldPiece } from './solution.ts';

/** Measures of one quantity that varies along a member; sag and stress have files of their own. */
export type PlainMeasure = Exclude<ResolvedMeasure['kind'], 'sag' | 'stress' | 'reaction'>;

/** A quantity that is a polynomial on every piece of a field. */
export interface AlongQuantity {
  /** What values are compared with to tell rounding. */
  readonly kind: Kind;
  readonly polynomial: (piece: FieldPiece, leg: Leg) => Polynomial;
  /** From the value of the polynomial to that of the measure; never falls and then rises, so that extremes stay extremes. */
  readonly read: (value: number) => number;
}

export const PLAIN_QUANTITIES: Readonly<Record<PlainMeasure, AlongQuantity>> = {
  deflection: { kind: 'movement', polynomial: (piece, leg) => movementAlong(piece, leg, 0, -1), read: asItIs },
  sway: { kind: 'movement', polynomial: (piece, leg) => movementAlong(piece, leg, 1, 0), read: asItIs },
  rotation: { kind: 'rotation', polynomial: piece => piece.rotation, read: asItIs },
  moment: { kind: 'moment', polynomial: piece => piece.bendingMoment, read: asItIs },
  shear: { kind: 'force', polynomial: piece => piece.shearForce, read: asItIs },
  force: { kind: 'force', polynomial: piece => piece.axialForce, read: asItIs },
  sagging: { kind: 'moment', polynomial: piece => piece.bendingMoment, read: positivePart },
  hogging: { kind: 'moment', polynomial: piece => piece.bendingMoment, read: negativePart },
  tension: { kind: 'force', polynomial: piece => piece.axialForce, read: positivePart },
  compression: { kind: 'force', polynomial: piece => piece.axialForce, read: negativePart },
};

/** Distance along a member of a point on it, m; undefined where the member does not pass it. */
export function distanceOf(structure: Structure, member: number, point: number): number | undefined {
  const { legs, length } = structure.members[member]!;
  for (const leg of legs) if (leg.from === point) return leg.start;
  return legs[legs.length - 1]!.to === point ? length : undefined;
}

function asItIs(value: number): number {
  return value;
}

function positivePart(value: number): number {
  return Math.max(0, value);
}

function negativePart(value: number): number {
  return value < 0 ? -value : 0;
}
