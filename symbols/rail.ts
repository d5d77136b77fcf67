import type { SymbolArt } from './art.ts';
import { line } from './pen.ts';

export const rail: SymbolArt = {
  pins: { node: [0, 0] },
  shapes: [line([0, 0], [0, -12]), line([-13, -12], [13, -12])],
  body: { left: -13, top: -13, right: 13, bottom: 0 },
};
