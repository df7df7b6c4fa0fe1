// What is asked of a structure, every name resolved: the input of mechanics' measures and of the second road.
import type { Location } from './structure.ts';

/** A stretch of one member, distances from its first point, start < end. */
export interface MemberStretch {
  readonly start: number;
  readonly end: number;
}

/**
 * Signs: deflection positive down, sway right, rotation anticlockwise, sag towards the underside, moment with tension on
 * the underside, shear dM/dx, force in tension, reaction up, right, anticlockwise. `sagging`, `hogging`, `tension`,
 * `compression` and `stress` are never negative.
 */
export type ResolvedMeasure =
  | { readonly kind: 'deflection' | 'sway'; readonly at: Location }
  /** At a point without a member: that of the joint. */
  | { readonly kind: 'rotation'; readonly at: Location }
  /** Along members (one, or those of a group); a stretch only with one member. */
  | {
      readonly kind:
        | 'deflection'
        | 'sway'
        | 'rotation'
        | 'moment'
        | 'shear'
        | 'sagging'
        | 'hogging'
        | 'force'
        | 'tension'
        | 'compression'
        | 'stress';
      readonly along: readonly number[];
      readonly stretch?: MemberStretch;
    }
  /**
   * The largest departure from the straight chord between the ends of the stretch (or of the member), at right angles to
   * it; `reversed` where the way from P to Q runs against the member's travel, which turns the underside over.
   */
  | {
      readonly kind: 'sag';
      readonly along: readonly number[];
      readonly stretch?: MemberStretch;
      readonly reversed: boolean;
    }
  /** At one place of one member; both sides of a jump count. */
  | {
      readonly kind:
        | 'moment'
        | 'shear'
        | 'force'
        | 'sagging'
        | 'hogging'
        | 'tension'
        | 'compression'
        | 'stress'
        | 'sag';
      readonly at: Extract<Location, { kind: 'along' }>;
    }
  | { readonly kind: 'reaction'; readonly support: number; readonly component: 'vertical' | 'horizontal' | 'moment' };

/** Which of several candidate values is the answer. `size`: the largest in size, with its sign, the first among equals. */
export type Seek = 'size' | 'greatest' | 'least';

export interface Measured {
  readonly value: number;
  /** Where along a member the value stands; absent for a point or a reaction. */
  readonly place?: { readonly member: number; readonly distance: number };
  /** The two sides of a jump at the place, before and after in the direction of travel; absent where there is none. */
  readonly sides?: readonly [before: number, after: number];
  /** A figure that the section (an index) lacks and this stress calls for; then the value is NaN. */
  readonly missing?: { readonly section: number; readonly figure: 'area' | 'sectionModulus' };
}

/** A unit force or couple of the virtual system; movements are the sum of action · movement. */
export interface UnitAction {
  readonly at: Location;
  readonly x: number;
  readonly y: number;
  /** Anticlockwise. */
  readonly moment: number;
  /**
   * Where a member runs through the place and its ends there are hinged, connected or freed: which of the two the action is
   * on, in the direction of travel. If not said, a force is on the joint and a couple on the end before.
   */
  readonly side?: 'before' | 'after';
}
