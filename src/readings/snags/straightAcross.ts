import type { Element } from '../../../solver/index.ts';
import { netOfPin } from '../../stage/connectivity.ts';
import type { CompiledPart, CompiledStage } from '../compile.ts';
import type { Notice } from '../readings.ts';

const sources = new Set(['supply', 'rail']);

/** Rails and supplies with a pin on a node that the element's current passes, the reference left out. */
const sourcesAt = (compiled: CompiledStage, element: Element): readonly CompiledPart[] =>
  compiled.parts.filter(
    (part) =>
      sources.has(part.part.kind) &&
      part.pins.some((pin) => {
        const net = netOfPin(compiled.connectivity, part.id, pin);
        return (
          net.index !== 0 &&
          element.nodes.some(
            (node, terminal) => !element.law.senses.includes(terminal) && compiled.nets[node] === net,
          )
        );
      }),
  );

/**
 * A junction that conducts straight across sources without a resistance between: whatever current were shown, it would
 * be the model's guard resistance that set it, not the drawing.
 */
export const straightAcrossSnags = (
  compiled: CompiledStage,
  elements: readonly Element[],
): readonly Notice[] =>
  elements.map((element) => {
    const owner = compiled.parts.find((part) => part.elements.includes(element));
    const across = sourcesAt(compiled, element).map(({ name }) => name);
    const names = [...new Set(across)];
    return {
      code: 'straight-across',
      severity: 'stop',
      parts: [...(owner === undefined ? [] : [owner.name]), ...names],
      message: `a junction of ${owner?.name ?? element.name} lies straight across ${names.join(' and ')}: nothing in the drawing limits its current`,
    };
  });
