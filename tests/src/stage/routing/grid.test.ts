import { describe, expect, it } from 'vitest';
import {
  boxAround,
  headingBetween,
  lengthOf,
  pointsAlong,
  tidied,
} from '../../../../src/stage/routing/grid.ts';

describe('tidied', () => {
  it('drops points in the middle of a straight stretch and repeated points', () => {
    expect(
      tidied([
        [0, 0],
        [2, 0],
        [2, 0],
        [5, 0],
        [5, 4],
      ]),
    ).toEqual([
      [0, 0],
      [5, 0],
      [5, 4],
    ]);
  });

  it('drops a stretch that is run there and back', () => {
    expect(
      tidied([
        [0, 0],
        [6, 0],
        [4, 0],
        [4, 3],
      ]),
    ).toEqual([
      [0, 0],
      [4, 0],
      [4, 3],
    ]);
  });

  it('keeps both ends of a line of no length', () => {
    expect(
      tidied([
        [3, 3],
        [3, 3],
      ]),
    ).toEqual([
      [3, 3],
      [3, 3],
    ]);
  });
});

it('pointsAlong gives every grid point once', () => {
  const line = [
    [0, 0],
    [2, 0],
    [2, -2],
  ] as const;
  expect(pointsAlong(line).map((at) => at.join())).toEqual(['0,0', '1,0', '2,0', '2,-1', '2,-2']);
  expect(lengthOf(line)).toBe(4);
});

it('headingBetween numbers right, down, left, up and knows no slants', () => {
  const from = [0, 0] as const;
  expect(
    [
      [1, 0],
      [0, 2],
      [-3, 0],
      [0, -1],
      [1, 1],
      [0, 0],
    ].map(([x = 0, y = 0]) => headingBetween(from, [x, y])),
  ).toEqual([0, 1, 2, 3, null, null]);
});

it('boxAround holds all boxes and is nothing for none', () => {
  const boxes = [
    { left: 0, top: 0, right: 2, bottom: 1 },
    { left: -1, top: 0.5, right: 1, bottom: 3 },
  ];
  expect(boxAround(boxes)).toEqual({ left: -1, top: 0, right: 2, bottom: 3 });
  expect(boxAround([])).toBeUndefined();
});
