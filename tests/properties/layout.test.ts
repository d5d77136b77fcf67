import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { layOut } from '../../src/stage/layout/layOut.ts';
import type { DrawnPart, DrawnStage } from '../../src/stage/routing/document.ts';
import { boxesOverlap } from '../../src/stage/routing/grid.ts';
import { routeStage } from '../../src/stage/routing/routeWires.ts';
import { reachOf, standParts } from '../../src/stage/routing/shape.ts';
import { faultsOf } from '../src/stage/routing/inspect.ts';
import { placedStage, unplacedStage } from './drawnStages.ts';

const runs = { seed: 4, numRuns: 60 };

/** Pairs of parts that stand on one another, body and leads. */
const overlapping = (document: DrawnStage): string[] => {
  const parts = [...standParts(document).values()];
  return parts.flatMap((a, index) =>
    parts
      .slice(index + 1)
      .filter((b) => boxesOverlap(reachOf(a), reachOf(b)))
      .map((b) => `${a.id} stands on ${b.id}`),
  );
};

/** The document with every `every`th part's place forgotten. */
const thinned = (document: DrawnStage, every: number): DrawnStage => ({
  ...document,
  parts: Object.fromEntries(
    Object.entries(document.parts).map(([id, part], index): [string, DrawnPart] => {
      if (index % every !== 0) return [id, part];
      const { kind, name, device, values } = part;
      return [id, { kind, name, device, values }];
    }),
  ),
});

const checked = (document: DrawnStage): void => {
  const laid = layOut(document);
  for (const [id, { place }] of Object.entries(document.parts)) {
    if (place === undefined) expect(laid.parts[id]?.place, id).toBeDefined();
    else expect(laid.parts[id]).toBe(document.parts[id]);
  }
  expect(overlapping(laid)).toEqual([]);
  const routing = routeStage(laid);
  expect([...routing.blocked]).toEqual([]);
  expect(faultsOf(laid, routing)).toEqual([]);
};

describe('laying out random stages', () => {
  it('places every part, none on another, with room for every wire to go round', () => {
    fc.assert(
      fc.property(unplacedStage(15, 16), (document) => {
        checked(document);
      }),
      runs,
    );
  });

  it('leaves placed parts alone and finds room for the others among them', () => {
    fc.assert(
      fc.property(placedStage(12, 10), fc.integer({ min: 2, max: 4 }), (document, every) => {
        checked(thinned(document, every));
      }),
      runs,
    );
  });

  it('gives the same places every time', () => {
    fc.assert(
      fc.property(unplacedStage(12, 12), (document) => {
        expect(layOut(structuredClone(document))).toEqual(layOut(document));
      }),
      { ...runs, numRuns: 20 },
    );
  });

  it('changes nothing where every part has a place', () => {
    fc.assert(
      fc.property(placedStage(12, 12), (document) => {
        expect(layOut(document)).toBe(document);
      }),
      { ...runs, numRuns: 20 },
    );
  });
});
