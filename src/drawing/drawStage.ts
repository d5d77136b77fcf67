import type { StateReadings } from '../readings/readings.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { boundsOfAll } from './bounds.ts';
import { emptyPlacement, placeReadings, refitted, signsOf, type Placement } from './placement.ts';
import { prepareStage, type PreparedStage } from './prepare.ts';
import type { Drawing, Primitive } from './primitives.ts';
import type { Routes } from './scene.ts';
import { badgeWithWords } from './shapes/badges.ts';
import { chevronShapes } from './shapes/chevrons.ts';
import { chipShapes } from './shapes/chips.ts';
import { concernShapes } from './shapes/concerns.ts';
import { signShapes } from './shapes/signs.ts';
import { wantedOf, type Density, type Wanted } from './wanted/wanted.ts';

export type { Density } from './wanted/wanted.ts';
export type { Routes } from './scene.ts';
export type { Placement } from './placement.ts';

export interface ReadingOptions {
  readonly density: Density;
  /** The values have changed since: readings are struck in grey. */
  readonly stale?: boolean;
  /** Places of an earlier drawing, to be kept: nothing moves while a value is dragged. */
  readonly keep?: Placement;
}

export interface DrawOptions extends ReadingOptions {
  /** The lines of the wires, grid units, as the router gives them. */
  readonly routes: Routes;
  /** The state whose values stand at the parts; the base state where left out. */
  readonly state?: string;
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
): StageDrawing => drawReadings(prepareStage(document, options.routes, options.state), readings, options);

const noReadings: Wanted = { chips: [], currents: [], badges: [] };

/** The same where the drawing without its readings is at hand. */
export const drawReadings = (
  { scene, wiring, still, room, dragged }: PreparedStage,
  readings: StateReadings | null,
  options: ReadingOptions,
): StageDrawing => {
  if (readings === null) return drawingOf(still, [], emptyPlacement);
  const wanted = readings.settled ? wantedOf(scene, wiring, readings, options.density) : noReadings;
  const signs = [...signsOf(scene, 'snag', readings.snags), ...signsOf(scene, 'caution', readings.cautions)];
  const placement = options.keep ?? placeReadings(scene, wiring, wanted, signs, room.copy(), dragged);
  const shapes = [
    ...readingShapes(wanted, placement, options.stale === true),
    ...(readings.settled ? [] : concernShapes(scene, readings.concerns)),
    ...signs.flatMap(({ kind, number, part }) => {
      const place = placement.signs.get(`${kind}/${number}`);
      return place === undefined ? [] : signShapes(kind, number, part?.id, place.centre);
    }),
  ];
  return drawingOf([...still, ...shapes], unplacedOf(wanted, placement), placement);
};

const readingShapes = (wanted: Wanted, placement: Placement, stale: boolean): readonly Primitive[] => [
  ...wanted.badges.flatMap((badge) => {
    const place = placement.badges.get(badge.id);
    return place === undefined ? [] : badgeWithWords(badge, place, stale);
  }),
  ...wanted.currents.flatMap((current) => {
    const place = placement.currents.get(current.id);
    return place === undefined ? [] : chevronShapes(current, place, stale);
  }),
  ...wanted.chips.flatMap((chip) => {
    const place = placement.chips.get(chip.id);
    return place === undefined ? [] : chipShapes(chip, refitted(chip, place), stale);
  }),
];

const unplacedOf = (wanted: Wanted, { badges, currents, chips }: Placement): readonly string[] => {
  const without = (
    readings: readonly { readonly id: string; readonly name: string }[],
    places: ReadonlyMap<string, unknown>,
  ) => readings.filter(({ id }) => !places.has(id)).map(({ name }) => name);
  return [
    ...without(wanted.badges, badges),
    ...without(wanted.currents, currents),
    ...without(wanted.chips, chips),
  ];
};

const drawingOf = (
  primitives: readonly Primitive[],
  unplaced: readonly string[],
  placement: Placement,
): StageDrawing => ({ primitives, bounds: boundsOfAll(primitives), unplaced, placement });
