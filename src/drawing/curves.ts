// Curves of fields as cubic Bézier segments: exact for polynomials up to the third degree, a Hermite fit in short parts above.
import type { Polynomial } from '../mechanics/polynomial.ts';
import { px, type Spot } from './geometry.ts';

/** A curve over s from 0 to `length`, with its derivative, both on the sheet. */
export interface Curve {
  readonly length: number;
  readonly at: (s: number) => Spot;
  readonly slope: (s: number) => Spot;
  /** Of the polynomials it is made of. */
  readonly degree: number;
}

/** Continues a path that stands at the curve's start. */
export function curveTo(curve: Curve): string {
  if (curve.degree <= 1) {
    const end = curve.at(curve.length);
    return `L${px(end.x)} ${px(end.y)}`;
  }
  const parts = curve.degree <= 3 ? 1 : 6;
  const step = curve.length / parts;
  let d = '';
  for (let i = 0; i < parts; i++) {
    const start = curve.at(i * step);
    const end = curve.at((i + 1) * step);
    const out = curve.slope(i * step);
    const into = curve.slope((i + 1) * step);
    const third = step / 3;
    d +=
      `C${px(start.x + out.x * third)} ${px(start.y + out.y * third)} ` +
      `${px(end.x - into.x * third)} ${px(end.y - into.y * third)} ${px(end.x)} ${px(end.y)}`;
  }
  return d;
}

/** Degree without leading zeros; noise of the solution counts as zero. */
export function degreeOf(polynomial: Polynomial, length: number): number {
  const sizes = polynomial.map((coefficient, power) => Math.abs(coefficient) * length ** power);
  const largest = Math.max(0, ...sizes);
  return Math.max(
    0,
    sizes.findLastIndex(size => size > 1e-9 * largest),
  );
}
