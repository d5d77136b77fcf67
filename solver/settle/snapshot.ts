/** A settlement: what was found, taken out of the workspace so that settling again does not change it. */
import type { Element } from '../circuit.ts';
import { at, codeAt } from '../elements/at.ts';
import type { ReadingPoint } from '../elements/law.ts';
import { graphOf } from '../structure/graph.ts';
import { STRAIGHT_CURRENT } from './limits.ts';
import type { NewtonRun } from './newton.ts';
import type { Prepared } from './prepared.ts';
import type { Method, Settlement, SettleOptions } from './settlement.ts';
import { findUnset } from './unset.ts';

export function settlementOf(
  prepared: Prepared,
  options: SettleOptions,
  method: Method,
  run: NewtonRun,
): Settlement {
  const { circuit, x, work, placeOf } = prepared;
  const state = x.slice();
  const currents = work.residual.slice();
  const local = work.x.slice();
  const derived = work.derived.slice();
  const voltages = new Float64Array(circuit.nodes.length);
  voltages.set(state.subarray(0, circuit.nodes.length - 1), 1);
  const residual = { ...run.residual };
  const iterations = run.iterations;

  const place = (element: Element) => {
    const found = placeOf.get(element);
    if (!found) throw new Error(`${element.name} is not an element of the circuit that was settled`);
    return found;
  };
  const terminalCurrents = (element: Element): Float64Array => {
    const { unknown } = place(element);
    const { terminals, behind = [] } = element.law;
    const into = currents.slice(unknown, unknown + terminals.length);
    behind.forEach((terminal, index) => {
      into[terminal] = at(into, terminal) + at(currents, unknown + terminals.length + index);
    });
    return into;
  };
  return {
    settled: true,
    method,
    iterations,
    residual,
    voltages,
    terminalCurrents,
    operating<Operating>(element: Element<Operating>): Operating {
      const found = place(element);
      const { law } = element;
      const width = law.terminals.length + law.internals.length + law.branches.length;
      const point: ReadingPoint = {
        unknowns: local.slice(found.unknown, found.unknown + width),
        currents: terminalCurrents(element),
        values: element.values,
        derived: derived.slice(found.derived, found.derived + law.derivedSize),
        temperature: options.temperatures?.[found.index] ?? options.temperature,
      };
      return law.read(point);
    },
    straightAcross: straightAcross(prepared),
    unset: (options.findUnset ?? true) ? findUnset(prepared, options, run) : { nodes: [], elements: [] },
    state,
  };
}

/** Elements with a junction that lies, conducting, straight across voltage sources. */
function straightAcross({ circuit, hull, x, work, placeOf }: Prepared): Element[] {
  const found = new Set<Element>();
  const pinnedVoltage = (node: number): number | null =>
    node === 0 ? 0 : codeAt(hull.pinned, node) === 1 ? at(x, node - 1) : null;
  for (const { element, path, from, to } of graphOf(circuit).edges) {
    if (path.kind !== 'junction') continue;
    const anode = pinnedVoltage(from);
    const cathode = pinnedVoltage(to);
    if (anode === null || cathode === null || anode <= cathode) continue;
    const { unknown } = placeOf.get(element) ?? { unknown: 0 };
    const current = Math.max(
      ...element.nodes.map((_, terminal) => Math.abs(at(work.residual, unknown + terminal))),
    );
    if (current > STRAIGHT_CURRENT) found.add(element);
  }
  return [...found];
}
