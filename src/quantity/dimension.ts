// The dimension of a quantity: exponents of length, mass, time, temperature and plane angle.
// An angle is kept only so that a rotation can be shown in radians; it never stands in the way of an addition.

/** Exponents, in this order: metre, kilogram, second, kelvin, radian. */
export type Dimension = readonly [length: number, mass: number, time: number, temperature: number, angle: number];

export const DIMENSIONLESS: Dimension = [0, 0, 0, 0, 0];
export const ANGLE: Dimension = [0, 0, 0, 0, 1];
export const LENGTH: Dimension = [1, 0, 0, 0, 0];
export const AREA: Dimension = [2, 0, 0, 0, 0];
export const SECTION_MODULUS: Dimension = [3, 0, 0, 0, 0];
export const SECOND_MOMENT_OF_AREA: Dimension = [4, 0, 0, 0, 0];
export const MASS: Dimension = [0, 1, 0, 0, 0];
export const MASS_PER_LENGTH: Dimension = [-1, 1, 0, 0, 0];
export const DENSITY: Dimension = [-3, 1, 0, 0, 0];
export const UNIT_WEIGHT: Dimension = [-2, 1, -2, 0, 0];
export const FORCE: Dimension = [1, 1, -2, 0, 0];
export const FORCE_PER_LENGTH: Dimension = [0, 1, -2, 0, 0];
export const STRESS: Dimension = [-1, 1, -2, 0, 0];
export const MOMENT: Dimension = [2, 1, -2, 0, 0];
export const BENDING_STIFFNESS: Dimension = [3, 1, -2, 0, 0];
export const TEMPERATURE: Dimension = [0, 0, 0, 1, 0];
export const PER_TEMPERATURE: Dimension = [0, 0, 0, -1, 0];

/** Whether quantities of the two dimensions may be added or compared. Angles are ratios and do not count. */
export function sameDimension(a: Dimension, b: Dimension): boolean {
  return a[0] === b[0] && a[1] === b[1] && a[2] === b[2] && a[3] === b[3];
}

export function multiplyDimensions(a: Dimension, b: Dimension): Dimension {
  return [a[0] + b[0], a[1] + b[1], a[2] + b[2], a[3] + b[3], a[4] + b[4]];
}

export function divideDimensions(a: Dimension, b: Dimension): Dimension {
  return [a[0] - b[0], a[1] - b[1], a[2] - b[2], a[3] - b[3], a[4] - b[4]];
}

export function raiseDimension(a: Dimension, power: number): Dimension {
  return [a[0] * power, a[1] * power, a[2] * power, a[3] * power, a[4] * power];
}
