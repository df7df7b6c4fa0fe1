import { describe, expect, test } from 'vitest';
import { factorise } from '../../src/mechanics/factorisation.ts';
import { nullSpace, nullTolerance } from '../../src/mechanics/null-space.ts';
import type { SymmetricMatrix } from '../../src/mechanics/symmetric-matrix.ts';
import { fromColumns, gridFrame, length } from '../bench/grid-frame.ts';
import { fromDense, randomStiffness, relativeDifference } from './sample-matrices.ts';

describe('the movements that meet no stiffness', () => {
  test.each([
    ['one spring to ground', fromDense([[5]])],
    ['a small frame', gridFrame(3, 3)],
    ['a large frame', gridFrame(20, 20)],
    ['a column in 1000 pieces', gridFrame(1000, 1)],
    ['random springs', randomStiffness(50, 100, 1)],
    ['nothing', fromColumns([], 1)],
  ])('are none for %s', (_, matrix) => {
    expect(nullSpace(matrix, factorise(matrix))).toEqual([]);
  });

  test.each([
    [2, 2],
    [5, 4],
    [1, 40],
    [25, 25],
  ])('of a floating frame of %i storeys and %i columns are those of a rigid body', (storeys, columns) => {
    const matrix = gridFrame(storeys, columns, 'none');
    const movements = checked(matrix, 3);
    const joint = (freedom: number) => Math.floor(freedom / 3);
    const x = (freedom: number) => length * (joint(freedom) % columns);
    const y = (freedom: number) => length * Math.floor(joint(freedom) / columns);
    expectInSpan(matrix, movements, freedom => [1, 0, 0][freedom % 3]!);
    expectInSpan(matrix, movements, freedom => [0, 1, 0][freedom % 3]!);
    expectInSpan(matrix, movements, freedom => [-y(freedom), x(freedom), 1][freedom % 3]!);
  });

  test('of two floating frames are six', () => {
    checked(sideBySide(gridFrame(4, 6, 'none'), gridFrame(7, 3, 'none')), 6);
  });

  test('of a floating frame beside one on bases are three, and leave the other at rest', () => {
    const standing = gridFrame(5, 5);
    const movements = checked(sideBySide(standing, gridFrame(4, 4, 'none')), 3);
    for (const movement of movements)
      expect(movement.subarray(0, standing.size).every(value => Math.abs(value) < 1e-12)).toBe(true);
  });

  test('of freedoms without any stiffness are these freedoms', () => {
    const matrix = fromDense([
      [0, 0, 0],
      [0, 3, 0],
      [0, 0, 0],
    ]);
    expect(nullSpace(matrix, factorise(matrix)).map(({ movement }) => [...movement])).toEqual([
      [1, 0, 0],
      [0, 0, 1],
    ]);
  });

  test.each([6, 30, 100])('are found where no pivot shows them: %i freedoms, two combinations left free', size => {
    // B Bᵀ with two columns fewer than rows; the last pivots are rounding of a size that chance decides.
    const random = randomStiffness(size, size, 2);
    const width = random.size - 2;
    const b = Array.from({ length: random.size }, (_, i) =>
      Array.from({ length: width }, (_, j) => Math.cos(1 + i * j) + Math.sin(i * i + 3 * j)),
    );
    const matrix = fromDense(b.map(row => b.map(other => row.reduce((sum, value, k) => sum + value * other[k]!, 0))));
    checked(matrix, 2);
  });

  test('are told from those of a spring 1e-11 as stiff as the rest', () => {
    const columns = Array.from({ length: 90 }, (_, k) => {
      const entries = new Map([[k, k === 0 ? 1 + 1e-11 : k === 89 ? 1 : 2]]);
      if (k < 89) entries.set(k + 1, -1);
      return entries;
    });
    expect(nullSpace(fromColumns(columns, 1), factorise(fromColumns(columns, 1)))).toEqual([]);
    columns[0]!.set(0, 1);
    checked(fromColumns(columns, 1), 1);
  });
});

/** The movements, after a check of their number, their residuals, and their being orthonormal by the roots of the diagonal. */
function checked(matrix: SymmetricMatrix, count: number): Float64Array[] {
  const vectors = nullSpace(matrix, factorise(matrix));
  expect(vectors).toHaveLength(count);
  for (const { residual } of vectors) expect(residual).toBeLessThanOrEqual(nullTolerance);
  const movements = vectors.map(({ movement }) => movement);
  for (const [i, a] of movements.entries()) {
    for (const [j, b] of movements.entries()) expect(weighted(matrix, a, b)).toBeCloseTo(i === j ? 1 : 0, 10);
  }
  return movements;
}

function expectInSpan(
  matrix: SymmetricMatrix,
  movements: readonly Float64Array[],
  shape: (freedom: number) => number,
): void {
  const sought = Float64Array.from({ length: matrix.size }, (_, freedom) => shape(freedom));
  const nearest = new Float64Array(matrix.size);
  for (const movement of movements) {
    const share = weighted(matrix, movement, sought);
    for (let k = 0; k < matrix.size; k++) nearest[k]! += share * movement[k]!;
  }
  expect(relativeDifference(nearest, sought)).toBeLessThan(1e-8);
}

/** The product of two movements, every freedom weighted by its own stiffness. */
function weighted(matrix: SymmetricMatrix, a: Float64Array, b: Float64Array): number {
  return a.reduce((sum, value, k) => sum + value * b[k]! * matrix.values[matrix.starts[k]!]!, 0);
}

/** Two matrices as one that does not couple them. */
function sideBySide(a: SymmetricMatrix, b: SymmetricMatrix): SymmetricMatrix {
  const shifted = (numbers: Int32Array, by: number) => [...numbers].map(number => number + by);
  return {
    size: a.size + b.size,
    starts: Int32Array.from([...a.starts, ...shifted(b.starts.subarray(1), a.rows.length)]),
    rows: Int32Array.from([...a.rows, ...shifted(b.rows, a.size)]),
    values: Float64Array.from([...a.values, ...b.values]),
    points: Int32Array.from([...a.points, ...shifted(b.points, a.points.at(-1)! + 1)]),
  };
}
