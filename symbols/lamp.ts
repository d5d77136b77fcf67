import type { SymbolArt } from './art.ts';
import { around, circle, leads, line, twoPins } from './pen.ts';

const reach45 = 15 * Math.SQRT1_2;

export const lamp: SymbolArt = {
  pins: twoPins('a', 'b'),
  shapes: [
    ...leads(15),
    circle(0, 0, 15),
    line([-reach45, -reach45], [reach45, reach45]),
    line([-reach45, reach45], [reach45, -reach45]),
  ],
  body: around(15, 15),
};
