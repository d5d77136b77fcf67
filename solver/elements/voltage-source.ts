/** Voltage source with internal resistance: V₊ − V₋ = E + R·I, I into the plus terminal, as a branch of its own. */
import type { Element } from '../circuit.ts';
import { absorbedPower, type ElementLaw } from './law.ts';
import type { TwoTerminalOperating } from './two-terminal.ts';

export interface VoltageSourceParameters {
  /** Electromotive force, plus against minus, V. */
  readonly voltage: number;
  /** Internal resistance, Ω; 0 (ideal) where not given. */
  readonly resistance?: number;
}

export interface SourceOperating extends TwoTerminalOperating {
  /** Power given to the circuit, W: the power absorbed with its sign turned. */
  readonly delivered: number;
}

export const voltageSourceLaw: ElementLaw<SourceOperating> = {
  name: 'voltage-source',
  terminals: ['plus', 'minus'],
  parameters: ['voltage', 'resistance'],
  internals: [],
  branches: ['current'],
  pattern: [
    [0, 2],
    [1, 2],
    [2, 0],
    [2, 1],
    [2, 2],
  ],
  senses: [],
  linear: true,
  derivedSize: 2,
  memorySize: 0,
  paths: (values) => [{ kind: 'source', from: 0, to: 1, voltage: 0, ideal: !(values[1]! > 0) }],
  pathValues: [1],
  derive(values, _conditions, derived, at) {
    derived[at] = values[0]!;
    derived[at + 1] = values[1]!;
  },
  load({ x, residual, jacobian, derived, sourceScale, linearKnown }, batch) {
    let { unknown: u, slot: s, derived: d } = batch;
    for (let k = 0; k < batch.count; k++, u += 3, s += 5, d += 2) {
      const resistance = derived[d + 1]!;
      const current = x[u + 2]!;
      residual[u] = current;
      residual[u + 1] = -current;
      residual[u + 2] = x[u]! - x[u + 1]! - sourceScale * derived[d]! - resistance * current;
      if (linearKnown) continue;
      jacobian[s] = jacobian[s + 2] = 1;
      jacobian[s + 1] = jacobian[s + 3] = -1;
      jacobian[s + 4] = -resistance;
    }
  },
  read: (at) => {
    const power = absorbedPower(at);
    return {
      voltage: at.unknowns[0]! - at.unknowns[1]!,
      current: at.currents[0]!,
      power,
      delivered: -power,
    };
  },
};

export const voltageSource = (
  name: string,
  nodes: readonly [plus: number, minus: number],
  { voltage, resistance = 0 }: VoltageSourceParameters,
): Element<SourceOperating> => ({
  name,
  law: voltageSourceLaw,
  nodes,
  values: Float64Array.of(voltage, resistance),
});
