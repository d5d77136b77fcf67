import type { SymbolArt } from './art.ts';
import { around, leads, line, reach, rectangle } from './pen.ts';

export const potentiometer: SymbolArt = {
  pins: { a: [-3, 0], b: [3, 0], wiper: [0, 3] },
  shapes: [
    ...leads(18),
    rectangle(around(18, 7)),
    line([0, reach], [0, 9]),
    line([-4.5, 14.5], [0, 9], [4.5, 14.5]),
  ],
  body: { left: -18, top: -7, right: 18, bottom: 16 },
};
