import { unit } from '../../symbols/pen.ts';
import { inState } from '../stage/states.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import type { Point } from './boxes.ts';
import { labelShapes, placeLabels } from './lettering/labels.ts';
import type { Occupancy } from './occupancy.ts';
import type { Dragged } from './placement.ts';
import { stillRoom } from './places/still.ts';
import type { Primitive } from './primitives.ts';
import { sceneOf, type Routes, type Scene } from './scene.ts';
import { symbolShapes } from './symbolShapes.ts';
import { wiringOf, type Piece } from './wireGraph.ts';
import { junctionShapes, wireShapes } from './wires.ts';

/** A stage as it is drawn before any reading: good for as long as the document and its routes stay the same. */
export interface PreparedStage {
  readonly scene: Scene;
  readonly wiring: readonly Piece[];
  /** Symbols, wires, junctions, names and values. */
  readonly still: readonly Primitive[];
  /** The room they take. Copied before readings are put into it. */
  readonly room: Occupancy;
  readonly dragged: Dragged;
}

/** @param state the state whose values stand at the parts; the base state where left out. */
export const prepareStage = (document: StageDocument, routes: Routes, state?: string): PreparedStage => {
  const shown = state === undefined ? document : (inState(document, state) ?? document);
  const scene = sceneOf(shown, routes);
  return prepareScene(scene, draggedOf(document, scene));
};

/** The same for anything that can be drawn, a document or not. */
export const prepareScene = (scene: Scene, dragged: Dragged = new Map()): PreparedStage => {
  const wiring = wiringOf(scene);
  const room = stillRoom(scene, wiring);
  const labels = placeLabels(scene, room);
  const still = [
    ...wireShapes(wiring),
    ...scene.parts.flatMap((part) => symbolShapes(part.id, part.art, part.origin, part.stance, part.wired)),
    ...junctionShapes(wiring),
    ...labelShapes(labels),
  ];
  return { scene, wiring, still, room, dragged };
};

/**
 * Places that the file keeps, in pixels on the sheet. A chip's key is the pin that names its node, `Q1.drain`, and
 * its offset goes from that pin to the chip's middle; a badge's key is its part, and the offset goes from the part's
 * place to the badge's upper left corner.
 */
const draggedOf = (document: StageDocument, scene: Scene): Dragged => {
  const dragged = new Map<string, Point>();
  for (const [key, [x, y]] of Object.entries(document.view?.chips ?? {})) {
    const [name, pin] = key.split('.');
    const part = scene.parts.find((candidate) => candidate.key === name);
    const from = pin === undefined ? part?.origin : part?.pins.get(pin);
    if (from !== undefined) dragged.set(key, [from[0] + x * unit, from[1] + y * unit]);
  }
  return dragged;
};
