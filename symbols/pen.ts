import type { Box, PathCommand, SymbolShape } from './art.ts';

/** The few strokes every symbol is made of, so that all share one rhythm. */
type Point = readonly [number, number];
type Fill = 'none' | 'paper' | 'ink';

/** Control length of the cubic that stands for a quarter circle of radius 1: 4/3·(√2 − 1). */
export const quarterArc = 0.5522847498;

/** One grid unit in pixels at 100 %. */
export const unit = 12;

/** Pins of every two-pin part lie this far from its origin, pixels. */
export const reach = 3 * unit;

export const line = (...points: readonly Point[]): SymbolShape => ({
  shape: 'path',
  commands: points.map(([x, y], index): PathCommand => (index === 0 ? ['M', x, y] : ['L', x, y])),
  fill: 'none',
});

export const polygon = (fill: Fill, ...points: readonly Point[]): SymbolShape => ({
  shape: 'path',
  commands: [...points.map(([x, y], index): PathCommand => (index === 0 ? ['M', x, y] : ['L', x, y])), ['Z']],
  fill,
});

export const rectangle = ({ left, top, right, bottom }: Box): SymbolShape =>
  polygon('paper', [left, top], [right, top], [right, bottom], [left, bottom]);

export const circle = (x: number, y: number, radius: number, fill: Fill = 'paper'): SymbolShape => ({
  shape: 'circle',
  x,
  y,
  radius,
  fill,
});

/** A box about the origin. */
export const around = (halfWidth: number, halfHeight: number): Box => ({
  left: -halfWidth,
  top: -halfHeight,
  right: halfWidth,
  bottom: halfHeight,
});

/** A solid arrowhead 8 long and 8 wide, its point at `tip`, pointing along `direction`. */
export const arrowhead = (tip: Point, direction: Point): SymbolShape => {
  const length = Math.hypot(...direction);
  const [x, y] = [direction[0] / length, direction[1] / length];
  const [baseX, baseY] = [tip[0] - 8 * x, tip[1] - 8 * y];
  return polygon('ink', tip, [baseX - 4 * y, baseY + 4 * x], [baseX + 4 * y, baseY - 4 * x]);
};

/** Leads of a lying two-pin part whose body ends at ±`edge`. */
export const leads = (edge: number): readonly SymbolShape[] => [
  line([-reach, 0], [-edge, 0]),
  line([edge, 0], [reach, 0]),
];

/** Pins of a lying two-pin part, the first on the left. */
export const twoPins = (
  first: string,
  second: string,
): Readonly<Record<string, readonly [number, number]>> => ({
  [first]: [-3, 0],
  [second]: [3, 0],
});
