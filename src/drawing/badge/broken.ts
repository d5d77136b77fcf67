/** A heavy curve broken into dots or dashes, as shapes of its own, so that every pen draws the pattern alike. */
import type { PathCommand } from '../../../symbols/art.ts';
import type { Point } from '../boxes.ts';

const dotPitch = 4.7;
const dash = 4.4;
const gap = 2.4;

/** Points along a path of lines and cubics, close enough together that straight lines between them pass for it. */
export const sampled = (commands: readonly PathCommand[]): readonly Point[] => {
  const points: Point[] = [];
  let [x, y]: Point = [0, 0];
  for (const command of commands) {
    if (command[0] === 'C') {
      const [, ax, ay, bx, by, ex, ey] = command;
      for (let step = 1; step <= 24; step++) {
        const t = step / 24;
        const s = 1 - t;
        points.push([
          s ** 3 * x + 3 * s * s * t * ax + 3 * s * t * t * bx + t ** 3 * ex,
          s ** 3 * y + 3 * s * s * t * ay + 3 * s * t * t * by + t ** 3 * ey,
        ]);
      }
      [x, y] = [ex, ey];
    } else if (command[0] !== 'Z') {
      [, x, y] = command;
      points.push([x, y]);
    }
  }
  return points;
};

const lengthOf = (points: readonly Point[]): number =>
  points.slice(1).reduce((sum, point, index) => {
    const before = points[index] ?? point;
    return sum + Math.hypot(point[0] - before[0], point[1] - before[1]);
  }, 0);

/** The point a given way along, and the unit direction there. */
const along = (points: readonly Point[], way: number): { readonly at: Point; readonly direction: Point } => {
  let left = way;
  for (let index = 1; index < points.length; index++) {
    const [a, b] = [points[index - 1] ?? [0, 0], points[index] ?? [0, 0]];
    const length = Math.hypot(b[0] - a[0], b[1] - a[1]);
    if (length > 0 && (left <= length || index === points.length - 1)) {
      const direction: Point = [(b[0] - a[0]) / length, (b[1] - a[1]) / length];
      return { at: [a[0] + direction[0] * left, a[1] + direction[1] * left], direction };
    }
    left -= length;
  }
  return { at: points[0] ?? [0, 0], direction: [1, 0] };
};

/** Centres of the dots of a weak heavy part, from its start; the last ones give way to the dot at the far end. */
export const dotCentres = (points: readonly Point[]): readonly Point[] => {
  const whole = lengthOf(points);
  const centres: Point[] = [];
  for (let way = 0; way < whole - 1; way += dotPitch) centres.push(along(points, way).at);
  return centres;
};

/** The dashes of a moderate heavy part, each the outline of a bar `width` thick. */
export const dashOutlines = (points: readonly Point[], width: number): readonly (readonly Point[])[] => {
  const whole = lengthOf(points);
  const outlines: (readonly Point[])[] = [];
  for (let way = 0; way < whole; way += dash + gap) {
    const stops = [0, 1, 2, 3, 4].map((step) => Math.min(way + (step * dash) / 4, whole));
    const sides = stops.map((stop) => {
      const { at, direction } = along(points, stop);
      const [nx, ny] = [(-direction[1] * width) / 2, (direction[0] * width) / 2];
      return { left: [at[0] + nx, at[1] + ny] as Point, right: [at[0] - nx, at[1] - ny] as Point };
    });
    outlines.push([...sides.map(({ left }) => left), ...sides.map(({ right }) => right).reverse()]);
  }
  return outlines;
};
