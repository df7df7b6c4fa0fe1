// The graph of the points that a matrix couples. Freedoms of one point reach nearly the same others, so that ordering
// and planning need to look at one ninth of the entries only.

import type { SymmetricMatrix } from './symmetric-matrix.ts';

export interface PointGraph {
  /** Nodes of the graph: a point each, or one of several where the freedoms of a point are not neighbours. */
  readonly nodes: number;
  /** The freedoms of node p are `freedoms[p]` up to `freedoms[p + 1]`. */
  readonly freedoms: Int32Array;
  /** The neighbours of node p, each once and without p itself: `neighbours[starts[p]]` up to `neighbours[starts[p + 1]]`. */
  readonly starts: Int32Array;
  readonly neighbours: Int32Array;
}

export function pointGraph(matrix: SymmetricMatrix): PointGraph {
  const { size, starts: columns, rows, points } = matrix;
  const nodeOf = new Int32Array(size);
  let nodes = 0;
  for (let freedom = 0; freedom < size; freedom++) {
    if (freedom > 0 && points[freedom] !== points[freedom - 1]) nodes++;
    nodeOf[freedom] = nodes;
  }
  if (size > 0) nodes++;
  const freedoms = new Int32Array(nodes + 1);
  for (let freedom = 0; freedom < size; freedom++) freedoms[nodeOf[freedom]! + 1] = freedom + 1;

  // Find every pair once, seen from the node with the lower freedoms.
  const ends = new Int32Array(rows.length);
  const pairStarts = new Int32Array(nodes + 1);
  const starts = new Int32Array(nodes + 1);
  const seenFrom = new Int32Array(nodes).fill(-1);
  let pairs = 0;
  for (let node = 0; node < nodes; node++) {
    seenFrom[node] = node;
    for (let k = columns[freedoms[node]!]!; k < columns[freedoms[node + 1]!]!; k++) {
      const other = nodeOf[rows[k]!]!;
      if (seenFrom[other] === node) continue;
      seenFrom[other] = node;
      ends[pairs++] = other;
      starts[other + 1]!++;
    }
    pairStarts[node + 1] = pairs;
    starts[node + 1]! += pairs - pairStarts[node]!;
  }

  // Enter every pair at both of its nodes.
  for (let node = 0; node < nodes; node++) starts[node + 1]! += starts[node]!;
  const neighbours = new Int32Array(2 * pairs);
  const next = starts.slice();
  for (let node = 0; node < nodes; node++) {
    for (let k = pairStarts[node]!; k < pairStarts[node + 1]!; k++) {
      const other = ends[k]!;
      neighbours[next[node]!++] = other;
      neighbours[next[other]!++] = node;
    }
  }
  return { nodes, freedoms, starts, neighbours };
}
