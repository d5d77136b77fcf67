import type { Box, PathCommand } from '../../symbols/art.ts';
import { boxOfPoints, grown, union, type Point } from './boxes.ts';
import { textBox } from './fontMetrics.ts';
import type { Drawing, Primitive } from './primitives.ts';

/** A third pen, which draws nothing and says where the others would: the box of a primitive, its stroke included. */
export const boundsOf = (primitive: Primitive): Box => {
  switch (primitive.kind) {
    case 'text':
      return textBox(primitive);
    case 'circle': {
      const { x, y, radius } = primitive;
      const half = primitive.stroke === undefined ? 0 : primitive.width / 2;
      return grown({ left: x, top: y, right: x, bottom: y }, radius + half);
    }
    case 'path':
      return grown(
        boxOfPoints(primitive.commands.flatMap(pointsOf)),
        primitive.stroke === undefined ? 0 : primitive.width / 2,
      );
  }
};

/** A curve lies inside the hull of its controls. */
const pointsOf = (command: PathCommand): readonly Point[] => {
  switch (command[0]) {
    case 'M':
    case 'L':
      return [[command[1], command[2]]];
    case 'C':
      return [
        [command[1], command[2]],
        [command[3], command[4]],
        [command[5], command[6]],
      ];
    case 'Z':
      return [];
  }
};

export const boundsOfAll = (primitives: readonly Primitive[]): Drawing['bounds'] =>
  union(primitives.map(boundsOf)) ?? { left: 0, top: 0, right: 0, bottom: 0 };
