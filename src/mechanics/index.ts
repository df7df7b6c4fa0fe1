// The public face of the mechanics room: what a structure does under its loads.

export { analyse, findStability, MAX_CONDITION, MAX_FREEDOMS, MAX_PIECES, SUSPICIOUS_CONDITION } from './analyse.ts';
export { doubtsOf, idleMembers, type LargeMovement, type SlenderCompression, type Stretch } from './doubts.ts';
export { type EnvelopePiece, envelopeAlong, type LinearQuantity } from './envelope.ts';
export { type FieldName, type FieldValues, fieldAt, movementAlong, movementAt, pieceAt, type Side } from './field.ts';
export { measure } from './measure.ts';
export { MAX_MECHANISMS } from './mechanisms.ts';
export { findPanel, type Panel } from './panels.ts';
export { worstPatterns } from './patterns.ts';
export { bound, derivative, evaluate, extremes, type Polynomial, roots, shifted, sum } from './polynomial.ts';
export { findRemedies, type Remedy, remedied, type SupportKind } from './remedies.ts';
export { roundingIn, type Sizes, sizesOf } from './rounding.ts';
export type {
  Analysis,
  CaseParts,
  Conflict,
  FieldPiece,
  Mechanism,
  MemberField,
  Reaction,
  Solution,
  Stability,
} from './solution.ts';
export { combine, imposedPart, loadPart, superpose } from './superposition.ts';
