/** Where the chip of a node may stand: at the end of a short leader at right angles to one of the node's lines. */
import type { Box } from '../../../symbols/art.ts';
import { boxAt, boxOfPoints, grown, type Point } from '../boxes.ts';
import { textWidth } from '../fontMetrics.ts';
import type { Occupancy } from '../occupancy.ts';
import type { WantedChip } from '../wanted/wanted.ts';
import { spotsOn, type Spot } from './onLines.ts';
import type { Place } from './solve.ts';

export const chipHeight = 22;
const padding = 7;
/** Clear paper round a chip. */
const air = 4;
/** A leader starts where the line's own stroke ends. */
const fromLine = 3;

export interface ChipPlace extends Place {
  readonly chip: Box;
  readonly anchor: Point;
  /** Where the leader meets the chip. */
  readonly end: Point;
}

export const chipWidth = (text: string): number => textWidth(text, 13) + 2 * padding;

type Leaders = readonly (readonly [number, number])[];

/** Leaders are 20 to 28 px long. */
const usual: Leaders = [
  [24, 0],
  [20, 0.5],
  [28, 0.5],
];
/** Others, only where these find little room. */
const unusual: Leaders = [
  [16, 5],
  [34, 5],
  [40, 7],
  [48, 9],
  [58, 12],
  [70, 15],
  [84, 19],
  [100, 24],
];
/** So many places of the usual kind are choice enough. */
const enough = 40;

const clearanceWanted = 14;

export const chipPlaces = (chip: WantedChip, occupancy: Occupancy): readonly ChipPlace[] => {
  const width = chipWidth(chip.text);
  const spots = chip.node.pieces.flatMap((piece) =>
    piece.stretches.flatMap((_, stretch) => spotsOn(piece, stretch)),
  );
  const near = spots.flatMap((spot) => placesAt(spot, width, usual, occupancy));
  const far = near.length >= enough ? [] : spots.flatMap((spot) => placesAt(spot, width, unusual, occupancy));
  return [...near, ...far].sort((a, b) => a.cost - b.cost);
};

const placesAt = (
  spot: Spot,
  width: number,
  leaders: Leaders,
  occupancy: Occupancy,
): readonly ChipPlace[] => {
  const base = spotCost(spot);
  const places: ChipPlace[] = [];
  for (const side of [-1, 1]) {
    for (const [length, longer] of leaders) {
      for (const [slide, aside] of slides(spot, width)) {
        const place = standAt(spot, width, side * length, slide);
        if (!place.boxes.every((box) => occupancy.isFree(box))) continue;
        const room = occupancy.clearance(place.chip, clearanceWanted);
        const cost = base + longer + aside + (side > 0 ? 0.4 : 0) + (clearanceWanted - room) * 0.5;
        places.push({ ...place, cost });
      }
    }
  }
  return places;
};

/** In the middle of a long straight line, away from its corners and from parts. */
const spotCost = ({ fromEnd, length }: Spot): number =>
  Math.max(0, 18 - fromEnd) * 0.25 + (length / 2 - fromEnd) * 0.02 + Math.max(0, 60 - length) * 0.05;

/** A chip over a level line may be shifted along it. */
const slides = ({ level }: Spot, width: number): readonly (readonly [number, number])[] => {
  if (!level) return [[0, 0]];
  const most = width / 2 - 10;
  return [
    [0, 0],
    [most, 2.5],
    [-most, 2.5],
  ];
};

/** @param reach signed length of the leader: negative is up, or to the left */
const standAt = (spot: Spot, width: number, reach: number, slide: number): Omit<ChipPlace, 'cost'> => {
  const [x, y] = spot.at;
  const towards = Math.sign(reach);
  const end: Point = spot.level ? [x, y + reach] : [x + reach, y];
  const chip = spot.level
    ? boxAt(x + slide - width / 2, towards > 0 ? end[1] : end[1] - chipHeight, width, chipHeight)
    : boxAt(towards > 0 ? end[0] : end[0] - width, y - chipHeight / 2, width, chipHeight);
  const start: Point = spot.level ? [x, y + towards * fromLine] : [x + towards * fromLine, y];
  return {
    chip,
    anchor: spot.at,
    end,
    boxes: [grown(chip, air), grown(boxOfPoints([start, end]), 1.5)],
    shares: [],
  };
};

/** The place to which a person dragged the chip: its middle, the leader going to the nearest point of the node. */
export const draggedChipPlace = (chip: WantedChip, centre: Point): ChipPlace | undefined => {
  const width = chipWidth(chip.text);
  const box = boxAt(centre[0] - width / 2, centre[1] - chipHeight / 2, width, chipHeight);
  let nearest: { readonly at: Point; readonly way: number } | undefined;
  for (const piece of chip.node.pieces) {
    for (let stretch = 0; stretch < piece.stretches.length; stretch++) {
      for (const { at } of spotsOn(piece, stretch)) {
        const way = Math.hypot(at[0] - centre[0], at[1] - centre[1]);
        if (nearest === undefined || way < nearest.way) nearest = { at, way };
      }
    }
  }
  if (nearest === undefined) return undefined;
  const [x, y] = nearest.at;
  const end: Point = [Math.min(Math.max(x, box.left), box.right), Math.min(Math.max(y, box.top), box.bottom)];
  return { chip: box, anchor: nearest.at, end, boxes: [grown(box, air)], cost: 0, shares: [] };
};
