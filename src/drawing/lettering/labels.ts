import type { Box } from '../../../symbols/art.ts';
import { badgeBlock, badgeBoxes, badgePlaces, type Reach } from '../badgeRoom.ts';
import { grown, overlap } from '../boxes.ts';
import type { Occupancy } from '../occupancy.ts';
import { Occupancy as Rooms } from '../occupancy.ts';
import type { Primitive } from '../primitives.ts';
import type { Scene, ScenePart } from '../scene.ts';
import { facingOf } from './facing.ts';
import { labelPlaces } from './labelPlaces.ts';
import { blockBox, blockTexts, type TextBlock, type TextLine } from './textBlock.ts';

/** Clear paper round a name or value. */
const air = 2.5;

/** What a badge's words will be, about: the room is kept before the readings are known. */
const likelyWords: readonly TextLine[] = ['saturation', '000.0 mA'].map((text) => [
  { text, weight: 600, role: 'read', thing: 'word' },
]);

/**
 * Puts every part's name and value in a free place and takes the room. Transistors come first, as their badges need
 * the most; the room for these is kept free of other names where that is possible. Follows from the drawing alone, so
 * that no name moves when the readings change.
 */
export const placeLabels = (scene: Scene, occupancy: Occupancy): ReadonlyMap<string, TextBlock> => {
  const kept = new Rooms();
  const placed = new Map<string, TextBlock>();
  const order = [...scene.parts].sort((a, b) => rank(a) - rank(b));
  for (const part of order) {
    const places = labelPlaces(part);
    const place = facingOf(part).form === 'transistor' ? withBadge(part, places, occupancy, kept) : undefined;
    const chosen = place ?? bestOf(places, occupancy, kept, part);
    if (chosen === undefined) continue;
    placed.set(part.id, chosen);
    occupancy.add(blockBox(chosen), `name/${part.id}`);
  }
  return placed;
};

const rank = (part: ScenePart): number =>
  part.joins === 'label' ? 0 : facingOf(part).form === 'transistor' ? 1 : 2;

/** The first place of the name that leaves room for the badge under or beside it; keeps that room. */
const withBadge = (
  part: ScenePart,
  places: readonly TextBlock[],
  occupancy: Occupancy,
  kept: Rooms,
): TextBlock | undefined => {
  const isFree = (box: Box): boolean => occupancy.isFree(box) && kept.isFree(box);
  const roomIn = (reach: Reach) =>
    badgePlaces(part, likelyWords, reach).find((place) => badgeBoxes(place).every(isFree));
  const badge = roomIn('near') ?? roomIn('anywhere');
  if (badge === undefined) return undefined;
  const room = badgeBlock(badge);
  const place = places.find((block) => {
    const box = blockBox(block);
    const roomy = grown(box, air);
    return isFree(roomy) && !overlap(box, room);
  });
  if (place === undefined) return undefined;
  kept.add(room, `badge/${part.id}`);
  return place;
};

const bestOf = (
  places: readonly TextBlock[],
  occupancy: Occupancy,
  kept: Rooms,
  part: ScenePart,
): TextBlock | undefined => {
  // A tag's label lies in its own outline.
  const own = part.joins === 'label' ? (owner: string) => owner.endsWith(`/${part.id}`) : undefined;
  const free = (place: TextBlock, rooms: Occupancy) => rooms.isFree(grown(blockBox(place), air), own);
  return (
    places.find((place) => free(place, occupancy) && free(place, kept)) ??
    places.find((place) => free(place, occupancy)) ??
    leastCovered(places, occupancy)
  );
};

/** Where nothing is free, the place that covers least: a name is always written. */
const leastCovered = (places: readonly TextBlock[], occupancy: Occupancy): TextBlock | undefined => {
  let [best, least]: [TextBlock | undefined, number] = [undefined, Infinity];
  for (const place of places) {
    const box = blockBox(place);
    let covered = 0;
    for (const hit of occupancy.hits(box)) covered += sharedArea(box, hit.box);
    if (covered < least) [best, least] = [place, covered];
  }
  return best;
};

const sharedArea = (a: Box, b: Box): number =>
  Math.max(0, Math.min(a.right, b.right) - Math.max(a.left, b.left)) *
  Math.max(0, Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top));

export const labelShapes = (labels: ReadonlyMap<string, TextBlock>): readonly Primitive[] =>
  [...labels].flatMap(([id, block]) => blockTexts(block, id, id, 'still'));
