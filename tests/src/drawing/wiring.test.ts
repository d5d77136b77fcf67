import { describe, expect, it } from 'vitest';
import { branchesOf } from '../../../src/drawing/branches.ts';
import { lineCurrents } from '../../../src/drawing/lineCurrents.ts';
import { sceneOf } from '../../../src/drawing/scene.ts';
import { junctionsOf, wiringOf } from '../../../src/drawing/wireGraph.ts';
import { wireShapes } from '../../../src/drawing/wires.ts';
import type { DrawnEnd, DrawnWire } from '../../../src/stage/routing/document.ts';

type Point = readonly [number, number];
type Line = readonly [from: DrawnEnd, to: DrawnEnd, ...points: readonly Point[]];

/** Resistors upright at their places, joints, and wires with the lines given, all in grid units. */
const scene = (
  places: Readonly<Record<string, Point>>,
  joints: Readonly<Record<string, Point>>,
  lines: readonly Line[],
) => {
  const parts = Object.fromEntries(
    Object.entries(places).map(([id, place]) => [
      id,
      { kind: 'resistor', name: id.toUpperCase(), place, turn: 90 as const, values: { resistance: 1000 } },
    ]),
  );
  const wires = Object.fromEntries(
    lines.map(([from, to], index): [string, DrawnWire] => [`w${index + 1}`, { ends: [from, to] }]),
  );
  const routes = new Map(lines.map(([, , ...points], index) => [`w${index + 1}`, points]));
  return sceneOf({ devices: {}, parts, joints, wires }, routes);
};

// Three upright resistors whose upper ends meet at one joint: r1 at x 0, r2 at x 10, r3 at x 20.
const star = () =>
  scene({ r1: [0, 10], r2: [10, 10], r3: [20, 10] }, { j1: [10, 4] }, [
    [['r1', 'a'], ['j1'], [0, 7], [0, 4], [10, 4]],
    [['j1'], ['r2', 'a'], [10, 4], [10, 7]],
    [['j1'], ['r3', 'a'], [10, 4], [20, 4], [20, 7]],
  ]);

describe('junctions', () => {
  it('stand where three lines meet', () => {
    expect(wiringOf(star()).flatMap(junctionsOf)).toEqual([[120, 48]]);
  });

  it('do not stand at a corner, nor where two wires merely cross', () => {
    const crossing = scene({ r1: [0, 10], r2: [20, 10], r3: [10, 3], r4: [10, 20] }, {}, [
      [
        ['r1', 'b'],
        ['r2', 'b'],
        [0, 13],
        [0, 15],
        [20, 15],
        [20, 13],
      ],
      [
        ['r3', 'b'],
        ['r4', 'a'],
        [10, 6],
        [10, 17],
      ],
    ]);
    expect(wiringOf(crossing)).toHaveLength(2);
    expect(wiringOf(crossing).flatMap(junctionsOf)).toEqual([]);
  });

  it('stand where two wires of a pin part ways, and where two wires end on one pin', () => {
    // Both wires run together from (0, 13) to (0, 15) and part there.
    const parting = scene({ r1: [0, 10], r2: [10, 20], r3: [-10, 20] }, {}, [
      [
        ['r1', 'b'],
        ['r2', 'a'],
        [0, 13],
        [0, 15],
        [10, 15],
        [10, 17],
      ],
      [
        ['r1', 'b'],
        ['r3', 'a'],
        [0, 13],
        [0, 15],
        [-10, 15],
        [-10, 17],
      ],
    ]);
    expect(wiringOf(parting).flatMap(junctionsOf)).toEqual([[0, 180]]);
    const shared = scene({ r1: [0, 10], r2: [10, 16], r3: [-10, 16] }, {}, [
      [
        ['r1', 'b'],
        ['r2', 'a'],
        [0, 13],
        [10, 13],
      ],
      [
        ['r1', 'b'],
        ['r3', 'a'],
        [0, 13],
        [-10, 13],
      ],
    ]);
    expect(wiringOf(shared).flatMap(junctionsOf)).toEqual([[0, 156]]);
  });
});

