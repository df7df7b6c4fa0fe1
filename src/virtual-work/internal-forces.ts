// Internal forces as plain data, member by member and range by range: what a working prints and integrates.
import { type Polynomial, shifted, sum } from './polynomial.ts';
import type { ForceState } from './primary.ts';
import type { StaticLeg, Statics } from './statics.ts';

export interface InternalForces {
  /** In the order of the structure's members. */
  readonly members: readonly MemberForces[];
}

export interface MemberForces {
  /** In order along the member, without gaps; a range ends where a leg ends or a load begins, ends or stands. */
  readonly pieces: readonly ForcePiece[];
}

/** The polynomials are in the distance from `start`, m. */
export interface ForcePiece {
  /** Index into the member's `legs`. */
  readonly leg: number;
  /** Distances along the member, m. */
  readonly start: number;
  readonly end: number;
  /** N, tension positive. */
  readonly axialForce: Polynomial;
  /** N m, tension on the underside positive. */
  readonly bendingMoment: Polynomial;
}

export function internalForces({ structure, legs, firstLeg }: Statics, state: ForceState): InternalForces {
  return {
    members: structure.members.map((_, member) => {
      const pieces: ForcePiece[] = [];
      for (let index = firstLeg[member]!; index < firstLeg[member + 1]!; index++) {
        pieces.push(...piecesOf(legs[index]!, index, state));
      }
      return { pieces };
    }),
  };
}

function piecesOf(leg: StaticLeg, index: number, { unknowns, spans }: ForceState): ForcePiece[] {
  const axial = [unknowns[3 * index]!];
  const startMoment = unknowns[3 * index + 1]!;
  const linear = [startMoment, (unknowns[3 * index + 2]! - startMoment) / leg.length];
  const span = spans.get(index);
  if (!span) {
    const end = leg.start + leg.length;
    return [{ leg: leg.index, start: leg.start, end, axialForce: axial, bendingMoment: linear }];
  }
  return span.pieces.map(({ start, end, axialForce, bendingMoment }) => ({
    leg: leg.index,
    start: leg.start + start,
    end: leg.start + end,
    axialForce: sum(axialForce, axial),
    bendingMoment: sum(bendingMoment, shifted(linear, start)),
  }));
}
