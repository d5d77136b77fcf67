/** The signs of snags (a numbered diamond) and cautions (a triangle) at the part they speak of. */
import { baselineBelowMiddle } from '../fontMetrics.ts';
import { closed } from '../paths.ts';
import type { Point } from '../boxes.ts';
import type { Primitive } from '../primitives.ts';

export type SignKind = 'snag' | 'caution';

/** Half the width and height of a sign, pixels. */
export const signReach = 11;

/** A sign with its middle at `centre`. A snag carries its number in the list, from 1. */
export const signShapes = (
  kind: SignKind,
  number: number,
  of: string | undefined,
  [x, y]: Point,
): readonly Primitive[] => {
  const id = `${kind}/${number}`;
  const belonging = { layer: 'readings', thing: kind, ...(of === undefined ? {} : { of }) } as const;
  if (kind === 'snag') {
    return [
      {
        ...belonging,
        kind: 'path',
        id: `${id}/diamond`,
        commands: closed([
          [x, y - 10],
          [x + 10, y],
          [x, y + 10],
          [x - 10, y],
        ]),
        stroke: 'atRisk',
        fill: 'paper',
        width: 1.5,
      },
      {
        ...belonging,
        kind: 'text',
        id: `${id}/number`,
        text: String(number),
        x,
        y: y + baselineBelowMiddle(11),
        size: 11,
        weight: 600,
        align: 'centre',
        role: 'atRisk',
      },
    ];
  }
  return [
    {
      ...belonging,
      kind: 'path',
      id: `${id}/triangle`,
      commands: closed([
        [x, y - 9.5],
        [x + 10.2, y + 8],
        [x - 10.2, y + 8],
      ]),
      stroke: 'missed',
      fill: 'paper',
      width: 1.6,
    },
    {
      ...belonging,
      kind: 'path',
      id: `${id}/stroke`,
      commands: [
        ['M', x, y - 3.4],
        ['L', x, y + 1.6],
      ],
      stroke: 'missed',
      width: 1.9,
    },
    { ...belonging, kind: 'circle', id: `${id}/point`, x, y: y + 5, radius: 1.1, fill: 'missed', width: 0 },
  ];
};
