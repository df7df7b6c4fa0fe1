// What a dimension is called and in which SI unit a program reads it: the words of messages and of JSON.

import type { Dimension } from './dimension.ts';

interface Kind {
  /** As it reads in a message: `a length`. */
  readonly name: string;
  /** Coherent SI, as JSON shows it. */
  readonly si: string;
}

/** By exponents of length, mass, time and temperature; an angle counts only alone. */
const KINDS: ReadonlyMap<string, Kind> = new Map([
  ['0 0 0 0', { name: 'a number', si: '' }],
  ['1 0 0 0', { name: 'a length', si: 'm' }],
  ['2 0 0 0', { name: 'an area', si: 'm2' }],
  ['3 0 0 0', { name: 'a section modulus or volume', si: 'm3' }],
  ['4 0 0 0', { name: 'a second moment of area', si: 'm4' }],
  ['-1 0 0 0', { name: 'a curvature', si: '1/m' }],
  ['0 1 0 0', { name: 'a mass', si: 'kg' }],
  ['-1 1 0 0', { name: 'a mass per length', si: 'kg/m' }],
  ['-2 1 0 0', { name: 'a mass per area', si: 'kg/m2' }],
  ['-3 1 0 0', { name: 'a density', si: 'kg/m3' }],
  ['0 0 1 0', { name: 'a time', si: 's' }],
  ['0 0 -1 0', { name: 'a frequency', si: '1/s' }],
  ['1 0 -1 0', { name: 'a speed', si: 'm/s' }],
  ['1 0 -2 0', { name: 'an acceleration', si: 'm/s2' }],
  ['1 1 -2 0', { name: 'a force', si: 'N' }],
  ['0 1 -2 0', { name: 'a line load', si: 'N/m' }],
  ['-1 1 -2 0', { name: 'a stress', si: 'Pa' }],
  ['-2 1 -2 0', { name: 'a unit weight', si: 'N/m3' }],
  ['2 1 -2 0', { name: 'a moment', si: 'N m' }],
  ['3 1 -2 0', { name: 'a bending stiffness', si: 'N m2' }],
  ['4 1 -2 0', { name: 'a movement times a bending stiffness', si: 'N m3' }],
  ['0 0 0 1', { name: 'a temperature difference', si: 'K' }],
  ['0 0 0 -1', { name: 'a thermal expansion', si: '1/K' }],
]);

const ANGLE: Kind = { name: 'an angle', si: 'rad' };

/** In the order of the SI: kilogram first. */
const BASE = [
  ['kg', 1],
  ['m', 0],
  ['s', 2],
  ['K', 3],
] as const;

/** `a force`, `a length`, `an angle`; for a dimension without a name its SI unit: `a quantity in kg m2/s3`. */
export function dimensionName(dimension: Dimension): string {
  return kindOf(dimension)?.name ?? `a quantity in ${product(dimension)}`;
}

/** The coherent SI unit as JSON shows it: `N m`, `Pa`, `rad`, '' for a number, `kg m2/s3` for what has no name. */
export function siUnit(dimension: Dimension): string {
  return kindOf(dimension)?.si ?? product(dimension);
}

/** Whether it is an angle and nothing else. */
export function isAngle(dimension: Dimension): boolean {
  return dimension[4] === 1 && dimension[0] === 0 && dimension[1] === 0 && dimension[2] === 0 && dimension[3] === 0;
}

/** Whether it is a plain number; an angle is one too. */
export function isRatio(dimension: Dimension): boolean {
  return dimension[0] === 0 && dimension[1] === 0 && dimension[2] === 0 && dimension[3] === 0;
}

function kindOf(dimension: Dimension): Kind | undefined {
  if (isAngle(dimension)) return ANGLE;
  return KINDS.get(`${dimension[0]} ${dimension[1]} ${dimension[2]} ${dimension[3]}`);
}

/** Factors above and below one stroke: `kg m2/s3`, `1/(m K)`. Powers that are not whole keep their point: `m0.5`. */
function product(dimension: Dimension): string {
  const above: string[] = [];
  const below: string[] = [];
  BASE.forEach(([unit, index]) => {
    const power = dimension[index];
    const size = Math.abs(power);
    if (power === 0) return;
    (power > 0 ? above : below).push(size === 1 ? unit : `${unit}${Number(size.toFixed(4))}`);
  });
  if (below.length === 0) return above.join(' ');
  const under = below.length === 1 ? below[0]! : `(${below.join(' ')})`;
  return `${above.length === 0 ? '1' : above.join(' ')}/${under}`;
}
