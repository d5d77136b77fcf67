/** Inductor at direct current: its winding resistance, V = R·I, as a branch of its own (never below 1 mΩ). */
import type { Element } from '../circuit.ts';
import { RESISTANCE_FLOOR } from './constants.ts';
import type { ElementLaw } from './law.ts';
import { branchPattern, loadBranchResistances } from './branch-resistance.ts';
import { readTwoTerminal, type TwoTerminalOperating } from './two-terminal.ts';

export interface InductorParameters {
  /** H. */
  readonly inductance: number;
  /** Winding resistance, Ω; the floor of 1 mΩ where not given. */
  readonly resistance?: number;
}

export const inductorLaw: ElementLaw<TwoTerminalOperating> = {
  name: 'inductor',
  terminals: ['a', 'b'],
  parameters: ['inductance', 'resistance'],
  internals: [],
  branches: ['current'],
  pattern: branchPattern,
  senses: [],
  linear: true,
  derivedSize: 1,
  memorySize: 0,
  paths: () => [{ kind: 'passive', from: 0, to: 1 }],
  derive(values, _conditions, derived, at) {
    derived[at] = Math.max(values[1]!, RESISTANCE_FLOOR); // Ω
  },
  load: loadBranchResistances,
  read: readTwoTerminal,
};

export const inductor = (
  name: string,
  nodes: readonly [a: number, b: number],
  { inductance, resistance = RESISTANCE_FLOOR }: InductorParameters,
): Element<TwoTerminalOperating> => ({
  name,
  law: inductorLaw,
  nodes,
  values: Float64Array.of(inductance, resistance),
});
