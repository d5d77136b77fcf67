/**
 * Switch. Closed: V_a − V_b = R·I. Open: I = I_L·tanh((V_a − V_b)/0.1 V), a leakage that is stated as a current and
 * hardly depends on the voltage (common practice); nothing where no leakage is stated.
 */
import type { Element } from '../circuit.ts';
import { branchPattern } from './branch-resistance.ts';
import { RESISTANCE_FLOOR } from './constants.ts';
import type { ElementLaw } from './law.ts';
import { readTwoTerminal, type TwoTerminalOperating } from './two-terminal.ts';

export interface SwitchParameters {
  readonly closed: boolean;
  /** Ω; the floor of 1 mΩ where not given. */
  readonly onResistance?: number;
  /** Current that passes when open, A, a magnitude; 0 where not given. */
  readonly leakage?: number;
}

/** Voltage over which an open contact's leakage sets in, V. */
const LEAKAGE_KNEE = 0.1;
/** Scale, V/A, of the row of an open contact. */
const OPEN_SCALE = 1e9;

export const switchLaw: ElementLaw<TwoTerminalOperating> = {
  name: 'switch',
  terminals: ['a', 'b'],
  parameters: ['closed', 'onResistance', 'leakage'],
  internals: [],
  branches: ['current'],
  pattern: branchPattern,
  senses: [],
  derivedSize: 3,
  memorySize: 0,
  paths: (values) => (values[0]! !== 0 || values[2]! > 0 ? [{ kind: 'passive', from: 0, to: 1 }] : []),
  pathValues: [0, 2],
  derive(values, _conditions, derived, at) {
    derived[at] = values[0]!; // 0: open
    derived[at + 1] = Math.max(values[1]!, RESISTANCE_FLOOR); // Ω
    derived[at + 2] = values[2]!; // A
  },
  load({ x, residual, jacobian, derived }, batch) {
    let { unknown: u, slot: s, derived: d } = batch;
    for (let k = 0; k < batch.count; k++, u += 3, s += 5, d += 3) {
      const current = x[u + 2]!;
      const voltage = x[u]! - x[u + 1]!;
      let slope = 1; // of the branch row against the voltage
      let resistance = derived[d + 1]!;
      let row = voltage - resistance * current; // V
      if (derived[d] === 0) {
        const leakage = derived[d + 2]!;
        const tanh = Math.tanh(voltage / LEAKAGE_KNEE);
        resistance = OPEN_SCALE;
        slope = (OPEN_SCALE * leakage * (1 - tanh * tanh)) / LEAKAGE_KNEE;
        row = OPEN_SCALE * (leakage * tanh - current);
      }
      residual[u] = current;
      residual[u + 1] = -current;
      residual[u + 2] = row;
      jacobian[s] = 1;
      jacobian[s + 1] = -1;
      jacobian[s + 2] = slope;
      jacobian[s + 3] = -slope;
      jacobian[s + 4] = -resistance;
    }
  },
  read: readTwoTerminal,
};

/** A switch; named so because `switch` is a word of the language. */
export const contact = (
  name: string,
  nodes: readonly [a: number, b: number],
  { closed, onResistance = RESISTANCE_FLOOR, leakage = 0 }: SwitchParameters,
): Element<TwoTerminalOperating> => ({
  name,
  law: switchLaw,
  nodes,
  values: Float64Array.of(closed ? 1 : 0, onResistance, leakage),
});
