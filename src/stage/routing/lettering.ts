import type { GridBox } from './grid.ts';
import type { StandingPart } from './shape.ts';

/** Where a part's name and value, and a transistor's badge, are most likely to stand. Grid units. */
export const letteringOf = (part: StandingPart): readonly GridBox[] => {
  const { body, origin, pins } = part;
  const [x, y] = origin;
  if (pins.has('gate') || pins.has('base')) {
    const gate = (pins.get('gate') ?? pins.get('base'))?.at ?? origin;
    // Beside the transistor on the side away from its gate.
    const away = gate[0] > x ? -1 : 1;
    const near = x + 3 * away;
    const far = x + 14 * away;
    return [{ left: Math.min(near, far), right: Math.max(near, far), top: y - 3, bottom: y + 2 }];
  }
  if (pins.size === 1) {
    const pin = pins.get('node');
    // A rail's name stands above it; a ground has none; a tag carries its own.
    if (pin?.heading === 1) return [{ left: x - 3, right: x + 3, top: body.top - 1.6, bottom: body.top }];
    return [];
  }
  if (pins.size === 2) {
    const upright = [...pins.values()].every((pin) => pin.heading === 1 || pin.heading === 3);
    if (upright) return [{ left: body.right + 0.4, right: body.right + 5, top: y - 1.5, bottom: y + 1.5 }];
  }
  return [{ left: x - 3, right: x + 3, top: body.top - 1.8, bottom: body.top }];
};
