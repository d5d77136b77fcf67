import type { PathCommand, UprightMark } from './art.ts';

/** Strokes of the marks that stay upright, about their own centre, pixels. */
export const markStrokes: Readonly<Record<UprightMark, readonly PathCommand[]>> = {
  plus: [
    ['M', -3.5, 0],
    ['L', 3.5, 0],
    ['M', 0, -3.5],
    ['L', 0, 3.5],
  ],
  minus: [
    ['M', -3.5, 0],
    ['L', 3.5, 0],
  ],
  sine: [
    ['M', -8.5, 0],
    ['C', -6.5, -9.5, -2.2, -9.5, 0, 0],
    ['C', 2.2, 9.5, 6.5, 9.5, 8.5, 0],
  ],
  'letter-m': [
    ['M', -5.5, 6],
    ['L', -5.5, -6],
    ['L', 0, 2.5],
    ['L', 5.5, -6],
    ['L', 5.5, 6],
  ],
  step: [
    ['M', -10, 6],
    ['L', -3.5, 6],
    ['L', -3.5, -6],
    ['L', 3.5, -6],
    ['L', 3.5, 6],
    ['L', 10, 6],
  ],
};
