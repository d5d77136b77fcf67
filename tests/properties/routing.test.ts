import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { DrawnPart, DrawnStage } from '../../src/stage/routing/document.ts';
import { rerouteAfterMove } from '../../src/stage/routing/reroute.ts';
import { routeStage } from '../../src/stage/routing/routeWires.ts';
import { cornersOf } from '../../src/stage/routing/routing.ts';
import { faultsOf } from '../src/stage/routing/inspect.ts';
import { placedStage } from './drawnStages.ts';

const runs = { seed: 20, numRuns: 300 };

/** The document with every route stated as its wire's path. */
const stated = (document: DrawnStage, paths: ReturnType<typeof routeStage>['paths']): DrawnStage => ({
  ...document,
  wires: Object.fromEntries(
    Object.entries(document.wires).map(([id, wire]) => [
      id,
      { ...wire, path: cornersOf(paths.get(id) ?? []) },
    ]),
  ),
});

const shifted = (document: DrawnStage, id: string, by: readonly [number, number]): DrawnStage => {
  const part: DrawnPart | undefined = document.parts[id];
  if (part?.place === undefined) return document;
  const place = [part.place[0] + by[0], part.place[1] + by[1]] as const;
  return { ...document, parts: { ...document.parts, [id]: { ...part, place } } };
};

describe('routes of random stages', () => {
  it('keep off bodies, foreign pins and foreign lines, turn at right angles, and end on their pins', () => {
    fc.assert(
      fc.property(placedStage(18, 24), (document) => {
        expect(faultsOf(document, routeStage(document))).toEqual([]);
      }),
      runs,
    );
  });

  it('are found for all but a few wires even where pins are joined at random', () => {
    const stages = fc.sample(placedStage(18, 24), { ...runs, numRuns: 200 });
    let wires = 0;
    let blocked = 0;
    for (const stage of stages) {
      const routing = routeStage(stage);
      wires += routing.paths.size;
      blocked += routing.blocked.size;
    }
    expect(wires).toBeGreaterThan(1000);
    expect(blocked / wires).toBeLessThan(0.01);
  });

  it('are the same every time, and whatever order the parts stand in the file', () => {
    fc.assert(
      fc.property(placedStage(12, 14), (document) => {
        const once = routeStage(document);
        expect(routeStage(structuredClone(document))).toEqual(once);
        const parts = Object.fromEntries(Object.entries(document.parts).reverse());
        expect(routeStage({ ...document, parts }).paths).toEqual(once.paths);
      }),
      { ...runs, numRuns: 60 },
    );
  });

  it('stated as paths come out as they are', () => {
    fc.assert(
      fc.property(placedStage(18, 20), (document) => {
        const first = routeStage(document);
        fc.pre(first.blocked.size === 0);
        expect(routeStage(stated(document, first.paths)).paths).toEqual(first.paths);
      }),
      { ...runs, numRuns: 120 },
    );
  });

  it('keep all of this when a part moves, and leave wires alone that it does not concern', () => {
    const by = fc.tuple(fc.integer({ min: -2, max: 2 }), fc.integer({ min: -2, max: 2 }));
    fc.assert(
      fc.property(placedStage(18, 20), fc.nat(), by, (document, pick, offset) => {
        const before = routeStage(document);
        const ids = Object.keys(document.parts);
        const id = ids[pick % ids.length] ?? '';
        const after = shifted(document, id, offset);
        const routing = rerouteAfterMove(after, before);
        expect(faultsOf(after, routing)).toEqual([]);
        expect(faultsOf(after, rerouteAfterMove(stated(after, before.paths), before))).toEqual([]);
        if (offset[0] === 0 && offset[1] === 0 && before.blocked.size === 0) expect(routing).toEqual(before);
      }),
      runs,
    );
  });
});