describe('currents along the lines', () => {
  it('are what the pins beyond a cut take', () => {
    const [piece] = wiringOf(star());
    if (piece === undefined) throw new Error('no wiring');
    // 3 mA comes out of R1 and divides: 1 mA into R2, 2 mA into R3.
    const into: Readonly<Record<string, number>> = { 'R1.a': -3e-3, 'R2.a': 1e-3, 'R3.a': 2e-3 };
    const currents = lineCurrents(piece, (part, pin) => into[`${part}.${pin}`]);
    const along = (from: Point, to: Point): number | undefined => {
      const at = ([x, y]: Point) => piece.vertices.findIndex((v) => v.at[0] === 12 * x && v.at[1] === 12 * y);
      const [a, b] = [at(from), at(to)];
      const index = piece.stretches.findIndex(
        (s) => (s.from === a && s.to === b) || (s.from === b && s.to === a),
      );
      const current = currents[index];
      return current === undefined ? undefined : piece.stretches[index]?.from === a ? current : -current;
    };
    expect(along([0, 4], [10, 4])).toBeCloseTo(3e-3, 12);
    expect(along([10, 4], [10, 7])).toBeCloseTo(1e-3, 12);
    expect(along([20, 4], [10, 4])).toBeCloseTo(-2e-3, 12);
  });

  it('follow from the other side where one pin is not known, and are not made up where two are not', () => {
    const [piece] = wiringOf(star());
    if (piece === undefined) throw new Error('no wiring');
    const one = lineCurrents(piece, (part) => (part === 'R1' ? undefined : 1e-3));
    expect(one.map((current) => (current === undefined ? undefined : Math.abs(current)))).toEqual(
      expect.arrayContaining([2e-3, 1e-3]),
    );
    expect(one).not.toContain(undefined);
    const two = lineCurrents(piece, (part) => (part === 'R3' ? 1e-3 : undefined));
    expect(two.filter((current) => current !== undefined).map(Math.abs)).toEqual([1e-3, 1e-3]);
  });

  it('are not made up on a ring of wires', () => {
    const ring = scene({ r1: [0, 10], r2: [10, 20] }, { j1: [0, 14], j2: [10, 14] }, [
      [['r1', 'b'], ['j1'], [0, 13], [0, 14]],
      [['j1'], ['j2'], [0, 14], [10, 14]],
      [['j1'], ['j2'], [0, 14], [0, 16], [10, 16], [10, 14]],
      [['j2'], ['r2', 'a'], [10, 14], [10, 17]],
    ]);
    const [piece] = wiringOf(ring);
    if (piece === undefined) throw new Error('no wiring');
    const currents = lineCurrents(piece, (part) => (part === 'R1' ? -1e-3 : 1e-3));
    // The stretch from (10, 14) to (10, 17) runs over the ring's right side down to (10, 16).
    const known = piece.stretches.filter((_, index) => currents[index] !== undefined);
    expect(known.length).toBeGreaterThanOrEqual(2);
    expect(currents).toContain(undefined);
  });
});

describe('branches', () => {
  it('run through parts from one junction to the next', () => {
    // r1 and r2 in series between two joints, r3 beside them: two branches through parts.
    const bridge = scene(
      { r1: [0, 10], r2: [0, 20], r3: [10, 15], r4: [5, 0], r5: [5, 30] },
      { j1: [5, 5], j2: [5, 25] },
      [
        [['r4', 'b'], ['j1'], [5, 3], [5, 5]],
        [['j1'], ['r1', 'a'], [5, 5], [0, 5], [0, 7]],
        [
          ['r1', 'b'],
          ['r2', 'a'],
          [0, 13],
          [0, 17],
        ],
        [['r2', 'b'], ['j2'], [0, 23], [0, 25], [5, 25]],
        [['j1'], ['r3', 'a'], [5, 5], [10, 5], [10, 12]],
        [['r3', 'b'], ['j2'], [10, 18], [10, 25], [5, 25]],
        [['j2'], ['r5', 'a'], [5, 25], [5, 27]],
      ],
    );
    const through = branchesOf(wiringOf(bridge)).map((branch) => branch.through.map(({ key }) => key).sort());
    expect(through.sort()).toEqual([['R1', 'R2'], ['R3'], ['R4'], ['R5']]);
  });

  it('take every stretch once', () => {
    const wiring = wiringOf(star());
    const runs = branchesOf(wiring).flatMap((branch) =>
      branch.runs.map(({ piece, stretch }) => `${piece}/${stretch}`),
    );
    expect(new Set(runs).size).toBe(runs.length);
    expect(runs).toHaveLength(wiring.reduce((sum, { stretches }) => sum + stretches.length, 0));
  });
});

describe('the strokes of wires', () => {
  it('lie on no other: a line shared by two wires is drawn once', () => {
    const parting = scene({ r1: [0, 10], r2: [10, 20], r3: [-10, 20] }, {}, [
      [
        ['r1', 'b'],
        ['r2', 'a'],
        [0, 13],
        [0, 15],
        [10, 15],
        [10, 17],
      ],
      [
        ['r1', 'b'],
        ['r3', 'a'],
        [0, 13],
        [0, 15],
        [-10, 15],
        [-10, 17],
      ],
    ]);
    const paths = wireShapes(wiringOf(parting)).map((one) => (one.kind === 'path' ? one.commands : []));
    expect(paths).toEqual([
      [
        ['M', 0, 156],
        ['L', 0, 180],
        ['L', 120, 180],
        ['L', 120, 204],
      ],
      [
        ['M', 0, 180],
        ['L', -120, 180],
        ['L', -120, 204],
      ],
    ]);
  });
});
