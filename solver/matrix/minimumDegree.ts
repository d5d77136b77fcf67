/** An elimination order of a graph's vertices that keeps fill small. */
import { createDegreeLists } from './degreeLists.ts';
import type { Graph } from './graph.ts';

const none = -1;

/**
 * Approximate minimum degree (P. R. Amestoy, T. A. Davis and I. S. Duff, "An approximate minimum degree
 * ordering algorithm", SIAM J. Matrix Anal. Appl. 17, 1996, 886–905), on the quotient graph: an eliminated
 * vertex lives on as an *element*, the set of vertices its elimination joined; elements are absorbed into
 * later ones; vertices that can no longer be told apart go on as one; degrees are the paper's upper bound.
 * Vertices met by very many others are left to the end. The order returned is a postorder of the assembly
 * tree, which has the same fill and keeps what belongs together close in memory.
 *
 * @returns length `graph.size`: the vertices in the order of elimination.
 */
export function minimumDegreeOrder(graph: Graph): Int32Array {
  const quotient = createQuotientGraph(graph);
  for (let pivot = quotient.takeLeast(); pivot !== none; pivot = quotient.takeLeast())
    quotient.eliminate(pivot);
  return quotient.postorder();
}

function createQuotientGraph(graph: Graph) {
  const { size } = graph;

  // ---- state -----------------------------------------------------------------------------------------
  /** Vertices a supervertex stands for; 0 once eliminated, merged into another, or set aside as dense. */
  const weight = new Int32Array(size).fill(1);
  /** Upper bound of a vertex's external degree; for an element, the weight of its vertices. */
  const degree = new Int32Array(size);
  /** A vertex's list in `arena` holds its elements, then its vertices; an element's list its vertices. */
  const listStart = new Int32Array(size);
  const listElements = new Int32Array(size);
  const listLength = new Int32Array(size);
  let arena = new Int32Array(graph.neighbour.length + 4 * size);
  let arenaUsed = graph.neighbour.length;
  /** 1 while an element is neither absorbed nor yet to be made. */
  const isElement = new Uint8Array(size);
  /** The element that absorbed this one. */
  const parent = new Int32Array(size).fill(none);
  /** Chains of the vertices that a supervertex, later an element, stands for. */
  const nextMember = new Int32Array(size).fill(none);
  const lastMember = Int32Array.from({ length: size }, (_, vertex) => vertex);
  const pivots: number[] = [];
  const dense: number[] = [];
  let eliminated = 0;
  const waiting = createDegreeLists(size);

  // ---- stamps and scratch ----------------------------------------------------------------------------
  const inElement = new Int32Array(size).fill(none); // the pivot whose element holds the vertex
  const outside = new Int32Array(size); // weight of an element's vertices outside the present one
  const outsideFor = new Int32Array(size).fill(none); // the pivot for which `outside` stands
  const listed = new Int32Array(size); // marks for comparing two lists
  let listedMark = 0;
  const external = new Int32Array(size); // weight of what a vertex meets outside the present element
  const kept = new Int32Array(size);
  const hashHead = new Int32Array(size).fill(none);
  const hashNext = new Int32Array(size);
  const hashOf = new Int32Array(size);

  // A vertex met by more than about √size others costs more to keep up to date than its order can save.
  const denseDegree = Math.max(16, 10 * Math.sqrt(size));
  arena.set(graph.neighbour);
  for (let vertex = 0; vertex < size; vertex++) {
    listStart[vertex] = graph.start[vertex]!;
    listLength[vertex] = degree[vertex] = graph.start[vertex + 1]! - graph.start[vertex]!;
    if (degree[vertex]! > denseDegree) {
      weight[vertex] = 0;
      dense.push(vertex);
    } else waiting.enter(vertex, degree[vertex]!);
  }

  const joinMembers = (into: number, vertex: number) => {
    nextMember[lastMember[into]!] = vertex;
    lastMember[into] = lastMember[vertex]!;
    weight[vertex] = 0;
  };

  /** Gathers the pivot's own vertices and those of its elements, which it absorbs, into a new list. */
  const formElement = (pivot: number) => {
    const start = listStart[pivot]!;
    const elements = listElements[pivot]!;
    let room = listLength[pivot]! - elements;
    for (let p = start; p < start + elements; p++) room += listLength[arena[p]!]!;
    if (arenaUsed + room > arena.length) {
      const wider = new Int32Array(2 * (arenaUsed + room));
      wider.set(arena.subarray(0, arenaUsed));
      arena = wider;
    }
    const formed = arenaUsed;
    const gather = (from: number, to: number) => {
      for (let p = from; p < to; p++) {
        const vertex = arena[p]!;
        if (weight[vertex] === 0 || vertex === pivot || inElement[vertex] === pivot) continue;
        inElement[vertex] = pivot;
        waiting.leave(vertex);
        arena[arenaUsed++] = vertex;
      }
    };
    for (let p = start; p < start + elements; p++) {
      const element = arena[p]!;
      gather(listStart[element]!, listStart[element]! + listLength[element]!);
      isElement[element] = 0;
      parent[element] = pivot;
    }
    gather(start + elements, start + listLength[pivot]!);
    listStart[pivot] = formed;
    listElements[pivot] = 0;
    listLength[pivot] = arenaUsed - formed;
    isElement[pivot] = 1;
  };

  /** For every element that meets the pivot's: the weight of its vertices outside the pivot's. */
  const measureOverlaps = (pivot: number) => {
    const end = listStart[pivot]! + listLength[pivot]!;
    for (let p = listStart[pivot]!; p < end; p++) {
      const vertex = arena[p]!;
      for (let q = listStart[vertex]!; q < listStart[vertex]! + listElements[vertex]!; q++) {
        const element = arena[q]!;
        if (isElement[element] === 0) continue;
        if (outsideFor[element] !== pivot) {
          outsideFor[element] = pivot;
          outside[element] = degree[element]!;
        }
        outside[element]! -= weight[vertex]!;
      }
    }
  };

  /**
   * Drops from a vertex's list what the pivot's element now says, puts that element in front, and sums the
   * degree outside it. The list never grows: it loses at least the pivot, or one of the pivot's elements.
   */
  const thinList = (vertex: number, pivot: number): number => {
    const start = listStart[vertex]!;
    const firstVertex = start + listElements[vertex]!;
    const end = start + listLength[vertex]!;
    let count = 0;
    let weightOutside = 0;
    let hash = pivot;
    kept[count++] = pivot;
    for (let p = start; p < firstVertex; p++) {
      const element = arena[p]!;
      if (isElement[element] === 0) continue;
      if (outside[element] === 0) {
        // All of it lies within the pivot's element: absorbed.
        isElement[element] = 0;
        parent[element] = pivot;
        continue;
      }
      weightOutside += outside[element]!;
      hash += element;
      kept[count++] = element;
    }
    const elements = count;
    for (let p = firstVertex; p < end; p++) {
      const other = arena[p]!;
      if (weight[other] === 0 || other === pivot || inElement[other] === pivot) continue;
      weightOutside += weight[other]!;
      hash += other;
      kept[count++] = other;
    }
    for (let p = 0; p < count; p++) arena[start + p] = kept[p]!;
    listElements[vertex] = elements;
    listLength[vertex] = count;
    hashOf[vertex] = hash % size;
    return weightOutside;
  };

  const sameLists = (vertex: number, other: number): boolean => {
    if (listLength[vertex] !== listLength[other] || listElements[vertex] !== listElements[other])
      return false;
    const start = listStart[other]!;
    for (let p = start; p < start + listLength[other]!; p++)
      if (listed[arena[p]!] !== listedMark) return false;
    return true;
  };

  /** Joins the vertices of the pivot's element that have come to have the same lists. */
  const mergeAlike = (pivot: number) => {
    const end = listStart[pivot]! + listLength[pivot]!;
    for (let p = listStart[pivot]!; p < end; p++) {
      const vertex = arena[p]!;
      if (weight[vertex] === 0) continue;
      const bucket = hashOf[vertex]!;
      hashNext[vertex] = hashHead[bucket]!;
      hashHead[bucket] = vertex;
    }
    for (let p = listStart[pivot]!; p < end; p++) {
      const bucket = hashOf[arena[p]!]!;
      let vertex = hashHead[bucket]!;
      hashHead[bucket] = none;
      for (; vertex !== none; vertex = hashNext[vertex]!) {
        if (weight[vertex] === 0 || hashNext[vertex] === none) continue;
        listedMark++;
        for (let q = listStart[vertex]!; q < listStart[vertex]! + listLength[vertex]!; q++)
          listed[arena[q]!] = listedMark;
        for (let other = hashNext[vertex]!; other !== none; other = hashNext[other]!) {
          if (weight[other] === 0 || !sameLists(vertex, other)) continue;
          const joined = weight[other]!;
          joinMembers(vertex, other);
          weight[vertex]! += joined;
          degree[vertex]! -= joined;
        }
      }
    }
  };

  const eliminate = (pivot: number): void => {
    let pivotWeight = weight[pivot]!;
    formElement(pivot);
    weight[pivot] = 0;
    const start = listStart[pivot]!;
    const end = start + listLength[pivot]!;
    let total = 0;
    for (let p = start; p < end; p++) total += weight[arena[p]!]!;
    measureOverlaps(pivot);

    for (let p = start; p < end; p++) {
      const vertex = arena[p]!;
      external[vertex] = thinList(vertex, pivot);
      if (external[vertex] > 0 || listLength[vertex]! > 1) continue;
      // Nothing outside the element: it can go along with the pivot without any further fill.
      pivotWeight += weight[vertex]!;
      total -= weight[vertex]!;
      joinMembers(pivot, vertex);
    }
    eliminated += pivotWeight;
    const remaining = size - dense.length - eliminated;
    for (let p = start; p < end; p++) {
      const vertex = arena[p]!;
      if (weight[vertex] === 0) continue;
      const inside = total - weight[vertex]!;
      degree[vertex] = Math.min(
        remaining - weight[vertex]!,
        degree[vertex]! + inside,
        external[vertex]! + inside,
      );
    }
    mergeAlike(pivot);

    let held = start;
    let heldWeight = 0;
    for (let p = start; p < end; p++) {
      const vertex = arena[p]!;
      if (weight[vertex] === 0) continue;
      heldWeight += weight[vertex]!;
      arena[held++] = vertex;
      waiting.enter(vertex, degree[vertex]!);
    }
    listLength[pivot] = held - start;
    degree[pivot] = heldWeight;
    if (heldWeight === 0) isElement[pivot] = 0;
    pivots.push(pivot);
  };

  /** Members of the elements, every element after those it absorbed; then the dense vertices. */
  const postorder = (): Int32Array => {
    const firstChild = new Int32Array(size).fill(none);
    const nextSibling = new Int32Array(size).fill(none);
    for (let p = pivots.length - 1; p >= 0; p--) {
      const pivot = pivots[p]!;
      const above = parent[pivot]!;
      if (above === none) continue;
      nextSibling[pivot] = firstChild[above]!;
      firstChild[above] = pivot;
    }
    const order = new Int32Array(size);
    let placed = 0;
    const stack: number[] = [];
    for (const root of pivots) {
      if (parent[root] !== none) continue;
      stack.push(root);
      while (stack.length > 0) {
        const pivot = stack[stack.length - 1]!;
        const child = firstChild[pivot]!;
        if (child !== none) {
          firstChild[pivot] = nextSibling[child]!;
          stack.push(child);
          continue;
        }
        stack.pop();
        for (let member = pivot; member !== none; member = nextMember[member]!) order[placed++] = member;
      }
    }
    for (const vertex of dense) order[placed++] = vertex;
    return order;
  };

  return { takeLeast: () => waiting.takeLeast(), eliminate, postorder };
}
