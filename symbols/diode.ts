import type { SymbolArt } from './art.ts';
import { around, leads, line, polygon, twoPins } from './pen.ts';

export const diodeTriangle = polygon('paper', [-8, -10], [-8, 10], [8, 0]);

export const diode: SymbolArt = {
  pins: twoPins('anode', 'cathode'),
  shapes: [...leads(8), diodeTriangle, line([8, -10], [8, 10])],
  body: around(8, 10),
};
