import { describe, expect, test } from 'vitest';
import { conditionEstimate } from '../../src/mechanics/condition.ts';
import { factorise, pivotTolerance } from '../../src/mechanics/factorisation.ts';
import { analyseSymbolic } from '../../src/mechanics/symbolic.ts';
import { multiply, type SymmetricMatrix } from '../../src/mechanics/symmetric-matrix.ts';
import { bendingStiffness, fromColumns, gridFrame, length } from '../bench/grid-frame.ts';
import {
  denseSolve,
  fromDense,
  randomNumbers,
  randomStiffness,
  relativeDifference,
  toDense,
} from './sample-matrices.ts';

describe('a solution', () => {
  test.each([1, 2, 3, 4, 5, 7, 20, 40, 70, 120])('of %i random points agrees with dense elimination', points => {
    const matrix = randomStiffness(points, 2 * points, points);
    const rhs = loads(matrix.size);
    const factorisation = factorise(matrix);
    expect(relativeDifference(factorisation.solve(rhs), denseSolve(toDense(matrix), rhs))).toBeLessThan(1e-11);
    expect(factorisation.singular).toHaveLength(0);
    expect(factorisation.negativePivots).toBe(0);
  });

  test.each([
    [1, 1],
    [1, 60],
    [60, 1],
    [5, 9],
    [12, 11],
  ])('of a frame of %i storeys and %i columns agrees with dense elimination', (storeys, columns) => {
    const matrix = gridFrame(storeys, columns);
    const rhs = loads(matrix.size);
    const expected = denseSolve(toDense(matrix), rhs);
    expect(relativeDifference(factorise(matrix).solve(rhs), expected)).toBeLessThan(1e-9);
  });

  test('of a column in 40 pieces gives P L³ / 3 E I at its tip', () => {
    const matrix = gridFrame(40, 1);
    const rhs = new Float64Array(120);
    rhs[117] = 1000;
    const expected = (1000 * (40 * length) ** 3) / (3 * bendingStiffness);
    expect(factorise(matrix).solve(rhs)[117]! / expected).toBeCloseTo(1, 8);
  });

  test('of a large frame balances its loads', () => {
    const matrix = gridFrame(45, 45);
    const rhs = loads(matrix.size);
    expect(relativeDifference(multiply(matrix, factorise(matrix).solve(rhs)), rhs)).toBeLessThan(1e-9);
  });

  test('for several right sides is that for each', () => {
    const matrix = gridFrame(6, 6);
    const both = loads(2 * matrix.size);
    const factorisation = factorise(matrix);
    const apart = [both.slice(0, matrix.size), both.slice(matrix.size)].map(rhs => [...factorisation.solve(rhs)]);
    expect([...factorisation.solve(both)]).toEqual(apart.flat());
    expect([...multiply(matrix, both)].slice(matrix.size)).toEqual([...multiply(matrix, both.slice(matrix.size))]);
  });

  test('with a plan made for another matrix of the same pattern is as without', () => {
    const matrix = randomStiffness(60, 100, 8);
    const doubled = { ...matrix, values: matrix.values.map(value => 2 * value) };
    const rhs = loads(matrix.size);
    expect(factorise(doubled, analyseSymbolic(matrix)).solve(rhs)).toEqual(factorise(doubled).solve(rhs));
  });

  test.each([20, 100])('of stiffnesses from 1e-6 to 1e6 is right in every freedom (%i points)', points => {
    const matrix = randomStiffness(points, 2 * points, 9);
    const random = randomNumbers(10);
    const units = Array.from({ length: matrix.size }, () => 10 ** (12 * random() - 6));
    const rhs = loads(matrix.size);
    const expected = denseSolve(toDense(matrix), rhs);
    const solution = factorise(scaled(matrix, units)).solve(rhs.map((value, k) => value * units[k]!));
    expect(
      relativeDifference(
        solution.map((value, k) => value * units[k]!),
        expected,
      ),
    ).toBeLessThan(1e-11);
  });

  test('of no freedoms is empty', () => {
    const factorisation = factorise(fromColumns([], 1));
    expect(factorisation.solve(new Float64Array(0))).toEqual(new Float64Array(0));
    expect(factorisation.singular).toHaveLength(0);
    expect(multiply(fromColumns([], 1), new Float64Array(0))).toHaveLength(0);
  });

  test('of one spring is load over stiffness', () => {
    expect([...factorise(fromDense([[4]])).solve(Float64Array.of(10, 20))]).toEqual([2.5, 5]);
  });

  test('refuses a right side of another length', () => {
    expect(() =>
      factorise(
        fromDense([
          [4, 0],
          [0, 4],
        ]),
      ).solve(new Float64Array(3)),
    ).toThrow('3 numbers');
  });
});

