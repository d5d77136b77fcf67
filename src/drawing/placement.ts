/** Every reading that is wanted gets a place, or is told to have none. */
import type { Notice } from '../readings/readings.ts';
import { middle, type Point } from './boxes.ts';
import type { Occupancy } from './occupancy.ts';
import { badgeSeeker, type SoughtBadge } from './places/badgeSeekers.ts';
import { chevronPlaces, type ChevronPlace } from './places/chevronPlaces.ts';
import { chipPlaces, chipWidth, draggedChipPlace, type ChipPlace } from './places/chipPlaces.ts';
import { looseSignPlaces, signPlaces, type SignPlace } from './places/signPlaces.ts';
import { solvePlaces, type Seeker } from './places/solve.ts';
import type { Scene, ScenePart } from './scene.ts';
import type { SignKind } from './shapes/signs.ts';
import type { Wanted } from './wanted/wanted.ts';
import type { Piece } from './wireGraph.ts';

export interface WantedSign {
  readonly kind: SignKind;
  /** Place in its list, from 1. */
  readonly number: number;
  readonly part: ScenePart | undefined;
}

/** Places by the ids of the readings: `chip/p3.drain`, `current/p4`, `badge/p3`, `snag/1`. */
export interface Placement {
  readonly chips: ReadonlyMap<string, ChipPlace>;
  readonly currents: ReadonlyMap<string, ChevronPlace>;
  readonly badges: ReadonlyMap<string, SoughtBadge>;
  readonly signs: ReadonlyMap<string, SignPlace>;
}

export const emptyPlacement: Placement = {
  chips: new Map(),
  currents: new Map(),
  badges: new Map(),
  signs: new Map(),
};

/** Where a person dragged a reading: of a chip its middle, of a badge its upper left corner, pixels on the sheet. */
export type Dragged = ReadonlyMap<string, Point>;

export const signsOf = (scene: Scene, kind: SignKind, notices: readonly Notice[]): readonly WantedSign[] =>
  notices.map(({ parts }, index) => {
    const [first] = parts;
    return {
      kind,
      number: index + 1,
      part: scene.parts.find(({ key, id }) => key === first || id === first),
    };
  });

/** Badges first, as they need the most room, then signs, then chips and currents together. Takes the room. */
export const placeReadings = (
  scene: Scene,
  wiring: readonly Piece[],
  wanted: Wanted,
  signs: readonly WantedSign[],
  occupancy: Occupancy,
  dragged: Dragged,
): Placement => {
  const badges = solvePlaces(
    wanted.badges.map((badge) => badgeSeeker(badge, occupancy, dragged.get(badge.name))),
    occupancy,
  );
  const placedSigns = solvePlaces(
    signs.map((sign) => ({
      id: `${sign.kind}/${sign.number}`,
      places: placesOfSign(sign, scene, occupancy),
    })),
    occupancy,
  );
  const seekers: Seeker<ChipPlace | ChevronPlace>[] = [
    ...wanted.chips.map((chip) => {
      const to = dragged.get(chip.name);
      const place = to === undefined ? undefined : draggedChipPlace(chip, to);
      if (place !== undefined) return { id: chip.id, places: [place], fixed: true };
      return { id: chip.id, places: chipPlaces(chip, occupancy) };
    }),
    ...wanted.currents.map((current) => ({
      id: current.id,
      places: chevronPlaces(current, wiring, occupancy),
    })),
  ];
  const onLines = solvePlaces(seekers, occupancy);
  const chips = new Map<string, ChipPlace>();
  const currents = new Map<string, ChevronPlace>();
  for (const [id, place] of onLines) {
    if ('chip' in place) chips.set(id, place);
    else currents.set(id, place);
  }
  return { chips, currents, badges, signs: placedSigns };
};

const placesOfSign = (sign: WantedSign, scene: Scene, occupancy: Occupancy): readonly SignPlace[] => {
  if (sign.part !== undefined) return signPlaces(sign.part, occupancy);
  const tops = scene.parts.map(({ body }) => body);
  return looseSignPlaces([
    Math.min(0, ...tops.map(({ left }) => left)),
    Math.min(0, ...tops.map(({ top }) => top)),
  ]);
};

/** The former places with new figures in them: nothing moves while a value is dragged. */
export const refitted = (chip: { readonly text: string }, place: ChipPlace): ChipPlace => {
  const width = chipWidth(chip.text);
  const { chip: box, anchor, end } = place;
  if (anchor[1] === end[1] && end[0] === box.left)
    return { ...place, chip: { ...box, right: box.left + width } };
  if (anchor[1] === end[1] && end[0] === box.right)
    return { ...place, chip: { ...box, left: box.right - width } };
  const [x] = middle(box);
  return { ...place, chip: { ...box, left: x - width / 2, right: x + width / 2 } };
};
