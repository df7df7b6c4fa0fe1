export { type CaseForces, ForceMethod, prepare } from './force-method.ts';
export { movement, movementOf } from './movement.ts';
export { type Preference, stiffestFromTheGround } from './preference.ts';
export { type PrimaryStructure, primaryStructure, virtualSystem } from './primary.ts';
