import type { SymbolArt } from './art.ts';
import { around, leads, line, rectangle, twoPins } from './pen.ts';

export const heater: SymbolArt = {
  pins: twoPins('a', 'b'),
  shapes: [...leads(18), rectangle(around(18, 7)), ...[-9, 0, 9].map((x) => line([x, -7], [x, 7]))],
  body: around(18, 7),
};
