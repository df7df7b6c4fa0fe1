// The order in which freedoms are eliminated, found on the points they belong to.

import { minimumDegree } from './minimum-degree.ts';
import { type PointGraph, pointGraph } from './point-graph.ts';
import type { SymmetricMatrix } from './symmetric-matrix.ts';

/** The freedoms in an order of elimination that leaves little fill; the freedoms of a point stay together. */
export function order(matrix: SymmetricMatrix): Int32Array {
  const graph = pointGraph(matrix);
  return freedomsInOrder(graph, minimumDegree(graph));
}

/** The freedoms of nodes, node after node. */
export function freedomsInOrder(graph: PointGraph, nodes: Int32Array): Int32Array {
  const { freedoms } = graph;
  const result = new Int32Array(graph.nodes === 0 ? 0 : freedoms[graph.nodes]!);
  let count = 0;
  for (const node of nodes) {
    for (let freedom = freedoms[node]!; freedom < freedoms[node + 1]!; freedom++) result[count++] = freedom;
  }
  return result;
}
