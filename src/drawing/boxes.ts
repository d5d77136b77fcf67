import type { Box } from '../../symbols/art.ts';

export type Point = readonly [number, number];

export const boxAt = (x: number, y: number, width: number, height: number): Box => ({
  left: x,
  top: y,
  right: x + width,
  bottom: y + height,
});

export const centredBox = ([x, y]: Point, width: number, height: number): Box =>
  boxAt(x - width / 2, y - height / 2, width, height);

export const grown = (box: Box, by: number): Box => ({
  left: box.left - by,
  top: box.top - by,
  right: box.right + by,
  bottom: box.bottom + by,
});

export const moved = (box: Box, [x, y]: Point): Box => ({
  left: box.left + x,
  top: box.top + y,
  right: box.right + x,
  bottom: box.bottom + y,
});

/** Boxes that merely touch do not overlap. */
export const overlap = (a: Box, b: Box): boolean =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

export const holds = (outer: Box, inner: Box): boolean =>
  outer.left <= inner.left &&
  outer.top <= inner.top &&
  outer.right >= inner.right &&
  outer.bottom >= inner.bottom;

/** The smallest distance between two boxes; 0 where they touch or overlap. */
export const distance = (a: Box, b: Box): number =>
  Math.hypot(
    Math.max(0, a.left - b.right, b.left - a.right),
    Math.max(0, a.top - b.bottom, b.top - a.bottom),
  );

export const union = (boxes: Iterable<Box>): Box | undefined => {
  let [left, top, right, bottom] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const box of boxes) {
    left = Math.min(left, box.left);
    top = Math.min(top, box.top);
    right = Math.max(right, box.right);
    bottom = Math.max(bottom, box.bottom);
  }
  return left <= right ? { left, top, right, bottom } : undefined;
};

export const boxOfPoints = (points: readonly Point[]): Box => {
  const [xs, ys] = [points.map(([x]) => x), points.map(([, y]) => y)];
  return { left: Math.min(...xs), top: Math.min(...ys), right: Math.max(...xs), bottom: Math.max(...ys) };
};

export const middle = (box: Box): Point => [(box.left + box.right) / 2, (box.top + box.bottom) / 2];
