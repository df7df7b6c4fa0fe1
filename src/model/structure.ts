// What a structure is: plain, immutable data in SI, every name resolved to an index. It is all that mechanics and
// virtual work know of a note, and all that they share.
//
// Axes: x to the right, y up, rotations and couples anticlockwise. A member's local axes: x along its travel, y to the
// left of it, so its underside is the side of negative local y.

import type { Range } from '../quantity/range.ts';

export interface Structure {
  readonly name: string;
  readonly title?: string;
  /** Where the structure is spoken of as a whole: its `structure` line, or its first member. */
  readonly range: Range;
  readonly points: readonly Point[];
  readonly sections: readonly Section[];
  readonly members: readonly Member[];
  readonly groups: readonly Group[];
  readonly hinges: readonly Hinge[];
  readonly supports: readonly Support[];
  readonly cases: readonly LoadCase[];
  readonly loads: readonly Load[];
}

export interface Point {
  readonly name: string;
  readonly x: number;
  readonly y: number;
  /** Where it was first named. */
  readonly range: Range;
}

/** A section with the material's figures worked in. */
export interface Section {
  readonly name: string;
  readonly material?: string;
  /** In the writer's words, for labels: `box 100 × 200 × 6, S355`. */
  readonly description: string;
  /** EI, N m²; undefined where no figure gives one (a bar's section needs none). */
  readonly bendingStiffness: number | undefined;
  /** Its I is still to be chosen: `bendingStiffness` is that of a trial I, and no result of it may be shown. */
  readonly wanted?: boolean;
  /** EA, N; undefined: no axial stiffness is known, and the member is axially stiff, exactly. */
  readonly axialStiffness: number | undefined;
  /** kg/m; undefined where no area or no density is known. */
  readonly massPerLength: number | undefined;
  /** The smaller elastic modulus, m³. */
  readonly sectionModulus: number | undefined;
  /** It is neither given nor a shape's, but 2 I / depth. */
  readonly sectionModulusAssumed?: boolean;
  /** m². */
  readonly area: number | undefined;
  /** m⁴, about the axis of bending. */
  readonly secondMomentOfArea: number | undefined;
  /** Pa. */
  readonly youngsModulus: number | undefined;
  /** GAs, N: shear deformation is counted with it; absent where it is not counted. */
  readonly shearStiffness?: number;
  /** m², and the shear modulus, Pa; for schedules. */
  readonly shearArea?: number;
  readonly shearModulus?: number;
  /** m, in the plane of bending. */
  readonly depth: number | undefined;
  /** Of its material, 1/K. */
  readonly thermalExpansion?: number | undefined;
  readonly range: Range;
}

/**
 * A member (bending and axial force) or a bar (axial force only), as a chain of straight legs.
 * Every point on the chain, one placed on it by a `point` statement included, ends a leg.
 */
export interface Member {
  readonly name: string;
  readonly kind: 'member' | 'bar';
  readonly legs: readonly Leg[];
  /** Along the chain, m. */
  readonly length: number;
  /** The writer's assumption that it is never in compression (`pulls`) or never in tension; tested, not built in. */
  readonly only?: 'pulls' | 'bears';
  readonly range: Range;
}

/** A straight stretch of a member between two neighbouring points of the structure. */
export interface Leg {
  /** Indices into `points`, in the direction of travel. */
  readonly from: number;
  readonly to: number;
  /** Index into `sections`. */
  readonly section: number;
  /** Distance of `from` along the member, m. */
  readonly start: number;
  readonly length: number;
  /** Unit vector along the travel. The left-hand normal, local y, is (−sine, cosine). */
  readonly cosine: number;
  readonly sine: number;
  /** Absent: the end is attached rigidly, or by what a hinge leaves. */
  readonly startAttachment?: Attachment;
  readonly endAttachment?: Attachment;
}

/** How the end of a leg of a member is attached to the joint at its point, other than rigidly; hinges are told apart. */
export interface Attachment {
  /** Forces that do not pass: axial force along the leg, shear across it. */
  readonly freed: readonly FreedForce[];
  /** Of a semi-rigid connection, N m/rad: moment for each radian between the end of the leg and the joint. */
  readonly turning?: number;
}

export type FreedForce = 'axial' | 'shear';

export interface Group {
  readonly name: string;
  readonly members: readonly number[];
}

