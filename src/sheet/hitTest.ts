/** What lies under a point of the sheet. Pure: by the drawing's own boxes and lines, no canvas asked. */
import type { Box } from '../../symbols/art.ts';
import { boundsOf } from '../drawing/bounds.ts';
import { boxOfPoints, grown, overlap, union } from '../drawing/boxes.ts';
import type { PreparedStage } from '../drawing/prepare.ts';
import type { ScenePart } from '../drawing/scene.ts';
import type { Point } from './viewport.ts';

export type Hit =
  | { readonly what: 'value'; readonly part: string }
  | { readonly what: 'part'; readonly part: string }
  | { readonly what: 'wire'; readonly wire: string };

/** A part with its leads. */
export const reachOf = ({ body, pins }: ScenePart): Box =>
  union([body, boxOfPoints([...pins.values()])]) ?? body;

/** A part with what is written at it, leads left out. */
export const faceOf = ({ still }: Pick<PreparedStage, 'still'>, part: ScenePart): Box => {
  const texts = still.filter(({ of, kind }) => of === part.id && kind === 'text').map(boundsOf);
  return union([part.body, ...texts]) ?? part.body;
};

const inside = (box: Box, [x, y]: Point): boolean =>
  box.left <= x && x <= box.right && box.top <= y && y <= box.bottom;

const distanceToRun = ([x, y]: Point, [ax, ay]: Point, [bx, by]: Point): number => {
  const length = (bx - ax) ** 2 + (by - ay) ** 2;
  const along =
    length === 0 ? 0 : Math.min(1, Math.max(0, ((x - ax) * (bx - ax) + (y - ay) * (by - ay)) / length));
  return Math.hypot(x - ax - along * (bx - ax), y - ay - along * (by - ay));
};

/**
 * A value before the part it stands at, a part before a wire, and of two parts the one whose middle is nearer.
 * @param reach how far beside a thing a pointer may be, pixels of the sheet
 */
export const hitTest = ({ scene, still }: PreparedStage, point: Point, reach: number): Hit | null => {
  for (const primitive of still) {
    if (primitive.kind !== 'text' || primitive.of === undefined) continue;
    if (primitive.thing !== 'value' && primitive.thing !== 'name') continue;
    if (!inside(grown(boundsOf(primitive), reach / 2), point)) continue;
    return { what: primitive.thing === 'value' ? 'value' : 'part', part: primitive.of };
  }
  let nearest: { readonly part: string; readonly distance: number } | null = null;
  for (const part of scene.parts) {
    if (!inside(grown(reachOf(part), reach), point)) continue;
    const distance = Math.hypot(point[0] - part.origin[0], point[1] - part.origin[1]);
    if (nearest === null || distance < nearest.distance) nearest = { part: part.id, distance };
  }
  if (nearest !== null) return { what: 'part', part: nearest.part };
  for (const { id, points } of scene.wires) {
    for (const [index, from] of points.entries()) {
      const to = points[index + 1];
      if (to !== undefined && distanceToRun(point, from, to) <= reach) return { what: 'wire', wire: id };
    }
  }
  return null;
};

/** Parts whose bodies a frame touches, and wires that lie in it whole. */
export const within = ({ scene }: PreparedStage, frame: Box): readonly string[] => [
  ...scene.parts.filter(({ body }) => overlap(body, frame)).map(({ id }) => id),
  ...scene.wires.filter(({ points }) => points.every((point) => inside(frame, point))).map(({ id }) => id),
];
