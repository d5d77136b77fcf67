/** Graph checks before any arithmetic: faults of the drawing, each with the parts by name. */
import type { Circuit } from '../circuit.ts';
import type { StructureFault } from '../settle/settlement.ts';

/** Every structural fault of the circuit at its present values. */
export function checkStructure(circuit: Circuit): readonly StructureFault[] {
  const faults: StructureFault[] = [];
  if (!circuit.elements.some((element) => element.nodes.includes(0)))
    faults.push({
      code: 'no-ground',
      message: 'nothing is joined to ground, so no voltage has a reference',
      nodes: [],
      elements: [],
    });
  return faults;
}
