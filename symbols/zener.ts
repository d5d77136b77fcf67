import type { SymbolArt } from './art.ts';
import { diodeTriangle } from './diode.ts';
import { leads, line, twoPins } from './pen.ts';

export const zener: SymbolArt = {
  pins: twoPins('anode', 'cathode'),
  shapes: [...leads(8), diodeTriangle, line([4, -13], [8, -10], [8, 10], [12, 13])],
  body: { left: -8, top: -13, right: 12, bottom: 13 },
};
