/** Resistor: I = V/R, R(T) = R·(1 + α·(T − T0)), never below 1 mΩ (Ohm's law). */
import type { Element } from '../circuit.ts';
import { branchPattern, loadBranchResistances } from './branch-resistance.ts';
import { REFERENCE_TEMPERATURE, RESISTANCE_FLOOR } from './constants.ts';
import type { Conditions, ElementLaw } from './law.ts';
import { conductancePattern, readTwoTerminal, type TwoTerminalOperating } from './two-terminal.ts';

export interface ResistorParameters {
  /** Ω at 25 °C. */
  readonly resistance: number;
  /** 1/K; 0 where not given. */
  readonly temperatureCoefficient?: number;
}

/** Below this, Ω, a resistor is made with its current as an unknown, so that the current keeps its digits. */
const SMALL_RESISTANCE = 1;

const resistanceAt = (values: Float64Array, { temperature }: Conditions): number =>
  Math.max(values[0]! * (1 + values[1]! * (temperature - REFERENCE_TEMPERATURE)), RESISTANCE_FLOOR);

const common = {
  name: 'resistor',
  terminals: ['a', 'b'],
  parameters: ['resistance', 'temperatureCoefficient'],
  internals: [],
  senses: [],
  derivedSize: 1,
  linear: true,
  memorySize: 0,
  paths: () => [{ kind: 'passive', from: 0, to: 1 }],
  read: readTwoTerminal,
} satisfies Partial<ElementLaw<TwoTerminalOperating>>;

export const resistorLaw: ElementLaw<TwoTerminalOperating> = {
  ...common,
  branches: [],
  pattern: conductancePattern,
  derive(values, conditions, derived, at) {
    derived[at] = 1 / resistanceAt(values, conditions); // S
  },
  load({ x, residual, jacobian, derived, linearKnown }, { count, unknown, slot, derived: d }) {
    for (let k = 0, u = unknown, s = slot; k < count; k++, u += 2, s += 4) {
      const conductance = derived[d + k]!;
      const current = conductance * (x[u]! - x[u + 1]!);
      residual[u] = current;
      residual[u + 1] = -current;
      if (linearKnown) continue;
      jacobian[s] = jacobian[s + 3] = conductance;
      jacobian[s + 1] = jacobian[s + 2] = -conductance;
    }
  },
};

export const smallResistorLaw: ElementLaw<TwoTerminalOperating> = {
  ...common,
  branches: ['current'],
  pattern: branchPattern,
  derive(values, conditions, derived, at) {
    derived[at] = resistanceAt(values, conditions); // Ω
  },
  load: loadBranchResistances,
};

export const resistor = (
  name: string,
  nodes: readonly [a: number, b: number],
  { resistance, temperatureCoefficient = 0 }: ResistorParameters,
): Element<TwoTerminalOperating> => ({
  name,
  law: resistance < SMALL_RESISTANCE ? smallResistorLaw : resistorLaw,
  nodes,
  values: Float64Array.of(resistance, temperatureCoefficient),
});
