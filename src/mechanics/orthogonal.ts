// Sets of vectors at right angles to each other.

/** Root of the sum of squares. */
export function norm(x: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < x.length; k++) sum += x[k]! * x[k]!;
  return Math.sqrt(sum);
}

/**
 * What of a vector is at right angles to orthonormal others, made of length 1; undefined where nothing but rounding is
 * left. Lengths and angles are those of scale × vector, entry by entry.
 */
export function orthonormalise(
  vector: Float64Array,
  scale: Float64Array,
  others: readonly Float64Array[],
): Float64Array | undefined {
  const result = vector.slice();
  const whole = scaledNorm(result, scale);
  // Gram and Schmidt's method, once more against what rounding left of the first time.
  for (let pass = 0; pass < 2; pass++) {
    for (const other of others) {
      let share = 0;
      for (let k = 0; k < result.length; k++) share += result[k]! * other[k]! * scale[k]! * scale[k]!;
      for (let k = 0; k < result.length; k++) result[k]! -= share * other[k]!;
    }
  }
  const length = scaledNorm(result, scale);
  if (!(length > NOTHING_NEW * whole)) return undefined;
  for (let k = 0; k < result.length; k++) result[k]! /= length;
  return result;
}

/**
 * Turns images among each other, pair by pair, until they are at right angles, and their vectors with them: the one-sided
 * Jacobi method (Hestenes 1958), which finds small images to full accuracy beside large ones.
 */
export function separate(images: readonly Float64Array[], vectors: readonly Float64Array[]): void {
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let turned = false;
    for (let i = 0; i < images.length; i++) {
      for (let j = i + 1; j < images.length; j++) {
        const x = images[i]!;
        const y = images[j]!;
        const a = norm(x);
        const b = norm(y);
        let product = 0;
        for (let k = 0; k < x.length; k++) product += x[k]! * y[k]!;
        if (!(Math.abs(product) > RIGHT_ANGLE * a * b)) continue;
        turned = true;
        const difference = ((b - a) * (b + a)) / (2 * product);
        const tangent = Math.sign(difference || 1) / (Math.abs(difference) + Math.hypot(1, difference));
        turn(x, y, tangent);
        turn(vectors[i]!, vectors[j]!, tangent);
      }
    }
    if (!turned) return;
  }
}

/** Numbers between −1 and 1, the same for the same seed (Park and Miller, Communications of the ACM 31, 1988). */
export function scatteredVector(size: number, seed: number): Float64Array {
  const vector = new Float64Array(size);
  let state = seed;
  // The first few of a small seed are small.
  for (let k = -3; k < size; k++) {
    state = (state * 16807) % 2147483647;
    if (k >= 0) vector[k] = (2 * state) / 2147483647 - 1;
  }
  return vector;
}

/** A vector of which less than this is new lies in the span of the others. */
const NOTHING_NEW = 1e-13;

const RIGHT_ANGLE = 1e-14;

/** Jacobi's method converges quadratically; a dozen vectors take some six sweeps. */
const MOST_SWEEPS = 30;

function scaledNorm(x: Float64Array, scale: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < x.length; k++) sum += (x[k]! * scale[k]!) ** 2;
  return Math.sqrt(sum);
}

function turn(x: Float64Array, y: Float64Array, tangent: number): void {
  const cosine = 1 / Math.hypot(1, tangent);
  const sine = cosine * tangent;
  for (let k = 0; k < x.length; k++) {
    const xk = x[k]!;
    x[k] = cosine * xk - sine * y[k]!;
    y[k] = sine * xk + cosine * y[k]!;
  }
}
