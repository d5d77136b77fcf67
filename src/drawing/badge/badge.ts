import { quarterArc } from '../../../symbols/pen.ts';
import { boxAt, type Point } from '../boxes.ts';
import { closed, mapped } from '../paths.ts';
import type { Primitive, Role } from '../primitives.ts';
import { dashOutlines, dotCentres, sampled } from './broken.ts';
import { badgeSize, halfTurn, heavyParts, thinCurves, type Dot } from './curves.ts';
import { frameStrokes } from './frame.ts';
import type { BadgeSign } from './sign.ts';
import { markedInversion } from './words.ts';

const thin = 1.25;
const heavy = 3.5;

/** The badge of one device, its upper left corner at `corner`; ids `<id>/…`. */
export const badgeShapes = (
  id: string,
  of: string,
  sign: BadgeSign,
  corner: Point,
  ground: Role = 'paper',
): readonly Primitive[] => {
  const stale = sign.stale === true;
  const turn = (point: Point): Point => (sign.reversed ? halfTurn(point) : point);
  const place = (point: Point): Point => {
    const [x, y] = turn(point);
    return [corner[0] + x, corner[1] + y];
  };
  const strong: Role = stale ? 'soft' : 'read';
  const belonging = { of, layer: 'readings', thing: 'badge' } as const;

  const { commands, dot, at, farAt, over } = heavyParts[sign.region];
  const inversion = markedInversion(sign);
  const thinShapes = thinCurves[sign.family].flatMap((curve, index): Primitive[] =>
    // What the heavy part covers, or breaks, is not drawn under it.
    index === over && (inversion !== undefined || curve === commands)
      ? []
      : [
          {
            ...belonging,
            kind: 'path',
            id: `${id}/curve${index}`,
            commands: mapped(curve, place),
            stroke: 'line',
            width: thin,
          },
        ],
  );

  const points = sampled(commands).map(place);
  const frames = frameStrokes(sign.verdict).map((stroke): Primitive => ({
    ...belonging,
    kind: 'path',
    id: `${id}/${stroke.part}`,
    thing: 'verdict',
    commands: mapped(stroke.commands, ([x, y]) => [corner[0] + x, corner[1] + y]),
    stroke: stale ? 'soft' : stroke.role,
    width: stroke.width,
    ...(stroke.dash === undefined ? {} : { dash: stroke.dash }),
  }));
  const heavyShapes: readonly Primitive[] =
    inversion === 'weak'
      ? dotCentres(points).map(([x, y], index): Primitive => ({
          ...belonging,
          kind: 'circle',
          id: `${id}/heavy${index}`,
          x,
          y,
          radius: 1.55,
          fill: strong,
          width: 0,
        }))
      : inversion === 'moderate'
        ? dashOutlines(points, heavy).map((outline, index): Primitive => ({
            ...belonging,
            kind: 'path',
            id: `${id}/heavy${index}`,
            commands: closed(outline),
            fill: strong,
            width: 0,
          }))
        : [
            {
              ...belonging,
              kind: 'path',
              id: `${id}/heavy`,
              commands: mapped(commands, place),
              stroke: strong,
              width: heavy,
            },
          ];
  return [
    ...frames,
    ...thinShapes,
    ...heavyShapes,
    ...dotShapes(`${id}/dot`, of, dot, place(inversion === undefined ? at : farAt), strong, ground),
    ...(stale ? [strike(id, of, corner)] : []),
  ];
};

const dotShapes = (
  id: string,
  of: string,
  dot: Dot,
  [x, y]: Point,
  role: Role,
  ground: Role,
): readonly Primitive[] => {
  const belonging = { id, of, layer: 'readings', thing: 'badge' } as const;
  switch (dot) {
    case 'filled':
      return [{ ...belonging, kind: 'circle', x, y, radius: 4, fill: role, width: 0 }];
    case 'hollow':
      return [{ ...belonging, kind: 'circle', x, y, radius: 3.5, fill: ground, stroke: role, width: 1.9 }];
    case 'half':
      return [
        { ...belonging, kind: 'circle', x, y, radius: 3.5, fill: ground, stroke: role, width: 1.9 },
        // The lower half of the dot's inside.
        {
          ...belonging,
          kind: 'path',
          id: `${id}-half`,
          commands: lowerHalf([x, y], 3.5),
          fill: role,
          width: 0,
        },
      ];
    case 'square': {
      const { left, top, right, bottom } = boxAt(x - 3.8, y - 3.8, 7.6, 7.6);
      const corners: readonly Point[] = [
        [left, top],
        [right, top],
        [right, bottom],
        [left, bottom],
      ];
      return [{ ...belonging, kind: 'path', commands: closed(corners), fill: role, width: 0 }];
    }
  }
};

const lowerHalf = ([x, y]: Point, radius: number) => {
  const bend = radius * quarterArc;
  return [
    ['M', x - radius, y],
    ['C', x - radius, y + bend, x - bend, y + radius, x, y + radius],
    ['C', x + bend, y + radius, x + radius, y + bend, x + radius, y],
    ['Z'],
  ] as const;
};

const strike = (id: string, of: string, [x, y]: Point): Primitive => ({
  kind: 'path',
  id: `${id}/strike`,
  of,
  layer: 'readings',
  thing: 'badge',
  commands: [
    ['M', x + 2, y + badgeSize.height / 2],
    ['L', x + badgeSize.width - 2, y + badgeSize.height / 2],
  ],
  stroke: 'soft',
  width: 1.25,
});
