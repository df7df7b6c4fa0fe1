// Movements of structures that have too many redundants for the force method: the real forces are given by the caller,
// and only the virtual system is found here.
//
// What this proves. The virtual system is in equilibrium by itself, so the movement is the one that belongs to the given
// forces along the members that carry the virtual system: a wrong movement is found out. That the forces are right is
// proved apart, by `largestGap`: forces that leave no gap anywhere belong to movements that fit together, and if they
// also balance the loads (which the caller's own residual says) they are the only ones that do both.
import type { UnitAction } from '../model/question.ts';
import type { InternalForces } from './internal-forces.ts';
import { addLoad, emptyLoading, type Loading } from './loading.ts';
import { bound, derivative, productIntegral, valueAt } from './polynomial.ts';
import { type Imposed, type PrimaryStructure, virtualSystem } from './primary.ts';
import type { SpanPiece } from './span.ts';
import { ENTRIES_PER_UNKNOWN, entriesOf, isUnknown, type StaticLeg, type Statics, unitOf } from './statics.ts';
import { movementsFrom } from './substitution.ts';
import { addFreeStrains, type Movement, type RealForces, roundingOf, virtualWork, workOnImposed } from './work.ts';

/** The strains that given forces cause, by unknown (see `strainsOf` in work.ts), with the forces themselves. */
export interface GivenForces {
  readonly forces: InternalForces;
  readonly strains: Float64Array;
  readonly imposed: Imposed;
  /** The largest force, N: of moments, with the leg's length for a lever. */
  readonly largest: number;
  /** The largest that any leg's strains could be if they did not change sign along it: movement of one end, m. */
  readonly size: number;
}

/** Of the structure under its cases with these factors, the forces being those of the same. */
export function givenForces(
  { statics }: PrimaryStructure,
  factors: readonly number[],
  forces: InternalForces,
): GivenForces {
  const { structure, legs, grounds, firstReaction } = statics;
  const strains = new Float64Array(statics.unknownCount);
  const loading = emptyLoading(statics);
  for (const load of structure.loads) {
    const factor = factors[load.case]!;
    if (factor !== 0) addLoad(statics, loading, load, factor);
  }
  const ends = new Float64Array(2 * legs.length * COMPONENTS);
  let largest = 0;
  let size = 0;
  for (let index = 0; index < legs.length; index++) {
    const leg = legs[index]!;
    const pieces = piecesWithin(forces, leg);
    const own = loading.spans.get(index);
    const couples = { start: own?.startMoment ?? 0, end: own?.endMoment ?? 0 };
    strains.set(strainsWithin(leg, pieces, couples), 3 * index);
    for (const { start, end, axialForce, bendingMoment } of pieces) {
      const axial = bound(axialForce, end - start);
      const lever = bound(bendingMoment, end - start) / leg.length;
      largest = Math.max(largest, axial, lever);
      size = Math.max(
        size,
        axial * leg.axialFlexibility * leg.length,
        lever * (leg.bendingFlexibility * leg.length ** 3 + leg.shearFlexibility * leg.length),
        lever * (leg.startTurning + leg.endTurning) * leg.length ** 2,
      );
    }
    ends.set(endForces(leg, pieces, couples), 2 * index * COMPONENTS);
  }
  addFreeStrains(statics, loading.free, strains);
  for (const [index, { axial, curvature }] of (loading.free ?? []).entries()) {
    const { length } = legs[index]!;
    size = Math.max(size, Math.abs(axial) * length, Math.abs(curvature) * length ** 2);
  }
  const onPoints = sumAtPoints(statics, ends, loading);
  for (const [index, { point, x, y, moment, flexibility }] of grounds.entries()) {
    const row = moment ? statics.coupleRow[point]! : statics.forceRow[point]!;
    const reaction = moment ? -onPoints[row]! : -(x * onPoints[row]! + y * onPoints[row + 1]!);
    strains[firstReaction + index] = flexibility * reaction - (loading.ground?.[index] ?? 0);
  }
  return { forces, strains, imposed: { ground: loading.ground, free: loading.free }, largest, size };
}

/** As `movement`, with the virtual system on the primary structure and the given forces for the real ones. */
export function movementFromForces(
  primary: PrimaryStructure,
  { forces, strains, imposed, largest }: GivenForces,
  actions: readonly UnitAction[],
): Movement {
  const { statics } = primary;
  const virtual = virtualSystem(primary, actions);
  const spans = new Map<number, { pieces: readonly SpanPiece[] }>();
  for (const leg of virtual.spans.keys()) spans.set(leg, { pieces: piecesWithin(forces, statics.legs[leg]!) });
  // The given pieces hold the whole force, so that nothing is left to stand at the ends.
  const real: RealForces = { unknowns: new Float64Array(statics.unknownCount), spans, imposed };
  const value = virtualWork(statics, virtual, real, strains);
  return { value, rounding: roundingOf(statics, virtual, largest, workOnImposed(statics, virtual, imposed)) };
}

