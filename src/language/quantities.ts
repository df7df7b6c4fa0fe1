// Reads a number and every unit behind it as one quantity: `4.8 m`, `5e-6 /K`, `12 ft 6 1/2 in`.

import { withAngleAlone } from '../quantity/evaluate.ts';
import { nearest } from '../quantity/nearest.ts';
import { inRange, readDecimal } from '../quantity/number.ts';
import type { Quantity } from '../quantity/quantity.ts';
import { LARGEST_POWER } from '../quantity/unit-text.ts';
import type { Unit } from '../quantity/units.ts';
import { divideUnits, multiplyUnits, NO_UNIT, scaled, UNIT_NAMES, unitNamed, unitRaised } from '../quantity/units.ts';
import type { Reader } from './reader.ts';
import { asWritten } from './reader.ts';
import type { Operand } from './syntax.ts';
import type { Token } from './tokens.ts';
import { endsValue, isNameless, VALUE_ENDS } from './words.ts';

type QuantityOperand = Extract<Operand, { readonly kind: 'quantity' }>;

/** The quantity that begins with the number here. */
export function readQuantity(reader: Reader): QuantityOperand | undefined {
  const from = reader.position;
  const inches = readFeetAndInches(reader);
  if (inches !== undefined) return finish(reader, from, inches, [1, 0, 0, 0, 0]);

  const { digits, tens } = readDecimal(reader.next()!.text);
  const unit = readUnits(reader);
  if (!unit || !standsAlone(reader)) return undefined;
  const value = digits === 0 ? 0 : scaled(digits, tens, unit);
  if (digits !== 0 && value === 0) return outOfRange(reader, from);
  return finish(reader, from, value, withAngleAlone(unit.dimension));
}

/** A plain number, without units; the factor of a case or of self-weight. */
export function readNumber(reader: Reader): QuantityOperand | undefined {
  const from = reader.position;
  return finish(reader, from, Number(reader.next()!.text), [0, 0, 0, 0, 0]);
}

function finish(
  reader: Reader,
  from: number,
  value: number,
  dimension: Quantity['dimension'],
): QuantityOperand | undefined {
  if (!inRange(value)) return outOfRange(reader, from);
  return { kind: 'quantity', quantity: { value, dimension }, range: reader.since(from) };
}

function outOfRange(reader: Reader, from: number): undefined {
  const range = reader.since(from);
  return reader.fail('number-out-of-range', range, 'This is not between 1e-30 and 1e30 in SI.');
}

/**
 * Feet with inches behind them, or inches as a mixed number, in metres: `12 ft 6 in`, `12 ft 6 1/2 in`, `12 ft 1/2 in`,
 * `9 1/4 in`. A bare fraction divides, and so does one with blanks about its stroke. Reads nothing where it is neither.
 */
function readFeetAndInches(reader: Reader): number | undefined {
  let ahead = 0;
  let inches = 0;
  if (reader.isWord('ft', 1) && reader.peek(2)?.kind === 'number') {
    inches = 12 * Number(reader.peek()!.text);
    ahead = 2;
    const fraction = fractionAt(reader, ahead);
    if (fraction !== undefined && reader.isWord('in', ahead + 3)) return take(reader, ahead + 4, inches + fraction);
  }
  const fraction = fractionAt(reader, ahead + 1);
  if (fraction !== undefined && reader.isWord('in', ahead + 4)) {
    return take(reader, ahead + 5, inches + Number(reader.peek(ahead)!.text) + fraction);
  }
  if (ahead > 0 && reader.isWord('in', ahead + 1)) {
    return take(reader, ahead + 2, inches + Number(reader.peek(ahead)!.text));
  }
  return undefined;
}

/** `1/2`, written without blanks, of whole numbers. */
function fractionAt(reader: Reader, ahead: number): number | undefined {
  const above = reader.peek(ahead);
  const below = reader.peek(ahead + 2);
  if (above?.kind !== 'number' || !reader.isMark('/', ahead + 1) || below?.kind !== 'number') return undefined;
  if (reader.peek(ahead + 1)!.spaced || below.spaced) return undefined;
  const fraction = Number(above.text) / Number(below.text);
  const whole = Number.isInteger(Number(above.text)) && Number.isInteger(Number(below.text));
  return whole && Number.isFinite(fraction) ? fraction : undefined;
}

