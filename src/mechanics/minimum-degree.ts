// A fill-reducing order of elimination: approximate minimum degree on the quotient graph (Amestoy, Davis and Duff, An
// approximate minimum degree ordering algorithm, SIAM Journal on Matrix Analysis and Applications 17, 1996).
//
// The plan. An eliminated node becomes an element: the list of the nodes that it couples. A node keeps two lists, the
// elements it belongs to and the nodes it still meets directly, so that the graph never grows. Each round
//   1. takes a node of least degree as pivot, and joins its elements and nodes to a new element;
//   2. finds for every element met by a node of the new one how much of it lies outside;
//   3. renews the lists and the degree bounds of these nodes; elements wholly inside the new one vanish in it;
//   4. merges nodes that have become alike, found by a hash of their lists.
// Degrees count freedoms. The same graph gives the same order.

import type { PointGraph } from './point-graph.ts';

/** The nodes of the graph in an order of elimination that leaves little fill. */
export function minimumDegree(graph: PointGraph): Int32Array {
  return new QuotientGraph(graph).eliminateAll();
}

/** A node that meets more than this many times √nodes others is kept for last: it would lengthen every list it is in. */
const denseFactor = 10;
const leastDense = 16;

/** Marks are renewed before they leave the range of 32 bits. */
const highestMark = 2 ** 30;

const none = -1;

class QuotientGraph {
  readonly #nodes: number;
  readonly #freedoms: number;
  /** Lists of elements (first) and nodes, for a node; of nodes, for an element. New elements go to the end. */
  #lists: Int32Array;
  #listsEnd: number;
  readonly #start: Int32Array;
  readonly #length: Int32Array;
  /** How many of a node's list are elements. */
  readonly #elements: Int32Array;
  /** Freedoms that stand for this node; negative while it is in the new element, 0 once it has merged into another. */
  readonly #weight: Int32Array;
  /** Bound of a node's degree, or freedoms of an element. */
  readonly #degree: Int32Array;
  /** Scratch for counting and comparing; 0 for an element that has vanished. */
  readonly #mark: Int32Array;
  #flag = 2;
  #largestElement = 0;
  /** Doubly linked lists of nodes by degree. */
  readonly #heads: Int32Array;
  readonly #next: Int32Array;
  readonly #previous: Int32Array;
  #leastDegree = 0;
  /** Heads of chains of nodes with equal hash; chained by `#next`, which such nodes do not need. */
  readonly #hashHeads: Int32Array;
  readonly #hash: Int32Array;
  /** The node that a node merged into; chains end at a pivot. */
  readonly #mergedInto: Int32Array;
  readonly #pivots: Int32Array;
  #pivotCount = 0;
  #eliminated = 0;

  constructor(graph: PointGraph) {
    const { nodes, freedoms, starts, neighbours } = graph;
    this.#nodes = nodes;
    this.#freedoms = nodes === 0 ? 0 : freedoms[nodes]!;
    this.#lists = new Int32Array(neighbours.length + (neighbours.length >> 1) + nodes);
    this.#lists.set(neighbours);
    this.#listsEnd = neighbours.length;
    this.#start = starts.slice(0, nodes);
    this.#length = new Int32Array(nodes);
    this.#elements = new Int32Array(nodes);
    this.#weight = new Int32Array(nodes);
    this.#degree = new Int32Array(nodes);
    this.#mark = new Int32Array(nodes).fill(1);
    this.#heads = new Int32Array(this.#freedoms + 1).fill(none);
    this.#next = new Int32Array(nodes).fill(none);
    this.#previous = new Int32Array(nodes).fill(none);
    this.#hashHeads = new Int32Array(nodes).fill(none);
    this.#hash = new Int32Array(nodes);
    this.#mergedInto = new Int32Array(nodes).fill(none);
    this.#pivots = new Int32Array(nodes);
    for (let node = 0; node < nodes; node++) {
      this.#length[node] = starts[node + 1]! - starts[node]!;
      this.#weight[node] = freedoms[node + 1]! - freedoms[node]!;
    }
  }

