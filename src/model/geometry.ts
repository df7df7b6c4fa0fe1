// A structure laid out: points with coordinates, and members with straight legs whose sections are still words.
import type { Name } from '../language/syntax.ts';
import type { Range } from '../quantity/range.ts';
import type { Group, Leg, Member, Point } from './structure.ts';

export interface Geometry {
  readonly points: readonly Point[];
  readonly pointNamed: ReadonlyMap<string, number>;
  readonly members: readonly LaidMember[];
  readonly memberNamed: ReadonlyMap<string, number>;
  readonly groups: readonly Group[];
  /** A typical length of the whole: the largest extent; the scale of geometric tolerances. */
  readonly size: number;
}

/** A member whose legs know the words for their section, not yet the section. */
export interface LaidMember extends Omit<Member, 'legs' | 'only'> {
  readonly legs: readonly LaidLeg[];
  readonly only: { readonly kind: 'pulls' | 'bears'; readonly range: Range } | undefined;
}

export interface LaidLeg extends Omit<Leg, 'section'> {
  /** Undefined: the note's only section is meant. */
  readonly section: Name | undefined;
}

/** Where a point stands along a member, m; undefined where it does not. */
export function distanceOf(member: Pick<Member, 'legs'> | LaidMember, point: number): number | undefined {
  for (const leg of member.legs) {
    if (leg.from === point) return leg.start;
    if (leg.to === point) return leg.start + leg.length;
  }
  return undefined;
}

/** A gap, a leg or an offset below this part of the structure's size is none: a hundredth of a millimetre in ten metres. */
export const CLOSING_TOLERANCE = 1e-6;
