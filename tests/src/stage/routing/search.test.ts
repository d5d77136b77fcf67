import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cost } from '../../../../src/stage/routing/costs.ts';
import { Field } from '../../../../src/stage/routing/field.ts';
import {
  headingBetween,
  pointsAlong,
  type GridPoint,
  type Polyline,
} from '../../../../src/stage/routing/grid.ts';
import { Heap } from '../../../../src/stage/routing/heap.ts';
import { PathFinder } from '../../../../src/stage/routing/search.ts';

const size = 14;

/** A bare field with some points solid and some dear. */
const fieldOf = (solid: readonly GridPoint[], dear: readonly GridPoint[]): Field => {
  const field = new Field({ left: 0, top: 0, right: size, bottom: size });
  for (const [x, y] of solid) field.solid[field.at(x, y)] = 1;
  for (const [x, y] of dear) field.toll[field.at(x, y)] = 25;
  return field;
};

/** What a line costs by the table of costs alone. */
const priceOf = (field: Field, line: Polyline): number => {
  const points = pointsAlong(line);
  let price = (line.length - 2) * cost.bend + (points.length - 1) * cost.step;
  for (const [x, y] of points.slice(1, -1)) price += field.toll[field.at(x, y)] ?? 0;
  return price;
};

/**
 * The least price from one point to another, by relaxing every state until nothing changes (Bellman, 1958): no
 * bound, no queue, nothing in common with the search but the costs.
 */
const leastPrice = (field: Field, from: GridPoint, to: GridPoint): number => {
  const steps = [
    [1, 0],
    [0, 1],
    [-1, 0],
    [0, -1],
  ] as const;
  const count = field.width * field.height;
  const best = new Float64Array(count * 4).fill(Infinity);
  const start = field.at(...from);
  const goal = field.at(...to);
  for (let changed = true; changed;) {
    changed = false;
    for (let point = 0; point < count; point++) {
      const [x, y] = field.pointAt(point);
      for (const [heading, [dx, dy]] of steps.entries()) {
        const back = field.at(x - dx, y - dy);
        if (back < 0 || (field.solid[point] === 1 && point !== goal)) continue;
        const before = steps.map(
          (_, other) =>
            (best[back * 4 + other] ?? Infinity) +
            (other === heading ? 0 : (other ^ 2) === heading ? Infinity : cost.bend),
        );
        const spent =
          (back === start ? 0 : Math.min(...before)) +
          cost.step +
          (point === goal ? 0 : (field.toll[point] ?? 0));
        if (spent >= (best[point * 4 + heading] ?? Infinity)) continue;
        best[point * 4 + heading] = spent;
        changed = true;
      }
    }
  }
  return Math.min(...steps.map((_, heading) => best[goal * 4 + heading] ?? Infinity));
};

const point = fc.tuple(fc.integer({ min: 0, max: size }), fc.integer({ min: 0, max: size }));

describe('PathFinder', () => {
  it('finds the cheapest route there is', () => {
    fc.assert(
      fc.property(
        fc.array(point, { maxLength: 60, size: 'max' }),
        fc.array(point, { maxLength: 40, size: 'max' }),
        point,
        point,
        (solid, dear, from, to) => {
          fc.pre(from.join() !== to.join() && !solid.some((at) => at.join() === from.join()));
          const field = fieldOf(solid, dear);
          const end = (at: GridPoint) => ({ at, heading: null, sideways: 0 });
          const line = new PathFinder(field).find({
            from: end(from),
            to: end(to),
            net: 0,
            lines: null,
            beyond: 99,
          });
          const least = leastPrice(field, from, to);
          expect(line === null ? Infinity : priceOf(field, line)).toBe(least);
          for (let index = 1; index < (line?.length ?? 0); index++) {
            expect(headingBetween(line?.[index - 1] ?? [0, 0], line?.[index] ?? [0, 0])).not.toBeNull();
          }
        },
      ),
      { seed: 3, numRuns: 150 },
    );
  });
});

describe('Heap', () => {
  it('gives items by key, of equal keys the last one in first, however many there are', () => {
    const heap = new Heap();
    const keys = Array.from({ length: 3000 }, (_, index) => (index * 7919) % 97);
    for (const [item, key] of keys.entries()) heap.push(key, item, item + 1);
    const order = [...keys.keys()].sort((a, b) => (keys[a] ?? 0) - (keys[b] ?? 0) || b - a);
    for (const item of order) {
      expect(heap.pop()).toBe(item);
      expect(heap.poppedTag).toBe(item + 1);
    }
    expect(heap.size).toBe(0);
  });
});
