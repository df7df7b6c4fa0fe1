// How a quantity is shown: four significant figures, in the units that the note chose for its kind.

import type { Dimension } from './dimension.ts';
import {
  ANGLE,
  AREA,
  BENDING_STIFFNESS,
  DENSITY,
  FORCE,
  FORCE_PER_LENGTH,
  LENGTH,
  MASS,
  MASS_PER_LENGTH,
  MOMENT,
  SECOND_MOMENT_OF_AREA,
  SECTION_MODULUS,
  STRESS,
  sameDimension,
  TEMPERATURE,
  UNIT_WEIGHT,
} from './dimension.ts';
import { dimensionName, isAngle, siUnit } from './dimension-names.ts';
import { nearest } from './nearest.ts';
import { significant } from './number.ts';
import type { Problem } from './problem.ts';
import type { Quantity } from './quantity.ts';
import type { Range } from './range.ts';
import { readUnits } from './unit-text.ts';
import { sizeOf } from './units.ts';

export type DisplayKind = 'force' | 'length' | 'deflection' | 'moment' | 'stress' | 'rotation' | 'line load';

/** A unit as shown and its size in SI. */
export interface DisplayUnit {
  readonly text: string;
  readonly size: number;
}

export type DisplayUnits = Readonly<Record<DisplayKind, DisplayUnit>>;

/** `display: metric`, the default. */
export const METRIC: DisplayUnits = {
  force: unit('kN'),
  length: unit('m'),
  deflection: unit('mm'),
  moment: unit('kN m'),
  stress: unit('MPa'),
  rotation: unit('rad'),
  'line load': unit('kN/m'),
};

/** `display: us`. */
export const US: DisplayUnits = {
  force: unit('kip'),
  length: unit('ft'),
  deflection: unit('in'),
  moment: unit('kip ft'),
  stress: unit('ksi'),
  rotation: unit('rad'),
  'line load': unit('kip/ft'),
};

/** What a `display` statement says. `units` as written: `kN m`. */
export type DisplayChoice =
  | { readonly kind: 'metric' | 'us' }
  | {
      readonly kind: 'units';
      readonly units: readonly {
        readonly name: { readonly text: string; readonly range: Range };
        readonly units: string;
        readonly range: Range;
      }[];
    };

/** The units that a choice makes of those before it. A kind or a unit that does not fit keeps its old unit. */
export function readDisplay(choice: DisplayChoice, base: DisplayUnits): { units: DisplayUnits; problems: Problem[] } {
  if (choice.kind !== 'units') return { units: choice.kind === 'us' ? US : METRIC, problems: [] };
  const units: Record<DisplayKind, DisplayUnit> = { ...base };
  const problems: Problem[] = [];
  for (const { name, units: text, range } of choice.units) {
    if (!isDisplayKind(name.text)) {
      const near = nearest(name.text, DISPLAY_KINDS);
      const message = `\`${name.text}\` is no kind of quantity that \`display\` knows: ${DISPLAY_KINDS.join(', ')}.`;
      problems.push({ code: 'bad-value', range: name.range, message, ...(near && { hint: `\`${near}\`?` }) });
      continue;
    }
    const read = readUnits(text);
    if (!read) {
      problems.push({ code: 'unknown-unit', range, message: `\`${text}\` is no unit.` });
    } else if (!sameDimension(read.dimension, DIMENSION_OF[name.text])) {
      const message = `\`${text}\` measures ${dimensionName(read.dimension)}, not ${dimensionName(DIMENSION_OF[name.text])}.`;
      problems.push({ code: 'wrong-dimension', range, message });
    } else {
      units[name.text] = { text, size: sizeOf(read) };
    }
  }
  return { units, problems };
}

/** A difference of temperature has no unit to choose: K, or degF beside feet. */
export function temperatureUnit(units: DisplayUnits): DisplayUnit {
  return isUs(units) ? FAHRENHEIT : KELVIN;
}

/** A quantity as shown; `text` is number and unit. ASCII, with `-` for minus. */
export interface Shown {
  readonly number: string;
  readonly unit: string;
  readonly text: string;
}

/** Shows a quantity, as the kind that is asked for where its dimension allows, else as its dimension and size suggest. */
export function showQuantity(quantity: Quantity, units: DisplayUnits, kind?: DisplayKind): Shown {
  const chosen = unitFor(quantity, units, kind);
  const number = significant(quantity.value / chosen.size);
  return { number, unit: chosen.text, text: chosen.text === '' ? number : `${number} ${chosen.text}` };
}

