import type { SymbolArt } from './art.ts';
import { around, line, reach, rectangle } from './pen.ts';

/** The last stage of a logic circuit: a box with a step in it. */
export const logicOutput: SymbolArt = {
  pins: { out: [3, 0], high: [0, -3], low: [0, 3] },
  shapes: [
    line([18, 0], [reach, 0]),
    rectangle(around(18, 15)),
    { shape: 'upright', mark: 'step', x: 0, y: 0 },
  ],
  whenWired: {
    high: [line([0, -reach], [0, -15])],
    low: [line([0, 15], [0, reach])],
  },
  body: around(18, 15),
};
