/** Capacitor: open at direct current. */
import type { Element } from '../circuit.ts';
import type { ElementLaw } from './law.ts';
import { readTwoTerminal, type TwoTerminalOperating } from './two-terminal.ts';

export interface CapacitorParameters {
  /** F. */
  readonly capacitance: number;
}

export const capacitorLaw: ElementLaw<TwoTerminalOperating> = {
  name: 'capacitor',
  terminals: ['a', 'b'],
  parameters: ['capacitance'],
  internals: [],
  branches: [],
  pattern: [],
  senses: [],
  linear: true,
  derivedSize: 0,
  memorySize: 0,
  paths: () => [],
  derive: () => undefined,
  load: () => undefined,
  read: readTwoTerminal,
};

export const capacitor = (
  name: string,
  nodes: readonly [a: number, b: number],
  { capacitance }: CapacitorParameters,
): Element<TwoTerminalOperating> => ({
  name,
  law: capacitorLaw,
  nodes,
  values: Float64Array.of(capacitance),
});