/**
 * The largest gap that the strains of the given forces leave at a redundant, when the points have moved as the primary
 * structure's strains say: relative to the largest movement, turns by the length of the legs. 0 where all fits; of no
 * meaning where nothing moves and all strains are rounding.
 */
export function largestGap({ statics, elimination }: PrimaryStructure, given: GivenForces): number {
  // Here in dimensionless units, as the columns are.
  const scaled = given.strains.map((strain, unknown) => (strain === 0 ? 0 : strain * unitOf(statics, unknown)));
  // A unit of an unknown pulls the points against their movement, so that its work on them is minus its strain.
  const movements = movementsFrom(
    elimination,
    scaled.map(strain => -strain),
  );
  const rows = new Int32Array(ENTRIES_PER_UNKNOWN);
  const values = new Float64Array(ENTRIES_PER_UNKNOWN);
  let { size } = given;
  for (const movement of movements) size = Math.max(size, Math.abs(movement));
  let largest = 0;
  for (const unknown of elimination.redundants) {
    if (!isUnknown(statics, unknown)) continue;
    const count = entriesOf(statics, unknown, rows, values);
    let gap = scaled[unknown]!;
    size = Math.max(size, Math.abs(gap));
    for (let entry = 0; entry < count; entry++) gap += values[entry]! * movements[rows[entry]!]!;
    largest = Math.max(largest, Math.abs(gap));
  }
  return size === 0 ? 0 : largest / size;
}

/** Force right, force up, couple anticlockwise. */
const COMPONENTS = 3;

/** The leg's pieces, in distances from its start. */
function piecesWithin(forces: InternalForces, leg: StaticLeg): SpanPiece[] {
  const pieces: SpanPiece[] = [];
  for (const { leg: index, start, end, axialForce, bendingMoment } of forces.members[leg.member]!.pieces) {
    if (index !== leg.index) continue;
    pieces.push({ start: start - leg.start, end: end - leg.start, axialForce, bendingMoment });
  }
  return pieces;
}

/** Moments that loads put on hinged or connected ends of a leg from within, tension on the underside positive, N m. */
interface EndCouples {
  readonly start: number;
  readonly end: number;
}

function strainsWithin(
  leg: StaticLeg,
  pieces: readonly SpanPiece[],
  couples: EndCouples,
): [axial: number, start: number, end: number] {
  const { length, axialFlexibility, bendingFlexibility, shearFlexibility, startTurning, endTurning } = leg;
  let axial = 0;
  let falling = 0;
  let rising = 0;
  let shear = 0;
  for (const { start, end, axialForce, bendingMoment } of pieces) {
    const span = end - start;
    axial += productIntegral(axialForce, [1], span);
    falling += productIntegral(bendingMoment, [1 - start / length, -1 / length], span);
    rising += productIntegral(bendingMoment, [start / length, 1 / length], span);
    shear += productIntegral(derivative(bendingMoment), [1], span);
  }
  const sliding = (shearFlexibility * shear) / length;
  return [
    axialFlexibility * axial,
    bendingFlexibility * falling - sliding + startTurning * (momentAtStart(pieces) - couples.start),
    bendingFlexibility * rising + sliding + endTurning * (momentAtEnd(pieces) - couples.end),
  ];
}

/** What the leg does to the points at its start and end, `COMPONENTS` each. */
export function endForces(
  { cosine, sine, rigidStart, rigidEnd }: StaticLeg,
  pieces: readonly SpanPiece[],
  couples: EndCouples,
): number[] {
  const first = pieces[0]!;
  const last = pieces[pieces.length - 1]!;
  const span = last.end - last.start;
  const startAxial = valueAt(first.axialForce, 0);
  const startShear = valueAt(derivative(first.bendingMoment), 0);
  const endAxial = valueAt(last.axialForce, span);
  const endShear = valueAt(derivative(last.bendingMoment), span);
  return [
    startAxial * cosine + startShear * sine,
    startAxial * sine - startShear * cosine,
    rigidStart ? momentAtStart(pieces) - couples.start : 0,
    -endAxial * cosine - endShear * sine,
    -endAxial * sine + endShear * cosine,
    rigidEnd ? couples.end - momentAtEnd(pieces) : 0,
  ];
}

function momentAtStart([first]: readonly SpanPiece[]): number {
  return valueAt(first!.bendingMoment, 0);
}

function momentAtEnd(pieces: readonly SpanPiece[]): number {
  const { start, end, bendingMoment } = pieces[pieces.length - 1]!;
  return valueAt(bendingMoment, end - start);
}

/** Legs and loads together, by the rows of the equations. */
export function sumAtPoints(
  { legs, forceRow, coupleRow }: Statics,
  ends: Float64Array,
  { joints }: Loading,
): Float64Array {
  const sum = joints.slice();
  for (const [index, { from, to }] of legs.entries()) {
    for (const [which, point] of [from, to].entries()) {
      const at = (2 * index + which) * COMPONENTS;
      const row = forceRow[point]!;
      sum[row]! += ends[at]!;
      sum[row + 1]! += ends[at + 1]!;
      if (coupleRow[point]! >= 0) sum[coupleRow[point]!]! += ends[at + 2]!;
    }
  }
  return sum;
}
