// How the movements of the joints strain the legs and the springs: natural strains (lengthening, and the turning of each
// end against the chord), by leg from the freedoms, and as rows in the unknowns of a solve.

import type { Freedoms } from './freedoms.ts';
import { FREED_END, type Legs } from './legs.ts';
import type { Reduction } from './reduction.ts';

/** What relates a leg to the freedoms of its ends. */
export interface Ends {
  /** Six a leg: two movements and the rotation of the start, then of the end; a rotation of a bar is −1. */
  readonly freedoms: Int32Array;
  /**
   * Eight a leg: what the first and second movement of the start give along the leg, what they give across it (to the
   * left of the travel), then the same of the end.
   */
  readonly shares: Float64Array;
}

export function relateEnds(legs: Legs, freedoms: Freedoms): Ends {
  const { first, axisX, axisY } = freedoms;
  const ends: Ends = { freedoms: new Int32Array(6 * legs.count), shares: new Float64Array(8 * legs.count) };
  for (let e = 0; e < legs.count; e++) {
    const cosine = legs.cosine[e]!;
    const sine = legs.sine[e]!;
    for (let end = 0; end < 2; end++) {
      const p = (end === 0 ? legs.from : legs.to)[e]!;
      const x = axisX[p]!;
      const y = axisY[p]!;
      const f = 6 * e + 3 * end;
      ends.freedoms[f] = first[p]!;
      ends.freedoms[f + 1] = first[p]! + 1;
      ends.freedoms[f + 2] = (end === 0 ? freedoms.startRotation : freedoms.endRotation)[e]!;
      const s = 8 * e + 4 * end;
      const parallel = exact(cosine * x + sine * y);
      const square = exact(cosine * y - sine * x);
      ends.shares[s] = parallel;
      ends.shares[s + 1] = -square;
      ends.shares[s + 2] = square;
      ends.shares[s + 3] = parallel;
    }
  }
  return ends;
}

/**
 * What is left of sums that cancel, relative to their terms. Directions come from coordinates and angles that are rounded;
 * a leg along an axis must not resist a movement across it by what that leaves.
 */
const CANCELLED = 1e-12;

function exact(share: number): number {
  return Math.abs(share) <= CANCELLED ? 0 : share;
}

/**
 * Adds to the strains (three a leg: lengthening in m, turning of start and end against the chord in rad, anticlockwise)
 * what movements of the freedoms cause.
 */
export function addStrains(legs: Legs, ends: Ends, movement: Float64Array, strains: Float64Array): void {
  const { freedoms, shares } = ends;
  for (let e = 0; e < legs.count; e++) {
    const f = 6 * e;
    const s = 8 * e;
    const x0 = movement[freedoms[f]!]!;
    const y0 = movement[freedoms[f + 1]!]!;
    const x1 = movement[freedoms[f + 3]!]!;
    const y1 = movement[freedoms[f + 4]!]!;
    strains[3 * e]! += shares[s + 4]! * x1 + shares[s + 5]! * y1 - (shares[s]! * x0 + shares[s + 1]! * y0);
    if (legs.bending[e] === 0) continue;
    const across = shares[s + 6]! * x1 + shares[s + 7]! * y1 - (shares[s + 2]! * x0 + shares[s + 3]! * y0);
    const chord = across / legs.length[e]!;
    strains[3 * e + 1]! += movement[freedoms[f + 2]!]! - chord;
    strains[3 * e + 2]! += movement[freedoms[f + 5]!]! - chord;
  }
}

/** Takes from the forces on the freedoms what holds the legs' natural forces (three a leg, doing work on the strains) in place. */
export function subtractForces(legs: Legs, ends: Ends, natural: Float64Array, force: Float64Array): void {
  const { freedoms, shares } = ends;
  for (let e = 0; e < legs.count; e++) {
    const f = 6 * e;
    const s = 8 * e;
    const axial = natural[3 * e]!;
    const start = natural[3 * e + 1]!;
    const end = natural[3 * e + 2]!;
    const shear = -(start + end) / legs.length[e]!;
    force[freedoms[f]!]! += shares[s]! * axial + shares[s + 2]! * shear;
    force[freedoms[f + 1]!]! += shares[s + 1]! * axial + shares[s + 3]! * shear;
    force[freedoms[f + 3]!]! -= shares[s + 4]! * axial + shares[s + 6]! * shear;
    force[freedoms[f + 4]!]! -= shares[s + 5]! * axial + shares[s + 7]! * shear;
    if (legs.bending[e] === 0) continue;
    force[freedoms[f + 2]!]! -= start;
    force[freedoms[f + 5]!]! -= end;
  }
}

