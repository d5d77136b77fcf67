/** Settles a prepared circuit: Newton, then the methods behind it, then acceptance, then what the leak decides. */
import type { Element } from '../circuit.ts';
import { at, codeAt, indexAt } from '../elements/at.ts';
import { Phase, type ReadingPoint } from '../elements/law.ts';
import { loadElements } from './evaluate.ts';
import {
  DIRECT_BUDGET,
  GREATEST_CURRENT,
  HULL_MARGIN,
  OTHER_BUDGET,
  TIME_BUDGET,
  UNSET_MOVE,
} from './limits.ts';
import type { Effort } from './effort.ts';
import { newton, type NewtonRun } from './newton.ts';
import type { Prepared } from './prepared.ts';
import { settleRamped } from './ramped.ts';
import { hundredthLeak, refresh, wholeLeak } from './refresh.ts';
import { settleTimed } from './timed.ts';
import { settleTraced } from './traced.ts';
import type { Method, Settlement, SettleOptions, SettleResult, Unsettled } from './settlement.ts';

const everyMethod: readonly Method[] = ['direct', 'timed', 'ramped', 'traced'];

const ways: Record<Method, (prepared: Prepared, effort: Effort) => boolean> = {
  direct: (prepared, { run }) => newton(prepared, run) === 'accepted',
  timed: settleTimed,
  ramped: settleRamped,
  traced: settleTraced,
};

/** Finds the point at which the circuit rests at its present values. */
export function settle(prepared: Prepared, options: SettleOptions): SettleResult {
  const { circuit, x } = prepared;
  const broken = refresh(prepared, options, wholeLeak);
  if (broken !== null || !(options.temperature > 0)) {
    const name = broken === null ? null : (circuit.elements[broken]?.name ?? null);
    return unsettled(0, {
      reason: 'parameter',
      message: name
        ? `${name} has a value that is not a usable number`
        : `the temperature must be above 0 K, not ${options.temperature} K`,
      elements: name ? [name] : [],
    });
  }
  const run: NewtonRun = {
    first: options.start ? Phase.adopt : Phase.start,
    maxIterations: options.budget?.direct ?? DIRECT_BUDGET,
    shunt: null,
    by: 'rows',
    iterations: 0,
    residual: { amperes: Infinity, ratio: Infinity },
    singularAt: -1,
  };
  const effort: Effort = {
    run,
    stopAt: 0,
    deadline: performance.now() + (options.budget?.time ?? TIME_BUDGET),
    signal: options.signal,
  };
  for (const method of options.methods ?? everyMethod) {
    if (options.start) x.set(options.start);
    else x.fill(0);
    effort.stopAt = run.iterations + (options.budget?.other ?? OTHER_BUDGET);
    const found = ways[method](prepared, effort);
    if (options.signal?.aborted)
      return unsettled(run.iterations, { reason: 'cancelled', message: 'settling was cancelled' });
    if (!found) continue;
    const beyond = beyondSense(prepared, run.iterations);
    if (beyond) return beyond;
    return settlementOf(prepared, options, method, run);
  }
  return unsettled(run.iterations, {
    reason: run.singularAt >= 0 ? 'singular' : 'budget',
    message:
      run.singularAt >= 0
        ? `the equations give no single answer at ${prepared.unknownNames[run.singularAt] ?? 'one node'}`
        : `no rest point was found in ${run.iterations} iterations`,
    nodes: run.singularAt >= 0 ? [prepared.unknownNames[run.singularAt] ?? ''] : [],
  });
}

function unsettled(
  iterations: number,
  what: Pick<Unsettled, 'reason' | 'message'> & Partial<Pick<Unsettled, 'nodes' | 'elements'>>,
): Unsettled {
  return { settled: false, iterations, nodes: [], elements: [], ...what };
}

/** A point outside the rails, or with a current beyond sense, is never a reading. */
function beyondSense(prepared: Prepared, iterations: number): Unsettled | null {
  const { x, hull, circuit, work, places } = prepared;
  for (let node = 1; node < circuit.nodes.length; node++) {
    if (codeAt(hull.bound, node) === 0) continue;
    const margin = HULL_MARGIN * Math.max(1, Math.abs(hull.low), Math.abs(hull.high));
    const v = at(x, node - 1);
    if (v >= hull.low - margin && v <= hull.high + margin) continue;
    const name = circuit.nodes[node] ?? '';
    return unsettled(iterations, {
      reason: 'beyond-rails',
      message: `${name} would lie outside the supplies, at ${v.toPrecision(4)} V`,
      nodes: [name],
      elements: circuit.elements.filter((element) => element.nodes.includes(node)).map(({ name }) => name),
    });
  }
  const heavy = places.filter(({ element, unknown }) =>
    element.nodes.some((_, terminal) => Math.abs(at(work.residual, unknown + terminal)) > GREATEST_CURRENT),
  );
  if (heavy.length === 0) return null;
  const names = heavy.map(({ element }) => element.name);
  return unsettled(iterations, {
    reason: 'over-current',
    message: `more than 1 MA would flow through ${names.join(', ')}`,
    elements: names,
  });
}

function settlementOf(
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
    return currents.slice(unknown, unknown + element.law.terminals.length);
  };
  const unset = (options.findUnset ?? true) ? findUnset(prepared, options, run) : { nodes: [], elements: [] };
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
    unset,
    state,
  };
}

/** Settles again with the leak at about a hundredth and looks for what moved. Leaves the point as it was. */
function findUnset(prepared: Prepared, options: SettleOptions, run: NewtonRun): Settlement['unset'] {
  const { circuit, x, places, gather } = prepared;
  const before = x.slice();
  refresh(prepared, options, hundredthLeak);
  run.first = Phase.adopt;
  newton(prepared, run);
  const after = x.slice();
  refresh(prepared, options, wholeLeak);
  x.set(before);
  prepared.work.phase = Phase.exact;
  loadElements(prepared);
  const moved = (unknown: number): number => at(after, unknown) - at(before, unknown);
  const nodes: number[] = [];
  for (let node = 1; node < circuit.nodes.length; node++)
    if (Math.abs(moved(node - 1)) > UNSET_MOVE) nodes.push(node);
  const elements =
    nodes.length === 0
      ? []
      : places
          .filter(({ element, unknown }) => {
            const moves = element.nodes.map((_, terminal) => moved(indexAt(gather, unknown + terminal)));
            return Math.max(...moves) - Math.min(...moves) > UNSET_MOVE;
          })
          .map(({ element }) => element);
  return { nodes, elements };
}
