// Directions as unit vectors: the four words, and angles without the rounding of π.
import type { Heading } from '../language/syntax.ts';

export const HEADINGS = {
  up: { x: 0, y: 1 },
  down: { x: 0, y: -1 },
  left: { x: -1, y: 0 },
  right: { x: 1, y: 0 },
} as const satisfies Record<Heading, { readonly x: number; readonly y: number }>;

/** `angle` from level, anticlockwise, rad. */
export function unitAt(angle: number): { readonly x: number; readonly y: number } {
  return { x: cleanCosine(angle), y: cleanSine(angle) };
}

/** Cosine and sine of a right angle and its multiples without the rounding of π. */
export function cleanCosine(angle: number): number {
  const quarters = angle / (Math.PI / 2);
  const whole = Math.round(quarters);
  if (Math.abs(quarters - whole) > 1e-14 * Math.max(1, Math.abs(whole))) return Math.cos(angle);
  return [1, 0, -1, 0][((whole % 4) + 4) % 4]!;
}

export function cleanSine(angle: number): number {
  return cleanCosine(angle - Math.PI / 2);
}
