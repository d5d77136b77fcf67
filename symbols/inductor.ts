import type { PathCommand, SymbolArt } from './art.ts';
import { leads, quarterArc, twoPins } from './pen.ts';

const radius = 4.5;
const rise = 6.5;

/** One turn of the winding: an arch from (left, 0) to (left + 9, 0). */
const arch = (left: number): readonly PathCommand[] => {
  const [middle, right] = [left + radius, left + 2 * radius];
  const [along, up] = [radius * quarterArc, rise * quarterArc];
  return [
    ['C', left, -up, middle - along, -rise, middle, -rise],
    ['C', middle + along, -rise, right, -up, right, 0],
  ];
};

export const inductor: SymbolArt = {
  pins: twoPins('a', 'b'),
  shapes: [
    ...leads(18),
    { shape: 'path', commands: [['M', -18, 0], ...[-18, -9, 0, 9].flatMap(arch)], fill: 'none' },
  ],
  body: { left: -18, top: -6.5, right: 18, bottom: 2 },
};
