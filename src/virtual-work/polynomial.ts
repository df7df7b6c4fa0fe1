// Polynomials of the force method: values and definite integrals of internal forces along a range. This room's own, so
// that the second road to a movement shares no arithmetic with the first.

/** `coefficients[i]` belongs to x to the power i. */
export type Polynomial = readonly number[];

export function valueAt(coefficients: Polynomial, x: number): number {
  let value = 0;
  for (let power = coefficients.length - 1; power >= 0; power--) value = value * x + coefficients[power]!;
  return value;
}

/** No value from 0 to `length` is larger in size. */
export function bound(coefficients: Polynomial, length: number): number {
  let value = 0;
  for (let power = coefficients.length - 1; power >= 0; power--)
    value = value * length + Math.abs(coefficients[power]!);
  return value;
}

/** The same polynomial in y, where x = y + shift. */
export function shifted(coefficients: Polynomial, shift: number): number[] {
  const result = coefficients.slice();
  for (let low = 0; low < result.length; low++) {
    for (let power = result.length - 2; power >= low; power--) result[power]! += shift * result[power + 1]!;
  }
  return result;
}

export function derivative(coefficients: Polynomial): number[] {
  return coefficients.slice(1).map((coefficient, index) => coefficient * (index + 1));
}

/** The integral of a · b from 0 to `length`. */
export function productIntegral(a: Polynomial, b: Polynomial, length: number): number {
  let sum = 0;
  for (let degree = a.length + b.length - 2; degree >= 0; degree--) {
    let coefficient = 0;
    const last = Math.min(degree, a.length - 1);
    for (let i = Math.max(0, degree - b.length + 1); i <= last; i++) coefficient += a[i]! * b[degree - i]!;
    sum = sum * length + coefficient / (degree + 1);
  }
  return sum * length;
}

export function sum(a: Polynomial, b: Polynomial): number[] {
  const [long, short] = a.length >= b.length ? [a, b] : [b, a];
  return long.map((coefficient, power) => coefficient + (short[power] ?? 0));
}
