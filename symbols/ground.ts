import type { SymbolArt } from './art.ts';
import { line } from './pen.ts';

export const ground: SymbolArt = {
  pins: { node: [0, 0] },
  shapes: [
    line([0, 0], [0, 12]),
    line([-13, 12], [13, 12]),
    line([-8, 17.5], [8, 17.5]),
    line([-3, 23], [3, 23]),
  ],
  body: { left: -13, top: 0, right: 13, bottom: 23 },
};
