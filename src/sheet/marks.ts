/** What is drawn under the stage: ticks of the grid at the edges, the selection, the wash behind the edited part. */
import type { Box } from '../../symbols/art.ts';
import { unit } from '../../symbols/pen.ts';
import { grown } from '../drawing/boxes.ts';
import { polyline, roundedBox } from '../drawing/paths.ts';
import type { PreparedStage } from '../drawing/prepare.ts';
import type { PathPrimitive } from '../drawing/primitives.ts';
import { faceOf, reachOf } from './hitTest.ts';
import { apply, invert, type Point, type Size, type Viewport } from './viewport.ts';

const mark = (id: string, commands: PathPrimitive['commands']) =>
  ({ kind: 'path', id, layer: 'still', thing: 'frame', commands, width: 1 }) as const;

/** Box of the wash behind a part that is edited, sheet pixels. */
export const washBox = (prepared: PreparedStage, part: string): Box | undefined => {
  const found = prepared.scene.partOf.get(part);
  return found === undefined ? undefined : grown(faceOf(prepared, found), 9);
};

export const selectionMarks = (
  prepared: PreparedStage,
  selection: ReadonlySet<string>,
  edited: string | null,
): readonly PathPrimitive[] => {
  const wash = edited === null ? undefined : washBox(prepared, edited);
  const marks: PathPrimitive[] =
    wash === undefined ? [] : [{ ...mark('edited', roundedBox(wash, 3)), fill: 'wash' }];
  for (const { id, points } of prepared.scene.wires) {
    if (!selection.has(id)) continue;
    marks.push({ ...mark(`selected/${id}`, polyline(points)), stroke: 'ink', width: 11 });
    marks.push({ ...mark(`selected/${id}/wash`, polyline(points)), stroke: 'wash', width: 8 });
  }
  for (const part of prepared.scene.parts) {
    if (!selection.has(part.id) || part.id === edited) continue;
    const outline = roundedBox(grown(reachOf(part), 6), 3);
    marks.push({ ...mark(`selected/${part.id}`, outline), stroke: 'ink', fill: 'wash', width: 1.5 });
  }
  return marks;
};

/** The frame that selects, while it is drawn. */
export const frameMark = (frame: Box, scale: number): PathPrimitive => ({
  ...mark('frame', roundedBox(frame, 0)),
  stroke: 'ink',
  width: 1 / scale,
  dash: [4 / scale, 3 / scale],
});

/** Closest that ticks may stand on the screen, pixels; closer ones are left to every fifth. */
const closest = 7;

/** Short ticks along the four edges where the grid's lines meet them, a longer one every fifth. Screen pixels. */
export const tickMarks = (viewport: Viewport, { width, height }: Size): PathPrimitive => {
  const pitch = unit * viewport.scale;
  let step = 1;
  while (pitch * step < closest) step *= 5;
  const [left, top] = invert(viewport, [0, 0]);
  const [right, bottom] = invert(viewport, [width, height]);
  const lines: Point[][] = [];
  for (let x = Math.ceil(left / unit / step) * step; x * unit < right; x += step) {
    const at = Math.round(apply(viewport, [x * unit, 0])[0]) + 0.5;
    const long = x % (5 * step) === 0 ? 8 : 4;
    lines.push(
      [
        [at, 0],
        [at, long],
      ],
      [
        [at, height - long],
        [at, height],
      ],
    );
  }
  for (let y = Math.ceil(top / unit / step) * step; y * unit < bottom; y += step) {
    const at = Math.round(apply(viewport, [0, y * unit])[1]) + 0.5;
    const long = y % (5 * step) === 0 ? 8 : 4;
    lines.push(
      [
        [0, at],
        [long, at],
      ],
      [
        [width - long, at],
        [width, at],
      ],
    );
  }
  return { ...mark('ticks', lines.flatMap(polyline)), stroke: 'tick' };
};
