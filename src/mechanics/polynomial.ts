// Polynomials of low degree as coefficient arrays: `coefficients[i]` belongs to x to the power i. Their values, roots and
// extremes; what they stand for is left to others.

export type Polynomial = readonly number[];

/** Horner's rule. */
export function evaluate(polynomial: Polynomial, x: number): number {
  let value = 0;
  for (let power = polynomial.length - 1; power >= 0; power--) value = value * x + polynomial[power]!;
  return value;
}

export function derivative(polynomial: Polynomial): Polynomial {
  const result: number[] = [];
  for (let power = 1; power < polynomial.length; power++) result.push(power * polynomial[power]!);
  return result;
}

/** factorA × a + factorB × b. */
export function sum(a: Polynomial, b: Polynomial, factorA = 1, factorB = 1): Polynomial {
  const result: number[] = [];
  for (let power = 0; power < a.length || power < b.length; power++) {
    result.push(factorA * (a[power] ?? 0) + factorB * (b[power] ?? 0));
  }
  return result;
}

/** The same values by coefficients of x − by. */
export function shifted(polynomial: Polynomial, by: number): Polynomial {
  // Synthetic division by x − by, once for each coefficient.
  const result = [...polynomial];
  for (let k = 0; k < result.length; k++) {
    for (let power = result.length - 2; power >= k; power--) result[power]! += by * result[power + 1]!;
  }
  return result;
}

/** No value on the stretch from 0 to `length` is larger in size, and rounding in a value is a few ε of this. */
export function bound(polynomial: Polynomial, length: number): number {
  let value = 0;
  for (let power = polynomial.length - 1; power >= 0; power--) value = value * length + Math.abs(polynomial[power]!);
  return value;
}

/**
 * Where the polynomial may be largest or smallest on a stretch: its start, every place of level slope, its end; in
 * ascending order, start < end.
 */
export function extremes(polynomial: Polynomial, start: number, end: number): number[] {
  const places = [start];
  for (const place of roots(derivative(polynomial), start, end)) if (place > start && place < end) places.push(place);
  places.push(end);
  return places;
}

/**
 * The zeros on a stretch, ends included, ascending: where the sign changes, and where zero is touched to within rounding.
 * None for a polynomial that is zero throughout.
 */
export function roots(polynomial: Polynomial, start: number, end: number): number[] {
  // In t = x / size, |t| ≤ 1 on the stretch, so that coefficients compare and rounding is relative to their sum.
  const size = Math.max(Math.abs(start), Math.abs(end));
  if (!(size > 0)) return [];
  const scaled: number[] = [];
  let power = 1;
  for (const coefficient of polynomial) {
    scaled.push(coefficient * power);
    power *= size;
  }
  while (scaled.length > 0 && scaled[scaled.length - 1] === 0) scaled.pop();
  const from = start / size;
  const to = end / size;
  return rootsBetween(scaled, from, to).map(t => (t === from ? start : t === to ? end : t * size));
}

/** Values of a polynomial on |t| ≤ 1 below this many times the sum of its coefficients' sizes are rounding. */
const ROUNDING = 8 * Number.EPSILON;

/** Between neighbouring zeros of the derivative the polynomial only rises or only falls: at most one zero each. */
function rootsBetween(polynomial: Polynomial, start: number, end: number): number[] {
  if (polynomial.length < 2) return [];
  if (polynomial.length === 2) {
    const root = -polynomial[0]! / polynomial[1]!;
    return root >= start && root <= end ? [root] : [];
  }
  const slope = derivative(polynomial);
  const noise = ROUNDING * bound(polynomial, 1);
  const found: number[] = [];
  let from = start;
  let fromValue = evaluate(polynomial, from);
  if (Math.abs(fromValue) <= noise) found.push(from);
  for (const to of [...rootsBetween(slope, start, end), end]) {
    if (!(to > from)) continue;
    const toValue = evaluate(polynomial, to);
    if (Math.abs(toValue) <= noise) found.push(to);
    else if (Math.abs(fromValue) > noise && fromValue < 0 !== toValue < 0) {
      found.push(crossing(polynomial, slope, from, to, fromValue < 0));
    }
    from = to;
    fromValue = toValue;
  }
  return found;
}

/** The one change of sign between two places: Newton's method, halving the stretch whenever it would leave it. */
function crossing(polynomial: Polynomial, slope: Polynomial, start: number, end: number, rising: boolean): number {
  let low = start;
  let high = end;
  let t = 0.5 * (low + high);
  // Each round halves the stretch or converges quadratically; 100 halvings pass every double.
  for (let round = 0; round < 100; round++) {
    const value = evaluate(polynomial, t);
    if (value === 0) return t;
    if (value < 0 === rising) low = t;
    else high = t;
    const newton = t - value / evaluate(slope, t);
    const next = newton > low && newton < high ? newton : 0.5 * (low + high);
    if (Math.abs(next - t) <= Number.EPSILON * Math.abs(next) || next === low || next === high) return next;
    t = next;
  }
  return t;
}
