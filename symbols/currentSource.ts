import type { SymbolArt } from './art.ts';
import { around, circle, leads, line, twoPins } from './pen.ts';

/** The arrow points the way the current flows through the source. */
export const currentSource: SymbolArt = {
  pins: twoPins('from', 'to'),
  shapes: [...leads(15), circle(0, 0, 15), line([-8, 0], [8, 0]), line([2.5, -5.5], [8, 0], [2.5, 5.5])],
  body: around(15, 15),
};