describe('pivots', () => {
  test('are those of the matrix scaled to a diagonal of ones', () => {
    const factorisation = factorise(
      fromDense([
        [4, 3],
        [3, 9],
      ]),
    );
    expect(factorisation.pivotOf(0)).toBe(1);
    expect(factorisation.pivotOf(1)).toBeCloseTo(1 - 9 / 36, 15);
    expect(factorisation.smallestPivot).toBe(factorisation.pivotOf(1));
    expect(factorisation.largestPivot).toBe(1);
  });

  test('are the same in other units', () => {
    const matrix = gridFrame(8, 8);
    const units = Array.from({ length: matrix.size }, (_, k) => (k % 3 === 2 ? 1 : 1e-3));
    const pivots = allPivots(matrix);
    expect(relativeDifference(allPivots(scaled(matrix, units)), pivots)).toBeLessThan(1e-12);
  });

  test.each([9, 90])('below zero are as many as the springs that push (%i freedoms)', size => {
    // Every third spring to ground is negative, and couplings are too weak to change a sign (Gershgorin's circles).
    const columns = Array.from({ length: size }, (_, k) => {
      const entries = new Map([[k, k % 3 === 0 ? -5 : 5]]);
      if (k + 1 < size) entries.set(k + 1, 1);
      if (k + 10 < size) entries.set(k + 10, 1);
      return entries;
    });
    const factorisation = factorise(fromColumns(columns, 1));
    expect(factorisation.negativePivots).toBe(size / 3);
    expect(factorisation.singular).toHaveLength(0);
  });
});

describe('a freedom of no stiffness', () => {
  test.each([5, 30])('is marked, and the others are solved without it (%i points)', points => {
    const matrix = randomStiffness(points, 2 * points, 11);
    const dense = toDense(matrix);
    const idle = Math.floor(matrix.size / 2);
    for (let k = 0; k < matrix.size; k++) dense[idle]![k] = dense[k]![idle] = 0;
    const rhs = loads(matrix.size);
    const factorisation = factorise({ ...fromDense(dense), points: matrix.points });
    expect([...factorisation.singular]).toEqual([idle]);
    expect(factorisation.pivotOf(idle)).toBe(0);
    dense[idle]![idle] = 1;
    const expected = denseSolve(dense, rhs.with(idle, 0));
    expect(relativeDifference(factorisation.solve(rhs), expected)).toBeLessThan(1e-11);
  });

  test('that is the only one is marked', () => {
    const factorisation = factorise(fromDense([[0]]));
    expect([...factorisation.singular]).toEqual([0]);
    expect([...factorisation.solve(Float64Array.of(3))]).toEqual([0]);
  });

  test('met after others moves them along', () => {
    // Two freedoms joined by a spring, held by nothing.
    const factorisation = factorise(
      fromDense([
        [2, -2],
        [-2, 2],
      ]),
    );
    expect([...factorisation.singular]).toEqual([1]);
    expect([...factorisation.movementOf(1)]).toEqual([1, 1]);
    expect([...factorisation.solve(Float64Array.of(3, -3))]).toEqual([1.5, 0]);
  });

  test('leaves no number undefined when all of them are', () => {
    const matrix = fromColumns(
      Array.from({ length: 100 }, (_, k) => new Map([[k, 0]])),
      1,
    );
    const factorisation = factorise(matrix);
    expect(factorisation.singular).toHaveLength(100);
    expect(factorisation.solve(loads(100)).every(value => value === 0)).toBe(true);
  });

  test('without an entry on the diagonal is marked', () => {
    const matrix = fromColumns([new Map([[0, 2]]), new Map()], 1);
    expect([...factorise(matrix).singular]).toEqual([1]);
  });

  test('is told from one of little stiffness', () => {
    const soft =
      1000 *
      pivotTolerance(
        analyseSymbolic(
          fromDense([
            [1, 0],
            [0, 1],
          ]),
        ),
      );
    const factorisation = factorise(
      fromDense([
        [1, 1],
        [1, 1 + soft],
      ]),
    );
    expect(factorisation.singular).toHaveLength(0);
    expect(factorisation.smallestPivot / soft).toBeCloseTo(1, 2);
  });
});

