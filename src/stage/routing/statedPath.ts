import { samePoint, tidied, type GridPoint, type Polyline } from './grid.ts';

/** Which way a corner gives way when the end next to it has moved: along the run that it shares with its neighbour. */
const follow = (end: GridPoint, corner: GridPoint, neighbour: GridPoint): GridPoint => {
  if (end[0] === corner[0] || end[1] === corner[1]) return corner;
  // The run on to the neighbour is upright: slide along it to the end's row. Level: to the end's column.
  return corner[0] === neighbour[0] ? [corner[0], end[1]] : [end[0], corner[1]];
};

/**
 * A wire's stated corners between its two ends as they lie now. Where an end has moved, the run next to it slides
 * along, so that the rest of the path stays as it was put; whatever is still slanted gets a corner of its own.
 */
export const statedRoute = (start: GridPoint, corners: readonly GridPoint[], end: GridPoint): Polyline => {
  const points = [...corners];
  const [first] = points;
  if (first === undefined) return squared([start, end]);
  if (points.length === 1) {
    const inLine = (point: GridPoint): boolean =>
      (point[0] === start[0] || point[1] === start[1]) && (point[0] === end[0] || point[1] === end[1]);
    if (!inLine(first)) points[0] = nearerCorner(start, first, end);
  } else {
    points[0] = follow(start, first, points[1] ?? end);
    const last = points.length - 1;
    points[last] = follow(end, points[last] ?? end, points[last - 1] ?? start);
  }
  return squared([start, ...points, end]);
};

/** Of the two corners of an L between two ends, the one that keeps the run which has not moved, else the nearer. */
const nearerCorner = (start: GridPoint, corner: GridPoint, end: GridPoint): GridPoint => {
  const upFirst: GridPoint = [start[0], end[1]];
  const acrossFirst: GridPoint = [end[0], start[1]];
  if (corner[0] === start[0] || corner[1] === end[1]) return upFirst;
  if (corner[1] === start[1] || corner[0] === end[0]) return acrossFirst;
  const away = (point: GridPoint): number => Math.abs(point[0] - corner[0]) + Math.abs(point[1] - corner[1]);
  return away(upFirst) < away(acrossFirst) ? upFirst : acrossFirst;
};

/** The line with a corner put into every slanted stretch, going on first the way it came. */
const squared = (line: Polyline): Polyline => {
  const points: GridPoint[] = [];
  for (const point of line) {
    const last = points.at(-1);
    if (last !== undefined && last[0] !== point[0] && last[1] !== point[1]) {
      const before = points.at(-2);
      const upright = before !== undefined && !samePoint(before, last) && before[0] === last[0];
      points.push(upright ? [last[0], point[1]] : [point[0], last[1]]);
    }
    points.push(point);
  }
  return tidied(points);
};
