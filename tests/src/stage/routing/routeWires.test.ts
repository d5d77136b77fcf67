import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { DrawnStage } from '../../../../src/stage/routing/document.ts';
import { lengthOf } from '../../../../src/stage/routing/grid.ts';
import { linesOf } from '../../../../src/stage/routing/lines.ts';
import { routeStage, routeWires } from '../../../../src/stage/routing/routeWires.ts';
import { cornersOf } from '../../../../src/stage/routing/routing.ts';
import { ground, mosfet, rail, resistor, stage, wire } from './hand.ts';
import { faultsOf } from './inspect.ts';

const route = (document: DrawnStage, id = 'w1') => routeWires(document).get(id);

describe('a route', () => {
  it('is one straight line between pins that face each other', () => {
    const document = stage({ p1: resistor([0, 0]), p2: resistor([12, 0]) }, [wire('p1.b', 'p2.a')]);
    expect(route(document)).toEqual([
      [3, 0],
      [9, 0],
    ]);
  });

  it('starts at the wire’s first end and stops at its last, whichever way round they lie', () => {
    const document = stage({ p1: resistor([0, 0]), p2: resistor([12, 0]) }, [wire('p2.a', 'p1.b')]);
    expect(route(document)).toEqual([
      [9, 0],
      [3, 0],
    ]);
  });

  it('takes one bend where one is enough, and leaves and meets pins in line with their leads', () => {
    const document = stage({ p1: resistor([0, 0]), p2: resistor([10, 10], 90) }, [wire('p1.b', 'p2.a')]);
    expect(route(document)).toEqual([
      [3, 0],
      [10, 0],
      [10, 7],
    ]);
  });

  it('goes round a part in its way', () => {
    const parts = { p1: resistor([0, 0]), p2: resistor([10, 0], 90), p3: resistor([20, 0]) };
    const document = stage(parts, [wire('p1.b', 'p3.a')]);
    expect(faultsOf(document, routeStage(document))).toEqual([]);
    expect(lengthOf(route(document) ?? [])).toBeGreaterThan(14);
  });

  it('crosses another net’s line straight over, and only where it must', () => {
    const parts = {
      p1: resistor([0, 0]),
      p2: resistor([20, 0]),
      p3: rail('VBAT', [10, -12]),
      p4: ground([10, 12]),
    };
    const document = stage(parts, [wire('p1.b', 'p2.a'), wire('p3.node', 'p4.node')]);
    const { paths, blocked } = routeStage(document);
    expect(blocked.size).toBe(0);
    const { crossings, junctions } = linesOf(document, paths);
    expect(junctions).toEqual([]);
    // The long way round costs more than one crossing.
    expect(crossings).toEqual([[10, 0]]);
  });

  it('shares the trunk of its own net, which is then a junction', () => {
    const parts = { p1: rail('VBAT', [0, 0]), p2: resistor([20, 10], 90), p3: resistor([30, 10], 90) };
    const document = stage(parts, [wire('p1.node', 'p2.a'), wire('p1.node', 'p3.a')]);
    const { paths } = routeStage(document);
    const { stretches, junctions } = linesOf(document, paths);
    expect(junctions).toHaveLength(1);
    // 30 across and 7 down to each: all the ink there need be.
    const ink = stretches.reduce((sum, { from, to }) => sum + lengthOf([from, to]), 0);
    expect(ink).toBe(30 + 7 + 7);
  });

  it('never touches a pin on which no wire ends', () => {
    const parts = { p1: resistor([0, 0]), p2: resistor([10, 3], 90), p3: resistor([20, 0]) };
    const document = stage(parts, [wire('p1.b', 'p3.a')]);
    // p2's upper pin lies on the straight line.
    expect(route(document)?.length).toBeGreaterThan(2);
    expect(faultsOf(document, routeStage(document))).toEqual([]);
  });

  it('of no length joins pins that lie on one another', () => {
    const document = stage({ p1: resistor([0, 0]), p2: resistor([6, 0]) }, [wire('p1.b', 'p2.a')]);
    expect(route(document)).toEqual([
      [3, 0],
      [3, 0],
    ]);
  });

  it('is left out for a wire with an end that has no place', () => {
    const document = stage({ p1: resistor([0, 0]), p2: resistor() }, [wire('p1.b', 'p2.a')]);
    expect(routeWires(document).size).toBe(0);
  });

  it('is a flagged L where there is no way at all', () => {
    // p1.b lies inside the body of the transistor that was set down upon it.
    const parts = { p1: resistor([0, 0]), p2: mosfet('n', [3, 0]), p3: resistor([20, 8]) };
    const document = stage(parts, [wire('p1.b', 'p3.a')]);
    const { paths, blocked } = routeStage(document);
    expect([...blocked]).toEqual(['w1']);
    expect(paths.get('w1')).toEqual([
      [3, 0],
      [17, 0],
      [17, 8],
    ]);
  });
});

