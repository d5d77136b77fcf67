/** The room that the drawing itself takes, before any reading is put on it. */
import type { Box } from '../../../symbols/art.ts';
import { boxOfPoints, grown, type Point } from '../boxes.ts';
import { Occupancy } from '../occupancy.ts';
import type { Scene, ScenePart } from '../scene.ts';
import { pen } from '../symbolShapes.ts';
import { junctionsOf, leadDirection, type Piece } from '../wireGraph.ts';
import { junctionRadius } from '../wires.ts';

/** Owner of the lines of one piece of wiring, and of one lead of a part. */
export const lineOwner = (piece: number): string => `line/${piece}`;
export const leadOwner = (part: ScenePart, pin: string): string => `lead/${pin}/${part.id}`;

/** The stretch from a pin to the body of its part; undefined where the pin lies at the body or has no stroke. */
export const leadOf = (part: ScenePart, pin: string): readonly [Point, Point] | undefined => {
  const at = part.pins.get(pin);
  const direction = leadDirection(part, pin);
  if (at === undefined || direction === undefined || isUndrawn(part, pin)) return undefined;
  const { left, top, right, bottom } = part.body;
  const end: Point =
    direction[0] === 0
      ? [at[0], direction[1] > 0 ? Math.max(top, at[1]) : Math.min(bottom, at[1])]
      : [direction[0] > 0 ? Math.max(left, at[0]) : Math.min(right, at[0]), at[1]];
  return end[0] === at[0] && end[1] === at[1] ? undefined : [at, end];
};

/** A lead drawn only once a wire ends on it: an amplifier's supplies, a transistor's body. */
const isUndrawn = (part: ScenePart, pin: string): boolean =>
  !part.wired.has(pin) &&
  (part.art.whenWired?.[pin] !== undefined || (part.pins.has('gate') && pin === 'body'));

const lineBox = (points: readonly Point[]): Box => grown(boxOfPoints(points), pen / 2);

export const stillRoom = (scene: Scene, wiring: readonly Piece[]): Occupancy => {
  const occupancy = new Occupancy();
  for (const part of scene.parts) {
    occupancy.add(grown(part.body, 1), `part/${part.id}`);
    for (const pin of part.pins.keys()) {
      const lead = leadOf(part, pin);
      if (lead !== undefined) occupancy.add(lineBox(lead), leadOwner(part, pin));
    }
  }
  for (const piece of wiring) {
    for (const { from, to } of piece.stretches) {
      const [a, b] = [piece.vertices[from], piece.vertices[to]];
      if (a !== undefined && b !== undefined) occupancy.add(lineBox([a.at, b.at]), lineOwner(piece.index));
    }
    for (const [x, y] of junctionsOf(piece)) {
      occupancy.add(
        grown({ left: x, top: y, right: x, bottom: y }, junctionRadius),
        `junction/${piece.index}`,
      );
    }
  }
  return occupancy;
};
