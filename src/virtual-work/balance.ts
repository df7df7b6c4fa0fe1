// Whether a solution of the first road balances: its forces at every point, along every leg and as a whole, under the loads
// as this room reads them; and the work of loads and ground against that of the internal forces (Clapeyron, with what is
// imposed counted), by this room's own flexibilities. All integrals are of polynomials, and exact.
import type { Structure } from '../model/structure.ts';
import { endForces, sumAtPoints } from './given-forces.ts';
import { addLoad, emptyLoading, type Loading, UNSTRAINED } from './loading.ts';
import { bound, derivative, type Polynomial, productIntegral, shifted, valueAt } from './polynomial.ts';
import type { SpanLoad } from './span.ts';
import type { StaticLeg, Statics } from './statics.ts';

/** What is read of a solution; signs and units are those of the model and of internal-forces.ts. */
export interface SolvedState {
  /** Per point: x, y, rotation of the joint. */
  readonly movements: Float64Array;
  readonly members: readonly { readonly pieces: readonly SolvedPiece[] }[];
  /** By support, on the structure. */
  readonly reactions: readonly { readonly x: number; readonly y: number; readonly moment: number }[];
  /** The largest force and couple that went into it, for what is imposed those that would hold all else still. */
  readonly largest?: { readonly force: number; readonly moment: number };
}

export interface SolvedPiece {
  readonly leg: number;
  readonly start: number;
  readonly end: number;
  readonly axialForce: Polynomial;
  readonly bendingMoment: Polynomial;
  readonly rotation: Polynomial;
  readonly axialMovement: Polynomial;
  readonly transverseMovement: Polynomial;
}

export interface Balance {
  /** The largest force out of balance at a point, on a leg or on the whole, over the loads; couples over the frame's size. */
  readonly equilibrium: number;
  /** Work of loads and ground less that of the internal forces, over the sizes of their terms. */
  readonly energy: number;
}

export function balanceOf(statics: Statics, factors: readonly number[], solution: SolvedState): Balance {
  const { structure } = statics;
  const loading = emptyLoading(statics);
  for (const load of structure.loads) {
    const factor = factors[load.case]!;
    if (factor !== 0) addLoad(statics, loading, load, factor);
  }
  const pieces = statics.legs.map(leg => piecesOf(leg, solution));
  const size = sizeOf(structure);
  const applied = totalOf(statics, loading);
  const { force, moment } = solution.largest ?? { force: 0, moment: 0 };
  const scale = Math.max(applied.size, force, moment / size);
  const open = Math.max(
    atPoints(statics, loading, solution, pieces, size),
    alongLegs(statics, loading, pieces),
    asAWhole(statics, applied, solution, size),
  );
  return { equilibrium: scale === 0 ? 0 : open / scale, energy: energyGap(statics, loading, solution, pieces, scale) };
}

/** Within one leg, places from its start. */
type LegPieces = readonly SolvedPiece[];

function piecesOf(leg: StaticLeg, { members }: SolvedState): LegPieces {
  return members[leg.member]!.pieces.filter(piece => piece.leg === leg.index).map(piece => ({
    ...piece,
    start: piece.start - leg.start,
    end: piece.end - leg.start,
  }));
}

/** Diagonal of the box around the points, m. */
function sizeOf({ points }: Structure): number {
  const extent = (values: readonly number[]) =>
    values.reduce((most, value) => Math.max(most, value), -Infinity) -
    values.reduce((least, value) => Math.min(least, value), Infinity);
  return Math.hypot(extent(points.map(({ x }) => x)), extent(points.map(({ y }) => y))) || 1;
}

// Equilibrium

/** Member-end forces, loads and reactions at each point. */
function atPoints(
  statics: Statics,
  loading: Loading,
  solution: SolvedState,
  pieces: readonly LegPieces[],
  size: number,
): number {
  const { structure, legs, forceRow, coupleRow } = statics;
  const ends = new Float64Array(6 * legs.length);
  for (const [index, leg] of legs.entries()) {
    const own = loading.spans.get(index);
    const couples = { start: own?.startMoment ?? 0, end: own?.endMoment ?? 0 };
    ends.set(endForces(leg, pieces[index]!, couples), 6 * index);
  }
  const open = sumAtPoints(statics, ends, loading);
  for (const [index, { point }] of structure.supports.entries()) {
    const { x, y, moment } = solution.reactions[index]!;
    if (forceRow[point]! < 0) continue;
    open[forceRow[point]!]! += x;
    open[forceRow[point]! + 1]! += y;
    if (coupleRow[point]! >= 0) open[coupleRow[point]!]! += moment;
  }
  let largest = 0;
  for (let point = 0; point < structure.points.length; point++) {
    const row = forceRow[point]!;
    if (row < 0) continue;
    largest = Math.max(largest, Math.abs(open[row]!), Math.abs(open[row + 1]!));
    if (coupleRow[point]! >= 0) largest = Math.max(largest, Math.abs(open[coupleRow[point]!]!) / size);
  }
  return largest;
}

