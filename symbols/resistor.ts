import type { SymbolArt } from './art.ts';
import { around, leads, rectangle, twoPins } from './pen.ts';

export const resistor: SymbolArt = {
  pins: twoPins('a', 'b'),
  shapes: [...leads(18), rectangle(around(18, 7))],
  body: around(18, 7),
};