/**
 * Frees the moment of every member at the point, or of one member. A member that runs through the point has its moment
 * split there, so that it is zero on both sides. Bars are pinned already and take no part.
 */
export interface Hinge {
  readonly point: number;
  readonly member?: number;
  readonly range: Range;
}

export interface Support {
  readonly point: number;
  readonly restraints: readonly Restraint[];
  /** The unit vector of the push on the structure that, as the writer assumes, never turns into a pull; tested, not built in. */
  readonly bears?: { readonly x: number; readonly y: number };
  /** As the writer said it, for drawings and words: `pinned`, `roller on 30 deg`, `hold x, rotation`. */
  readonly symbol: SupportSymbol;
  readonly range: Range;
}

/** One held or sprung freedom. Several at one point may repeat or lie askew; together they span what is held. */
export interface Restraint {
  /** A unit vector for a movement that is resisted, or the rotation. */
  readonly freedom:
    | { readonly kind: 'movement'; readonly x: number; readonly y: number }
    | { readonly kind: 'rotation' };
  /** N/m or N m/rad; Infinity where held. */
  readonly stiffness: number;
}

/** What the drawing shows. `angle` is that of a roller's surface from level, anticlockwise, rad. */
export interface SupportSymbol {
  readonly kind: 'pinned' | 'roller' | 'fixed' | 'guided' | 'held';
  readonly angle: number;
  readonly springs: readonly ('x' | 'y' | 'rotation')[];
}

export interface LoadCase {
  readonly name: string;
  readonly title?: string;
  /**
   * Stands behind all whole cases, for the patterned loads of one of them (an index) on one span, `A–B`. It bears that
   * case's name and acts with its factor or, where another set of spans is worse, not at all.
   */
  readonly span?: { readonly of: number; readonly name: string };
}

/** Where a load or a question stands: at a point (of one member, where it matters), or along a member. */
export type Location =
  | { readonly kind: 'point'; readonly point: number; readonly member?: number }
  /** `distance` from the member's first point, along it. */
  | { readonly kind: 'along'; readonly member: number; readonly distance: number };

interface LoadCommon {
  /** Index into `cases`. */
  readonly case: number;
  readonly source?: string;
  readonly range: Range;
}

/** Loads in SI, in the case's own size, unfactored. */
export type Load = LoadCommon &
  (
    | { readonly kind: 'self-weight'; readonly members: readonly number[]; readonly factor: number }
    /** On one member (a statement that names several gives several). Linear in the distance along the member. */
    | {
        readonly kind: 'line';
        readonly member: number;
        /** Distances along the member, start < end. */
        readonly start: number;
        readonly end: number;
        /** N/m at start and end, positive in `direction`. */
        readonly startIntensity: number;
        readonly endIntensity: number;
        readonly direction: LineDirection;
        /** On any set of the member's spans; such a load is divided before the structure is handed on: see patterns.ts. */
        readonly patterned?: true;
      }
    /** N, global components. */
    | { readonly kind: 'force'; readonly x: number; readonly y: number; readonly at: Location; readonly row?: number }
    /** N m, anticlockwise. */
    | { readonly kind: 'couple'; readonly moment: number; readonly at: Location; readonly row?: number }
    /** Imposed movement of a held or sprung freedom: m along the unit vector, or rad anticlockwise. */
    | {
        readonly kind: 'movement';
        readonly point: number;
        readonly freedom: Restraint['freedom'];
        readonly amount: number;
      }
    /**
     * A change of temperature, K, at the upper side of one member and at its underside, linear between them and the same
     * all along. A bar, and a member whose depth is not known, are as warm above as below.
     */
    | { readonly kind: 'heat'; readonly member: number; readonly above: number; readonly below: number }
    /** Lack of fit: m that one member is too long (positive) or too short, spread evenly over its length. */
    | { readonly kind: 'lengthen'; readonly member: number; readonly amount: number }
  );

export type LineDirection =
  /** Unit vector in global axes; `onPlan`: per length measured level. */
  | { readonly kind: 'global'; readonly x: number; readonly y: number; readonly onPlan: boolean }
  /** At right angles to each leg, on the side whose normal has a positive part along this global unit vector. */
  | { readonly kind: 'square'; readonly x: number; readonly y: number }
  /** Along each leg, with the travel (1) or against it (−1). */
  | { readonly kind: 'along'; readonly sense: 1 | -1 };
