// Words that several features share, in the voice of the page: figures with their units, movements with a direction,
// the state of an answer.
import type { Answer } from '../note/result.ts';
import { ANGLE, FORCE, LENGTH, MOMENT } from '../quantity/dimension.ts';
import { type DisplayUnits, showQuantity } from '../quantity/display.ts';
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
  return showQuantity({ value, dimension: LENGTH }, units, 'length').text;
}

/** N → `3.100 kN`. */
export function force(value: number, units: DisplayUnits): string {
  return showQuantity({ value, dimension: FORCE }, units, 'force').text;
}

/** N m → `22.00 kN m`. */
export function moment(value: number, units: DisplayUnits): string {
  return showQuantity({ value, dimension: MOMENT }, units, 'moment').text;
}

/** m, positive down → `4.443 mm down`. */
export function verticalMovement(down: number, units: DisplayUnits): string {
  return directed(down, 'down', 'up', value => movement(value, units));
}

/** m, positive right → `2.100 mm to the left`. */
export function levelMovement(right: number, units: DisplayUnits): string {
  return directed(right, 'to the right', 'to the left', value => movement(value, units));
}

/** rad, positive anticlockwise → `0.008100 rad clockwise`. */
export function rotation(anticlockwise: number, units: DisplayUnits): string {
  return directed(
    anticlockwise,
    'anticlockwise',
    'clockwise',
    value => showQuantity({ value, dimension: ANGLE }, units, 'rotation').text,
  );
}

/** N, positive in the first direction → `3.100 kN up`. */
export function directedForce(value: number, positive: string, negative: string, units: DisplayUnits): string {
  return directed(value, positive, negative, size => force(size, units));
}

/** N m, positive anticlockwise → `6.000 kN m clockwise`. */
export function directedMoment(anticlockwise: number, units: DisplayUnits): string {
  return directed(anticlockwise, 'anticlockwise', 'clockwise', size => moment(size, units));
}

function movement(value: number, units: DisplayUnits): string {
  return showQuantity({ value, dimension: LENGTH }, units, 'deflection').text;
}

/** What is nothing has no direction. */
function directed(value: number, positive: string, negative: string, show: (size: number) => string): string {
  const shown = show(Math.abs(value));
  if (value === 0) return shown;
  return `${shown} ${value > 0 ? positive : negative}`;
}
