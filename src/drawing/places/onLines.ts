/** Points along a piece of wiring where a reading may sit, and what the line looks like there. */
import type { Point } from '../boxes.ts';
import type { Piece, Vertex } from '../wireGraph.ts';
import { leadOf, leadOwner, lineOwner } from './still.ts';

export interface Spot {
  readonly at: Point;
  /** Whether the line is level or upright here. */
  readonly level: boolean;
  /** Distance to the nearer end of the straight line, and the line's length, pixels. */
  readonly fromEnd: number;
  readonly length: number;
  /** Owners of the line and of the leads in line with it. */
  readonly owners: readonly string[];
  /** Which stretch of the piece. */
  readonly stretch: number;
}

/** Spots are this far apart, farther on a long line, where a few pixels make no difference. */
const fine = 6;
const coarse = 12;
const long = 96;

/** Spots along a stretch, leads of parts in line with it included. */
export const spotsOn = (piece: Piece, stretch: number): readonly Spot[] => {
  const { from, to } = piece.stretches[stretch] ?? { from: 0, to: 0 };
  const [a, b] = [piece.vertices[from], piece.vertices[to]];
  if (a === undefined || b === undefined) return [];
  const level = a.at[1] === b.at[1];
  if (!level && a.at[0] !== b.at[0]) return [];
  const axis = level ? 0 : 1;
  const owners = [lineOwner(piece.index)];
  const start = extended(a, b.at, owners);
  const end = extended(b, a.at, owners);
  const [low, high] = [Math.min(start[axis], end[axis]), Math.max(start[axis], end[axis])];
  const step = high - low > long ? coarse : fine;
  const spots: Spot[] = [];
  // On multiples of the step, whichever end comes first: a spot never depends on the way the wire was drawn.
  for (let way = Math.ceil(low / step) * step; way <= high; way += step) {
    const at: Point = level ? [way, a.at[1]] : [a.at[0], way];
    spots.push({
      at,
      level,
      fromEnd: Math.min(way - low, high - way),
      length: high - low,
      owners,
      stretch,
    });
  }
  return spots;
};

/** The end of a line moved on along the lead of the part at whose pin it ends. */
const extended = (vertex: Vertex, other: Point, owners: string[]): Point => {
  if (vertex.stretches.length !== 1 || vertex.pins.length !== 1) return vertex.at;
  const [pin] = vertex.pins;
  const lead = pin === undefined ? undefined : leadOf(pin.part, pin.pin);
  if (pin === undefined || lead === undefined) return vertex.at;
  const [x, y] = vertex.at;
  const end = lead[1];
  const isStraight =
    Math.sign(end[0] - x) === -Math.sign(other[0] - x) && Math.sign(end[1] - y) === -Math.sign(other[1] - y);
  if (!isStraight) return vertex.at;
  owners.push(leadOwner(pin.part, pin.pin));
  return end;
};
