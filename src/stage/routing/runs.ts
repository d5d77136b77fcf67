/**
 * What a hand does to one route: drag a run, cut it, put a part into it, close it again. All of it gives corners as a
 * wire's `path` states them, and none of it changes anything.
 */
import { headingBetween, tidied, type GridPoint, type Polyline } from './grid.ts';
import { cornersOf } from './routing.ts';

/** A place on a route. */
export interface OnRoute {
  /** The nearest grid point of the route. */
  readonly at: GridPoint;
  /** Index of the run (straight stretch) it lies on, from 0; at a corner the earlier one. */
  readonly run: number;
  /** Distance from the point asked about to the line itself, grid units. */
  readonly distance: number;
}

/** Nearest place on a route to a point of the sheet, which need not be a grid point. */
export const nearestOnRoute = (line: Polyline, [x, y]: GridPoint): OnRoute | undefined => {
  let nearest: OnRoute | undefined;
  for (let run = 0; run + 1 < line.length; run++) {
    const from = line[run];
    const to = line[run + 1];
    if (from === undefined || to === undefined) continue;
    const onX = Math.min(Math.max(x, Math.min(from[0], to[0])), Math.max(from[0], to[0]));
    const onY = Math.min(Math.max(y, Math.min(from[1], to[1])), Math.max(from[1], to[1]));
    const distance = Math.hypot(onX - x, onY - y);
    if (nearest === undefined || distance < nearest.distance) {
      nearest = { at: [Math.round(onX), Math.round(onY)], run, distance };
    }
  }
  return nearest;
};

/** The wire nearest to a point of the sheet, no farther from it than `within` grid units. */
export const nearestWire = (
  paths: ReadonlyMap<string, Polyline>,
  point: GridPoint,
  within: number,
): (OnRoute & { readonly wire: string }) | undefined => {
  let nearest: (OnRoute & { readonly wire: string }) | undefined;
  for (const [wire, line] of paths) {
    const found = nearestOnRoute(line, point);
    if (found === undefined || found.distance > within) continue;
    if (nearest === undefined || found.distance < nearest.distance) nearest = { ...found, wire };
  }
  return nearest;
};

/**
 * Corners of a route one of whose runs is dragged by so many units across its own direction (down for a level run,
 * right for an upright one). A run that ends on a pin leaves a short lead behind, so that the end stays joined.
 */
export const draggedRun = (line: Polyline, run: number, by: number): readonly GridPoint[] => {
  const from = line[run];
  const to = line[run + 1];
  if (from === undefined || to === undefined || by === 0) return cornersOf(line);
  const heading = headingBetween(from, to);
  if (heading === null) return cornersOf(line);
  const level = heading === 0 || heading === 2;
  const shift = ([x, y]: GridPoint): GridPoint => (level ? [x, y + by] : [x + by, y]);
  const long = Math.abs(to[0] - from[0]) + Math.abs(to[1] - from[1]);
  const step: GridPoint = [Math.sign(to[0] - from[0]), Math.sign(to[1] - from[1])];
  // A lead of one unit at an end, where the run is long enough to leave something between its leads.
  const lead = long >= 3 ? 1 : 0;
  const before: GridPoint[] = line.slice(0, run + 1);
  const after: GridPoint[] = line.slice(run + 1);
  if (run === 0 && lead > 0) before.push([from[0] + step[0] * lead, from[1] + step[1] * lead]);
  if (run === line.length - 2 && lead > 0) after.unshift([to[0] - step[0] * lead, to[1] - step[1] * lead]);
  const start = before.at(-1) ?? from;
  const end = after[0] ?? to;
  // A corner between two other runs moves with the run; an end (or its lead) stays and gets a corner beside it.
  const keepStart = run === 0;
  const keepEnd = run === line.length - 2;
  const points = [
    ...(keepStart ? before : before.slice(0, -1)),
    shift(start),
    shift(end),
    ...(keepEnd ? after : after.slice(1)),
  ];
  return cornersOf(tidied(points));
};

export interface CutRoute {
  /** Corners from the route's first end to the cut. */
  readonly before: readonly GridPoint[];
  /** Corners from the cut to its last end. */
  readonly after: readonly GridPoint[];
}

/** A route cut at one of its points, for a joint to be put there; undefined where the point is not on it. */
export const cutAt = (line: Polyline, point: GridPoint): CutRoute | undefined => {
  for (let run = 0; run + 1 < line.length; run++) {
    const from = line[run];
    const to = line[run + 1];
    if (from === undefined || to === undefined || !isBetween(from, point, to)) continue;
    return {
      before: cornersOf(tidied([...line.slice(0, run + 1), point])),
      after: cornersOf(tidied([point, ...line.slice(run + 1)])),
    };
  }
  return undefined;
};

export interface Insertion extends CutRoute {
  /** Which of the two pins takes the wire's first end; the other takes its last. */
  readonly first: 'a' | 'b';
}

/**
 * Whether a two-pin part whose pins lie at `a` and `b` is in line with one run of a route, and how it then takes the
 * route apart. Undefined where it is not: the pins must both lie on that run.
 */
export const insertionInto = (line: Polyline, a: GridPoint, b: GridPoint): Insertion | undefined => {
  for (let run = 0; run + 1 < line.length; run++) {
    const from = line[run];
    const to = line[run + 1];
    if (from === undefined || to === undefined) continue;
    if (!isBetween(from, a, to) || !isBetween(from, b, to)) continue;
    const away = ([x, y]: GridPoint): number => Math.abs(x - from[0]) + Math.abs(y - from[1]);
    const first = away(a) <= away(b) ? 'a' : 'b';
    const [near, far] = first === 'a' ? [a, b] : [b, a];
    const before = tidied([...line.slice(0, run + 1), near]);
    const after = tidied([far, ...line.slice(run + 1)]);
    return { first, before: cornersOf(before), after: cornersOf(after) };
  }
  return undefined;
};

/**
 * Corners of the one wire that closes the gap which a removed part leaves: `first` runs to one of its pins and
 * `second` on from the other. The gap is closed straight, or by an L where the pins were not in line.
 */
export const healedPath = (first: Polyline, second: Polyline): readonly GridPoint[] => {
  const end = first.at(-1);
  const start = second[0];
  if (end === undefined || start === undefined) return [];
  const slanted = end[0] !== start[0] && end[1] !== start[1];
  const points = [...first, ...(slanted ? ([[start[0], end[1]]] as const) : []), ...second];
  return cornersOf(tidied(points));
};

/** Whether a point lies on the level or upright line between two others. */
const isBetween = (from: GridPoint, point: GridPoint, to: GridPoint): boolean =>
  (from[1] === to[1] && point[1] === from[1] && (point[0] - from[0]) * (point[0] - to[0]) <= 0) ||
  (from[0] === to[0] && point[0] === from[0] && (point[1] - from[1]) * (point[1] - to[1]) <= 0);