/** Each leg as a free body: its end forces against the loads within, couples over its length. */
function alongLegs({ legs }: Statics, { spans }: Loading, pieces: readonly LegPieces[]): number {
  let largest = 0;
  for (const [index, { length, bendingFlexibility }] of legs.entries()) {
    const first = pieces[index]![0]!;
    const last = pieces[index]!.at(-1)!;
    const reach = last.end - last.start;
    const total = resultant(spans.get(index), length);
    const axial = valueAt(last.axialForce, reach) - valueAt(first.axialForce, 0) + total.along;
    largest = Math.max(largest, Math.abs(axial));
    if (bendingFlexibility === 0) continue;
    const startShear = valueAt(derivative(first.bendingMoment), 0);
    const shear = valueAt(derivative(last.bendingMoment), reach) - startShear - total.across;
    const moment =
      valueAt(last.bendingMoment, reach) - valueAt(first.bendingMoment, 0) - startShear * length - total.moment;
    largest = Math.max(largest, Math.abs(shear), Math.abs(moment) / length);
  }
  return largest;
}

/** Sums of the loads within a leg, N, and what they add to the moment at its end, N m. */
function resultant(load: SpanLoad | undefined, length: number) {
  const total = { along: 0, across: 0, moment: 0 };
  for (const { at, along, across, couple } of load?.forces ?? []) {
    total.along += along;
    total.across += across;
    total.moment += across * (length - at) - couple;
  }
  for (const { start, end, startAlong, endAlong, startAcross, endAcross } of load?.stretches ?? []) {
    const reach = end - start;
    total.along += (reach * (startAlong + endAlong)) / 2;
    total.across += (reach * (startAcross + endAcross)) / 2;
    total.moment +=
      (reach * (startAcross + endAcross) * (length - start)) / 2 - (reach * reach * (startAcross + 2 * endAcross)) / 6;
  }
  return total;
}

interface Total {
  x: number;
  y: number;
  /** About the origin, anticlockwise. */
  moment: number;
  /** Sum of the sizes of the forces, N. */
  size: number;
}

function totalOf({ structure, legs, forceRow, coupleRow }: Statics, { joints, spans }: Loading): Total {
  const total: Total = { x: 0, y: 0, moment: 0, size: 0 };
  const add = (atX: number, atY: number, x: number, y: number) => {
    total.x += x;
    total.y += y;
    total.moment += atX * y - atY * x;
    total.size += Math.hypot(x, y);
  };
  structure.points.forEach(({ x, y }, point) => {
    const row = forceRow[point]!;
    if (row < 0) return;
    add(x, y, joints[row]!, joints[row + 1]!);
    if (coupleRow[point]! >= 0) total.moment += joints[coupleRow[point]!]!;
  });
  for (const [index, load] of spans) {
    const { from, cosine, sine, length } = legs[index]!;
    const { x, y } = structure.points[from]!;
    const { along, across, moment } = resultant(load, length);
    add(x, y, cosine * along - sine * across, sine * along + cosine * across);
    // About the start: the whole at the end, less what it turns about that end, and couples on hinged ends.
    total.moment += across * length - moment + load.endMoment - load.startMoment;
  }
  return total;
}

/** Loads and reactions together, turned about the first supported point. */
function asAWhole({ structure, forceRow }: Statics, applied: Total, { reactions }: SolvedState, size: number): number {
  let { x, y, moment } = applied;
  for (const [index, { point }] of structure.supports.entries()) {
    if (forceRow[point]! < 0) continue;
    const at = structure.points[point]!;
    const reaction = reactions[index]!;
    x += reaction.x;
    y += reaction.y;
    moment += reaction.moment + at.x * reaction.y - at.y * reaction.x;
  }
  const about = structure.points[structure.supports[0]?.point ?? 0]!;
  return Math.max(Math.abs(x), Math.abs(y), Math.abs(moment - about.x * y + about.y * x) / size);
}

// Energy

/** A sum beside the sizes of its terms, N m. */
interface Work {
  value: number;
  size: number;
}

/** Below this share of the largest force on the largest movement a difference is rounding: some hundreds of terms. */
const ROUNDING = 2.5e-4;

