import type { Settlement } from '../../solver/index.ts';
import { measure } from '../../solver/questions/quantities.ts';
import type { CompiledStage } from './compile.ts';
import type { Measure } from './duty/condition.ts';

/** Quantities that hold even where the leak alone decides the voltages: they are as small as the leak. */
const currents = new Set([
  'currentMagnitude',
  'forwardJunction',
  'baseMagnitude',
  'drainCurrent',
  'collectorCurrent',
  'current',
]);

/** A settled circuit to be read: operating points worked out once, and what the drawing does not set. */
export interface Point {
  readonly settlement: Settlement;
  readonly operating: (element: number) => unknown;
  /** An element's quantity; NaN where the drawing does not set it. */
  readonly measure: Measure;
  readonly unsetNode: (node: number | null) => boolean;
  readonly unsetElement: (element: number) => boolean;
}

export const pointOf = (compiled: CompiledStage, settlement: Settlement): Point => {
  const { elements } = compiled.circuit;
  const known: unknown[] = [];
  const operating = (index: number): unknown => {
    const element = elements[index];
    return element === undefined ? undefined : (known[index] ??= settlement.operating(element));
  };
  const nodes = new Set(settlement.unset.nodes);
  const unset = new Set(settlement.unset.elements.map((element) => elements.indexOf(element)));
  return {
    settlement,
    operating,
    measure: (index, quantity) =>
      unset.has(index) && !currents.has(quantity)
        ? Number.NaN
        : measure(elements[index]?.law.name ?? '', operating(index), quantity),
    unsetNode: (node) => node === null || nodes.has(node),
    unsetElement: (index) => unset.has(index),
  };
};
