import type { SymbolArt } from './art.ts';
import { around, leads, rectangle, twoPins } from './pen.ts';

/** The operating coil of a relay or a valve. */
export const coil: SymbolArt = {
  pins: twoPins('a', 'b'),
  shapes: [...leads(9), rectangle(around(9, 18))],
  body: around(9, 18),
};
