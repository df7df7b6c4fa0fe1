// The response as fields along the members: exact polynomials on every segment, each integrated from the start of its leg.

import { SEGMENT_NUMBERS } from './loading.ts';
import { evaluate, type Polynomial } from './polynomial.ts';
import type { FieldPiece, MemberField } from './solution.ts';
import type { System } from './system.ts';

/** What of a loading lies along the legs; see `Loading`. */
export interface Along {
  readonly segments: Float64Array;
  readonly shares: Float64Array;
}

/** `movement` by freedom, `natural` three a leg, as in `Response`; by member. */
export function fieldsOf(
  system: System,
  along: Along,
  movement: Float64Array,
  natural: Float64Array,
): readonly MemberField[] {
  const { structure, legs } = system;
  return structure.members.map((member, m) => {
    const pieces: FieldPiece[] = [];
    for (let k = 0; k < member.legs.length; k++) {
      const e = legs.first[m]! + k;
      const state = startOf(system, along, movement, natural, e);
      const start = member.legs[k]!.start;
      const end = k + 1 < member.legs.length ? member.legs[k + 1]!.start : member.length;
      if (legs.bending[e] === 0) addBarPieces(system, along, e, k, start, end, state, pieces);
      else addPieces(system, along, e, k, start, end, state, pieces);
    }
    return { pieces };
  });
}

/** The values of the fields at one place; signs as in solution.ts. */
interface State {
  axialForce: number;
  shearForce: number;
  bendingMoment: number;
  rotation: number;
  axialMovement: number;
  transverseMovement: number;
  /** Of the chord, per length. */
  readonly chord: number;
}

/** At the start of leg e, behind its joint. */
function startOf(system: System, along: Along, movement: Float64Array, natural: Float64Array, e: number): State {
  const { legs, ends } = system;
  const { freedoms, shares } = ends;
  const f = 6 * e;
  const s = 8 * e;
  const x0 = movement[freedoms[f]!]!;
  const y0 = movement[freedoms[f + 1]!]!;
  const x1 = movement[freedoms[f + 3]!]!;
  const y1 = movement[freedoms[f + 4]!]!;
  const startAcross = shares[s + 2]! * x0 + shares[s + 3]! * y0;
  const chord = (shares[s + 6]! * x1 + shares[s + 7]! * y1 - startAcross) / legs.length[e]!;
  // Moments sum to shear × length and to what the loads' shares turn: V = (M(L) − M(0)) / L − share.
  const startMoment = natural[3 * e + 1]!;
  const endMoment = natural[3 * e + 2]!;
  const bar = legs.bending[e] === 0;
  return {
    axialForce: natural[3 * e]! + along.shares[2 * e]!,
    shearForce: bar ? 0 : (startMoment + endMoment) / legs.length[e]! - along.shares[2 * e + 1]!,
    bendingMoment: bar ? 0 : 0 - startMoment,
    rotation: bar ? chord : movement[freedoms[f + 2]!]!,
    axialMovement: shares[s]! * x0 + shares[s + 1]! * y0,
    transverseMovement: startAcross,
    chord,
  };
}

function addPieces(
  system: System,
  along: Along,
  e: number,
  leg: number,
  legStart: number,
  legEnd: number,
  state: State,
  pieces: FieldPiece[],
): void {
  const { legs, segments } = system;
  const flexibility = 1 / legs.bending[e]!;
  const stretch = 1 / legs.axial[e]!;
  const last = segments.first[e + 1]! - 1;
  for (let g = segments.first[e]!; g <= last; g++) {
    const from = segments.breaks[g + e]!;
    const length = segments.breaks[g + e + 1]! - from;
    const at = SEGMENT_NUMBERS * g;
    const w0 = along.segments[at]!;
    const w1 = along.segments[at + 1]!;
    const p0 = along.segments[at + 2]!;
    const p1 = along.segments[at + 3]!;
    state.shearForce += along.segments[at + 4]!;
    state.axialForce -= along.segments[at + 5]!;
    state.bendingMoment -= along.segments[at + 6]!;
    const N = state.axialForce;
    const V = state.shearForce;
    const M = state.bendingMoment;
    // dN/ds = −p, dV/ds = w, dM/ds = V; EI dθ/ds = M, dv/ds = θ, EA du/ds = N.
    const axialForce: Polynomial = [N, 0 - p0, 0 - p1 / 2];
    const shearForce: Polynomial = [V, w0, w1 / 2];
    const bendingMoment: Polynomial = [M, V, w0 / 2, w1 / 6];
    const rotation: Polynomial = [
      state.rotation,
      M * flexibility,
      (V / 2) * flexibility,
      (w0 / 6) * flexibility,
      (w1 / 24) * flexibility,
    ];
    const transverseMovement: Polynomial = [
      state.transverseMovement,
      state.rotation,
      (M / 2) * flexibility,
      (V / 6) * flexibility,
      (w0 / 24) * flexibility,
      (w1 / 120) * flexibility,
    ];
    const axialMovement: Polynomial = [
      state.axialMovement,
      N * stretch,
      (0 - p0 / 2) * stretch,
      (0 - p1 / 6) * stretch,
    ];
    pieces.push({
      leg,
      start: legStart + from,
      end: g === last ? legEnd : legStart + from + length,
      axialForce,
      shearForce,
      bendingMoment,
      rotation,
      axialMovement,
      transverseMovement,
    });
    if (g === last) break;
    state.axialForce = evaluate(axialForce, length);
    state.shearForce = evaluate(shearForce, length);
    state.bendingMoment = evaluate(bendingMoment, length);
    state.rotation = evaluate(rotation, length);
    state.axialMovement = evaluate(axialMovement, length);
    state.transverseMovement = evaluate(transverseMovement, length);
  }
}

/** A bar stays straight; only what acts along it makes its force vary. */
function addBarPieces(
  system: System,
  along: Along,
  e: number,
  leg: number,
  legStart: number,
  legEnd: number,
  state: State,
  pieces: FieldPiece[],
): void {
  const { legs, segments } = system;
  const stretch = 1 / legs.axial[e]!;
  const last = segments.first[e + 1]! - 1;
  for (let g = segments.first[e]!; g <= last; g++) {
    const from = segments.breaks[g + e]!;
    const length = segments.breaks[g + e + 1]! - from;
    const at = SEGMENT_NUMBERS * g;
    const p0 = along.segments[at + 2]!;
    const p1 = along.segments[at + 3]!;
    state.axialForce -= along.segments[at + 5]!;
    const N = state.axialForce;
    const axialForce: Polynomial = [N, 0 - p0, 0 - p1 / 2];
    const axialMovement: Polynomial = [
      state.axialMovement,
      N * stretch,
      (0 - p0 / 2) * stretch,
      (0 - p1 / 6) * stretch,
    ];
    pieces.push({
      leg,
      start: legStart + from,
      end: g === last ? legEnd : legStart + from + length,
      axialForce,
      shearForce: NONE,
      bendingMoment: NONE,
      rotation: [state.chord],
      axialMovement,
      transverseMovement: [state.transverseMovement + state.chord * from, state.chord],
    });
    state.axialForce = evaluate(axialForce, length);
    state.axialMovement = evaluate(axialMovement, length);
  }
}

const NONE: Polynomial = [0];
