// The moved shape: each leg's axial and transverse movement, exaggerated and added to where it stood.
import { derivative, evaluate } from '../mechanics/polynomial.ts';
import type { FieldPiece, MemberField, Solution } from '../mechanics/solution.ts';
import { type Curve, curveTo, degreeOf } from './curves.ts';
import { moved, path, type Spot } from './geometry.ts';
import { largestSize } from './readings.ts';
import { type DrawnLeg, spotOnLeg } from './view.ts';

/** The largest round figure that exaggerates no more than asked: 1, 1.5, 2, 2.5, 3, 4, 5, 6 or 8 times ten to a whole power. */
export function roundedExaggeration(most: number): number {
  if (!(most > 0) || !Number.isFinite(most)) return 1;
  const power = 10 ** Math.floor(Math.log10(most));
  const step = [8, 6, 5, 4, 3, 2.5, 2, 1.5, 1].find(candidate => candidate * power <= most * (1 + 1e-9)) ?? 1;
  return Number((step * power).toPrecision(3));
}

/** One path a member. `exaggeration` times the movement, at the drawing's own scale `pxPerMetre`. */
export function movedPath(
  field: MemberField,
  legs: readonly DrawnLeg[],
  exaggeration: number,
  pxPerMetre: number,
): string {
  let d = '';
  for (const piece of field.pieces) {
    const leg = legs[piece.leg];
    if (leg === undefined) continue;
    const curve = movedCurve(piece, leg, exaggeration * pxPerMetre);
    d += (d === '' ? path(curve.at(0)) : '') + curveTo(curve);
  }
  return d;
}

function movedCurve(piece: FieldPiece, leg: DrawnLeg, scale: number): Curve {
  const start = spotOnLeg(leg, piece.start);
  const pxPerMetre = leg.leg.length === 0 ? 0 : leg.length / leg.leg.length;
  const [along, across] = [piece.axialMovement, piece.transverseMovement];
  const [alongSlope, acrossSlope] = [derivative(along), derivative(across)];
  const length = piece.end - piece.start;
  return {
    length,
    degree: Math.max(degreeOf(along, length), degreeOf(across, length), 1),
    at: s =>
      moved(
        moved(start, leg.along, s * pxPerMetre + scale * evaluate(along, s)),
        leg.left,
        scale * evaluate(across, s),
      ),
    slope: s => {
      const forward = pxPerMetre + scale * evaluate(alongSlope, s);
      const aside = scale * evaluate(acrossSlope, s);
      return {
        x: leg.along.x * forward + leg.left.x * aside,
        y: leg.along.y * forward + leg.left.y * aside,
      };
    },
  };
}

export function movedSpot(piece: FieldPiece, leg: DrawnLeg, s: number, scale: number): Spot {
  return movedCurve(piece, leg, scale).at(s);
}

/** Of any joint or any place along a member, m. */
export function largestMovement({ movements, members }: Solution): number {
  let largest = largestSize(members, 'transverseMovement');
  for (let i = 0; i + 1 < movements.length; i += 3) {
    largest = Math.max(largest, Math.hypot(movements[i] ?? 0, movements[i + 1] ?? 0));
  }
  return largest;
}