/** The unit that a metric note shows for a dimension; '' for a number. For messages about dimensions. */
export function tradeUnit(dimension: Dimension): string {
  return unitFor({ value: 1, dimension }, METRIC, undefined).text;
}

const DIMENSION_OF: Readonly<Record<DisplayKind, Dimension>> = {
  force: FORCE,
  length: LENGTH,
  deflection: LENGTH,
  moment: MOMENT,
  stress: STRESS,
  rotation: ANGLE,
  'line load': FORCE_PER_LENGTH,
};

const DISPLAY_KINDS = Object.keys(DIMENSION_OF) as readonly DisplayKind[]; // the keys of the record above

function isDisplayKind(word: string): word is DisplayKind {
  return Object.hasOwn(DIMENSION_OF, word);
}

/** Below this a stress without a kind is taken for a pressure on an area: 100 kPa is 2 ksf. */
const LARGEST_PRESSURE = 1e5;

/** Quantities without a kind of their own, from the smallest unit up: the last that the value reaches is used. */
interface TradeUnits {
  readonly dimension: Dimension;
  readonly metric: readonly Step[];
  readonly us: readonly Step[];
}

interface Step {
  readonly unit: DisplayUnit;
  /** In SI: values of at least this size. */
  readonly from: number;
}

const TRADE: readonly TradeUnits[] = [
  { dimension: AREA, metric: [step('cm2'), step('m2', 0.1)], us: [step('in2'), step('ft2', 0.5)] },
  { dimension: SECTION_MODULUS, metric: [step('cm3'), step('m3', 0.1)], us: [step('in3'), step('ft3', 0.1)] },
  { dimension: SECOND_MOMENT_OF_AREA, metric: [step('cm4'), step('m4', 0.1)], us: [step('in4'), step('ft4', 0.1)] },
  { dimension: BENDING_STIFFNESS, metric: [step('kN m2')], us: [step('kip in2')] },
  // A movement times a bending stiffness.
  { dimension: [4, 1, -2, 0, 0], metric: [step('kN m3')], us: [step('kip in3')] },
  { dimension: UNIT_WEIGHT, metric: [step('kN/m3')], us: [step('pcf')] },
  { dimension: MASS, metric: [step('kg'), step('t', 1e4)], us: [step('lb')] },
  { dimension: MASS_PER_LENGTH, metric: [step('kg/m')], us: [step('lb/ft')] },
  { dimension: [-2, 1, 0, 0, 0], metric: [step('kg/m2')], us: [step('lb/ft2')] },
  { dimension: DENSITY, metric: [step('kg/m3')], us: [step('lb/ft3')] },
];

const KELVIN = unit('K');
const FAHRENHEIT = unit('degF');

const PRESSURE = { metric: unit('kN/m2'), us: unit('psf') } as const;

function unitFor(quantity: Quantity, units: DisplayUnits, kind: DisplayKind | undefined): DisplayUnit {
  const { value, dimension } = quantity;
  if (kind && sameDimension(DIMENSION_OF[kind], dimension)) return units[kind];
  if (isAngle(dimension)) return units.rotation;
  const system = isUs(units) ? 'us' : 'metric';
  if (sameDimension(dimension, TEMPERATURE)) return temperatureUnit(units);
  if (sameDimension(dimension, DIMENSION_OF.stress) && Math.abs(value) < LARGEST_PRESSURE) return PRESSURE[system];
  for (const own of KINDS_BY_DIMENSION) if (sameDimension(DIMENSION_OF[own], dimension)) return units[own];
  const trade = TRADE.find(row => sameDimension(row.dimension, dimension));
  if (!trade) return { text: siUnit(dimension), size: 1 };
  return trade[system].findLast(row => Math.abs(value) >= row.from)!.unit;
}

/** A rotation is an angle and was asked for above; a plain number has no kind. */
const KINDS_BY_DIMENSION: readonly DisplayKind[] = ['force', 'length', 'moment', 'stress', 'line load'];

function isUs(units: DisplayUnits): boolean {
  return units.length.text === 'ft' || units.length.text === 'in' || units.length.text === 'yd';
}

function unit(text: string): DisplayUnit {
  const read = readUnits(text);
  if (!read) throw new Error(`no unit: ${text}`);
  return { text, size: sizeOf(read) };
}

function step(text: string, from = 0): Step {
  return { unit: unit(text), from };
}
