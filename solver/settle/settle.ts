/** Settles a prepared circuit: Newton, then the methods behind it, then acceptance, then what the leak decides. */
import { at, codeAt } from '../elements/at.ts';
import { Phase } from '../elements/law.ts';
import { list } from '../structure/list.ts';
import type { Effort } from './effort.ts';
import { DIRECT_BUDGET, GREATEST_CURRENT, HULL_MARGIN, OTHER_BUDGET, TIME_BUDGET } from './limits.ts';
import { newton, polish } from './newton.ts';
import type { Prepared } from './prepared.ts';
import { settleRamped } from './ramped.ts';
import { refresh, wholeLeak } from './refresh.ts';
import type { Method, SettleOptions, SettleResult, Unsettled } from './settlement.ts';
import { settlementOf } from './snapshot.ts';
import { settleTimed } from './timed.ts';
import { settleTraced } from './traced.ts';

const everyMethod: readonly Method[] = ['direct', 'timed', 'ramped', 'traced'];

const ways: Record<Method, (prepared: Prepared, effort: Effort) => boolean> = {
  direct: (prepared, { run }) => newton(prepared, run) === 'accepted',
  timed: settleTimed,
  ramped: settleRamped,
  traced: settleTraced,
};

/** Finds the point at which the circuit rests at its present values. */
export function settle(prepared: Prepared, options: SettleOptions): SettleResult {
  const { x } = prepared;
  const unusable = unusableParameter(prepared, options);
  if (unusable) return unusable;
  const effort: Effort = {
    run: {
      first: options.start ? Phase.adopt : Phase.start,
      maxIterations: options.budget?.direct ?? DIRECT_BUDGET,
      shunt: null,
      by: 'rows',
      iterations: 0,
      residual: { amperes: Infinity, ratio: Infinity },
      singularAt: -1,
    },
    stopAt: 0,
    deadline: performance.now() + (options.budget?.time ?? TIME_BUDGET),
    signal: options.signal,
    ranAway: -1,
  };
  const { run } = effort;
  for (const method of options.methods ?? everyMethod) {
    if (options.start) x.set(options.start);
    else x.fill(0);
    run.singularAt = -1;
    effort.stopAt = run.iterations + (options.budget?.other ?? OTHER_BUDGET);
    const found = ways[method](prepared, effort);
    if (options.signal?.aborted)
      return unsettled(run.iterations, { reason: 'cancelled', message: 'settling was cancelled' });
    if (!found) continue;
    polish(prepared, run);
    return beyondSense(prepared, run.iterations) ?? settlementOf(prepared, options, method, run);
  }
  return nothingFound(prepared, effort);
}

function unsettled(
  iterations: number,
  what: Pick<Unsettled, 'reason' | 'message'> & Partial<Pick<Unsettled, 'nodes' | 'elements'>>,
): Unsettled {
  return { settled: false, iterations, nodes: [], elements: [], ...what };
}

function unusableParameter(prepared: Prepared, options: SettleOptions): Unsettled | null {
  if (!(options.temperature > 0))
    return unsettled(0, {
      reason: 'parameter',
      message: `the temperature must be above 0 K, not ${options.temperature} K`,
    });
  const element = refresh(prepared, options, wholeLeak);
  if (element === null) return null;
  return unsettled(0, {
    reason: 'parameter',
    message: `${element.name} has a value with which its law gives no number`,
    elements: [element.name],
  });
}

/** Names what stood in the way, as far as the methods could tell. */
function nothingFound(prepared: Prepared, { run, ranAway }: Effort): Unsettled {
  const { iterations, singularAt } = run;
  if (ranAway >= 0) {
    const { nodes, elements } = named(prepared, ranAway);
    return unsettled(iterations, {
      reason: 'runaway',
      message: `nothing limits ${list(nodes)}: an output drives it off without end`,
      nodes,
      elements,
    });
  }
  if (singularAt >= 0) {
    const { nodes, elements } = named(prepared, singularAt);
    return unsettled(iterations, {
      reason: 'singular',
      message: `the equations give no single answer for ${list(nodes)}`,
      nodes,
      elements,
    });
  }
  // The node that moved most at the end is where to look.
  let worst = 0;
  for (let k = 1; k < prepared.size; k++)
    if (Math.abs(at(prepared.step, k)) > Math.abs(at(prepared.step, worst))) worst = k;
  const { nodes, elements } = named(prepared, worst);
  return unsettled(iterations, {
    reason: 'budget',
    message: `no rest point was found in ${iterations} iterations; look at ${list(nodes)}`,
    nodes,
    elements,
  });
}

/** An unknown by its name, with the elements at it. */
function named({ circuit, unknownNames }: Prepared, unknown: number): Pick<Unsettled, 'nodes' | 'elements'> {
  const name = unknownNames[unknown] ?? '';
  const elements = circuit.elements.filter(
    (element) => element.nodes.includes(unknown + 1) || name.startsWith(`${element.name}.`),
  );
  return { nodes: [name], elements: elements.map((element) => element.name) };
}

/** A point outside the rails, or with a current beyond sense, is never a reading. */
function beyondSense(prepared: Prepared, iterations: number): Unsettled | null {
  const { x, hull, circuit, work, places } = prepared;
  const margin = HULL_MARGIN * Math.max(1, Math.abs(hull.low), Math.abs(hull.high));
  for (let node = 1; node < circuit.nodes.length; node++) {
    if (codeAt(hull.bound, node) === 0) continue;
    const v = at(x, node - 1);
    if (v >= hull.low - margin && v <= hull.high + margin) continue;
    const { nodes, elements } = named(prepared, node - 1);
    return unsettled(iterations, {
      reason: 'beyond-rails',
      message: `${list(nodes)} would lie outside the supplies, at ${v.toPrecision(4)} V`,
      nodes,
      elements,
    });
  }
  const heavy = places.filter(({ element, unknown }) =>
    element.nodes.some((_, terminal) => Math.abs(at(work.residual, unknown + terminal)) > GREATEST_CURRENT),
  );
  if (heavy.length === 0) return null;
  const elements = heavy.map(({ element }) => element.name);
  return unsettled(iterations, {
    reason: 'over-current',
    message: `more than 1 MA would flow through ${list(elements)}: something lies straight across a source`,
    elements,
  });
}
