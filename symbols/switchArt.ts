import type { SymbolArt } from './art.ts';
import { circle, leads, line, twoPins } from './pen.ts';

/** Two contacts and a blade; closed, the blade lies across the far contact. */
export const switchArt = (closed: boolean): SymbolArt => ({
  pins: twoPins('a', 'b'),
  shapes: [
    ...leads(18),
    closed ? line([-15, -3], [18.5, -3]) : line([-12.3, -1.3], [14.5, -14]),
    circle(-15, 0, 3),
    circle(15, 0, 3),
  ],
  body: { left: -18, top: closed ? -4 : -14, right: 18.5, bottom: 3 },
});
