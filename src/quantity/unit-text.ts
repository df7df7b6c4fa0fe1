// Reads units that stand alone in a text: `kN m`, `N/mm²`, `kip·ft`. Behind a number they are read token by token.

import type { Unit } from './units.ts';
import { divideUnits, multiplyUnits, NO_UNIT, unitNamed, unitRaised } from './units.ts';

/** The product of units joined by blanks, `·` or `/` (one unit behind each stroke); undefined where a word is no unit. */
export function readUnits(text: string): Unit | undefined {
  const words = text.replaceAll('/', ' / ').replaceAll('·', ' ').trim().split(/\s+/);
  let product = NO_UNIT;
  let divides = false;
  let divided = false;
  for (const word of words) {
    if (word === '/') {
      if (divides) return undefined;
      divides = true;
      continue;
    }
    const unit = readPower(word);
    if (!unit || (divided && !divides)) return undefined;
    product = divides ? divideUnits(product, unit) : multiplyUnits(product, unit);
    divided ||= divides;
    divides = false;
  }
  return divides ? undefined : product;
}

/** Raised digits and the digit that each stands for. */
export const RAISED: Readonly<Record<string, string>> = {
  '⁻': '-',
  '⁰': '0',
  '¹': '1',
  '²': '2',
  '³': '3',
  '⁴': '4',
  '⁵': '5',
  '⁶': '6',
  '⁷': '7',
  '⁸': '8',
  '⁹': '9',
};

/** The largest power that a unit may carry. */
export const LARGEST_POWER = 12;

function readPower(word: string): Unit | undefined {
  const plain = unitNamed(word);
  if (plain) return plain;
  let end = word.length;
  let power = '';
  while (end > 0 && RAISED[word[end - 1]!] !== undefined) power = RAISED[word[--end]!] + power;
  if (power === '') {
    end = word.indexOf('^');
    if (end < 0) return undefined;
    power = word.slice(end + 1);
  }
  const exponent = Number(power);
  if (!Number.isInteger(exponent) || Math.abs(exponent) > LARGEST_POWER || exponent === 0) return undefined;
  return unitRaised(word.slice(0, end), exponent);
}
