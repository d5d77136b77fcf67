import type { SymbolArt } from './art.ts';
import { around, circle, leads, twoPins } from './pen.ts';

export const motor: SymbolArt = {
  pins: twoPins('a', 'b'),
  shapes: [...leads(15), circle(0, 0, 15), { shape: 'upright', mark: 'letter-m', x: 0, y: 0 }],
  body: around(15, 15),
};
