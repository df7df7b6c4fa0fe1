// The unit table: every unit that a note may write, as an exact decimal multiple of SI, and products of them.

import type { Dimension } from './dimension.ts';
import {
  ANGLE,
  DIMENSIONLESS,
  divideDimensions,
  FORCE,
  FORCE_PER_LENGTH,
  LENGTH,
  MASS,
  multiplyDimensions,
  raiseDimension,
  STRESS,
  TEMPERATURE,
  UNIT_WEIGHT,
} from './dimension.ts';
import type { Quantity } from './quantity.ts';

/**
 * The size of a unit in SI is numerator · 10^tens / denominator. Both are whole numbers (π aside), so that a decimal
 * in a trade unit becomes the nearest double to the same decimal in SI.
 */
export interface Unit {
  readonly numerator: number;
  readonly denominator: number;
  readonly tens: number;
  readonly dimension: Dimension;
}

export const NO_UNIT: Unit = { numerator: 1, denominator: 1, tens: 0, dimension: DIMENSIONLESS };

const POUND_FORCE = 44_482_216_152_605; // 1 lbf = 4.448 221 615 260 5 N: 0.453 592 37 kg at 9.806 65 m/s²
const FOOT = 3048; // 1 ft = 0.3048 m, international
const SQUARE_FOOT = 9_290_304;
const CUBIC_FOOT = 28_316_846_592;
const SQUARE_INCH = 64_516; // 1 in = 25.4 mm

const TIME: Dimension = [0, 0, 1, 0, 0];
const ACCELERATION: Dimension = [1, 0, -2, 0, 0];

/** Numerator, power of ten, dimension, denominator (1 where left out). */
type Row = readonly [numerator: number, tens: number, dimension: Dimension, denominator?: number];

const TABLE: Readonly<Record<string, Row>> = {
  m: [1, 0, LENGTH],
  mm: [1, -3, LENGTH],
  cm: [1, -2, LENGTH],
  km: [1, 3, LENGTH],
  in: [254, -4, LENGTH],
  ft: [FOOT, -4, LENGTH],
  yd: [3 * FOOT, -4, LENGTH],
  N: [1, 0, FORCE],
  kN: [1, 3, FORCE],
  MN: [1, 6, FORCE],
  lbf: [POUND_FORCE, -13, FORCE],
  kip: [POUND_FORCE, -10, FORCE],
  Pa: [1, 0, STRESS],
  kPa: [1, 3, STRESS],
  MPa: [1, 6, STRESS],
  GPa: [1, 9, STRESS],
  psi: [POUND_FORCE, -13 + 8, STRESS, SQUARE_INCH],
  ksi: [POUND_FORCE, -10 + 8, STRESS, SQUARE_INCH],
  psf: [POUND_FORCE, -13 + 8, STRESS, SQUARE_FOOT],
  ksf: [POUND_FORCE, -10 + 8, STRESS, SQUARE_FOOT],
  plf: [POUND_FORCE, -13 + 4, FORCE_PER_LENGTH, FOOT],
  klf: [POUND_FORCE, -10 + 4, FORCE_PER_LENGTH, FOOT],
  pcf: [POUND_FORCE, -13 + 12, UNIT_WEIGHT, CUBIC_FOOT],
  kg: [1, 0, MASS],
  t: [1, 3, MASS],
  g: [1, -3, MASS],
  lb: [45_359_237, -8, MASS],
  s: [1, 0, TIME],
  Hz: [1, 0, [0, 0, -1, 0, 0]],
  rad: [1, 0, ANGLE],
  mrad: [1, -3, ANGLE],
  deg: [Math.PI, 0, ANGLE, 180],
  K: [1, 0, TEMPERATURE],
  degC: [1, 0, TEMPERATURE],
  degF: [5, 0, TEMPERATURE, 9],
  g0: [980_665, -5, ACCELERATION],
};

/** The spellings that may carry a bare 2, 3 or 4: `mm2`, `ft3`, `s2`. */
const BARE_POWERS = ['m', 'mm', 'cm', 'km', 'in', 'ft', 'yd', 's'] as const;

/** Force times length in one word. A power behind it is that of the metre: `kNm2` is kN m². */
const FORCE_TIMES_METRE = { Nm: 'N', kNm: 'kN', MNm: 'MN' } as const;

const UNITS: ReadonlyMap<string, Unit> = spellings();

/** Every unit without powers, for completion and for the nearest spelling. */
export const UNIT_NAMES: readonly string[] = [...Object.keys(TABLE), ...Object.keys(FORCE_TIMES_METRE)];

/** The named constants of a value. */
export const CONSTANTS: Readonly<Record<'pi' | 'g0', Quantity>> = {
  pi: { value: Math.PI, dimension: DIMENSIONLESS },
  g0: { value: 9.80665, dimension: ACCELERATION },
};

/** The unit of one word, a bare power included: `kN`, `mm4`, `kNm2`. */
export function unitNamed(word: string): Unit | undefined {
  return UNITS.get(word);
}

/** Whether a unit takes `^` and raised digits; the power of `kNm` is the metre's and only 2. */
export function unitRaised(word: string, power: number): Unit | undefined {
  if (Object.hasOwn(FORCE_TIMES_METRE, word)) return power === 2 ? UNITS.get(`${word}2`) : undefined;
  const unit = UNITS.get(word);
  return unit && raiseUnit(unit, power);
}

export function multiplyUnits(a: Unit, b: Unit): Unit {
  return {
    numerator: a.numerator * b.numerator,
    denominator: a.denominator * b.denominator,
    tens: a.tens + b.tens,
    dimension: multiplyDimensions(a.dimension, b.dimension),
  };
}

export function divideUnits(a: Unit, b: Unit): Unit {
  return {
    numerator: a.numerator * b.denominator,
    denominator: a.denominator * b.numerator,
    tens: a.tens - b.tens,
    dimension: divideDimensions(a.dimension, b.dimension),
  };
}

/** A whole power; a negative one turns the unit over. */
export function raiseUnit(unit: Unit, power: number): Unit {
  if (power < 0) return divideUnits(NO_UNIT, raiseUnit(unit, -power));
  return {
    numerator: unit.numerator ** power,
    denominator: unit.denominator ** power,
    tens: unit.tens * power,
    dimension: raiseDimension(unit.dimension, power),
  };
}

/** One of the unit in SI. */
export function sizeOf(unit: Unit): number {
  return scaled(1, 0, unit);
}

/** digits · 10^tens of a unit, in SI. Exact to the last place where the products of whole numbers are exact. */
export function scaled(digits: number, tens: number, unit: Unit): number {
  const power = tens + unit.tens;
  if (power >= 0) return (digits * unit.numerator * 10 ** power) / unit.denominator;
  return (digits * unit.numerator) / (unit.denominator * 10 ** -power);
}

function spellings(): Map<string, Unit> {
  const units = new Map<string, Unit>();
  for (const [name, [numerator, tens, dimension, denominator = 1]] of Object.entries(TABLE)) {
    units.set(name, { numerator, denominator, tens, dimension });
  }
  const metre = units.get('m')!;
  for (const name of BARE_POWERS) {
    for (const power of [2, 3, 4]) units.set(`${name}${power}`, raiseUnit(units.get(name)!, power));
  }
  for (const [name, force] of Object.entries(FORCE_TIMES_METRE)) {
    units.set(name, multiplyUnits(units.get(force)!, metre));
    units.set(`${name}2`, multiplyUnits(units.get(force)!, raiseUnit(metre, 2)));
  }
  return units;
}
