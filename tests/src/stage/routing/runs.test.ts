import { describe, expect, it } from 'vitest';
import type { Polyline } from '../../../../src/stage/routing/grid.ts';
import {
  cutAt,
  draggedRun,
  healedPath,
  insertionInto,
  nearestOnRoute,
  nearestWire,
} from '../../../../src/stage/routing/runs.ts';

/** Right, down, right. */
const bent: Polyline = [
  [0, 0],
  [6, 0],
  [6, 8],
  [14, 8],
];

describe('nearestOnRoute', () => {
  it('gives the grid point, the run and the true distance', () => {
    expect(nearestOnRoute(bent, [6.4, 3.2])).toEqual({
      at: [6, 3],
      run: 1,
      distance: expect.closeTo(0.4, 9) as number,
    });
    expect(nearestOnRoute(bent, [-3, 4])).toEqual({ at: [0, 0], run: 0, distance: 5 });
  });

  it('takes the earlier run at a corner', () => {
    expect(nearestOnRoute(bent, [6, 8])?.run).toBe(1);
  });
});

it('nearestWire looks no farther than it is told', () => {
  const paths = new Map([
    ['w1', bent],
    [
      'w2',
      [
        [0, 2],
        [4, 2],
      ],
    ],
  ] as const);
  expect(nearestWire(paths, [2, 1.6], 1)?.wire).toBe('w2');
  expect(nearestWire(paths, [20, 20], 1)).toBeUndefined();
});

describe('draggedRun', () => {
  it('moves a run between two corners, which follow it', () => {
    expect(draggedRun(bent, 1, 3)).toEqual([
      [9, 0],
      [9, 8],
    ]);
  });

  it('leaves a short lead at a pin', () => {
    expect(draggedRun(bent, 0, -2)).toEqual([
      [1, 0],
      [1, -2],
      [6, -2],
      [6, 8],
    ]);
    expect(draggedRun(bent, 2, 1)).toEqual([
      [6, 0],
      [6, 9],
      [13, 9],
      [13, 8],
    ]);
  });

  it('lifts a straight wire out between its two leads', () => {
    expect(
      draggedRun(
        [
          [0, 0],
          [8, 0],
        ],
        0,
        4,
      ),
    ).toEqual([
      [1, 0],
      [1, 4],
      [7, 4],
      [7, 0],
    ]);
  });

  it('brings a run in line with its neighbour and the corners between are gone', () => {
    const step: Polyline = [
      [0, 0],
      [4, 0],
      [4, 2],
      [8, 2],
      [8, 6],
    ];
    expect(draggedRun(step, 2, -2)).toEqual([[8, 0]]);
  });

  it('dragged by nothing changes nothing', () => {
    expect(draggedRun(bent, 1, 0)).toEqual([
      [6, 0],
      [6, 8],
    ]);
  });
});

describe('cutAt', () => {
  it('shares the corners out between the two halves', () => {
    expect(cutAt(bent, [6, 5])).toEqual({ before: [[6, 0]], after: [[6, 8]] });
    expect(cutAt(bent, [6, 0])).toEqual({ before: [], after: [[6, 8]] });
  });

  it('cuts nothing at a point off the route', () => {
    expect(cutAt(bent, [7, 5])).toBeUndefined();
  });
});

describe('insertionInto', () => {
  it('takes a part in line with a run, whichever way round it stands', () => {
    expect(insertionInto(bent, [6, 1], [6, 7])).toEqual({ first: 'a', before: [[6, 0]], after: [[6, 8]] });
    expect(insertionInto(bent, [6, 7], [6, 1])).toEqual({ first: 'b', before: [[6, 0]], after: [[6, 8]] });
  });

  it('refuses a part across a run or longer than it', () => {
    expect(insertionInto(bent, [3, 2], [9, 2])).toBeUndefined();
    expect(insertionInto(bent, [6, -1], [6, 5])).toBeUndefined();
  });
});

describe('healedPath', () => {
  it('closes the gap of a part that stood in line', () => {
    const first: Polyline = [
      [0, 0],
      [6, 0],
      [6, 1],
    ];
    const second: Polyline = [
      [6, 7],
      [6, 8],
      [14, 8],
    ];
    expect(healedPath(first, second)).toEqual([
      [6, 0],
      [6, 8],
    ]);
  });

  it('is undone by inserting the part again', () => {
    const insertion = insertionInto(bent, [6, 1], [6, 7]);
    const first: Polyline = [[0, 0], ...(insertion?.before ?? []), [6, 1]];
    const second: Polyline = [[6, 7], ...(insertion?.after ?? []), [14, 8]];
    expect(healedPath(first, second)).toEqual(bent.slice(1, -1));
  });

  it('puts an L between pins that were not in line', () => {
    expect(
      healedPath(
        [
          [0, 0],
          [3, 0],
        ],
        [
          [6, 4],
          [6, 9],
        ],
      ),
    ).toEqual([[6, 0]]);
  });
});
