// The legs of all members in flat arrays: the pieces that stiffness, loads and fields are worked out for.

import type { Structure } from '../model/structure.ts';

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
      e++;
    }
  }
  return legs;
}
