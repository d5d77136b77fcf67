import type { SymbolArt } from './art.ts';
import { line, polygon, reach } from './pen.ts';

/** A voltage at the wide side sets a current at the narrow one; the arrow points from `from` to `to`. */
export const transconductor: SymbolArt = {
  pins: { plus: [-3, -1], minus: [-3, 1], from: [3, -1], to: [3, 1] },
  shapes: [
    line([-reach, -12], [-18, -12]),
    line([-reach, 12], [-18, 12]),
    line([18, -12], [reach, -12]),
    line([18, 12], [reach, 12]),
    polygon('paper', [-18, -26], [18, -18], [18, 18], [-18, 26]),
    line([8, -9], [8, 9]),
    line([3.5, 4], [8, 9], [12.5, 4]),
    { shape: 'upright', mark: 'plus', x: -10, y: -12 },
    { shape: 'upright', mark: 'minus', x: -10, y: 12 },
  ],
  body: { left: -18, top: -26, right: 18, bottom: 26 },
};
