/** Current source: a fixed current through the source from `from` to `to`. */
import type { Element } from '../circuit.ts';
import { absorbedPower, type ElementLaw } from './law.ts';
import type { SourceOperating } from './voltage-source.ts';

export interface CurrentSourceParameters {
  /** A, from the first terminal through the source to the second. */
  readonly current: number;
}

export const currentSourceLaw: ElementLaw<SourceOperating> = {
  name: 'current-source',
  terminals: ['from', 'to'],
  parameters: ['current'],
  internals: [],
  branches: [],
  pattern: [],
  senses: [],
  linear: true,
  derivedSize: 1,
  memorySize: 0,
  paths: () => [{ kind: 'current', from: 0, to: 1 }],
  derive(values, _conditions, derived, at) {
    derived[at] = values[0]!;
  },
  load({ residual, derived, sourceScale }, batch) {
    for (let k = 0, u = batch.unknown; k < batch.count; k++, u += 2) {
      const current = sourceScale * derived[batch.derived + k]!;
      residual[u] = current;
      residual[u + 1] = -current;
    }
  },
  read: (at) => {
    const power = absorbedPower(at);
    return { voltage: at.unknowns[0]! - at.unknowns[1]!, current: at.currents[0]!, power, delivered: -power };
  },
};

export const currentSource = (
  name: string,
  nodes: readonly [from: number, to: number],
  { current }: CurrentSourceParameters,
): Element<SourceOperating> => ({ name, law: currentSourceLaw, nodes, values: Float64Array.of(current) });
