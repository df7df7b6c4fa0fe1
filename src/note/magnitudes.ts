// How large a solution is, by kind: what an answer is noise against. Rounding leaves some 1e-13 of the largest movement
// or force where the true answer is nothing; a reaction of that size must not fail `>= 0 kN`.

import type { MeasureKind } from '../language/syntax.ts';
import { evaluate, type Polynomial } from '../mechanics/polynomial.ts';
import type { Solution } from '../mechanics/solution.ts';

/** Largest sizes at joints, ends, middles and supports, SI. */
export interface Magnitudes {
  readonly movement: number;
  readonly rotation: number;
  readonly force: number;
  readonly moment: number;
}

/** An answer below this part of the largest of its kind is none. Well above rounding, well below what anyone reads. */
const NOISE = 1e-11;

export function magnitudesOf(solution: Solution): Magnitudes {
  let [movement, rotation, force, moment] = [0, 0, 0, 0];
  const { movements } = solution;
  for (let i = 0; i < movements.length; i += 3) {
    movement = Math.max(movement, Math.abs(movements[i]!), Math.abs(movements[i + 1]!));
    rotation = Math.max(rotation, Math.abs(movements[i + 2]!));
  }
  for (const field of solution.members) {
    for (const piece of field.pieces) {
      const length = piece.end - piece.start;
      movement = Math.max(movement, sizeOn(piece.transverseMovement, length), sizeOn(piece.axialMovement, length));
      rotation = Math.max(rotation, sizeOn(piece.rotation, length));
      force = Math.max(force, sizeOn(piece.axialForce, length), sizeOn(piece.shearForce, length));
      moment = Math.max(moment, sizeOn(piece.bendingMoment, length));
    }
  }
  for (const { x, y, moment: turning } of solution.reactions) {
    force = Math.max(force, Math.abs(x), Math.abs(y));
    moment = Math.max(moment, Math.abs(turning));
  }
  return { movement, rotation, force, moment };
}

/** The largest size that counts for an answer of a measure, or undefined where noise cannot be told (a stress). */
export function magnitudeFor(kind: MeasureKind, isMoment: boolean, magnitudes: Magnitudes): number | undefined {
  switch (kind) {
    case 'deflection':
    case 'sway':
    case 'sag':
      return magnitudes.movement;
    case 'rotation':
      return magnitudes.rotation;
    case 'moment':
    case 'sagging':
    case 'hogging':
      return magnitudes.moment;
    case 'shear':
    case 'force':
    case 'tension':
    case 'compression':
      return magnitudes.force;
    case 'reaction':
      return isMoment ? magnitudes.moment : magnitudes.force;
    case 'stress':
      return undefined;
  }
}

export function withoutNoise(value: number, magnitude: number | undefined): number {
  return magnitude !== undefined && Math.abs(value) <= NOISE * magnitude ? 0 : value;
}

/** At both ends and the middle: enough for a scale. */
function sizeOn(polynomial: Polynomial, length: number): number {
  return Math.max(
    Math.abs(evaluate(polynomial, 0)),
    Math.abs(evaluate(polynomial, length / 2)),
    Math.abs(evaluate(polynomial, length)),
  );
}
