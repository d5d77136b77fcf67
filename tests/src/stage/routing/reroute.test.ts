import { describe, expect, it } from 'vitest';
import type { DrawnStage } from '../../../../src/stage/routing/document.ts';
import type { GridPoint } from '../../../../src/stage/routing/grid.ts';
import { rerouteAfterMove } from '../../../../src/stage/routing/reroute.ts';
import { routeStage } from '../../../../src/stage/routing/routeWires.ts';
import { resistor, stage, wire } from './hand.ts';
import { faultsOf } from './inspect.ts';

const parts = {
  p1: resistor([0, 0]),
  p2: resistor([20, 0]),
  p3: resistor([0, 8]),
  p4: resistor([20, 8]),
  p5: resistor([10, 16]),
};
const document = stage(parts, [wire('p1.b', 'p2.a'), wire('p3.b', 'p4.a')]);
const before = routeStage(document);

const moved = (id: keyof typeof parts, place: GridPoint): DrawnStage => ({
  ...document,
  parts: { ...parts, [id]: resistor(place) },
});

describe('rerouteAfterMove', () => {
  it('brings the wires of a moved part along and leaves the others as they were', () => {
    const after = moved('p2', [20, 3]);
    const { paths } = rerouteAfterMove(after, before);
    expect(paths.get('w1')?.at(-1)).toEqual([17, 3]);
    expect(paths.get('w2')).toBe(before.paths.get('w2'));
  });

  it('lets a wire give way to a part put down upon it, and go back when it leaves', () => {
    const upon = moved('p5', [10, 8]);
    const aside = rerouteAfterMove(upon, before);
    expect(faultsOf(upon, aside)).toEqual([]);
    expect(aside.paths.get('w2')?.length).toBeGreaterThan(2);
    expect(rerouteAfterMove(document, aside).paths.get('w2')).toBe(aside.paths.get('w2'));
    expect(routeStage(document)).toEqual(before);
  });

  it('draws a wire that is new and forgets one that is gone', () => {
    const after = { ...document, wires: { w1: wire('p1.b', 'p2.a'), w3: wire('p5.a', 'p3.b') } };
    const { paths } = rerouteAfterMove(after, before);
    expect([...paths.keys()]).toEqual(['w1', 'w3']);
    expect(faultsOf(after, { paths, blocked: new Set() })).toEqual([]);
  });
});
