/** Islands: sets of nodes that no direct current can reach from ground. */
import type { Circuit, Element } from '../circuit.ts';
import type { StructureFault } from '../settle/settlement.ts';
import { DisjointSets, type Graph } from './graph.ts';
import { list } from './list.ts';

/** One fault for each island, named by what leaves it hanging. */
export function findIslands(circuit: Circuit, graph: Graph): StructureFault[] {
  const sets = new DisjointSets(graph.size);
  for (const { path, from, to } of graph.edges) if (path.kind !== 'current') sets.join(from, to);
  const islands = new Map<number, number[]>();
  for (let node = 1; node < circuit.nodes.length; node++) {
    const root = sets.find(node);
    if (root === sets.find(0)) continue;
    const members = islands.get(root);
    if (members) members.push(node);
    else islands.set(root, [node]);
  }
  return [...islands.values()].map((members) => faultOf(circuit, graph, members));
}

function faultOf(circuit: Circuit, graph: Graph, members: readonly number[]): StructureFault {
  const inside = new Set(members);
  const nodes = members.map((node) => circuit.nodes[node] ?? '');
  const touching = circuit.elements.filter((element) => element.nodes.some((node) => inside.has(node)));
  const where = list(nodes);

  const forcing = graph.edges.filter(
    ({ path, from, to }) => path.kind === 'current' && inside.has(from) !== inside.has(to),
  );
  if (forcing.length > 0) {
    const elements = names(forcing.map(({ element }) => element));
    return {
      code: 'current-cut-set',
      message: `only the current of ${list(elements)} reaches ${where}: give it a path to ground`,
      nodes,
      elements,
    };
  }

  const carries = new Set(graph.edges.flatMap(({ from, to }) => [from, to]));
  const sensing = touching.filter((element) =>
    element.law.senses.some((terminal) => inside.has(element.nodes[terminal] ?? -1)),
  );
  if (sensing.length > 0 && !members.some((node) => carries.has(node))) {
    const elements = names(sensing);
    const terminals = sensing.flatMap((element) =>
      element.law.senses
        .filter((terminal) => inside.has(element.nodes[terminal] ?? -1))
        .map((terminal) => `${element.name}.${element.law.terminals[terminal] ?? ''}`),
    );
    return {
      code: 'floating-gate',
      message: `nothing sets the potential of ${list(terminals)}: join it to something that carries direct current`,
      nodes,
      elements,
    };
  }

  const elements = names(touching);
  const of = elements.length > 0 ? ` (${list(elements)})` : '';
  return {
    code: 'no-path-to-ground',
    message: `${where}${of} has no path for direct current to ground`,
    nodes,
    elements,
  };
}

const names = (elements: readonly Element[]): string[] => [...new Set(elements.map(({ name }) => name))];
