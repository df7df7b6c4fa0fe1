// What a leg answers the movements of its ends with: its lengthening, and the turning of its ends against the chord.

import { FREED_END, type Legs } from './legs.ts';

/** EA/L, N/m; 0 where the leg keeps its length, or slides at an end. */
export function axialStiffness(legs: Legs, e: number): number {
  const axial = legs.axial[e]!;
  if (axial === Number.POSITIVE_INFINITY || legs.freedAxial[e] !== FREED_END.none) return 0;
  return axial / legs.length[e]!;
}

/**
 * The couple at an end for a turning of one radian there (`own`) and at the other end (`other`), N m/rad: 4EI/L and 2EI/L,
 * with shear (4 + φ) EI/L(1 + φ) and (2 − φ) EI/L(1 + φ), φ = 12 EI/GAs L² (Przemieniecki, Theory of Matrix Structural
 * Analysis, 1968, section 5.6, from memory). A leg whose shear is freed at an end bends only as its ends turn against
 * each other: EI/L and −EI/L, the limit of φ without bound.
 */
export function turningStiffness(legs: Legs, e: number): { readonly own: number; readonly other: number } {
  const bending = legs.bending[e]! / legs.length[e]!;
  if (legs.freedShear[e] !== FREED_END.none) return { own: bending, other: -bending };
  const phi = shearRatio(legs, e);
  return { own: (bending * (4 + phi)) / (1 + phi), other: (bending * (2 - phi)) / (1 + phi) };
}

/** φ = 12 EI/GAs L²; 0 where shear deformation is not counted. */
export function shearRatio(legs: Legs, e: number): number {
  return (12 * legs.bending[e]! * legs.shearing[e]!) / (legs.length[e]! * legs.length[e]!);
}
