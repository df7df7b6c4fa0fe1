import { describe, expect, test } from 'vitest';
import { eliminationTree } from '../../src/mechanics/elimination-tree.ts';
import { minimumDegree } from '../../src/mechanics/minimum-degree.ts';
import { order } from '../../src/mechanics/ordering.ts';
import { pointGraph } from '../../src/mechanics/point-graph.ts';
import type { SymmetricMatrix } from '../../src/mechanics/symmetric-matrix.ts';
import { fromColumns, gridFrame } from '../bench/grid-frame.ts';
import { randomStiffness } from './sample-matrices.ts';

describe('an order of elimination', () => {
  test.each([
    ['of nothing', fromColumns([], 1)],
    ['of one freedom', coupled(1, [])],
    ['of freedoms that nothing couples', coupled(7, [])],
    ['of a frame', gridFrame(7, 9)],
    [
      'of two parts',
      coupled(6, [
        [0, 1],
        [1, 2],
        [3, 4],
        [4, 5],
      ]),
    ],
    ['of points with different numbers of freedoms', randomStiffness(80, 90, 3)],
    ['of a matrix that couples everything', randomStiffness(20, 2000, 4)],
    ['of many random springs', randomStiffness(300, 500, 5)],
  ])('%s names every freedom once', (_, matrix) => {
    expect([...order(matrix)].sort((a, b) => a - b)).toEqual([...Array(matrix.size).keys()]);
  });

  test('keeps the freedoms of a point together', () => {
    const matrix = gridFrame(6, 5);
    const points = [...order(matrix)].map(freedom => matrix.points[freedom]!);
    expect(points.filter((point, k) => point !== points[k - 1])).toHaveLength(30);
  });

  test('is the same each time', () => {
    expect(order(randomStiffness(200, 300, 6))).toEqual(order(randomStiffness(200, 300, 6)));
  });

  test('leaves no fill in a chain, wherever it is numbered from', () => {
    const matrix = coupled(
      50,
      Array.from({ length: 49 }, (_, k) => [(k * 7) % 50, ((k + 1) * 7) % 50] as const),
    );
    expect(reached(matrix)).toBe(49);
  });

  test('leaves no fill in a tree', () => {
    expect(
      reached(
        coupled(
          127,
          Array.from({ length: 126 }, (_, k) => [k >> 1, k + 1] as const),
        ),
      ),
    ).toBe(126);
  });

  test('leaves a freedom that meets all others for last', () => {
    const matrix = coupled(
      400,
      Array.from({ length: 399 }, (_, k) => [200, k < 200 ? k : k + 1] as const),
    );
    expect(order(matrix).at(-1)).toBe(200);
    expect(reached(matrix)).toBe(399);
  });

  test('of a ring fills one entry for each freedom short of three', () => {
    expect(
      reached(
        coupled(
          30,
          Array.from({ length: 30 }, (_, k) => [k, (k + 1) % 30] as const),
        ),
      ),
    ).toBe(30 + 27);
  });

  test('of a square frame leaves less than half the fill of storey after storey', () => {
    const matrix = gridFrame(40, 40);
    const graph = pointGraph(matrix);
    const natural = eliminationTree(
      graph,
      Int32Array.from({ length: graph.nodes }, (_, k) => k),
    );
    expect(reached(matrix)).toBeLessThan(0.5 * total(natural.reach));
  });
});

/** Entries below the diagonal of L, nodes with one freedom counted one by one. */
function reached(matrix: SymmetricMatrix): number {
  const graph = pointGraph(matrix);
  return total(eliminationTree(graph, minimumDegree(graph)).reach);
}

function total(numbers: Int32Array): number {
  return numbers.reduce((sum, number) => sum + number, 0);
}

/** A matrix of single freedoms with these pairs coupled. */
function coupled(size: number, pairs: readonly (readonly [number, number])[]): SymmetricMatrix {
  const columns = Array.from({ length: size }, (_, k) => new Map([[k, 4]]));
  for (const [a, b] of pairs) columns[Math.min(a, b)]!.set(Math.max(a, b), -1);
  return fromColumns(columns, 1);
}
