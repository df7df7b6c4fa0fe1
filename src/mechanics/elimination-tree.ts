// The elimination tree of a graph whose nodes are eliminated in a given order: the parent of a node is the first of
// those after it that its elimination reaches.

import type { PointGraph } from './point-graph.ts';

export interface EliminationTree {
  /** The nodes of the graph in an order of elimination in which the descendants of each come right before it. */
  readonly order: Int32Array;
  /** By positions in this order; −1 for a root. */
  readonly parents: Int32Array;
  /** By positions: the freedoms after it that the elimination of a node reaches. */
  readonly reach: Int32Array;
}

/** The tree of an order of elimination, with that order rearranged to a postorder of the tree, which has the same fill. */
export function eliminationTree(graph: PointGraph, order: Int32Array): EliminationTree {
  const parents = parentsOf(graph, order);
  const post = postorder(parents);
  const position = inverse(post);
  const sorted = post.map(k => order[k]!);
  const sortedParents = post.map(k => (parents[k]! < 0 ? -1 : position[parents[k]!]!));
  return { order: sorted, parents: sortedParents, reach: reachOf(graph, sorted, sortedParents) };
}

/** `inverse(order)[order[k]]` is k. */
export function inverse(order: Int32Array): Int32Array {
  const result = new Int32Array(order.length);
  for (let k = 0; k < order.length; k++) result[order[k]!] = k;
  return result;
}

/** Liu, The role of elimination trees in sparse factorization, SIAM Journal on Matrix Analysis and Applications 11, 1990, algorithm 4.2. */
function parentsOf(graph: PointGraph, order: Int32Array): Int32Array {
  const { starts, neighbours } = graph;
  const position = inverse(order);
  const parents = new Int32Array(order.length).fill(-1);
  // Shortcuts up the tree as far as it is known.
  const ancestors = new Int32Array(order.length).fill(-1);
  for (let k = 0; k < order.length; k++) {
    const node = order[k]!;
    for (let m = starts[node]!; m < starts[node + 1]!; m++) {
      let below = position[neighbours[m]!]!;
      if (below >= k) continue;
      while (ancestors[below] !== -1 && ancestors[below] !== k) {
        const above = ancestors[below]!;
        ancestors[below] = k;
        below = above;
      }
      if (ancestors[below] === -1) {
        ancestors[below] = k;
        parents[below] = k;
      }
    }
  }
  return parents;
}

/** Children before their parent, each with all its descendants right before it; without recursion, for chains are deep. */
function postorder(parents: Int32Array): Int32Array {
  const size = parents.length;
  const firstChild = new Int32Array(size).fill(-1);
  const nextSibling = new Int32Array(size).fill(-1);
  for (let k = size - 1; k >= 0; k--) {
    const parent = parents[k]!;
    if (parent < 0) continue;
    nextSibling[k] = firstChild[parent]!;
    firstChild[parent] = k;
  }
  const order = new Int32Array(size);
  const path = new Int32Array(size);
  let count = 0;
  for (let root = 0; root < size; root++) {
    if (parents[root]! >= 0) continue;
    let depth = 0;
    path[0] = root;
    while (depth >= 0) {
      const node = path[depth]!;
      const child = firstChild[node]!;
      if (child >= 0) {
        firstChild[node] = nextSibling[child]!;
        path[++depth] = child;
      } else {
        order[count++] = node;
        depth--;
      }
    }
  }
  return order;
}

/** Every node walks up from its neighbours before it to itself, and is reached by all that it passes (the row subtrees of Liu, section 3). */
function reachOf(graph: PointGraph, order: Int32Array, parents: Int32Array): Int32Array {
  const { starts, neighbours, freedoms } = graph;
  const position = inverse(order);
  const reach = new Int32Array(order.length);
  const passed = new Int32Array(order.length).fill(-1);
  for (let k = 0; k < order.length; k++) {
    const node = order[k]!;
    const own = freedoms[node + 1]! - freedoms[node]!;
    passed[k] = k;
    for (let m = starts[node]!; m < starts[node + 1]!; m++) {
      let below = position[neighbours[m]!]!;
      if (below > k) continue;
      for (; passed[below] !== k; below = parents[below]!) {
        passed[below] = k;
        reach[below]! += own;
      }
    }
  }
  return reach;
}
