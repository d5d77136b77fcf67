import type { SymbolArt } from './art.ts';
import { around, leads, line, twoPins } from './pen.ts';

/** Plates 26 long and 8 apart. */
export const capacitor: SymbolArt = {
  pins: twoPins('a', 'b'),
  shapes: [...leads(4), line([-4, -13], [-4, 13]), line([4, -13], [4, 13])],
  body: around(4, 13),
};
