import type { Point } from './boxes.ts';
import { polyline } from './paths.ts';
import type { Primitive } from './primitives.ts';
import { pen } from './symbolShapes.ts';
import { junctionsOf, type Piece } from './wireGraph.ts';

export const junctionRadius = 3.4;

/**
 * One path a wire. Where wires run over one another the first alone is drawn, as two strokes on one line would look
 * heavier than one; a wire that lies wholly on others has no path.
 */
export const wireShapes = (wiring: readonly Piece[]): readonly Primitive[] =>
  wiring.flatMap((piece) =>
    piece.wires.flatMap((wire): Primitive[] => {
      const lines = linesOf(piece, wire);
      if (lines.length === 0) return [];
      return [
        {
          kind: 'path',
          id: wire,
          of: wire,
          layer: 'still',
          thing: 'wire',
          commands: lines.flatMap(polyline),
          stroke: 'ink',
          width: pen,
        },
      ];
    }),
  );

/** The stretches that a wire draws, joined to lines; points in the middle of a straight line are left out. */
const linesOf = (piece: Piece, wire: string): readonly (readonly Point[])[] => {
  const lines: Point[][] = [];
  for (const stretch of piece.stretches) {
    if (stretch.wire !== wire) continue;
    const [from, to] = [piece.vertices[stretch.from]?.at, piece.vertices[stretch.to]?.at];
    if (from === undefined || to === undefined) continue;
    const line = lines.at(-1);
    const [before, last] = [line?.at(-2), line?.at(-1)];
    if (line === undefined || last?.[0] !== from[0] || last[1] !== from[1]) {
      lines.push([from, to]);
    } else if (before !== undefined && isStraight(before, last, to)) line[line.length - 1] = to;
    else line.push(to);
  }
  return lines;
};

const isStraight = (a: Point, b: Point, c: Point): boolean =>
  (a[0] === b[0] && b[0] === c[0]) || (a[1] === b[1] && b[1] === c[1]);

/** A dot where three or more lines meet. A crossing of two wires has none: it is no connection. */
export const junctionShapes = (wiring: readonly Piece[]): readonly Primitive[] =>
  wiring.flatMap((piece) =>
    junctionsOf(piece).map(([x, y], number): Primitive => ({
      kind: 'circle',
      id: `junction/${piece.index}/${number}`,
      layer: 'still',
      thing: 'junction',
      x,
      y,
      radius: junctionRadius,
      fill: 'ink',
      width: 0,
    })),
  );
