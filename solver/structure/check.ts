/** Graph checks before any arithmetic: faults of the drawing, each with the parts by name. */
import type { Circuit } from '../circuit.ts';
import type { StructureFault } from '../settle/settlement.ts';
import { graphOf } from './graph.ts';
import { findIslands } from './islands.ts';
import { findLoops } from './loops.ts';

/** Every structural fault of the circuit at its present values (a switch counts as it stands). */
export function checkStructure(circuit: Circuit): readonly StructureFault[] {
  if (!circuit.elements.some((element) => element.nodes.includes(0)))
    return [
      {
        code: 'no-ground',
        message: 'nothing is joined to ground, so no voltage has a reference',
        nodes: [],
        elements: [],
      },
    ];
  const graph = graphOf(circuit);
  return [...findIslands(circuit, graph), ...findLoops(circuit, graph)];
}
