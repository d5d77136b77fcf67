import { settle } from '../../../solver/index.ts';
import type { Prepared, Settlement } from '../../../solver/index.ts';
import { margin } from '../../../solver/questions/limit.ts';
import type { Limit } from '../../../solver/questions/limit.ts';
import { kelvin } from '../compile.ts';
import type { CompiledStage } from '../compile.ts';
import { bipolarAmplifyHeadroom, mosfetAmplifyHeadroom } from '../duty/amplify.ts';
import { dropLimit } from '../duty/conduct.ts';
import type { PartDuty } from '../duty/partDuty.ts';
import { pointOf } from '../point.ts';
import type { Point } from '../point.ts';
import type { Figure } from '../readings.ts';
import { TransistorProbe } from './control.ts';
import { gateLeadHeadroom } from './gateLead.ts';
import type { GateLeadPoint } from './gateLead.ts';

/** What headrooms are measured with: the circuit made ready, and probes made once. */
export interface HeadroomBench {
  readonly compiled: CompiledStage;
  readonly prepared: Prepared;
  readonly probes: Map<number, TransistorProbe>;
  /** °C. */
  readonly ambient: number;
}

/**
 * Distance to the limit that ends a switch's headroom; of a resistance as the volts it stands for, which stay finite
 * where no current flows.
 */
const distance = (limit: Limit, point: Point): number =>
  limit.quantity === 'onResistance'
    ? limit.bound * point.measure(limit.element, 'currentMagnitude') - point.measure(limit.element, 'drop')
    : margin(limit, point.measure(limit.element, limit.quantity));

/**
 * A voltage in series with the gate lead is the same as that much added to the threshold: no direct current flows in
 * the lead, and the law knows the gate's voltage only against the threshold. So no source is put into the circuit.
 */
const conductHeadroom = (bench: HeadroomBench, duty: PartDuty, point: Point): Figure => {
  const { compiled, prepared, ambient } = bench;
  const element = compiled.circuit.elements[duty.element];
  if (duty.terms?.kind !== 'conduct' || element === undefined) return null;
  const limit = dropLimit(duty.element, duty.terms, duty.facts);
  const threshold = element.law.parameters.indexOf('threshold');
  const stated = element.values[threshold] ?? Number.NaN;
  let start: Float64Array = point.settlement.state;
  const read = (settled: Settlement): GateLeadPoint => {
    const there = pointOf(compiled, settled);
    return { margin: distance(limit, there), overdrive: there.measure(duty.element, 'overdrive') };
  };
  const at = (against: number): GateLeadPoint => {
    element.values[threshold] = stated + duty.facts.polarity * against;
    const result = settle(prepared, { temperature: kelvin(ambient), start, findUnset: false });
    if (!result.settled) return { margin: Number.NaN, overdrive: Number.NaN };
    start = result.state;
    return read(result);
  };
  const headroom = gateLeadHeadroom(at, {
    margin: distance(limit, point),
    overdrive: point.measure(duty.element, 'overdrive'),
  });
  element.values[threshold] = stated;
  return headroom;
};

const blockHeadroom = (bench: HeadroomBench, duty: PartDuty, point: Point): Figure => {
  const { compiled, probes, ambient } = bench;
  const element = compiled.circuit.elements[duty.element];
  if (duty.terms?.kind !== 'block' || element === undefined) return null;
  const probe = probes.get(duty.element) ?? new TransistorProbe(element);
  probes.set(duty.element, probe);
  const voltages = element.nodes.map((node) => point.settlement.voltages[node] ?? 0);
  return probe.headroom(voltages, duty.terms.leakLimit, duty.facts.polarity, kelvin(ambient));
};

const finite = (value: number): Figure => (Number.isFinite(value) ? value : null);

/** Volts to the edge that matters for the duty, positive inside; null where there is none or it is not set. */
export const headroomOf = (bench: HeadroomBench, duty: PartDuty, point: Point): Figure => {
  const { terms, element } = duty;
  if (terms === null || point.unsetElement(element)) return null;
  const bipolar = bench.compiled.circuit.elements[element]?.law.name === 'bipolar';
  switch (terms.kind) {
    case 'amplify':
      return finite(
        bipolar
          ? bipolarAmplifyHeadroom(element, terms, point.measure)
          : mosfetAmplifyHeadroom(element, terms, point.measure),
      );
    case 'conduct':
      return bipolar ? null : conductHeadroom(bench, duty, point);
    case 'block':
      return blockHeadroom(bench, duty, point);
  }
};
