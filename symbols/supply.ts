import type { SymbolArt } from './art.ts';
import { around, circle, leads, twoPins } from './pen.ts';

export const supply: SymbolArt = {
  pins: twoPins('plus', 'minus'),
  shapes: [
    ...leads(15),
    circle(0, 0, 15),
    { shape: 'upright', mark: 'plus', x: -7, y: 0 },
    { shape: 'upright', mark: 'minus', x: 7, y: 0 },
  ],
  body: around(15, 15),
};
