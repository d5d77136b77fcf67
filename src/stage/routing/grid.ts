/** A point of the sheet in whole grid units, x right, y down. */
export type GridPoint = readonly [number, number];

/** A run of points joined by straight lines; in a finished route every line is level or upright. */
export type Polyline = readonly GridPoint[];

/** A box in grid units. Sides may be fractions: a symbol's body seldom ends on the grid. */
export interface GridBox {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** Pixels at 100 % to a grid unit. */
export const unit = 12;

/** The four ways along the grid, in the order in which they are numbered: right, down, left, up. */
export const headings: readonly GridPoint[] = [
  [1, 0],
  [0, 1],
  [-1, 0],
  [0, -1],
];

export type Heading = 0 | 1 | 2 | 3;

export const samePoint = (a: GridPoint, b: GridPoint): boolean => a[0] === b[0] && a[1] === b[1];

export const boxesOverlap = (a: GridBox, b: GridBox): boolean =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

export const boxAround = (boxes: Iterable<GridBox>): GridBox | undefined => {
  let around: GridBox | undefined;
  for (const box of boxes) {
    around =
      around === undefined
        ? box
        : {
            left: Math.min(around.left, box.left),
            top: Math.min(around.top, box.top),
            right: Math.max(around.right, box.right),
            bottom: Math.max(around.bottom, box.bottom),
          };
  }
  return around;
};

/** The heading from one point to another on the same row or column; null for one and the same or a slanted pair. */
export const headingBetween = (from: GridPoint, to: GridPoint): Heading | null => {
  if (from[1] === to[1]) return to[0] > from[0] ? 0 : to[0] < from[0] ? 2 : null;
  if (from[0] === to[0]) return to[1] > from[1] ? 1 : 3;
  return null;
};

/** Length along the lines of a right-angled polyline, grid units. */
export const lengthOf = (line: Polyline): number => {
  let length = 0;
  for (let index = 1; index < line.length; index++) {
    const [ax, ay] = line[index - 1] ?? [0, 0];
    const [bx, by] = line[index] ?? [0, 0];
    length += Math.abs(bx - ax) + Math.abs(by - ay);
  }
  return length;
};

/**
 * The same line without repeated points, points in the middle of a straight stretch, and stretches run there and
 * back. Both ends stay, so a line of no length comes out as its two equal ends.
 */
export const tidied = (line: Polyline): Polyline => {
  const kept: GridPoint[] = [];
  for (const point of line) {
    let last = kept.at(-1);
    if (last !== undefined && samePoint(last, point)) continue;
    for (let before = kept.at(-2); last !== undefined && before !== undefined; before = kept.at(-2)) {
      const level = before[1] === last[1] && last[1] === point[1];
      const upright = before[0] === last[0] && last[0] === point[0];
      if (!level && !upright) break;
      kept.pop();
      last = before;
    }
    if (last === undefined || !samePoint(last, point)) kept.push(point);
  }
  const [first] = line;
  const end = line.at(-1);
  if (first === undefined || end === undefined) return [];
  return kept.length > 1 ? kept : [first, end];
};

/** Every grid point along a right-angled polyline, both ends included, corners once. */
export const pointsAlong = (line: Polyline): GridPoint[] => {
  const points: GridPoint[] = [];
  for (let index = 1; index < line.length; index++) {
    const from = line[index - 1];
    const to = line[index];
    if (from === undefined || to === undefined) continue;
    const stepX = Math.sign(to[0] - from[0]);
    const stepY = Math.sign(to[1] - from[1]);
    const count = Math.abs(to[0] - from[0]) + Math.abs(to[1] - from[1]);
    for (let step = points.length === 0 ? 0 : 1; step <= count; step++) {
      points.push([from[0] + stepX * step, from[1] + stepY * step]);
    }
  }
  return points;
};
