// What comes of an analysis: plain data that questions, drawings and reports read. SI; signs as in model/structure.ts;
// internal forces as language users know them: axial force positive in tension, bending moment positive with tension on
// the underside, shear = dM/dx.
import type { Structure } from '../model/structure.ts';
import type { Polynomial } from './polynomial.ts';

export interface Analysis {
  readonly structure: Structure;
  readonly stability: Stability;
  /** Degree of static indeterminacy, springs and bars counted as unknowns; 0 when determinate. Meaningless when unstable. */
  readonly redundancy: number;
  /** The response to each case alone, in the order of `structure.cases`; empty when unstable, too large or in conflict. */
  readonly cases: readonly Solution[];
  /** By case: what of its response forces cause, and what is imposed: movements, heat, lack of fit. Undefined where nothing is. */
  readonly parts: readonly (CaseParts | undefined)[];
  /** An imposed movement that an axially stiff member would have to change its length for, or a change of it that is held. */
  readonly conflict?: Conflict;
  /**
   * Not analysed, as it would take more than seconds or gigabytes: too many freedoms, too many movements tied together by
   * axially stiff members, or too many cases for so many legs and loads.
   */
  readonly tooLarge?: 'freedoms' | 'axially-stiff' | 'cases';
}

export interface CaseParts {
  readonly forces: Solution;
  readonly imposed: Solution;
}

export interface Conflict {
  /** Indices. */
  readonly case: number;
  readonly member: number;
  /** What the member would have to lengthen by (heat and lack of fit: shorten), m. */
  readonly amount: number;
}

export interface Stability {
  readonly stable: boolean;
  /** One for each independent way to move; empty when stable. */
  readonly mechanisms: readonly Mechanism[];
  /** Estimate of the condition of the scaled stiffness matrix (1-norm); Infinity when unstable. */
  readonly condition: number;
  /** Of a stable structure that is nearly unstable: the movement that it resists least. */
  readonly softest?: Mechanism;
}

export interface Mechanism {
  /** `rigid-body`: the whole structure (or a part joined to nothing else) moves as one; `mechanism`: parts move against each other. */
  readonly kind: 'rigid-body' | 'mechanism';
  /** Per point, scaled so that the largest movement is 1: [x, y] pairs, length 2 × points. */
  readonly movements: Float64Array;
  /** Points that move, and members that move or turn, as indices. */
  readonly points: readonly number[];
  readonly members: readonly number[];
  /** Points that turn in place (a joint, or a member end at a hinge) without moving. */
  readonly turning: readonly number[];
}

/** The response to one set of loads: of a case, or of a combination by superposition. */
export interface Solution {
  /** Per point: x, y, rotation of the joint (0 where every end at the point is hinged); length 3 × points. */
  readonly movements: Float64Array;
  /** In the order of `structure.members`. */
  readonly members: readonly MemberField[];
  /** In the order of `structure.supports`: what the support does to the structure. */
  readonly reactions: readonly Reaction[];
  /** Sum of the applied loads, moment about the origin, anticlockwise. */
  readonly applied: Reaction;
  /** Largest unbalanced force at any free freedom over the largest load; 0 for no load. */
  readonly residual: number;
  /**
   * The largest force (N) and couple (N m) that went into it: loads at the joints, those between them shared out, and for
   * what is imposed what would hold every other freedom still. Rounding in forces and moments is relative to them.
   */
  readonly largest?: { readonly force: number; readonly moment: number };
}

/** x right, y up, moment anticlockwise: N and N m. */
export interface Reaction {
  readonly x: number;
  readonly y: number;
  readonly moment: number;
}

export interface MemberField {
  /** In order along the member, without gaps; a jump shows as a difference where two pieces meet. */
  readonly pieces: readonly FieldPiece[];
}

/** Exact on its stretch. Every polynomial is in s = distance along the member − start, metres. */
export interface FieldPiece {
  /** Index into the member's `legs`. */
  readonly leg: number;
  /** Distances along the member. */
  readonly start: number;
  readonly end: number;
  /** N, tension positive. */
  readonly axialForce: Polynomial;
  /** N, dM/dx. */
  readonly shearForce: Polynomial;
  /** N m, tension on the underside positive. */
  readonly bendingMoment: Polynomial;
  /** rad, anticlockwise, of the section; for a bar, that of its chord. */
  readonly rotation: Polynomial;
  /** m, along the travel of the leg. */
  readonly axialMovement: Polynomial;
  /** m, to the left of the travel (away from the underside). */
  readonly transverseMovement: Polynomial;
}
