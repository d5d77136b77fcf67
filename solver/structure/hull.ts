/**
 * The hull of the rails: the interval no node can leave where only voltage sources, resistors, junctions and
 * transistors drive (the no-gain property: Willson 1975). It follows from the sources alone.
 */
import type { Circuit } from '../circuit.ts';
import { graphOf } from './graph.ts';

export interface Hull {
  /** V, of all rails, the reference included, at the values last looked at. */
  low: number;
  high: number;
  /** By node, then by internal node as in the graph: 1 where the node must stay inside; 0 where a forced or driven current reaches it. */
  readonly bound: Uint8Array;
  /** Likewise: 1 where voltage sources alone hold the node against the reference. */
  readonly pinned: Uint8Array;
}

/** A hull still to be worked out. */
export const emptyHull = (size: number): Hull => ({
  low: 0,
  high: 0,
  bound: new Uint8Array(size).fill(1),
  pinned: new Uint8Array(size),
});

interface Edge {
  readonly a: number;
  readonly b: number;
  /** V of a less b. */
  readonly voltage: number;
  readonly ideal: boolean;
}

/** Works the hull out anew from the present values. Not in the inner loop. */
export function updateHull(circuit: Circuit, hull: Hull): void {
  const sources: Edge[] = [];
  const conducts: [number, number][] = [];
  const driven: number[] = [];
  const drivenIdeal: [number, number][] = [];
  const graph = graphOf(circuit);
  for (const { path, from: a, to: b } of graph.edges) {
    if (path.kind === 'source') sources.push({ a, b, voltage: path.voltage, ideal: path.ideal });
    else if (path.kind === 'current' || path.kind === 'driven') {
      driven.push(a, b);
      if (path.kind === 'driven' && path.ideal) drivenIdeal.push([a, b]);
    } else conducts.push([a, b]);
  }

  // --- Potentials that sources fix, each as an interval: sources with resistance, or in a loop, widen it ---
  const known = new Map<number, number>([[0, 0]]);
  hull.pinned.fill(0);
  hull.pinned[0] = 1;
  let low = 0;
  let high = 0;
  for (let grown = true; grown;) {
    grown = false;
    for (const { a, b, voltage, ideal } of sources) {
      const ofA = known.get(a);
      const ofB = known.get(b);
      if (ofA === undefined && ofB !== undefined) known.set(a, ofB + voltage);
      else if (ofB === undefined && ofA !== undefined) known.set(b, ofA - voltage);
      else if (!ideal || ofA === undefined || hull.pinned[a] === hull.pinned[b]) continue;
      if (ideal && (hull.pinned[a] === 1 || hull.pinned[b] === 1)) hull.pinned[a] = hull.pinned[b] = 1;
      grown = true;
    }
  }
  for (const potential of known.values()) {
    low = Math.min(low, potential);
    high = Math.max(high, potential);
  }
  // Sources that the reference does not reach through sources, or that close a loop, may add their whole voltage.
  let extra = 0;
  for (const { a, b, voltage } of sources) {
    const ofA = known.get(a);
    const ofB = known.get(b);
    const consistent = ofA !== undefined && ofB !== undefined && ofA - ofB === voltage;
    if (!consistent) extra += Math.abs(voltage);
  }
  hull.low = low - extra;
  hull.high = high + extra;

  // --- Where a forced or driven current reaches ---
  hull.bound.fill(1);
  const loose: number[] = driven.filter((node) => node > 0 && hull.pinned[node] === 0);
  const neighbours = Array.from({ length: graph.size }, (): number[] => []);
  for (const [a, b] of [...conducts, ...sources.map(({ a, b }): [number, number] => [a, b])]) {
    neighbours[a]?.push(b);
    neighbours[b]?.push(a);
  }
  for (let node = loose.pop(); node !== undefined; node = loose.pop()) {
    if (hull.pinned[node] === 1 || hull.bound[node] === 0) continue;
    hull.bound[node] = 0;
    loose.push(...(neighbours[node] ?? []));
  }
  // An ideal output decides its own potential, rails or not.
  for (const [a] of drivenIdeal) if (a > 0 && hull.pinned[a] === 0) hull.bound[a] = 0;
}
