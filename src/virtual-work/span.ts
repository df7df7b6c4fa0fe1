// Internal forces within one loaded leg, range by range and exactly: those that the loads on it cause while it rests
// simply at its ends. What the end moments and the axial force add is linear and constant.
import { type Polynomial, productIntegral } from './polynomial.ts';

/** Loads on one leg. Distances from its start, m; along: with the travel, across: to the left of it. */
export interface SpanLoad {
  /** Linear from start to end, start < end; N/m. */
  readonly stretches: SpanStretch[];
  readonly forces: SpanForce[];
  /** Moments that couples on hinged ends cause there, N m, tension on the underside positive. */
  startMoment: number;
  endMoment: number;
}

export interface SpanStretch {
  readonly start: number;
  readonly end: number;
  readonly startAlong: number;
  readonly endAlong: number;
  readonly startAcross: number;
  readonly endAcross: number;
}

export interface SpanForce {
  readonly at: number;
  /** N. */
  readonly along: number;
  readonly across: number;
  /** N m, anticlockwise. */
  readonly couple: number;
}

export interface SpanPiece {
  readonly start: number;
  readonly end: number;
  /** In the distance from `start`: N, tension positive, zero at the start of the leg. */
  readonly axialForce: Polynomial;
  /** N m, tension on the underside positive. */
  readonly bendingMoment: Polynomial;
}

export interface SpanForces {
  readonly pieces: readonly SpanPiece[];
  /** Of the whole leg, at its ends, N: shear dM/dx, and axial force (that at the start is zero). */
  readonly startShear: number;
  readonly endShear: number;
  readonly endAxial: number;
  /** Integrals along the leg: of N; of M with a weight that falls from 1 to 0; of M with one that rises from 0 to 1. */
  readonly axialIntegral: number;
  readonly fallingIntegral: number;
  readonly risingIntegral: number;
  /** Of the shear, N m: what the couples on the leg and at its hinged ends leave. */
  readonly shearIntegral: number;
}

export function emptySpanLoad(): SpanLoad {
  return { stretches: [], forces: [], startMoment: 0, endMoment: 0 };
}

export function spanForces(load: SpanLoad, length: number): SpanForces {
  const ends = breakpoints(load, length);
  const startShear = shearAtStart(load, length);
  const pieces: SpanPiece[] = [];
  let axial = 0;
  let shear = startShear;
  let moment = load.startMoment;
  let axialIntegral = 0;
  let fallingIntegral = 0;
  let risingIntegral = 0;
  let shearIntegral = 0;
  for (let index = 0; index + 1 < ends.length; index++) {
    const start = ends[index]!;
    const end = ends[index + 1]!;
    const span = end - start;
    for (const force of load.forces) {
      if (force.at !== start) continue;
      axial -= force.along;
      shear += force.across;
      moment -= force.couple;
    }
    const [along, alongSlope, across, acrossSlope] = intensities(load.stretches, start, end);
    const axialForce = [axial, -along, -alongSlope / 2];
    const bendingMoment = [moment, shear, across / 2, acrossSlope / 6];
    pieces.push({ start, end, axialForce, bendingMoment });
    axialIntegral += productIntegral(axialForce, [1], span);
    fallingIntegral += productIntegral(bendingMoment, [(length - start) / length, -1 / length], span);
    risingIntegral += productIntegral(bendingMoment, [start / length, 1 / length], span);
    const gained = span * (shear + span * (across / 2 + (span * acrossSlope) / 6));
    shearIntegral += gained;
    moment += gained;
    axial -= span * (along + (span * alongSlope) / 2);
    shear += span * (across + (span * acrossSlope) / 2);
  }
  return {
    pieces,
    startShear,
    endShear: shear,
    endAxial: axial,
    axialIntegral,
    fallingIntegral,
    risingIntegral,
    shearIntegral,
  };
}

/** By turning about the end: the shear there has no lever. */
function shearAtStart({ stretches, forces, startMoment, endMoment }: SpanLoad, length: number): number {
  let turning = endMoment - startMoment;
  for (const { at, across, couple } of forces) turning += couple - across * (length - at);
  for (const { start, end, startAcross, endAcross } of stretches) {
    const span = end - start;
    turning -= (span * (startAcross + endAcross) * (length - start)) / 2;
    turning += (span * span * (startAcross + 2 * endAcross)) / 6;
  }
  return turning / length;
}

function breakpoints({ stretches, forces }: SpanLoad, length: number): number[] {
  const ends = [0, length];
  for (const { start, end } of stretches) ends.push(start, end);
  for (const { at } of forces) ends.push(at);
  ends.sort((a, b) => a - b);
  return ends.filter((end, index) => index === 0 || end !== ends[index - 1]);
}

/** Line loads at the start of a range that none of them ends within, and their slopes. */
function intensities(
  stretches: readonly SpanStretch[],
  start: number,
  end: number,
): [along: number, alongSlope: number, across: number, acrossSlope: number] {
  let along = 0;
  let alongSlope = 0;
  let across = 0;
  let acrossSlope = 0;
  for (const stretch of stretches) {
    if (stretch.start >= end || stretch.end <= start) continue;
    const span = stretch.end - stretch.start;
    const toAlong = (stretch.endAlong - stretch.startAlong) / span;
    const toAcross = (stretch.endAcross - stretch.startAcross) / span;
    along += stretch.startAlong + toAlong * (start - stretch.start);
    across += stretch.startAcross + toAcross * (start - stretch.start);
    alongSlope += toAlong;
    acrossSlope += toAcross;
  }
  return [along, alongSlope, across, acrossSlope];
}
