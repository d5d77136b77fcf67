import { leadDirection } from '../wireGraph.ts';
import type { ScenePart } from '../scene.ts';

/**
 * How a part stands, as far as its lettering goes: `upright` and `lying` two-pin parts; `up`, `down`, `left`, `right`
 * parts on one pin, by the side on which their body lies; transistors, with the side away from the gate; other blocks.
 */
export type Facing =
  | { readonly form: 'upright' | 'lying' | 'block' }
  | { readonly form: 'single'; readonly side: 'up' | 'down' | 'left' | 'right' }
  | { readonly form: 'transistor'; readonly away: 'left' | 'right' | 'up' | 'down' };

export const facingOf = (part: ScenePart): Facing => {
  const control = part.pins.get('gate') ?? part.pins.get('base');
  if (control !== undefined) {
    const [x, y] = [control[0] - part.origin[0], control[1] - part.origin[1]];
    if (Math.abs(x) > Math.abs(y)) return { form: 'transistor', away: x < 0 ? 'right' : 'left' };
    return { form: 'transistor', away: y < 0 ? 'down' : 'up' };
  }
  const pins = [...part.pins];
  const [first, second] = pins;
  if (first === undefined) return { form: 'block' };
  if (second === undefined) {
    const [x, y] = leadDirection(part, first[0]) ?? [0, -1];
    return { form: 'single', side: x > 0 ? 'right' : x < 0 ? 'left' : y > 0 ? 'down' : 'up' };
  }
  if (pins.length > 3) return { form: 'block' };
  const [a, b] = [first[1], second[1]];
  if (a[0] === b[0]) return { form: 'upright' };
  return { form: a[1] === b[1] ? 'lying' : 'block' };
};