function take(reader: Reader, count: number, inches: number): number {
  reader.skip(count);
  return (inches * 254) / 10_000;
}

/** Units joined by blanks, `·` or `/`; behind a `/` stands one. */
function readUnits(reader: Reader): Unit | undefined {
  let product = NO_UNIT;
  let divided = false;
  for (;;) {
    if (reader.isMark('/')) {
      if (!isUnit(reader, 1)) return product;
      reader.skip(1);
      const unit = readUnit(reader);
      if (!unit) return undefined;
      product = divideUnits(product, unit);
      divided = true;
      continue;
    }
    const dotted = reader.isMark('·') ? 1 : 0;
    if (!isUnit(reader, dotted)) return product;
    if (divided) {
      const message = 'Behind `/` stands one unit; it is not clear on which side of the stroke this one belongs.';
      const hint = 'Put it before the stroke, or behind a second one.';
      return reader.fail('bad-value', reader.peek(dotted)!, message, { hint });
    }
    reader.skip(dotted);
    const unit = readUnit(reader);
    if (!unit) return undefined;
    product = multiplyUnits(product, unit);
  }
}

/** In `10 kN / t of RHS`, with blanks about the stroke, `t` is a property and not the tonne. */
function isUnit(reader: Reader, ahead: number): boolean {
  const token = reader.peek(ahead);
  if (token?.kind !== 'word' || unitNamed(token.text) === undefined) return false;
  return ahead === 0 || !token.spaced || !reader.isWord('of', ahead + 1);
}

/** One unit with its power: `mm2`, `mm²`, `mm^2`. */
function readUnit(reader: Reader): Unit | undefined {
  const word = reader.next()!;
  const raised = reader.peek();
  if (raised?.kind === 'raised' && !raised.spaced) {
    reader.skip(1);
    return powerOf(reader, word, raised, Number(raised.text));
  }
  if (!reader.isMark('^')) return unitNamed(word.text);
  const negative = reader.isMark('-', 1) ? 1 : 0;
  const exponent = reader.peek(1 + negative);
  if (exponent?.kind !== 'number') {
    return reader.fail('bad-value', reader.peek()!, 'Behind a unit, `^` takes a whole number.', {
      hint: 'Put the quantity in parentheses to raise it as a whole: `(3 mm)^2`.',
    });
  }
  reader.skip(2 + negative);
  return powerOf(reader, word, exponent, (negative ? -1 : 1) * Number(exponent.text));
}

function powerOf(reader: Reader, word: Token, exponent: Token, power: number): Unit | undefined {
  const usable = Number.isInteger(power) && power !== 0 && Math.abs(power) <= LARGEST_POWER;
  const unit = usable ? unitRaised(word.text, power) : undefined;
  return unit ?? reader.fail('bad-value', exponent, `\`${word.text}\` has no power ${asWritten(exponent)}.`);
}

/** Whether what follows the units may follow a quantity; a word that neither is a unit nor ends a value may not. */
function standsAlone(reader: Reader): boolean {
  const token = reader.peek();
  if (token?.kind === 'stray' && SIGNS[token.text]) {
    reader.fail('unknown-unit', token, `${asWritten(token)} is no unit here.`, { hint: SIGNS[token.text]! });
    return false;
  }
  if (token?.kind !== 'word' || endsValue(token.text) || isNameless(token.text) || token.text === 'of') return true;
  const near = nearest(token.text, UNIT_NAMES) ?? nearest(token.text, VALUE_ENDS);
  const hint = near ? `\`${near}\`?` : 'If it is a name, an operator is missing before it.';
  reader.fail('unknown-unit', token, `${asWritten(token)} is no unit.`, {
    hint: joinsDimensions(token.text) ? BLANKS : hint,
  });
  return false;
}

const BLANKS = 'Between dimensions `x` stands with blanks on both sides.';

/** `mmx220mm`, or the `x220mm` of `47x220mm`. */
function joinsDimensions(word: string): boolean {
  const at = word.indexOf('x');
  if (at < 0 || word.length > 40 || !/^\d/.test(word.slice(at + 1))) return false;
  return at === 0 || unitNamed(word.slice(0, at)) !== undefined;
}

/** Signs that stand for units elsewhere, and what is written here. */
const SIGNS: Readonly<Record<string, string>> = {
  '°': '`deg`?',
  '%': '`/ 100`?',
  "'": '`ft`?',
  '′': '`ft`?',
  '″': '`in`?',
};
