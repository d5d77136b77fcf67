/** Transconductor: a current g·(V₊ − V₋) through the element from `from` to `to`, a linear controlled source. */
import type { Element } from '../circuit.ts';
import { absorbedPower, type ElementLaw } from './law.ts';

export interface TransconductorParameters {
  /** S. */
  readonly transconductance: number;
}

export interface TransconductorOperating {
  /** Plus less minus, V. */
  readonly input: number;
  /** From `from` through the element to `to`, A. */
  readonly current: number;
  /** Absorbed, W. */
  readonly power: number;
}

export const transconductorLaw: ElementLaw<TransconductorOperating> = {
  name: 'transconductor',
  terminals: ['plus', 'minus', 'from', 'to'],
  parameters: ['transconductance'],
  internals: [],
  branches: [],
  pattern: [
    [2, 0],
    [2, 1],
    [3, 0],
    [3, 1],
  ],
  senses: [0, 1],
  derivedSize: 1,
  memorySize: 0,
  paths: () => [{ kind: 'current', from: 2, to: 3 }],
  derive(values, _conditions, derived, at) {
    derived[at] = values[0]!;
  },
  load({ x, residual, jacobian, derived, gainScale }, batch) {
    for (let k = 0, u = batch.unknown, s = batch.slot; k < batch.count; k++, u += 4, s += 4) {
      const slope = gainScale * derived[batch.derived + k]!;
      const current = slope * (x[u]! - x[u + 1]!);
      residual[u + 2] = current;
      residual[u + 3] = -current;
      jacobian[s] = jacobian[s + 3] = slope;
      jacobian[s + 1] = jacobian[s + 2] = -slope;
    }
  },
  read: (at) => ({
    input: at.unknowns[0]! - at.unknowns[1]!,
    current: at.currents[2]!,
    power: absorbedPower(at),
  }),
};

export const transconductor = (
  name: string,
  nodes: readonly [plus: number, minus: number, from: number, to: number],
  { transconductance }: TransconductorParameters,
): Element<TransconductorOperating> => ({
  name,
  law: transconductorLaw,
  nodes,
  values: Float64Array.of(transconductance),
});
