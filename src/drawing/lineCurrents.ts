/**
 * What each stretch of line carries, by Kirchhoff's current law on the lines as they are drawn: cut the stretch, and
 * what flows through it is what the pins beyond the cut take. A stretch of a ring has no such answer, nor one with
 * parts on both sides whose share is not known (two grounds of one net).
 */
import type { Scene } from './scene.ts';
import type { Piece, Vertex } from './wireGraph.ts';

/** Amperes into the part at a pin; undefined where it is not known. */
export type PinCurrent = (partKey: string, pin: string) => number | undefined;

/** Amperes along each stretch from its `from` to its `to`; undefined where the drawing does not say. */
export const lineCurrents = (piece: Piece, pinCurrent: PinCurrent): readonly (number | undefined)[] => {
  const own = piece.vertices.map((vertex) => vertexLoad(vertex, pinCurrent));
  const whole = own.reduce(joined, empty);
  const { order, parentStretch, parent } = walk(piece);
  const ring = stretchesOnRings(piece, order, parent, parentStretch);

  // Loads of the part of the tree beyond each vertex, gathered from the leaves inwards.
  const beyond = [...own];
  const currents: (number | undefined)[] = piece.stretches.map(() => undefined);
  for (const vertex of [...order].reverse()) {
    const [stretchIndex, up] = [parentStretch[vertex] ?? -1, parent[vertex] ?? -1];
    const here = beyond[vertex] ?? empty;
    const stretch = piece.stretches[stretchIndex];
    if (stretch === undefined) continue;
    beyond[up] = joined(beyond[up] ?? empty, here);
    if (ring.has(stretchIndex)) continue;
    const flow =
      here.unknown === 0
        ? here.amperes
        : whole.unknown === here.unknown
          ? here.amperes - whole.amperes
          : undefined;
    if (flow !== undefined) currents[stretchIndex] = stretch.to === vertex ? flow : -flow;
  }
  return currents;
};

/** What a set of pins takes: the sum of what is known, and how many are not. */
interface Load {
  readonly amperes: number;
  readonly unknown: number;
}

const empty: Load = { amperes: 0, unknown: 0 };

const joined = (a: Load, b: Load): Load => ({
  amperes: a.amperes + b.amperes,
  unknown: a.unknown + b.unknown,
});

const vertexLoad = (vertex: Vertex, pinCurrent: PinCurrent): Load => {
  let load = empty;
  for (const { part, pin } of vertex.pins) {
    // A ground, a rail or a tag stands for all its like: what flows at this one is not what flows at all of them.
    const known = part.joins === 'nothing' ? pinCurrent(part.key, pin) : undefined;
    load = joined(load, known === undefined ? { amperes: 0, unknown: 1 } : { amperes: known, unknown: 0 });
  }
  return load;
};

/** A walk through the piece from its first vertex: the order met, and by which stretch. */
const walk = (piece: Piece) => {
  const order: number[] = [];
  const parent: number[] = [];
  const parentStretch: number[] = [];
  const met = new Set<number>();
  for (let start = 0; start < piece.vertices.length; start++) {
    if (met.has(start)) continue;
    met.add(start);
    const waiting = [start];
    for (let vertex = waiting.pop(); vertex !== undefined; vertex = waiting.pop()) {
      order.push(vertex);
      for (const index of piece.vertices[vertex]?.stretches ?? []) {
        const other = otherEnd(piece, index, vertex);
        if (met.has(other)) continue;
        met.add(other);
        parent[other] = vertex;
        parentStretch[other] = index;
        waiting.push(other);
      }
    }
  }
  return { order, parent, parentStretch };
};

export const otherEnd = (piece: Piece, stretch: number, vertex: number): number => {
  const { from, to } = piece.stretches[stretch] ?? { from: vertex, to: vertex };
  return from === vertex ? to : from;
};

/** Every stretch left out of the walk closes a ring with the way between its ends along the walk. */
const stretchesOnRings = (
  piece: Piece,
  order: readonly number[],
  parent: readonly number[],
  parentStretch: readonly number[],
): ReadonlySet<number> => {
  const ring = new Set<number>();
  const walked = new Set(parentStretch);
  const place = new Map(order.map((vertex, index) => [vertex, index]));
  for (const [index, { from, to }] of piece.stretches.entries()) {
    if (walked.has(index)) continue;
    ring.add(index);
    let [a, b] = [from, to];
    while (a !== b) {
      if ((place.get(a) ?? 0) < (place.get(b) ?? 0)) [a, b] = [b, a];
      const up = parent[a];
      if (up === undefined) break;
      ring.add(parentStretch[a] ?? -1);
      a = up;
    }
  }
  return ring;
};

/** The currents into the pins as a settled state gives them. A test point takes none. */
export const pinCurrentsOf = (
  scene: Scene,
  currents: Readonly<Record<string, number | null>>,
): PinCurrent => {
  const meters = new Set(
    scene.parts.filter(({ joins, pins }) => joins === 'nothing' && pins.size === 1).map(({ key }) => key),
  );
  return (part, pin) => currents[`${part}.${pin}`] ?? (meters.has(part) ? 0 : undefined);
};
