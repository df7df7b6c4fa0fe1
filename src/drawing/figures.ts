// Numbers with units as they stand on a drawing: four significant figures, a thin space before the unit, a true minus.
import type { DisplayUnit } from '../quantity/display.ts';
import { significant } from '../quantity/number.ts';

export const THIN = '\u2009';

/** `value` in SI: `7.747 kN`. */
export function withUnit(value: number, unit: DisplayUnit): string {
  return `${inUnit(value, unit)}${THIN}${spaced(unit.text)}`;
}

/** `value` in SI, its number alone: `7.747`. */
export function inUnit(value: number, unit: DisplayUnit): string {
  return trueMinus(significant(value / unit.size));
}

/** With its sign always: `+7.747`. */
export function signed(value: number, unit: DisplayUnit): string {
  const text = inUnit(value, unit);
  return value > 0 ? `+${text}` : text;
}

/** A figure that the writer gave keeps his digits: `2.4`, `0.45`; four figures where it has more. */
export function asGiven(value: number, unit: DisplayUnit): string {
  const text = inUnit(value, unit);
  if (!text.includes('.') || /e/i.test(text)) return text;
  return text.replace(/\.?0+$/, '');
}

export function asGivenWithUnit(value: number, unit: DisplayUnit): string {
  return `${asGiven(value, unit)}${THIN}${spaced(unit.text)}`;
}

/** A unit's parts stand apart by a thin space, its powers raised. */
export function spaced(unit: string): string {
  return unit.replaceAll(' ', THIN).replace(/(?<=[a-z])[234]/g, power => RAISED[power] ?? power);
}

const RAISED: Readonly<Record<string, string>> = { '2': '²', '3': '³', '4': '⁴' };

function trueMinus(text: string): string {
  return text.replaceAll('-', '−');
}
