import type { SymbolArt } from './art.ts';
import { circle, line } from './pen.ts';

export const testPoint: SymbolArt = {
  pins: { node: [0, 0] },
  shapes: [line([0, 0], [0, -11]), circle(0, -16, 5)],
  body: { left: -5, top: -21, right: 5, bottom: 0 },
};