  eliminateAll(): Int32Array {
    const dense = this.#setDenseAside();
    for (let node = this.#nodes - 1; node >= 0; node--) {
      if (this.#weight[node] === 0) continue;
      let degree = 0;
      const start = this.#start[node]!;
      for (let k = start; k < start + this.#length[node]!; k++) degree += this.#weight[this.#lists[k]!]!;
      this.#degree[node] = degree;
      this.#enlist(node, degree);
    }
    while (this.#eliminated < this.#freedoms) {
      const pivot = this.#takeLeast();
      this.#formElement(pivot);
      this.#measureOverlaps(pivot);
      this.#renewNodes(pivot);
      this.#mergeAlike(pivot);
      this.#enlistElement(pivot);
    }
    return this.#sequence(dense);
  }

  /** Nodes that meet very many others, which go last. */
  #setDenseAside(): number[] {
    const limit = Math.max(leastDense, denseFactor * Math.sqrt(this.#nodes));
    const dense: number[] = [];
    for (let node = 0; node < this.#nodes; node++) if (this.#length[node]! > limit) dense.push(node);
    for (const node of dense) {
      this.#eliminated += this.#weight[node]!;
      this.#weight[node] = 0;
    }
    return dense;
  }

  #enlist(node: number, degree: number): void {
    const head = this.#heads[degree]!;
    this.#next[node] = head;
    this.#previous[node] = none;
    if (head !== none) this.#previous[head] = node;
    this.#heads[degree] = node;
    if (degree < this.#leastDegree) this.#leastDegree = degree;
  }

  #delist(node: number): void {
    const next = this.#next[node]!;
    const previous = this.#previous[node]!;
    if (next !== none) this.#previous[next] = previous;
    if (previous !== none) this.#next[previous] = next;
    else this.#heads[this.#degree[node]!] = next;
  }

  #takeLeast(): number {
    while (this.#heads[this.#leastDegree] === none) this.#leastDegree++;
    const pivot = this.#heads[this.#leastDegree]!;
    this.#delist(pivot);
    return pivot;
  }

  /** Step 1: the pivot's list becomes all nodes that it meets, directly or through its elements, which vanish in it. */
  #formElement(pivot: number): void {
    const weight = this.#weight;
    const elements = this.#elements[pivot]!;
    const pivotStart = this.#start[pivot]!;
    const pivotEnd = pivotStart + this.#length[pivot]!;
    this.#pivots[this.#pivotCount++] = pivot;
    this.#eliminated += weight[pivot]!;
    weight[pivot] = -weight[pivot]!;
    let start = pivotStart;
    if (elements > 0) {
      let room = pivotEnd - pivotStart - elements;
      for (let k = pivotStart; k < pivotStart + elements; k++) room += this.#length[this.#lists[k]!]!;
      this.#reserve(room);
      start = this.#listsEnd;
    }
    this.#degree[pivot] = 0;
    let end = start;
    for (let k = pivotStart; k < pivotStart + elements; k++) {
      const element = this.#lists[k]!;
      const from = this.#start[element]!;
      end = this.#gather(from, from + this.#length[element]!, pivot, end);
      this.#mark[element] = 0;
    }
    // Without elements the list is gathered where it stands, never ahead of what is read.
    end = this.#gather(pivotStart + elements, pivotEnd, pivot, end);
    if (elements > 0) this.#listsEnd = end;
    this.#start[pivot] = start;
    this.#length[pivot] = end - start;
    this.#elements[pivot] = none;
  }

  /** Moves the live nodes of a stretch of the lists, those not there yet, to the new element, which ends at `end`; returns its new end. */
  #gather(from: number, to: number, pivot: number, end: number): number {
    const lists = this.#lists;
    const weight = this.#weight;
    let freedoms = 0;
    let at = end;
    for (let k = from; k < to; k++) {
      const node = lists[k]!;
      const own = weight[node]!;
      if (own <= 0) continue;
      freedoms += own;
      weight[node] = -own;
      lists[at++] = node;
      this.#delist(node);
    }
    this.#degree[pivot]! += freedoms;
    return at;
  }

  #reserve(room: number): void {
    if (this.#listsEnd + room <= this.#lists.length) return;
    const larger = new Int32Array(2 * this.#lists.length + room);
    larger.set(this.#lists);
    this.#lists = larger;
  }

  /** Step 2: `mark − flag` of an element becomes the number of its freedoms outside the new one. */
  #measureOverlaps(pivot: number): void {
    const lists = this.#lists;
    const mark = this.#mark;
    const degree = this.#degree;
    const flag = this.#flag;
    const start = this.#start[pivot]!;
    const end = start + this.#length[pivot]!;
    for (let m = start; m < end; m++) {
      const node = lists[m]!;
      const own = -this.#weight[node]!;
      const from = this.#start[node]!;
      const to = from + this.#elements[node]!;
      for (let k = from; k < to; k++) {
        const element = lists[k]!;
        const marked = mark[element]!;
        if (marked >= flag) mark[element] = marked - own;
        else if (marked !== 0) mark[element] = degree[element]! + flag - own;
      }
    }
  }

  /** Step 3: nodes of the new element lose what lies inside it, and get new bounds of their degrees outside it. */
  #renewNodes(pivot: number): void {
    const lists = this.#lists;
    const mark = this.#mark;
    const weight = this.#weight;
    const flag = this.#flag;
    const start = this.#start[pivot]!;
    const end = start + this.#length[pivot]!;
    for (let m = start; m < end; m++) {
      const node = lists[m]!;
      const from = this.#start[node]!;
      const elementsEnd = from + this.#elements[node]!;
      const to = from + this.#length[node]!;
      let degree = 0;
      let hash = 0;
      let kept = from;
      for (let k = from; k < elementsEnd; k++) {
        const element = lists[k]!;
        const marked = mark[element]!;
        if (marked === 0) continue;
        const outside = marked - flag;
        if (outside > 0) {
          degree += outside;
          hash += element;
          lists[kept++] = element;
        } else {
          mark[element] = 0;
        }
      }
      const keptElements = kept - from;
      for (let k = elementsEnd; k < to; k++) {
        const other = lists[k]!;
        const own = weight[other]!;
        if (own <= 0) continue;
        degree += own;
        hash += other;
        lists[kept++] = other;
      }
      if (kept === from) {
        // Nothing is left outside the new element: the node can go with the pivot, at no fill.
        const own = -weight[node]!;
        this.#degree[pivot]! -= own;
        this.#eliminated += own;
        weight[pivot]! -= own;
        this.#mergeInto(node, pivot);
        continue;
      }
      if (degree < this.#degree[node]!) this.#degree[node] = degree;
      // The new element takes the first place; what stood there moves up. An entry has gone, so there is room.
      lists[kept] = lists[from + keptElements]!;
      lists[from + keptElements] = lists[from]!;
      lists[from] = pivot;
      this.#elements[node] = keptElements + 1;
      this.#length[node] = kept - from + 1;
      const bucket = hash % this.#nodes;
      this.#hash[node] = bucket;
      this.#next[node] = this.#hashHeads[bucket]!;
      this.#hashHeads[bucket] = node;
    }
    this.#largestElement = Math.max(this.#largestElement, this.#degree[pivot]!);
    this.#raiseFlag(this.#largestElement);
  }

  #mergeInto(node: number, other: number): void {
    this.#weight[node] = 0;
    this.#elements[node] = none;
    this.#mergedInto[node] = other;
  }

  #raiseFlag(by: number): void {
    this.#flag += by;
    if (this.#flag < highestMark) return;
    for (let k = 0; k < this.#nodes; k++) if (this.#mark[k] !== 0) this.#mark[k] = 1;
    this.#flag = 2;
  }

  /** Step 4: nodes of the new element with the same lists will stay alike, and are one from now on. */
  #mergeAlike(pivot: number): void {
    const lists = this.#lists;
    const start = this.#start[pivot]!;
    const end = start + this.#length[pivot]!;
    for (let m = start; m < end; m++) {
      const member = lists[m]!;
      if (this.#weight[member]! >= 0) continue;
      const bucket = this.#hash[member]!;
      let node = this.#hashHeads[bucket]!;
      this.#hashHeads[bucket] = none;
      for (; node !== none && this.#next[node] !== none; node = this.#next[node]!) {
        const length = this.#length[node]!;
        const elements = this.#elements[node]!;
        const from = this.#start[node]!;
        for (let k = from + 1; k < from + length; k++) this.#mark[lists[k]!] = this.#flag;
        let last = node;
        for (let other = this.#next[node]!; other !== none; other = this.#next[other]!) {
          if (this.#length[other] === length && this.#elements[other] === elements && this.#allMarked(other)) {
            this.#weight[node]! += this.#weight[other]!;
            this.#mergeInto(other, node);
            this.#next[last] = this.#next[other]!;
          } else {
            last = other;
          }
        }
        this.#raiseFlag(1);
      }
    }
  }

  #allMarked(node: number): boolean {
    const from = this.#start[node]!;
    for (let k = from + 1; k < from + this.#length[node]!; k++)
      if (this.#mark[this.#lists[k]!] !== this.#flag) return false;
    return true;
  }

  /** Gives the nodes of the new element their degrees, with the element itself counted in, and closes its list. */
  #enlistElement(pivot: number): void {
    const lists = this.#lists;
    const weight = this.#weight;
    const start = this.#start[pivot]!;
    const end = start + this.#length[pivot]!;
    const inElement = this.#degree[pivot]!;
    let kept = start;
    for (let m = start; m < end; m++) {
      const node = lists[m]!;
      const own = -weight[node]!;
      if (own <= 0) continue;
      weight[node] = own;
      const degree = Math.min(this.#degree[node]! + inElement - own, this.#freedoms - this.#eliminated - own);
      this.#degree[node] = degree;
      this.#enlist(node, degree);
      lists[kept++] = node;
    }
    this.#length[pivot] = kept - start;
    weight[pivot] = 0;
    if (kept === start) this.#mark[pivot] = 0;
  }

  /** The pivots in order, each followed by the nodes that merged into it. */
  #sequence(dense: readonly number[]): Int32Array {
    const nodes = this.#nodes;
    const merged = this.#mergedInto;
    // Chains of merged nodes, by what they merged into; a later number comes first in its chain.
    const first = new Int32Array(nodes).fill(none);
    const next = new Int32Array(nodes).fill(none);
    for (let node = nodes - 1; node >= 0; node--) {
      const into = merged[node]!;
      if (into === none) continue;
      next[node] = first[into]!;
      first[into] = node;
    }
    const order = new Int32Array(nodes);
    const pending: number[] = [];
    let count = 0;
    for (let k = 0; k < this.#pivotCount; k++) {
      pending.push(this.#pivots[k]!);
      for (let node = pending.pop(); node !== undefined; node = pending.pop()) {
        order[count++] = node;
        for (let child = first[node]!; child !== none; child = next[child]!) pending.push(child);
      }
    }
    for (const node of dense) order[count++] = node;
    return order;
  }
}
