import { polyline } from './paths.ts';
import type { Primitive } from './primitives.ts';
import type { Scene } from './scene.ts';
import { pen } from './symbolShapes.ts';
import { junctionsOf, type Piece } from './wireGraph.ts';

export const junctionRadius = 3.4;

export const wireShapes = (scene: Scene): readonly Primitive[] =>
  scene.wires.map(({ id, points }) => ({
    kind: 'path',
    id,
    of: id,
    layer: 'still',
    thing: 'wire',
    commands: polyline(points),
    stroke: 'ink',
    width: pen,
  }));

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
