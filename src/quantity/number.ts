// Numbers as written and as shown: decimal literals in, significant figures out, without floating-point noise.

/** A number as digits · 10^tens; `digits` is a whole number wherever the literal has at most 15 digits. */
export interface Decimal {
  readonly digits: number;
  readonly tens: number;
}

/** What a note may hold: nothing larger, and nothing smaller but zero. */
export const LARGEST = 1e30;
export const SMALLEST = 1e-30;

export function inRange(value: number): boolean {
  const size = Math.abs(value);
  return size === 0 || (size >= SMALLEST && size <= LARGEST);
}

/** Reads `12.4`, `.5`, `5e-6`; the text is known to have that form. */
export function readDecimal(text: string): Decimal {
  let digits = 0;
  let count = 0;
  let tens = 0;
  let index = 0;
  let afterPoint = false;
  for (; index < text.length; index++) {
    const code = text.charCodeAt(index);
    if (code === POINT) {
      afterPoint = true;
    } else if (code >= ZERO && code <= NINE) {
      if (count > 0 || code !== ZERO) count++;
      digits = digits * 10 + (code - ZERO);
      if (afterPoint) tens--;
    } else break;
  }
  // More digits than a double holds exactly are better read by the language's own, correctly rounding, reader.
  if (count > 15) return { digits: Number(text), tens: 0 };
  if (index < text.length) tens += Number(text.slice(index + 1));
  return { digits, tens };
}

/**
 * A value in so many significant figures, ties away from zero, trailing zeros kept: `2.063`, `10.00`, `0.5000`.
 * What lies past the 14th digit is noise and is dropped first. Plain digits from 1e-4 up to 1e7, `1.234e-7` outside.
 */
export function significant(value: number, figures = 4): string {
  if (value === 0) return '0';
  if (!Number.isFinite(value)) return String(value);
  const sign = value < 0 ? '-' : '';
  const text = Math.abs(value).toExponential(NOISE_FREE_DIGITS - 1);
  let digits = Number(text[0] + text.slice(2, figures + 1));
  let exponent = Number(text.slice(text.indexOf('e') + 1));
  if (text.charCodeAt(figures + 1) >= FIVE) digits++;
  if (digits === 10 ** figures) {
    digits /= 10;
    exponent++;
  }
  return sign + place(String(digits), exponent);
}

/** All that is known of a value: at most 14 digits, trailing zeros dropped. */
export function full(value: number): string {
  return String(withoutNoise(value)).replace('e+', 'e');
}

/** The value to 14 significant digits. */
export function withoutNoise(value: number): number {
  return Number(value.toPrecision(NOISE_FREE_DIGITS));
}

const NOISE_FREE_DIGITS = 14;
const POINT = 46;
const ZERO = 48;
const FIVE = 53;
const NINE = 57;

/** Sets the decimal point into digits that stand for d.ddd · 10^exponent. */
function place(digits: string, exponent: number): string {
  const behind = digits.length - 1 - exponent;
  if (exponent < -4 || exponent >= 7) {
    const mantissa = digits.length > 1 ? `${digits[0]}.${digits.slice(1)}` : digits;
    return `${mantissa}e${exponent}`;
  }
  if (behind <= 0) return digits + '0'.repeat(-behind);
  if (exponent < 0) return `0.${'0'.repeat(-exponent - 1)}${digits}`;
  return `${digits.slice(0, exponent + 1)}.${digits.slice(exponent + 1)}`;
}