/**
 * The strains as linear forms in the unknowns: item i, a leg or, behind the legs, a spring, has the unknowns
 * `unknowns[starts[i]]` up to `unknowns[starts[i + 1]]`, each with its share in the lengthening (of a spring: its
 * shortening) and in the turning of both ends.
 */
export interface StrainRows {
  readonly count: number;
  readonly starts: Int32Array;
  readonly unknowns: Int32Array;
  readonly lengthening: Float64Array;
  readonly startTurning: Float64Array;
  readonly endTurning: Float64Array;
}

export function strainRows(legs: Legs, ends: Ends, freedoms: Freedoms, reduction: Reduction): StrainRows {
  const count = legs.count + freedoms.springs.length;
  const starts = new Int32Array(count + 1);
  const capacity = countTerms(ends, freedoms, reduction);
  const unknowns = new Int32Array(capacity);
  const lengthening = new Float64Array(capacity);
  const startTurning = new Float64Array(capacity);
  const endTurning = new Float64Array(capacity);
  // Sizes of the terms summed up in each; needed only where dependent freedoms bring several to one unknown.
  const tied = reduction.unknowns.length > reduction.size;
  const lengths = new Float64Array(tied ? capacity : 0);
  const turnings = new Float64Array(tied ? capacity : 0);
  // Where an unknown stands in the row under way, if it is there already.
  const places = new Int32Array(reduction.size).fill(-1);
  let filled = 0;
  let rowStart = 0;

  const add = (freedom: number, length: number, start: number, end: number) => {
    for (let k = reduction.starts[freedom]!; k < reduction.starts[freedom + 1]!; k++) {
      const unknown = reduction.unknowns[k]!;
      const value = reduction.values[k]!;
      let place = places[unknown]!;
      if (place < rowStart) {
        place = filled++;
        places[unknown] = place;
        unknowns[place] = unknown;
      }
      lengthening[place]! += value * length;
      startTurning[place]! += value * start;
      endTurning[place]! += value * end;
      if (tied) {
        lengths[place]! += Math.abs(value * length);
        turnings[place]! += Math.abs(value * start) + Math.abs(value * end);
      }
    }
  };
  const finish = (item: number) => {
    starts[item + 1] = filled;
    if (!tied) return;
    for (let k = rowStart; k < filled; k++) {
      if (Math.abs(lengthening[k]!) <= CANCELLED * lengths[k]!) lengthening[k] = 0;
      if (Math.abs(startTurning[k]!) <= CANCELLED * turnings[k]!) startTurning[k] = 0;
      if (Math.abs(endTurning[k]!) <= CANCELLED * turnings[k]!) endTurning[k] = 0;
    }
  };

  for (let e = 0; e < legs.count; e++) {
    rowStart = filled;
    const bends = legs.bending[e] !== 0;
    const stretches = legs.freedAxial[e] === FREED_END.none ? 1 : 0;
    // Where the shear is freed the chord has no part, and the one strain is the start turned against the end.
    const shears = legs.freedShear[e] === FREED_END.none;
    const turning = bends && shears ? 1 / legs.length[e]! : 0;
    for (let end = 0; end < 2; end++) {
      const sign = end === 0 ? -1 : 1;
      const f = 6 * e + 3 * end;
      const s = 8 * e + 4 * end;
      for (let k = 0; k < 2; k++) {
        const chord = -sign * ends.shares[s + 2 + k]! * turning;
        add(ends.freedoms[f + k]!, stretches * sign * ends.shares[s + k]!, chord, chord);
      }
      if (!bends) continue;
      if (shears) add(ends.freedoms[f + 2]!, 0, end === 0 ? 1 : 0, end === 0 ? 0 : 1);
      else add(ends.freedoms[f + 2]!, 0, -sign, 0);
    }
    finish(e);
  }
  freedoms.springs.forEach((spring, k) => {
    rowStart = filled;
    spring.freedoms.forEach((freedom, i) => {
      add(freedom, spring.coefficients[i]!, 0, 0);
    });
    finish(legs.count + k);
  });
  return { count, starts, unknowns, lengthening, startTurning, endTurning };
}

/** No fewer terms than the rows will have. */
function countTerms(ends: Ends, freedoms: Freedoms, reduction: Reduction): number {
  let terms = 0;
  const count = (freedom: number) => {
    if (freedom >= 0) terms += reduction.starts[freedom + 1]! - reduction.starts[freedom]!;
  };
  for (let k = 0; k < ends.freedoms.length; k++) count(ends.freedoms[k]!);
  for (const spring of freedoms.springs) for (const freedom of spring.freedoms) count(freedom);
  return terms;
}
