import type { StateReadings } from '../readings/readings.ts';
import { inState } from '../stage/states.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { unit } from '../../symbols/pen.ts';
import { boundsOfAll } from './bounds.ts';
import type { Point } from './boxes.ts';
import { labelShapes, placeLabels } from './lettering/labels.ts';
import {
  emptyPlacement,
  placeReadings,
  refitted,
  signsOf,
  type Dragged,
  type Placement,
} from './placement.ts';
import { stillRoom } from './places/still.ts';
import type { Drawing, Primitive } from './primitives.ts';
import { sceneOf, type Routes, type Scene } from './scene.ts';
import { badgeWithWords } from './shapes/badges.ts';
import { chevronShapes } from './shapes/chevrons.ts';
import { chipShapes } from './shapes/chips.ts';
import { concernShapes } from './shapes/concerns.ts';
import { signShapes } from './shapes/signs.ts';
import { symbolShapes } from './symbolShapes.ts';
import { wantedOf, type Density, type Wanted } from './wanted/wanted.ts';
import { wiringOf } from './wireGraph.ts';
import { junctionShapes, wireShapes } from './wires.ts';

export type { Density } from './wanted/wanted.ts';
export type { Routes } from './scene.ts';
export type { Placement } from './placement.ts';

export interface DrawOptions {
  readonly density: Density;
  /** The lines of the wires, grid units, as the router gives them. */
  readonly routes: Routes;
  /** The state whose values stand at the parts; the base state where left out. */
  readonly state?: string;
  /** The values have changed since: readings are struck in grey. */
  readonly stale?: boolean;
  /** Places of an earlier drawing, to be kept: nothing moves while a value is dragged. */
  readonly keep?: Placement;
}

export interface StageDrawing extends Drawing {
  /** Where the readings went, for a later call to keep. */
  readonly placement: Placement;
}

/**
 * All there is to see of a stage in one state: symbols, wires, names, and the readings with it where there are any.
 * Pure; the same document and readings give the same drawing.
 * @param readings null where nothing has been settled
 */
export const drawStage = (
  document: StageDocument,
  readings: StateReadings | null,
  options: DrawOptions,
): StageDrawing => {
  const shown = options.state === undefined ? document : (inState(document, options.state) ?? document);
  const scene = sceneOf(shown, options.routes);
  return drawScene(scene, readings, options, draggedOf(document, scene));
};

/** The same for anything that can be drawn, a document or not. */
export const drawScene = (
  scene: Scene,
  readings: StateReadings | null,
  options: Pick<DrawOptions, 'density' | 'stale' | 'keep'>,
  dragged: Dragged = new Map(),
): StageDrawing => {
  const wiring = wiringOf(scene);
  const occupancy = stillRoom(scene, wiring);
  const labels = placeLabels(scene, occupancy);
  const still = [
    ...wireShapes(scene),
    ...scene.parts.flatMap((part) => symbolShapes(part.id, part.art, part.origin, part.stance, part.wired)),
    ...junctionShapes(wiring),
    ...labelShapes(labels),
  ];
  if (readings === null) return drawingOf(still, [], emptyPlacement);

  const nothing: Wanted = { chips: [], currents: [], badges: [] };
  const wanted = readings.settled ? wantedOf(scene, wiring, readings, options.density) : nothing;
  const signs = [...signsOf(scene, 'snag', readings.snags), ...signsOf(scene, 'caution', readings.cautions)];
  const placement = options.keep ?? placeReadings(scene, wiring, wanted, signs, occupancy, dragged);
  const shapes = [
    ...(readings.settled ? settledShapes(wanted, placement, options.stale === true) : []),
    ...(readings.settled ? [] : concernShapes(scene, readings.concerns)),
    ...signs.flatMap(({ kind, number, part }) => {
      const place = placement.signs.get(`${kind}/${number}`);
      return place === undefined ? [] : signShapes(kind, number, part?.id, place.centre);
    }),
  ];
  return drawingOf([...still, ...shapes], unplacedOf(wanted, placement), placement);
};

const settledShapes = (wanted: Wanted, placement: Placement, stale: boolean): readonly Primitive[] => [
  ...wanted.badges.flatMap((badge) => {
    const place = placement.badges.get(`badge/${badge.part.id}`);
    return place === undefined ? [] : badgeWithWords(badge, place, stale);
  }),
  ...wanted.currents.flatMap((current) => {
    const place = placement.currents.get(`current/${current.name}`);
    return place === undefined ? [] : chevronShapes(current, place, stale);
  }),
  ...wanted.chips.flatMap((chip) => {
    const place = placement.chips.get(`chip/${chip.name}`);
    return place === undefined ? [] : chipShapes(chip, refitted(chip, place), stale);
  }),
];

const unplacedOf = (wanted: Wanted, { badges, currents, chips }: Placement): readonly string[] => [
  ...wanted.badges.filter(({ part }) => !badges.has(`badge/${part.id}`)).map(({ name }) => name),
  ...wanted.currents.map(({ name }) => name).filter((name) => !currents.has(`current/${name}`)),
  ...wanted.chips.map(({ name }) => name).filter((name) => !chips.has(`chip/${name}`)),
];

const drawingOf = (
  primitives: readonly Primitive[],
  unplaced: readonly string[],
  placement: Placement,
): StageDrawing => ({ primitives, bounds: boundsOfAll(primitives), unplaced, placement });

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
