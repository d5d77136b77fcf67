import { quarterArc } from '../../symbols/pen.ts';
import type { Box, PathCommand } from '../../symbols/art.ts';
import type { Point } from './boxes.ts';

export const polyline = (points: readonly Point[]): readonly PathCommand[] =>
  points.map(([x, y], index): PathCommand => (index === 0 ? ['M', x, y] : ['L', x, y]));

export const closed = (points: readonly Point[]): readonly PathCommand[] => [...polyline(points), ['Z']];

/** A box with rounded corners, clockwise from its upper left. */
export const roundedBox = ({ left, top, right, bottom }: Box, radius: number): readonly PathCommand[] => {
  const cut = radius * (1 - quarterArc);
  return [
    ['M', left + radius, top],
    ['L', right - radius, top],
    ['C', right - cut, top, right, top + cut, right, top + radius],
    ['L', right, bottom - radius],
    ['C', right, bottom - cut, right - cut, bottom, right - radius, bottom],
    ['L', left + radius, bottom],
    ['C', left + cut, bottom, left, bottom - cut, left, bottom - radius],
    ['L', left, top + radius],
    ['C', left, top + cut, left + cut, top, left + radius, top],
    ['Z'],
  ];
};

/** Every point of a path put through a mapping that keeps straight lines straight (a shift, a turn). */
export const mapped = (
  commands: readonly PathCommand[],
  map: (point: Point) => Point,
): readonly PathCommand[] =>
  commands.map((command): PathCommand => {
    switch (command[0]) {
      case 'M':
      case 'L':
        return [command[0], ...map([command[1], command[2]])];
      case 'C':
        return [
          'C',
          ...map([command[1], command[2]]),
          ...map([command[3], command[4]]),
          ...map([command[5], command[6]]),
        ];
      case 'Z':
        return command;
    }
  });

export const shifted = (commands: readonly PathCommand[], [dx, dy]: Point): readonly PathCommand[] =>
  mapped(commands, ([x, y]) => [x + dx, y + dy]);
