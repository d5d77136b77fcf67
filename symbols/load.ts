import type { SymbolArt } from './art.ts';
import { around, leads, rectangle, twoPins } from './pen.ts';

/** A piece of equipment, nothing more said of it. */
export const load: SymbolArt = {
  pins: twoPins('a', 'b'),
  shapes: [...leads(13), rectangle(around(13, 13))],
  body: around(13, 13),
};
