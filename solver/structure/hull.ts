/**
 * The hull of the rails: the interval no node can leave where only voltage sources, resistors, junctions and
 * transistors drive (the no-gain property: Willson 1975). It follows from the sources alone.
 */
import type { Circuit, Element } from '../circuit.ts';
import { at } from '../elements/at.ts';
import { graphOf, type Edge } from './graph.ts';

export interface Hull {
  /** V, of all rails, the reference included, at the values last looked at. */
  low: number;
  high: number;
  /** By node, then by internal node as in the graph: 1 where it must stay inside; 0 where a forced current reaches. */
  readonly bound: Uint8Array;
  /** Likewise: 1 where voltage sources alone hold the node against the reference. */
  readonly pinned: Uint8Array;
  /** Sources by which the reference reaches nodes, in order: each makes the potential of `node` known. */
  readonly tree: readonly Source[];
  /** The other sources: they close loops, or float. */
  readonly others: readonly Source[];
  /** V, by node; 0 where the tree does not reach. */
  readonly potential: Float64Array;
}

interface Source {
  readonly element: Element;
  /** Place of its voltage in the element's values. */
  readonly value: number;
  readonly known: number;
  readonly node: number;
  /** +1 where `node` is the plus end. */
  readonly sign: 1 | -1;
}

/** Works out the hull of a circuit at its present values. */
export function findHull(circuit: Circuit): Hull {
  const { size, edges } = graphOf(circuit);
  const sources = edges.filter(({ path }) => path.kind === 'source');

  const pinned = new Uint8Array(size);
  pinned[0] = 1;
  const ideal = sources.filter(({ path }) => path.kind === 'source' && path.ideal);
  for (const { node } of spanningTree(ideal)) pinned[node] = 1;
  const tree = spanningTree(sources);
  const inTree = new Set(tree.map(({ element }) => element));
  const others = sources.filter(({ element }) => !inTree.has(element)).map((edge) => sourceOf(edge, edge.to));

  const hull: Hull = {
    low: 0,
    high: 0,
    bound: boundNodes(size, edges, pinned),
    pinned,
    tree,
    others,
    potential: new Float64Array(size),
  };
  updateHull(hull);
  return hull;
}

/** Works the interval out anew after voltages of sources changed. Allocates nothing. */
export function updateHull(hull: Hull): void {
  const { tree, others, potential } = hull;
  let low = 0;
  let high = 0;
  for (const source of tree) {
    const here = at(potential, source.known) + source.sign * at(source.element.values, source.value);
    potential[source.node] = here;
    low = Math.min(low, here);
    high = Math.max(high, here);
  }
  // Sources that float, or that close a loop, may add their whole voltage at either end.
  let extra = 0;
  for (const source of others) {
    const voltage = source.sign * at(source.element.values, source.value);
    const fits = at(potential, source.node) - at(potential, source.known) === voltage;
    if (!fits) extra += Math.abs(voltage);
  }
  hull.low = low - extra;
  hull.high = high + extra;
}

const sourceOf = ({ element, path, from, to }: Edge, known: number): Source => ({
  element,
  value: path.kind === 'source' ? path.voltage : 0,
  known,
  node: known === from ? to : from,
  sign: known === to ? 1 : -1,
});

function spanningTree(edges: readonly Edge[]): Source[] {
  const reached = new Set([0]);
  const tree: Source[] = [];
  for (let grown = true; grown;) {
    grown = false;
    for (const edge of edges) {
      if (reached.has(edge.from) === reached.has(edge.to)) continue;
      tree.push(sourceOf(edge, reached.has(edge.from) ? edge.from : edge.to));
      reached.add(edge.from).add(edge.to);
      grown = true;
    }
  }
  return tree;
}

/** Nodes that no forced or driven current reaches except through a pinned node. */
function boundNodes(size: number, edges: readonly Edge[], pinned: Uint8Array): Uint8Array {
  const bound = new Uint8Array(size).fill(1);
  const neighbours = Array.from({ length: size }, (): number[] => []);
  const waiting: number[] = [];
  for (const { path, from, to } of edges) {
    if (path.kind === 'current' || path.kind === 'driven') waiting.push(from, to);
    else {
      neighbours[from]?.push(to);
      neighbours[to]?.push(from);
    }
  }
  for (let node = waiting.pop(); node !== undefined; node = waiting.pop()) {
    if (pinned[node] === 1 || bound[node] === 0) continue;
    bound[node] = 0;
    waiting.push(...(neighbours[node] ?? []));
  }
  return bound;
}