describe('a stated path', () => {
  const parts = { p1: resistor([0, 0]), p2: resistor([20, 0]) };

  it('is kept as it is, detour and all', () => {
    const document = stage(parts, [
      wire('p1.b', 'p2.a', [
        [6, 0],
        [6, -8],
        [15, -8],
        [15, 0],
      ]),
    ]);
    expect(cornersOf(route(document) ?? [])).toEqual(document.wires.w1?.path);
  });

  it('is not kept where it runs through a part', () => {
    const document = stage({ ...parts, p3: resistor([10, -8], 90) }, [
      wire('p1.b', 'p2.a', [
        [6, 0],
        [6, -8],
        [15, -8],
        [15, 0],
      ]),
    ]);
    expect(route(document)).toEqual([
      [3, 0],
      [17, 0],
    ]);
  });

  it('follows an end that has moved: the run next to it slides, the rest stays', () => {
    const document = stage({ ...parts, p1: resistor([0, 2]) }, [
      wire('p1.b', 'p2.a', [
        [6, 0],
        [6, -8],
        [15, -8],
        [15, 0],
      ]),
    ]);
    expect(route(document)).toEqual([
      [3, 2],
      [6, 2],
      [6, -8],
      [15, -8],
      [15, 0],
      [17, 0],
    ]);
  });

  it('of a single corner follows both ends', () => {
    const corner = { p1: resistor([0, 0]), p2: resistor([10, 10], 90) };
    const moved = (p1: readonly [number, number]) =>
      route(stage({ ...corner, p1: resistor(p1) }, [wire('p1.b', 'p2.a', [[10, 0]])]));
    expect(moved([0, 0])).toEqual([
      [3, 0],
      [10, 0],
      [10, 7],
    ]);
    expect(moved([1, -2])).toEqual([
      [4, -2],
      [10, -2],
      [10, 7],
    ]);
  });

  it('of slanted corners gets corners of its own', () => {
    const document = stage(parts, [wire('p1.b', 'p2.a', [[8, 5]])]);
    expect(faultsOf(document, routeStage(document))).toEqual([]);
  });

  it('that runs along an earlier one of another net gives way', () => {
    const four = { ...parts, p3: resistor([0, 6]), p4: resistor([20, 6]) };
    const high = [
      [6, 0],
      [6, 3],
      [14, 3],
      [14, 0],
    ] as const;
    const low = [
      [6, 6],
      [6, 3],
      [14, 3],
      [14, 6],
    ] as const;
    const document = stage(four, [wire('p1.b', 'p2.a', high), wire('p3.b', 'p4.a', low)]);
    expect(cornersOf(route(document) ?? [])).toEqual(high);
    expect(faultsOf(document, routeStage(document))).toEqual([]);
  });
});

describe('the examples', () => {
  const folder = new URL('../../../../examples/', import.meta.url);
  for (const file of readdirSync(folder).filter((name) => name.endsWith('.stage.json'))) {
    const document = JSON.parse(readFileSync(new URL(file, folder), 'utf8')) as DrawnStage;
    if (Object.values(document.parts).some(({ place }) => place === undefined)) continue;

    it(`${file} is drawn as stated, without a fault`, () => {
      const routing = routeStage(document);
      expect(faultsOf(document, routing)).toEqual([]);
      expect([...routing.blocked]).toEqual([]);
      for (const [id, { path }] of Object.entries(document.wires)) {
        if (path !== undefined) expect(cornersOf(routing.paths.get(id) ?? []), id).toEqual(path);
      }
    });

    it(`${file} is drawn without a fault where no path is stated`, () => {
      const wires = Object.fromEntries(
        Object.entries(document.wires).map(([id, { ends }]) => [id, { ends }]),
      );
      const bare = { ...document, wires };
      const routing = routeStage(bare);
      expect(faultsOf(bare, routing)).toEqual([]);
      expect([...routing.blocked]).toEqual([]);
      const most = Math.floor(Object.keys(document.parts).length / 10);
      expect(linesOf(bare, routing.paths).crossings.length).toBeLessThanOrEqual(most);
    });
  }
});
