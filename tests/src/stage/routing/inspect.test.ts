import { describe, expect, it } from 'vitest';
import type { Polyline } from '../../../../src/stage/routing/grid.ts';
import { ground, resistor, stage, wire } from './hand.ts';
import { confusions, looseEnds, overForeignPins, slanted, throughBodies } from './inspect.ts';

// The checks by which routes are judged must themselves see the faults they are there for.
const parts = {
  p1: resistor([0, 0]),
  p2: resistor([20, 0]),
  p3: resistor([10, 0], 90),
  p4: ground([5, 5]),
  p5: ground([15, 5]),
};
const document = stage(parts, [wire('p1.b', 'p2.a'), wire('p4.node', 'p5.node')]);
const drawn = (w1: Polyline, w2: Polyline) => ({
  paths: new Map([
    ['w1', w1],
    ['w2', w2],
  ]),
  blocked: new Set<string>(),
});
const straight: Polyline = [
  [3, 0],
  [17, 0],
];
const level: Polyline = [
  [5, 5],
  [15, 5],
];

describe('the checks of routes', () => {
  it('see a line through a body', () => {
    expect(throughBodies(document, drawn(straight, level))).toEqual(['w1 passes through p3']);
  });

  it('see a line over another net’s pin', () => {
    const over: Polyline = [
      [3, 0],
      [3, 5],
      [17, 5],
      [17, 0],
    ];
    expect(overForeignPins(document, drawn(over, level))).toEqual([
      'w1 touches p4.node',
      'w1 touches p5.node',
    ]);
  });

  it('see lines of two nets along each other, and an end on another’s line', () => {
    const along: Polyline = [
      [3, 0],
      [3, 5],
      [17, 5],
      [17, 0],
    ];
    expect(confusions(document, drawn(along, level))).toContain('w1 and w2 run along each other');
    const onto: Polyline = [
      [3, 0],
      [3, 9],
      [10, 9],
      [10, 5],
    ];
    expect(confusions(document, drawn(onto, level))).toEqual(['w1 and w2 touch at 10,5']);
  });

  it('see slants, points that are no corners, and ends off their pins', () => {
    expect(
      slanted(
        drawn(
          [
            [3, 0],
            [17, 1],
          ],
          level,
        ).paths,
      ),
    ).toHaveLength(1);
    expect(
      slanted(
        drawn(
          [
            [3, 0],
            [9, 0],
            [17, 0],
          ],
          level,
        ).paths,
      ),
    ).toHaveLength(1);
    expect(
      looseEnds(
        document,
        drawn(
          [
            [3, 0],
            [16, 0],
          ],
          level,
        ).paths,
      ),
    ).toEqual(['w1 ends at 16,0, not at p2.a']);
  });

  it('see nothing in a plain crossing', () => {
    const cross = stage({ ...parts, p6: ground([10, 12]), p7: ground([10, 3]) }, [
      wire('p6.node', 'p7.node'),
      wire('p4.node', 'p5.node'),
    ]);
    expect(
      confusions(
        cross,
        drawn(
          [
            [10, 12],
            [10, 3],
          ],
          level,
        ),
      ),
    ).toEqual([]);
  });
});
