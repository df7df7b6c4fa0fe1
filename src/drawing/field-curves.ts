// One field drawn on the legs of a member: the washed area, its outline, and where each reading stands on it.
import { derivative, evaluate, type Polynomial } from '../mechanics/polynomial.ts';
import type { FieldPiece, MemberField } from '../mechanics/solution.ts';
import { type Curve, curveTo, degreeOf } from './curves.ts';
import { moved, path, px, type Spot } from './geometry.ts';
import type { FillRole, LineRole, WashRole, WordRole } from './ink.ts';
import type { Quantity, Reading } from './readings.ts';
import type { Sheet } from './sheet.ts';
import { type DrawnLeg, spotOnLeg } from './view.ts';

/** A field and the side it is drawn on: `side` 1 puts positive values to the left of the travel, −1 to the right. */
export interface FieldStyle {
  readonly title: string;
  readonly quantity: Quantity;
  readonly side: 1 | -1;
  readonly line: LineRole;
  readonly wash: WashRole;
  /** Of its dots and words. */
  readonly hue: FillRole & WordRole;
}

/** Compression and positive shear to the left of the travel, moments on the side in tension, movement where it goes. */
export const FIELD_STYLES = {
  axial: { title: 'Axial force', quantity: 'axialForce', side: -1, line: 'axial', wash: 'axial', hue: 'ink' },
  shear: { title: 'Shear', quantity: 'shearForce', side: 1, line: 'bending', wash: 'shear', hue: 'bend' },
  moment: { title: 'Moment', quantity: 'bendingMoment', side: -1, line: 'bending', wash: 'moment', hue: 'bend' },
  movement: {
    title: 'Movement',
    quantity: 'transverseMovement',
    side: 1,
    line: 'moved',
    wash: 'movement',
    hue: 'move',
  },
} as const satisfies Record<string, FieldStyle>;

export type FieldName = keyof typeof FIELD_STYLES;

/** `scale`: px for one SI unit of the quantity. */
export function drawFieldOnLegs(
  sheet: Sheet,
  field: MemberField,
  legs: readonly DrawnLeg[],
  style: FieldStyle,
  scale: number,
): void {
  for (const run of straightRuns(field, legs)) {
    const first = run[0] as FieldPiece;
    const last = run.at(-1) as FieldPiece;
    const base = spotOnLeg(legs[first.leg] as DrawnLeg, first.start);
    const end = spotOnLeg(legs[last.leg] as DrawnLeg, last.end);
    const curves = run.map(piece => fieldCurve(piece, legs[piece.leg] as DrawnLeg, style, scale));
    const begin = (curves[0] as Curve).at(0);
    const d = curves.map((curve, i) => (i === 0 ? '' : lineTo(curve.at(0))) + curveTo(curve)).join('');
    sheet.wash(style.wash, `${path(base, begin)}${d}${lineTo(end)}Z`);
    // A force closes down to the axis at its ends; a movement is a line of its own.
    const isMoved = style.line === 'moved';
    sheet.line(style.line, isMoved ? `${path(begin)}${d}` : `${path(base, begin)}${d}${lineTo(end)}`);
    for (const curve of curves) obstruct(sheet, curve);
    sheet.reach(...curves.flatMap(curve => sampled(curve).map(spot => spot.y)));
  }
}

/** Where a reading's dot stands. */
export function spotOfReading(reading: Reading, legs: readonly DrawnLeg[], style: FieldStyle, scale: number): Spot {
  const leg = legs[reading.piece.leg] as DrawnLeg;
  return moved(spotOnLeg(leg, reading.distance), leg.left, style.side * scale * reading.value);
}

/** Unit vector from the axis towards the side on which a value lies. */
export function sideOf(value: number, leg: DrawnLeg, style: FieldStyle): Spot {
  const sign = style.side * (value < 0 ? -1 : 1);
  return { x: leg.left.x * sign, y: leg.left.y * sign };
}

/** Pieces on legs in one line are one outline, with a step where the value jumps. */
function straightRuns(field: MemberField, legs: readonly DrawnLeg[]): FieldPiece[][] {
  const runs: FieldPiece[][] = [];
  for (const piece of field.pieces) {
    const before = runs.at(-1)?.at(-1);
    const [leg, other] = [legs[piece.leg], before === undefined ? undefined : legs[before.leg]];
    if (leg === undefined) continue;
    const goesOn = other !== undefined && leg.along.x * other.along.x + leg.along.y * other.along.y > 0.9999;
    if (goesOn) runs.at(-1)?.push(piece);
    else runs.push([piece]);
  }
  return runs;
}

function lineTo(spot: Spot): string {
  return `L${px(spot.x)} ${px(spot.y)}`;
}

function fieldCurve(piece: FieldPiece, leg: DrawnLeg, style: FieldStyle, scale: number): Curve {
  const polynomial: Polynomial = piece[style.quantity];
  const slope = derivative(polynomial);
  const pxPerMetre = leg.leg.length === 0 ? 0 : leg.length / leg.leg.length;
  const start = spotOnLeg(leg, piece.start);
  const across = style.side * scale;
  return {
    length: piece.end - piece.start,
    degree: degreeOf(polynomial, piece.end - piece.start),
    at: s => moved(moved(start, leg.along, s * pxPerMetre), leg.left, across * evaluate(polynomial, s)),
    slope: s => {
      const rise = across * evaluate(slope, s);
      return { x: leg.along.x * pxPerMetre + leg.left.x * rise, y: leg.along.y * pxPerMetre + leg.left.y * rise };
    },
  };
}

function sampled(curve: Curve): Spot[] {
  return [0, 0.25, 0.5, 0.75, 1].map(share => curve.at(share * curve.length));
}

function obstruct(sheet: Sheet, curve: Curve): void {
  const spots = sampled(curve);
  for (let i = 1; i < spots.length; i++) sheet.obstacles.push([spots[i - 1] as Spot, spots[i] as Spot]);
}
