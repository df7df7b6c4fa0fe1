import { describe, expect, it } from 'vitest';
import { bound, derivative, evaluate, extremes, type Polynomial, roots, sum } from '../../src/mechanics/index.ts';

/** The polynomial with these roots, times a factor. */
const fromRoots = (factor: number, ...zeros: number[]) => {
  let polynomial: Polynomial = [factor];
  for (const zero of zeros) polynomial = sum([0, ...polynomial], polynomial, 1, -zero);
  return polynomial;
};

const expectRoots = (found: readonly number[], expected: readonly number[], tolerance = 1e-12) => {
  expect(found).toHaveLength(expected.length);
  expected.forEach((zero, k) => {
    expect(Math.abs(found[k]! - zero)).toBeLessThanOrEqual(tolerance * Math.max(1, Math.abs(zero)));
  });
};

describe('polynomials', () => {
  it('are evaluated, differentiated, summed and bounded', () => {
    expect(evaluate([1, -2, 3], 2)).toBe(9);
    expect(evaluate([], 2)).toBe(0);
    expect(derivative([1, -2, 3])).toEqual([-2, 6]);
    expect(sum([1, 2], [3, 4, 5], 2, -1)).toEqual([-1, 0, -5]);
    expect(bound([1, -2, 3], 2)).toBe(17);
  });

  it('of each degree up to six give all their roots on a stretch', () => {
    const zeros = [0.3, 1.1, 2.7, 3.05, 4.4, 5.9];
    for (let degree = 1; degree <= 6; degree++) {
      expectRoots(roots(fromRoots(-2.5, ...zeros.slice(0, degree)), 0, 6), zeros.slice(0, degree), 1e-11);
    }
  });

  it('give no roots outside the stretch, and those on its ends', () => {
    const p = fromRoots(1, -1, 2, 7);
    expectRoots(roots(p, 0, 6), [2]);
    expectRoots(roots(p, 2, 7), [2, 7]);
    expect(roots(p, 3, 6)).toEqual([]);
  });

  it('give a zero that is only touched', () => {
    expectRoots(roots(fromRoots(3, 1.25, 1.25), 0, 4), [1.25], 1e-7);
    expectRoots(roots(fromRoots(3, 1.25, 1.25, 3), 0, 4), [1.25, 3], 1e-7);
  });

  it('that are constant or nil have no roots', () => {
    expect(roots([3], 0, 1)).toEqual([]);
    expect(roots([0, 0, 0], 0, 1)).toEqual([]);
    expect(roots([], 0, 1)).toEqual([]);
    expectRoots(roots([-1, 2, 0, 0], 0, 1), [0.5]);
  });

  it('do not depend on the scale of place or value', () => {
    const zeros = [0.2, 0.21, 0.9];
    for (const scale of [1e-9, 1e-3, 1, 1e6]) {
      for (const factor of [1e-20, 1, 1e15]) {
        const p = fromRoots(factor, ...zeros.map(zero => zero * scale));
        const found = roots(p, 0, scale).map(zero => zero / scale);
        expectRoots(found, zeros, 1e-11);
      }
    }
  });

  it('find a deflection whose place is irrational', () => {
    // A triangular load on a simple span: the slope is nil at L √(1 − √(8/15)).
    const v = [0, 7, 0, -10, 0, 3];
    const [, place] = extremes(v, 0, 1);
    expect(Math.abs(place! - Math.sqrt(1 - Math.sqrt(8 / 15)))).toBeLessThan(1e-15);
  });

  it('may be extreme at their ends and where they are level', () => {
    expect(extremes([0, 1], 0, 2)).toEqual([0, 2]);
    expect(extremes([5], 1, 3)).toEqual([1, 3]);
    expectRoots(extremes([0, -4, 1], 0, 5), [0, 2, 5]);
  });
});
