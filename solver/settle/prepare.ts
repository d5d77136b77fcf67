/** Makes a circuit ready to settle: structure checks first, then numbering and layout. */
import type { Circuit } from '../circuit.ts';
import { checkStructure } from '../structure/check.ts';
import { layOut, type Prepared } from './prepared.ts';
import type { StructureFault } from './settlement.ts';

export type Preparation =
  | { readonly ok: true; readonly value: Prepared }
  | { readonly ok: false; readonly faults: readonly StructureFault[] };

/**
 * Prepares a circuit, or names every structural fault. Values may change afterwards without preparing again, in
 * `Element.values`; nodes and elements may not. A switch that opens changes the structure's soundness, not its
 * layout: prepare again to have it checked.
 */
export function prepare(circuit: Circuit): Preparation {
  const faults = checkStructure(circuit);
  return faults.length > 0 ? { ok: false, faults } : { ok: true, value: layOut(circuit) };
}
