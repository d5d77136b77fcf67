import type { SymbolArt } from './art.ts';
import { around, circle, leads, twoPins } from './pen.ts';

/** A supply that is there for its signal: one period of a sine in the round body. */
export const signalSource: SymbolArt = {
  pins: twoPins('plus', 'minus'),
  shapes: [...leads(15), circle(0, 0, 15), { shape: 'upright', mark: 'sine', x: 0, y: 0 }],
  body: around(15, 15),
};