function energyGap(
  statics: Statics,
  loading: Loading,
  solution: SolvedState,
  pieces: readonly LegPieces[],
  scale: number,
): number {
  const work: Work = { value: 0, size: 0 };
  addWorkAtPoints(statics, loading, solution, work);
  let [force, movement] = [scale, 0];
  for (const value of solution.movements) movement = Math.max(movement, Math.abs(value));
  for (const [index, leg] of statics.legs.entries()) {
    const load = loading.spans.get(index);
    if (load !== undefined) addWorkWithin(load, pieces[index]!, work);
    addInternalWork(leg, loading.free?.[index] ?? UNSTRAINED, load, pieces[index]!, work);
    for (const { start, end, axialForce, axialMovement, transverseMovement } of pieces[index]!) {
      force = Math.max(force, bound(axialForce, end - start));
      movement = Math.max(movement, bound(axialMovement, end - start), bound(transverseMovement, end - start));
    }
  }
  const size = Math.max(work.size, ROUNDING * force * movement);
  return size === 0 ? 0 : Math.abs(work.value) / size;
}

function add(work: Work, value: number): void {
  work.value += value;
  work.size += Math.abs(value);
}

/** Of loads on the points, and of reactions: what the ground moves, or a spring gives. */
function addWorkAtPoints(statics: Statics, { joints }: Loading, solution: SolvedState, work: Work): void {
  const { structure, forceRow, coupleRow } = statics;
  const { movements, reactions } = solution;
  for (let point = 0; point < structure.points.length; point++) {
    const row = forceRow[point]!;
    if (row < 0) continue;
    add(work, joints[row]! * movements[3 * point]!);
    add(work, joints[row + 1]! * movements[3 * point + 1]!);
    if (coupleRow[point]! >= 0) add(work, joints[coupleRow[point]!]! * movements[3 * point + 2]!);
  }
  for (const [index, { point }] of structure.supports.entries()) {
    const { x, y, moment } = reactions[index]!;
    add(work, x * movements[3 * point]!);
    add(work, y * movements[3 * point + 1]!);
    add(work, moment * movements[3 * point + 2]!);
  }
}

function addWorkWithin({ stretches, forces, startMoment, endMoment }: SpanLoad, pieces: LegPieces, work: Work): void {
  for (const stretch of stretches) {
    const span = stretch.end - stretch.start;
    const [along, across] = [
      (stretch.endAlong - stretch.startAlong) / span,
      (stretch.endAcross - stretch.startAcross) / span,
    ];
    for (const piece of pieces) {
      const start = Math.max(stretch.start, piece.start);
      const reach = Math.min(stretch.end, piece.end) - start;
      if (reach <= 0) continue;
      const behind = start - stretch.start;
      const inPiece = start - piece.start;
      const alongHere = [stretch.startAlong + along * behind, along];
      const acrossHere = [stretch.startAcross + across * behind, across];
      add(work, productIntegral(alongHere, shifted(piece.axialMovement, inPiece), reach));
      add(work, productIntegral(acrossHere, shifted(piece.transverseMovement, inPiece), reach));
    }
  }
  for (const { at, along, across, couple } of forces) {
    const piece = pieces.find(({ end }) => at <= end) ?? pieces.at(-1)!;
    add(work, along * valueAt(piece.axialMovement, at - piece.start));
    add(work, across * valueAt(piece.transverseMovement, at - piece.start));
    add(work, couple * valueAt(piece.rotation, at - piece.start));
  }
  // Couples on hinged or connected ends turn the leg, not the joint: see `SpanLoad` for their sense.
  const last = pieces.at(-1)!;
  add(work, -startMoment * valueAt(pieces[0]!.rotation, 0));
  add(work, endMoment * valueAt(last.rotation, last.end - last.start));
}

/** Takes off ∫ (N ε + M κ + V²/GAs) dx and M²/k of the connections, ε and κ with what is free of force. */
function addInternalWork(
  leg: StaticLeg,
  free: { readonly axial: number; readonly curvature: number },
  load: SpanLoad | undefined,
  pieces: LegPieces,
  work: Work,
): void {
  const { axialFlexibility, bendingFlexibility, shearFlexibility, startTurning, endTurning } = leg;
  for (const { start, end, axialForce, bendingMoment } of pieces) {
    const reach = end - start;
    add(work, -axialFlexibility * productIntegral(axialForce, axialForce, reach));
    add(work, -free.axial * productIntegral(axialForce, [1], reach));
    add(work, -bendingFlexibility * productIntegral(bendingMoment, bendingMoment, reach));
    add(work, -free.curvature * productIntegral(bendingMoment, [1], reach));
    if (shearFlexibility === 0) continue;
    const shear = derivative(bendingMoment);
    add(work, -shearFlexibility * productIntegral(shear, shear, reach));
  }
  if (startTurning === 0 && endTurning === 0) return;
  const last = pieces.at(-1)!;
  const start = valueAt(pieces[0]!.bendingMoment, 0) - (load?.startMoment ?? 0);
  const end = valueAt(last.bendingMoment, last.end - last.start) - (load?.endMoment ?? 0);
  add(work, -startTurning * start * start);
  add(work, -endTurning * end * end);
}
