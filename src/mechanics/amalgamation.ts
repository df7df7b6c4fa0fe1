// Which nodes of an elimination tree are eliminated together in one front. A few zeros stored and worked on as if they
// were numbers are cheaper than many small fronts.

import type { EliminationTree } from './elimination-tree.ts';

export interface Fronts {
  readonly count: number;
  /** The front of each node, by positions in the tree; a front has a higher number than its descendants, which come right before it. */
  readonly frontOf: Int32Array;
  readonly parents: Int32Array;
  /** The freedoms that each front eliminates, and those that it reaches beyond. */
  readonly pivots: Int32Array;
  readonly reach: Int32Array;
}

/**
 * A child joins its parent when the front then has at most this share of zeros among its panel's numbers: more for
 * narrow fronts, whose handling costs more than their arithmetic (the relaxed supernodes of Ashcraft and Grimes, The
 * influence of relaxed supernode partitions on the multifrontal method, ACM Transactions on Mathematical Software 15,
 * 1989; the limits found by measurement on frames of 300 to 30 000 freedoms).
 */
const zeroLimits: readonly { readonly pivots: number; readonly share: number }[] = [
  { pivots: 12, share: 0.4 },
  { pivots: 24, share: 0.2 },
  { pivots: Number.POSITIVE_INFINITY, share: 0.05 },
];

/** Gathers the nodes of a tree in fronts. `weights` are the freedoms of the nodes, by positions. */
export function amalgamate(tree: EliminationTree, weights: Int32Array): Fronts {
  const { parents, reach } = tree;
  const nodes = parents.length;
  const pivots = weights.slice();
  const zeros = new Float64Array(nodes);
  // The node that a node has been joined to, itself for the topmost of a front.
  const joined = new Int32Array(nodes);
  const firstChild = new Int32Array(nodes).fill(-1);
  const nextSibling = new Int32Array(nodes).fill(-1);
  for (let node = 0; node < nodes; node++) {
    joined[node] = node;
    // Children that do not join stay children of the node.
    for (let child = firstChild[node]!; child >= 0; child = nextSibling[child]!) {
      const width = pivots[child]! + pivots[node]!;
      const height = width + reach[node]!;
      const added = pivots[child]! * (pivots[node]! + reach[node]! - reach[child]!);
      const total = zeros[child]! + zeros[node]! + added;
      if (total > shareAllowed(width) * (width * (height - width / 2))) continue;
      joined[child] = node;
      pivots[node] = width;
      zeros[node] = total;
    }
    const parent = parents[node]!;
    if (parent < 0) continue;
    nextSibling[node] = firstChild[parent]!;
    firstChild[parent] = node;
  }

  // Number the fronts by their topmost nodes, which keeps the postorder.
  const numbers = new Int32Array(nodes);
  let count = 0;
  for (let node = 0; node < nodes; node++) if (joined[node] === node) numbers[node] = count++;
  const frontOf = new Int32Array(nodes);
  const fronts: Fronts = {
    count,
    frontOf,
    parents: new Int32Array(count),
    pivots: new Int32Array(count),
    reach: new Int32Array(count),
  };
  for (let node = nodes - 1; node >= 0; node--) {
    if (joined[node] !== node) {
      frontOf[node] = frontOf[joined[node]!]!;
      continue;
    }
    const front = numbers[node]!;
    frontOf[node] = front;
    fronts.parents[front] = parents[node]! < 0 ? -1 : frontOf[parents[node]!]!;
    fronts.pivots[front] = pivots[node]!;
    fronts.reach[front] = reach[node]!;
  }
  return fronts;
}

function shareAllowed(width: number): number {
  for (const limit of zeroLimits) if (width <= limit.pivots) return limit.share;
  return 0;
}
