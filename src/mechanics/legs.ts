// The legs of all members in flat arrays: the pieces that stiffness, loads and fields are worked out for.

import type { FreedForce, Leg, Structure } from '../model/structure.ts';

/** By leg, in the order of the members and along each. */
export interface Legs {
  readonly count: number;
  /** Index of each member's first leg; members + 1. */
  readonly first: Int32Array;
  readonly member: Int32Array;
  /** Points. */
  readonly from: Int32Array;
  readonly to: Int32Array;
  /** m. */
  readonly length: Float64Array;
  /** Unit vector along the travel. */
  readonly cosine: Float64Array;
  readonly sine: Float64Array;
  /** EI, N m²; 0 for a bar. */
  readonly bending: Float64Array;
  /** EA, N; Infinity where axially stiff. */
  readonly axial: Float64Array;
  /** 1/GAs, 1/N; 0 where shear deformation is not counted. */
  readonly shearing: Float64Array;
  /** What passes at neither or one of the ends: see `FREED_END`; 0 where every force passes at both. */
  readonly freedAxial: Uint8Array;
  readonly freedShear: Uint8Array;
  /** Stiffness of the connections at both ends, N m/rad; Infinity where rigid or hinged. */
  readonly startTurning: Float64Array;
  readonly endTurning: Float64Array;
}

/** The end at which a force of a leg is freed; never at both, as nothing would hold the leg. */
export const FREED_END = { none: 0, start: 1, end: 2 } as const;

/** Whether the leg keeps its length against what its ends do: axially stiff, and attached along it at both. */
export function keepsLength(legs: Legs, e: number): boolean {
  return legs.axial[e] === Number.POSITIVE_INFINITY && legs.freedAxial[e] === FREED_END.none;
}

export function flattenLegs(structure: Structure): Legs {
  const { members, sections } = structure;
  const first = new Int32Array(members.length + 1);
  for (let m = 0; m < members.length; m++) first[m + 1] = first[m]! + members[m]!.legs.length;
  const count = first[members.length]!;
  const legs: Legs = {
    count,
    first,
    member: new Int32Array(count),
    from: new Int32Array(count),
    to: new Int32Array(count),
    length: new Float64Array(count),
    cosine: new Float64Array(count),
    sine: new Float64Array(count),
    bending: new Float64Array(count),
    axial: new Float64Array(count),
    shearing: new Float64Array(count),
    freedAxial: new Uint8Array(count),
    freedShear: new Uint8Array(count),
    startTurning: new Float64Array(count).fill(Number.POSITIVE_INFINITY),
    endTurning: new Float64Array(count).fill(Number.POSITIVE_INFINITY),
  };
  for (let m = 0, e = 0; m < members.length; m++) {
    const { kind, name, legs: chain } = members[m]!;
    for (const leg of chain) {
      const section = sections[leg.section]!;
      const bending = kind === 'bar' ? 0 : section.bendingStiffness;
      if (bending === undefined) {
        throw new Error(
          `Member ${name} has section ${section.name} without a bending stiffness; it cannot be analysed`,
        );
      }
      legs.member[e] = m;
      legs.from[e] = leg.from;
      legs.to[e] = leg.to;
      legs.length[e] = leg.length;
      legs.cosine[e] = leg.cosine;
      legs.sine[e] = leg.sine;
      legs.bending[e] = bending;
      legs.axial[e] = section.axialStiffness ?? Number.POSITIVE_INFINITY;
      if (kind === 'member') {
        if (section.shearStiffness !== undefined) legs.shearing[e] = 1 / section.shearStiffness;
        legs.freedAxial[e] = freedEnd(leg, 'axial');
        legs.freedShear[e] = freedEnd(leg, 'shear');
        legs.startTurning[e] = leg.startAttachment?.turning ?? Number.POSITIVE_INFINITY;
        legs.endTurning[e] = leg.endAttachment?.turning ?? Number.POSITIVE_INFINITY;
      }
      e++;
    }
  }
  return legs;
}

function freedEnd({ startAttachment, endAttachment }: Leg, force: FreedForce): number {
  if (startAttachment?.freed.includes(force)) return FREED_END.start;
  return endAttachment?.freed.includes(force) ? FREED_END.end : FREED_END.none;
}
