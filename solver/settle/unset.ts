/**
 * What the drawing does not set: voltages that only the declared leak decides. Found twice over: by settling again
 * with the leak at a hundredth and looking for what moved, and as nodes that nothing which conducts joins to
 * ground (the drain between two transistors that are off; the source of a follower that drives nothing).
 */
import { at, indexAt } from '../elements/at.ts';
import { Phase } from '../elements/law.ts';
import { DisjointSets, graphOf } from '../structure/graph.ts';
import { loadElements } from './evaluate.ts';
import { UNSET_CONDUCTANCE, UNSET_MOVE } from './limits.ts';
import { newton, type NewtonRun } from './newton.ts';
import type { Prepared } from './prepared.ts';
import { hundredthLeak, refresh, wholeLeak } from './refresh.ts';
import type { SettleOptions, Unset } from './settlement.ts';

/** Leaves the point as it was. The elements must stand as loaded at the point. */
export function findUnset(prepared: Prepared, options: SettleOptions, run: NewtonRun): Unset {
  const { circuit, places, gather } = prepared;
  const islands = liveIslands(prepared);
  const moved = movesWithLeak(prepared, options, run);
  const ground = islands.find(0);
  const nodes = circuit.nodes
    .map((_, node) => node)
    .filter(
      (node) => node > 0 && (islands.find(node) !== ground || Math.abs(at(moved, node - 1)) > UNSET_MOVE),
    );
  if (nodes.length === 0) return { nodes, elements: [] };
  const elements = places
    .filter(({ element, unknown }) => {
      if (new Set(element.nodes.map((node) => islands.find(node))).size > 1) return true;
      const moves = element.nodes.map((_, terminal) => at(moved, indexAt(gather, unknown + terminal)));
      return Math.max(...moves) - Math.min(...moves) > UNSET_MOVE;
    })
    .map(({ element }) => element);
  return { nodes, elements };
}

/** Nodes joined by whatever conducts at the point at hand. */
function liveIslands(prepared: Prepared): DisjointSets {
  const { circuit, work, placeOf } = prepared;
  const graph = graphOf(circuit);
  const sets = new DisjointSets(graph.size);
  for (const { element, path, from, to } of graph.edges) {
    if (path.kind === 'current') continue;
    if (path.kind === 'junction' || path.kind === 'channel') {
      const place = placeOf.get(element);
      if (!place) continue;
      // The conductance between the two ends, seen from either.
      const conducts = element.law.pattern.some(
        ([row, column], slot) =>
          ((row === path.from && column === path.to) || (row === path.to && column === path.from)) &&
          Math.abs(at(work.jacobian, place.slot + slot)) > UNSET_CONDUCTANCE,
      );
      if (!conducts) continue;
    }
    sets.join(from, to);
  }
  return sets;
}

/** By unknown, how far it moves with the leak at a hundredth, V; the last place, the reference, 0. */
function movesWithLeak(prepared: Prepared, options: SettleOptions, run: NewtonRun): Float64Array {
  const { x } = prepared;
  const before = x.slice();
  refresh(prepared, options, hundredthLeak);
  run.first = Phase.adopt;
  run.by = 'rows';
  run.shunt = null;
  run.maxIterations = 200;
  newton(prepared, run);
  const moved = x.map((value, k) => value - at(before, k));
  refresh(prepared, options, wholeLeak);
  x.set(before);
  prepared.work.phase = Phase.exact;
  loadElements(prepared);
  return moved;
}
