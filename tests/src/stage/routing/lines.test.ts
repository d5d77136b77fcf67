import { describe, expect, it } from 'vitest';
import type { Polyline } from '../../../../src/stage/routing/grid.ts';
import { junctionPoints, linesOf } from '../../../../src/stage/routing/lines.ts';
import { ground, rail, resistor, stage, wire } from './hand.ts';

const paths = (...lines: readonly Polyline[]): ReadonlyMap<string, Polyline> =>
  new Map(lines.map((line, index) => [`w${index + 1}`, line]));

describe('junctions', () => {
  const parts = { p1: rail('VBAT', [5, 0]), p2: resistor([0, 6], 90), p3: resistor([10, 6], 90) };

  it('stand where two wires and a pin’s lead meet', () => {
    const document = stage(parts, [wire('p1.node', 'p2.a'), wire('p1.node', 'p3.a')]);
    const routes = paths(
      [
        [5, 0],
        [0, 0],
        [0, 3],
      ],
      [
        [5, 0],
        [10, 0],
        [10, 3],
      ],
    );
    expect(junctionPoints(document, routes)).toEqual([[5, 0]]);
  });

  it('stand where a wire of the net ends on another’s line', () => {
    const document = stage(parts, [wire('p2.a', 'p3.a'), wire('p1.node', 'p2.a')]);
    const routes = paths(
      [
        [0, 3],
        [0, 1],
        [10, 1],
        [10, 3],
      ],
      [
        [5, 0],
        [5, 1],
        [0, 1],
        [0, 3],
      ],
    );
    expect(junctionPoints(document, routes)).toEqual([[5, 1]]);
  });

  it('do not stand at a bend, at a joint of two wires, or where a wire ends on a pin alone', () => {
    const document = stage(parts, [wire('p2.a', 'j1'), wire('j1', 'p3.a')], { j1: [5, 1] });
    const routes = paths(
      [
        [0, 3],
        [0, 1],
        [5, 1],
      ],
      [
        [5, 1],
        [10, 1],
        [10, 3],
      ],
    );
    expect(junctionPoints(document, routes)).toEqual([]);
  });

  it('do not stand where two nets cross: that is a crossing', () => {
    const four = { ...parts, p4: ground([-3, 1]), p5: ground([13, 1]), p6: ground([5, 9]) };
    const document = stage(four, [wire('p4.node', 'p5.node'), wire('p1.node', 'p6.node')]);
    const routes = paths(
      [
        [-3, 1],
        [13, 1],
      ],
      [
        [5, 0],
        [5, 9],
      ],
    );
    const lines = linesOf(document, routes);
    expect(lines.junctions).toEqual([]);
    expect(lines.crossings).toEqual([[5, 1]]);
  });
});

it('stretches end where the wires on them change, and name all that share them', () => {
  const parts = { p1: rail('VBAT', [0, 0]), p2: resistor([8, 6], 90), p3: resistor([14, 6], 90) };
  const document = stage(parts, [wire('p1.node', 'p2.a'), wire('p1.node', 'p3.a')]);
  const routes = paths(
    [
      [0, 0],
      [8, 0],
      [8, 3],
    ],
    [
      [0, 0],
      [14, 0],
      [14, 3],
    ],
  );
  const { stretches } = linesOf(document, routes);
  expect(stretches.map(({ from, to, wires }) => [from.join(), to.join(), wires.join()])).toEqual([
    ['0,0', '8,0', 'w1,w2'],
    ['8,0', '14,0', 'w2'],
    ['8,0', '8,3', 'w1'],
    ['14,0', '14,3', 'w2'],
  ]);
});
