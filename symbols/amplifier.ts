import type { SymbolArt } from './art.ts';
import { line, polygon, reach } from './pen.ts';

/** Where the triangle's slanted edges pass the axis of the supply pins. */
const edge = (24 * 24) / 42;

export const amplifier: SymbolArt = {
  pins: { plus: [-3, -1], minus: [-3, 1], out: [3, 0], high: [0, -3], low: [0, 3] },
  shapes: [
    line([-reach, -12], [-18, -12]),
    line([-reach, 12], [-18, 12]),
    line([24, 0], [reach, 0]),
    polygon('paper', [-18, -24], [24, 0], [-18, 24]),
    { shape: 'upright', mark: 'plus', x: -10, y: -12 },
    { shape: 'upright', mark: 'minus', x: -10, y: 12 },
  ],
  whenWired: {
    high: [line([0, -reach], [0, -edge])],
    low: [line([0, reach], [0, edge])],
  },
  body: { left: -18, top: -24, right: 24, bottom: 24 },
};