describe('the estimate of the condition', () => {
  test.each([3, 10, 30])('of %i random points is the true one within a factor of 3, never above', points => {
    const matrix = randomStiffness(points, 2 * points, 12);
    const dense = toDense(matrix);
    const unit = dense.map((row, i) => row.map((value, j) => value / Math.sqrt(dense[i]![i]! * dense[j]![j]!)));
    const inverseColumns = unit.map((_, k) =>
      denseSolve(
        unit,
        unit.map((_, i) => (i === k ? 1 : 0)),
      ),
    );
    const exact = largestColumnSum(unit) * largestColumnSum(inverseColumns);
    const estimate = conditionEstimate(matrix, factorise(matrix));
    expect(estimate / exact).toBeGreaterThan(1 / 3);
    expect(estimate / exact).toBeLessThan(1 + 1e-9);
  });

  test('of springs to ground is 1, whatever their stiffness', () => {
    const matrix = fromDense([
      [1e-6, 0, 0],
      [0, 1, 0],
      [0, 0, 1e6],
    ]);
    expect(conditionEstimate(matrix, factorise(matrix))).toBeCloseTo(1, 14);
  });

  test('of a matrix that leaves a freedom free is infinite', () => {
    const matrix = fromDense([
      [2, -2],
      [-2, 2],
    ]);
    expect(conditionEstimate(matrix, factorise(matrix))).toBe(Number.POSITIVE_INFINITY);
  });

  test('of nothing is 1', () => {
    const matrix = fromColumns([], 1);
    expect(conditionEstimate(matrix, factorise(matrix))).toBe(1);
  });
});

/** Loads that differ from freedom to freedom. */
function loads(size: number): Float64Array {
  const random = randomNumbers(7);
  return Float64Array.from({ length: size }, () => 2 * random() - 1);
}

/** The matrix when freedom k is measured in units of 1 / units[k]. */
function scaled(matrix: SymmetricMatrix, units: readonly number[]): SymmetricMatrix {
  const values = matrix.values.slice();
  for (let column = 0; column < matrix.size; column++) {
    for (let k = matrix.starts[column]!; k < matrix.starts[column + 1]!; k++) {
      values[k]! *= units[column]! * units[matrix.rows[k]!]!;
    }
  }
  return { ...matrix, values };
}

function allPivots(matrix: SymmetricMatrix): number[] {
  const factorisation = factorise(matrix);
  return Array.from({ length: matrix.size }, (_, freedom) => factorisation.pivotOf(freedom));
}

function largestColumnSum(columns: readonly (readonly number[])[]): number {
  return Math.max(...columns.map(column => column.reduce((sum, value) => sum + Math.abs(value), 0)));
}
