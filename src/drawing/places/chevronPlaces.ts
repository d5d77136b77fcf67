/** Where the chevron of a branch and its figure may stand: on the line, the figure beside it. */
import { grown, type Point } from '../boxes.ts';
import { blockBox, type TextBlock } from '../lettering/textBlock.ts';
import type { Occupancy } from '../occupancy.ts';
import type { Run } from '../branches.ts';
import type { WantedCurrent } from '../wanted/wanted.ts';
import type { Piece } from '../wireGraph.ts';
import { spotsOn, type Spot } from './onLines.ts';
import type { Place } from './solve.ts';

export const chevron = { span: 12, depth: 7.5, stroke: 2 } as const;
/** From the lead to the figure beside it; over and under a level lead, to the figure's middle. */
const toFigure = 14;
const air = 3;
/** From the end of a straight line to the chevron's middle. */
const fromEnd = 12;
const clearanceWanted = 12;

export interface ChevronPlace extends Place {
  /** The middle of the chevron, on the line. */
  readonly at: Point;
  readonly run: Run;
  /** Unit direction of the stretch from its `from` to its `to`. */
  readonly along: Point;
  readonly figure: TextBlock;
}

export const chevronPlaces = (
  current: WantedCurrent,
  wiring: readonly Piece[],
  occupancy: Occupancy,
): readonly ChevronPlace[] =>
  current.runs
    .flatMap(({ piece: index, stretch }) => {
      const piece = wiring[index];
      if (piece === undefined) return [];
      const seat = { run: { piece: index, stretch }, along: directionOf(piece, stretch) };
      return spotsOn(piece, stretch).flatMap((spot) => placesAt(spot, seat, current.text, occupancy));
    })
    .sort((a, b) => a.cost - b.cost);

const directionOf = (piece: Piece, stretch: number): Point => {
  const { from, to } = piece.stretches[stretch] ?? { from: 0, to: 0 };
  const [a, b] = [piece.vertices[from]?.at ?? [0, 0], piece.vertices[to]?.at ?? [0, 0]];
  return [Math.sign(b[0] - a[0]), Math.sign(b[1] - a[1])];
};

const placesAt = (
  spot: Spot,
  seat: Pick<ChevronPlace, 'run' | 'along'>,
  text: string,
  occupancy: Occupancy,
): readonly ChevronPlace[] => {
  if (spot.fromEnd < fromEnd) return [];
  const [x, y] = spot.at;
  const [across, along] = [chevron.span / 2 + 2, chevron.depth / 2 + 2];
  const mark = spot.level
    ? { left: x - along, top: y - across, right: x + along, bottom: y + across }
    : { left: x - across, top: y - along, right: x + across, bottom: y + along };
  const shares = [...spot.owners];
  if (!occupancy.isFree(mark, (owner) => shares.includes(owner))) return [];
  return [1, -1].flatMap((side): ChevronPlace[] => {
    const figure: TextBlock = {
      lines: [[{ text, weight: 400, role: 'read', thing: 'figure' }]],
      at: spot.level ? [x, y - side * toFigure] : [x + side * toFigure, y],
      align: spot.level ? 'centre' : side > 0 ? 'left' : 'right',
      size: 13,
    };
    const box = blockBox(figure);
    if (!occupancy.isFree(grown(box, air))) return [];
    const room = occupancy.clearance(box, clearanceWanted);
    const middle = (spot.length / 2 - spot.fromEnd) * 0.04;
    const cost =
      (side > 0 ? 0 : 1) +
      middle +
      (spot.level ? 2 : 0) +
      (clearanceWanted - room) * 0.4 +
      Math.max(0, 20 - spot.fromEnd) * 0.2;
    return [{ ...seat, at: spot.at, figure, boxes: [mark, grown(box, air)], cost, shares }];
  });
};
