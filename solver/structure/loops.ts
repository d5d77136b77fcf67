/** Loops of ideal voltage sources and outputs, whose currents nothing decides, and sources shorted on themselves. */
import type { Circuit } from '../circuit.ts';
import type { StructureFault } from '../settle/settlement.ts';
import { DisjointSets, type Edge, type Graph } from './graph.ts';
import { list } from './list.ts';

/** One fault for each source that closes a loop. */
export function findLoops(circuit: Circuit, graph: Graph): StructureFault[] {
  const faults: StructureFault[] = [];
  const sets = new DisjointSets(graph.size);
  const tree: Edge[] = [];
  for (const edge of graph.edges) {
    const { path, from, to, element } = edge;
    if ((path.kind !== 'source' && path.kind !== 'driven') || !path.ideal) continue;
    if (from === to)
      faults.push({
        code: 'shorted-source',
        message: `${element.name} is shorted: both its ends are on ${circuit.nodes[from] ?? 'one node'}`,
        nodes: [circuit.nodes[from] ?? ''],
        elements: [element.name],
      });
    else if (sets.join(from, to)) tree.push(edge);
    else {
      const loop = [edge, ...walk(tree, from, to)];
      const elements = [...new Set(loop.map((part) => part.element.name))];
      faults.push({
        code: 'voltage-loop',
        message: `${list(elements)} form a loop of voltages with no resistance in it`,
        nodes: [...new Set(loop.flatMap((part) => [part.from, part.to]))].map((n) => circuit.nodes[n] ?? ''),
        elements,
      });
    }
  }
  return faults;
}

/** The edges of the forest between two nodes. */
function walk(tree: readonly Edge[], start: number, end: number): Edge[] {
  const cameBy = new Map<number, Edge | null>([[start, null]]);
  const waiting = [start];
  for (let node = waiting.pop(); node !== undefined; node = waiting.pop())
    for (const edge of tree) {
      if (edge.from !== node && edge.to !== node) continue;
      const next = edge.from === node ? edge.to : edge.from;
      if (cameBy.has(next)) continue;
      cameBy.set(next, edge);
      waiting.push(next);
    }
  const path: Edge[] = [];
  let node = end;
  for (let edge = cameBy.get(node); edge; edge = cameBy.get(node)) {
    path.push(edge);
    node = edge.from === node ? edge.to : edge.from;
  }
  return path;
}
