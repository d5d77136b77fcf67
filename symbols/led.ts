import type { SymbolArt, SymbolShape } from './art.ts';
import { diodeTriangle } from './diode.ts';
import { leads, line, twoPins } from './pen.ts';

/** A ray of light, leaving up and to the right. */
const ray = (x: number, y: number): readonly SymbolShape[] => [
  line([x, y], [x + 7, y - 9]),
  line([x + 1.8, y - 8], [x + 7, y - 9], [x + 7.3, y - 3.8]),
];

export const led: SymbolArt = {
  pins: twoPins('anode', 'cathode'),
  shapes: [...leads(8), diodeTriangle, line([8, -10], [8, 10]), ...ray(-2.5, -13), ...ray(5.5, -13)],
  body: { left: -8, top: -22, right: 13, bottom: 10 },
};
