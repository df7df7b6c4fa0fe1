// The response as fields along the members: exact polynomials on every segment, each integrated from the start of its leg.

import type { FreeStrains } from './free-strains.ts';
import { FREED_END, type Legs } from './legs.ts';
import { evaluate, sum } from './polynomial.ts';
import { SEGMENT_NUMBERS } from './shares.ts';
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
  free: FreeStrains | undefined,
  movement: Float64Array,
  natural: Float64Array,
): readonly MemberField[] {
  const { structure, legs } = system;
  return structure.members.map((member, m) => {
    const pieces: FieldPiece[] = [];
    for (let k = 0; k < member.legs.length; k++) {
      const e = legs.first[m]! + k;
      const end = k + 1 < member.legs.length ? member.legs[k + 1]!.start : member.length;
      const leg = { index: k, start: member.legs[k]!.start, end };
      const firstPiece = pieces.length;
      const state = startOf(system, along, movement, natural, e);
      addPieces(system, along, free, e, leg, state, pieces);
      closeLeg(system, movement, e, state, pieces, firstPiece);
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
}

/** At the start of leg e, behind its joint. A bar has neither shear nor moment, and turns with its chord. */
function startOf(system: System, along: Along, movement: Float64Array, natural: Float64Array, e: number): State {
  const { legs, ends } = system;
  const { freedoms, shares } = ends;
  const f = 6 * e;
  const s = 8 * e;
  const x0 = movement[freedoms[f]!]!;
  const y0 = movement[freedoms[f + 1]!]!;
  const axialForce = natural[3 * e]! + along.shares[2 * e]!;
  const axialMovement = shares[s]! * x0 + shares[s + 1]! * y0;
  const transverseMovement = shares[s + 2]! * x0 + shares[s + 3]! * y0;
  if (legs.bending[e] === 0) {
    const x1 = movement[freedoms[f + 3]!]!;
    const y1 = movement[freedoms[f + 4]!]!;
    const rotation = (shares[s + 6]! * x1 + shares[s + 7]! * y1 - transverseMovement) / legs.length[e]!;
    return { axialForce, shearForce: 0, bendingMoment: 0, rotation, axialMovement, transverseMovement };
  }
  // The couples on both ends and what the loads' shares turn balance: V = (M(L) − M(0)) / L − share.
  const startCouple = natural[3 * e + 1]!;
  const endCouple = natural[3 * e + 2]!;
  const shearForce = (startCouple + endCouple) / legs.length[e]! - along.shares[2 * e + 1]!;
  const rotation = movement[freedoms[f + 2]!]!;
  return { axialForce, shearForce, bendingMoment: 0 - startCouple, rotation, axialMovement, transverseMovement };
}

/**
 * What a leg's pieces, integrated from the joint at its start, are off by across and along it where that start slides past
 * the joint: the joint at the end says so.
 */
function closeLeg(
  { legs, ends }: System,
  movement: Float64Array,
  e: number,
  reached: State,
  pieces: FieldPiece[],
  firstPiece: number,
): void {
  if (isAttachedAtStart(legs, e)) return;
  const slides = legs.freedAxial[e] === FREED_END.start;
  const shifts = legs.freedShear[e] === FREED_END.start;
  const { freedoms, shares } = ends;
  const s = 8 * e + 4;
  const x = movement[freedoms[6 * e + 3]!]!;
  const y = movement[freedoms[6 * e + 4]!]!;
  const along = slides ? shares[s]! * x + shares[s + 1]! * y - reached.axialMovement : 0;
  const across = shifts ? shares[s + 2]! * x + shares[s + 3]! * y - reached.transverseMovement : 0;
  for (let k = firstPiece; k < pieces.length; k++) {
    const piece = pieces[k]!;
    pieces[k] = {
      ...piece,
      axialMovement: sum(piece.axialMovement, [along]),
      transverseMovement: sum(piece.transverseMovement, [across]),
    };
  }
}

/** Whether the start moves with its joint. */
function isAttachedAtStart(legs: Legs, e: number): boolean {
  return legs.freedAxial[e] !== FREED_END.start && legs.freedShear[e] !== FREED_END.start;
}

/** `leg`: its index in the member, and where along the member it lies. Takes the state from the start of the leg to its end. */
function addPieces(
  system: System,
  along: Along,
  free: FreeStrains | undefined,
  e: number,
  leg: { readonly index: number; readonly start: number; readonly end: number },
  state: State,
  pieces: FieldPiece[],
): void {
  const { legs, segments } = system;
  const bending = legs.bending[e]!;
  const flexibility = bending === 0 ? 0 : 1 / bending;
  const stretch = 1 / legs.axial[e]!;
  const strain = free === undefined ? 0 : free.axial[e]!;
  const curvature = free === undefined || bending === 0 ? 0 : free.curvature[e]!;
  const shearing = legs.shearing[e]!;
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
    // dN/ds = −p, dV/ds = w, dM/ds = V; dθ/ds = M/EI + curvature, dv/ds = θ − V/GAs, du/ds = N/EA + strain.
    const piece = {
      leg: leg.index,
      start: leg.start + from,
      end: g === last ? leg.end : leg.start + from + length,
      axialForce: [N, 0 - p0, 0 - p1 / 2],
      shearForce: [V, w0, w1 / 2],
      bendingMoment: [M, V, w0 / 2, w1 / 6],
      rotation: [
        state.rotation,
        M * flexibility + curvature,
        (V / 2) * flexibility,
        (w0 / 6) * flexibility,
        (w1 / 24) * flexibility,
      ],
      axialMovement: [state.axialMovement, N * stretch + strain, (0 - p0 / 2) * stretch, (0 - p1 / 6) * stretch],
      transverseMovement: [
        state.transverseMovement,
        state.rotation - V * shearing,
        (M * flexibility + curvature) / 2 - (w0 / 2) * shearing,
        (V / 6) * flexibility - (w1 / 6) * shearing,
        (w0 / 24) * flexibility,
        (w1 / 120) * flexibility,
      ],
    };
    pieces.push(piece);
    if (g === last && isAttachedAtStart(legs, e)) break;
    state.axialForce = evaluate(piece.axialForce, length);
    state.shearForce = evaluate(piece.shearForce, length);
    state.bendingMoment = evaluate(piece.bendingMoment, length);
    state.rotation = evaluate(piece.rotation, length);
    state.axialMovement = evaluate(piece.axialMovement, length);
    state.transverseMovement = evaluate(piece.transverseMovement, length);
  }
}
