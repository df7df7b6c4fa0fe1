// Words that several features share, in the voice of the page: the state of an answer, figures with their units.
import { show } from '../note/phrases.ts';
import type { Answer } from '../note/result.ts';
import { FORCE, LENGTH, MOMENT } from '../quantity/dimension.ts';
import type { DisplayUnits } from '../quantity/display.ts';
import { full } from '../quantity/number.ts';
import type { Quantity } from '../quantity/quantity.ts';

/** `met, use 0.333`, `not met, use 1.14`, `not checked`, `withheld`. A `>=` has no use. */
export function stateInWords({ quantity, status, utilisation }: Answer): string {
  if (quantity === undefined) return 'withheld';
  if (status === 'none') return 'not checked';
  const word = status === 'ok' ? 'met' : 'not met';
  return utilisation === undefined ? word : `${word}, use ${utilisation.toPrecision(3)}`;
}

/** `at most span A–B 4.800 m / 360 = 13.33 mm`; undefined where there is no limit. */
export function limitInWords({ comparison, limitDisplay }: Answer): string | undefined {
  if (comparison === undefined || limitDisplay === undefined) return undefined;
  return `${comparison === '<=' ? 'at most' : 'at least'} ${limitDisplay}`;
}

/** What was asked and what was required, on one line. */
export function requirementInWords(answer: Answer): string {
  const asked = answer.under === null ? answer.measure : `${answer.measure}, ${answer.under}`;
  const limit = limitInWords(answer);
  return limit === undefined ? asked : `${asked}: ${limit}`;
}

/** Every digit, in SI: `-0.001648703049 m`. */
export function allDigits({ value }: Quantity, unit: string): string {
  return unit === '' ? full(value) : `${full(value)} ${unit}`;
}

/** m → `4.800 m`. */
export function length(value: number, units: DisplayUnits): string {
  return show({ value, dimension: LENGTH }, units, 'length');
}

/** N right and up, N m anticlockwise → `3.100 kN down, 1.200 kN to the right`; `none` where all are nothing. */
export function inAllDirections(
  { x, y, couple }: { readonly x: number; readonly y: number; readonly couple: number },
  units: DisplayUnits,
): string {
  const noise = 1e-12 * Math.max(Math.abs(x), Math.abs(y));
  const parts: string[] = [];
  if (Math.abs(y) > noise) parts.push(`${force(Math.abs(y), units)} ${y > 0 ? 'up' : 'down'}`);
  if (Math.abs(x) > noise) parts.push(`${force(Math.abs(x), units)} to the ${x > 0 ? 'right' : 'left'}`);
  if (couple !== 0) parts.push(`${moment(Math.abs(couple), units)} ${couple > 0 ? 'anticlockwise' : 'clockwise'}`);
  return parts.length === 0 ? 'none' : parts.join(', ');
}

function force(value: number, units: DisplayUnits): string {
  return show({ value, dimension: FORCE }, units, 'force');
}

function moment(value: number, units: DisplayUnits): string {
  return show({ value, dimension: MOMENT }, units, 'moment');
}
