// What the loads along a leg come to at its ends: its shares of them as a simple span, and what turns ends that are clamped.

import { shearRatio } from './leg-stiffness.ts';
import { FREED_END, type Legs } from './legs.ts';
import type { Segments } from './segments.ts';
import type { Reaction } from './solution.ts';
import type { Ends } from './strains.ts';

export interface Loading {
  /** Forces and couples on the freedoms, each load between the ends of a leg shared out to them as by a simple span. */
  readonly nodal: Float64Array;
  /**
   * `SEGMENT_NUMBERS` a segment: intensity across the leg (to the left of the travel) at the segment's start and its
   * slope, the same along the leg, N/m and N/m²; then what acts at the segment's start: force across, force along,
   * couple anticlockwise.
   */
  readonly segments: Float64Array;
  /** Two a leg: what of the loads on it its start takes, along and across, N. */
  readonly shares: Float64Array;
  /**
   * Three a leg, as natural forces, what ends that are held still answer the loads with, reversed: along it (0 unless the
   * axial force is freed at an end), and the work of the loads on a unit turning of each end against the chord, N m.
   */
  readonly clamped: Float64Array;
  readonly applied: Reaction;
}

export const SEGMENT_NUMBERS = 7;

/**
 * The shares of a leg's ends: work of the loads on the movements that a unit movement or turning of an end causes, which
 * are linear and, for a turning, the cubic of a beam clamped at both ends (Przemieniecki, Theory of Matrix Structural
 * Analysis, chapter 5). Gauss's rule with three points is exact for a linear intensity on a cubic.
 */
export function shareOut(e: number, legs: Legs, ends: Ends, places: Segments, loading: Loading): void {
  const { nodal, segments, shares, clamped } = loading;
  const length = legs.length[e]!;
  const sums: Shares = {
    couples: 0,
    startAlong: 0,
    endAlong: 0,
    startAcross: 0,
    endAcross: 0,
    startTurning: 0,
    endTurning: 0,
  };
  for (let g = places.first[e]!; g < places.first[e + 1]!; g++) {
    const at = SEGMENT_NUMBERS * g;
    const from = places.breaks[g + e]!;
    const to = places.breaks[g + e + 1]!;
    for (let k = 0; k < 3; k++) {
      const s = (to - from) * GAUSS_PLACES[k]!;
      const weight = (to - from) * GAUSS_WEIGHTS[k]!;
      const across = segments[at]! + segments[at + 1]! * s;
      const along = segments[at + 2]! + segments[at + 3]! * s;
      addForce(sums, (from + s) / length, length, weight * across, weight * along);
    }
    addForce(sums, from / length, length, segments[at + 4]!, segments[at + 5]!);
    addCouple(sums, from / length, length, segments[at + 6]!);
  }
  if (legs.bending[e] === 0) {
    for (let g = places.first[e]!; g < places.first[e + 1]!; g++) {
      const at = SEGMENT_NUMBERS * g;
      segments[at] = segments[at + 1] = segments[at + 4] = segments[at + 6] = 0;
    }
  } else {
    shares[2 * e + 1] = sums.startAcross;
    // What shear adds to both couples alike.
    const more = 0.5 * (clampedSum(e, legs, sums) - (sums.startTurning + sums.endTurning));
    clamped[3 * e + 1] = sums.startTurning + more;
    clamped[3 * e + 2] = sums.endTurning + more;
  }
  shares[2 * e] = sums.startAlong;
  // Freed at an end, the axial force is nil there and the other end takes all that lies along the leg.
  if (legs.freedAxial[e] === FREED_END.start) clamped[3 * e] = sums.startAlong;
  if (legs.freedAxial[e] === FREED_END.end) clamped[3 * e] = -sums.endAlong;

  for (let end = 0; end < 2; end++) {
    const along = end === 0 ? sums.startAlong : sums.endAlong;
    const across = end === 0 ? sums.startAcross : sums.endAcross;
    const f = 6 * e + 3 * end;
    const s = 8 * e + 4 * end;
    nodal[ends.freedoms[f]!]! += along * ends.shares[s]! + across * ends.shares[s + 2]!;
    nodal[ends.freedoms[f + 1]!]! += along * ends.shares[s + 1]! + across * ends.shares[s + 3]!;
  }
}

/**
 * The sum of both couples of a clamped leg, which is what its shear differs by from that of a simple span; their difference
 * is the same with shear deformation and without. As forces along a simple span leave no mean shear but couples do, the
 * sum is (that of bending alone + φ Σ couples) / (1 + φ). With the shear freed at an end, it is what makes it nil there.
 */
function clampedSum(e: number, legs: Legs, sums: Shares): number {
  if (legs.freedShear[e] === FREED_END.start) return -legs.length[e]! * sums.startAcross;
  if (legs.freedShear[e] === FREED_END.end) return legs.length[e]! * sums.endAcross;
  const phi = shearRatio(legs, e);
  return (sums.startTurning + sums.endTurning + phi * sums.couples) / (1 + phi);
}

interface Shares {
  /** Of all couples within, N m. */
  couples: number;
  startAlong: number;
  endAlong: number;
  startAcross: number;
  endAcross: number;
  startTurning: number;
  endTurning: number;
}

/** On 0 … 1. */
const GAUSS_PLACES = [0.5 - Math.sqrt(0.15), 0.5, 0.5 + Math.sqrt(0.15)];
const GAUSS_WEIGHTS = [5 / 18, 8 / 18, 5 / 18];

/** `t`: place over length. */
function addForce(sums: Shares, t: number, length: number, across: number, along: number): void {
  sums.startAlong += along * (1 - t);
  sums.endAlong += along * t;
  sums.startAcross += across * (1 - t);
  sums.endAcross += across * t;
  sums.startTurning += across * length * t * (1 - t) * (1 - t);
  sums.endTurning -= across * length * t * t * (1 - t);
}

/** A couple does work on the slopes of the same movements. */
function addCouple(sums: Shares, t: number, length: number, moment: number): void {
  sums.couples += moment;
  sums.startAcross -= moment / length;
  sums.endAcross += moment / length;
  sums.startTurning += moment * (1 - t) * (1 - 3 * t);
  sums.endTurning += moment * t * (3 * t - 2);
}
