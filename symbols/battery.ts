import type { SymbolArt } from './art.ts';
import { leads, line, twoPins } from './pen.ts';

/** Two cells; the long plate is the positive one. */
export const battery: SymbolArt = {
  pins: twoPins('plus', 'minus'),
  shapes: [
    ...leads(9),
    line([-9, -13], [-9, 13]),
    line([-3, -7], [-3, 7]),
    line([3, -13], [3, 13]),
    line([9, -7], [9, 7]),
    { shape: 'upright', mark: 'plus', x: -18, y: -9 },
  ],
  body: { left: -22, top: -13, right: 9, bottom: 13 },
};
