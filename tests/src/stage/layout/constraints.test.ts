import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Constraints } from '../../../../src/stage/layout/constraints.ts';

describe('Constraints', () => {
  it('puts each position as low as its distances allow', () => {
    const system = new Constraints();
    const [a, b, c] = [system.add(), system.add(), system.add()];
    expect(system.require(a, b, 4)).toBe(true);
    expect(system.require(a, c, 10)).toBe(true);
    expect(system.require(b, c, 3)).toBe(true);
    expect([system.low(a), system.low(b), system.low(c)]).toEqual([0, 4, 10]);
    system.limit(12);
    expect([system.high(a), system.high(b), system.high(c)]).toEqual([2, 9, 12]);
  });

  it('refuses what does not fit and stays as it was', () => {
    const system = new Constraints();
    const [a, b] = [system.add(), system.add()];
    system.require(a, b, 4);
    expect(system.equal(a, b)).toBe(false);
    expect(system.require(b, a, -3)).toBe(false);
    expect([system.low(a), system.low(b)]).toEqual([0, 4]);
    expect(system.require(b, a, -9)).toBe(true);
    expect(system.fix(b, 20)).toBe(true);
    expect(system.low(a)).toBe(11);
  });

  it('never passes the limit', () => {
    const system = new Constraints();
    const [a, b] = [system.add(), system.add()];
    system.require(a, b, 4);
    system.limit(6);
    expect(system.fix(a, 3)).toBe(false);
    expect(system.fix(a, 2)).toBe(true);
    expect(system.low(b)).toBe(6);
  });

  it('agrees with trying every way of setting a few positions', () => {
    const arc = fc.tuple(
      fc.integer({ min: 0, max: 3 }),
      fc.integer({ min: 0, max: 3 }),
      fc.integer({ min: -3, max: 3 }),
    );
    fc.assert(
      fc.property(fc.array(arc, { maxLength: 6 }), (arcs) => {
        const system = new Constraints();
        for (let index = 1; index <= 3; index++) system.add();
        const taken = arcs.filter(([from, to, least]) => system.require(from, to, least));
        // Distances of at most 3 over three positions keep within 0 … 9 if they can be kept at all.
        const range = Array.from({ length: 10 }, (_, value) => value);
        const fits = (values: readonly number[], list: typeof arcs) =>
          list.every(([from, to, least]) => (values[to] ?? 0) - (values[from] ?? 0) >= least);
        const all = range.flatMap((x) => range.flatMap((y) => range.map((z) => [0, x, y, z])));
        const possible = all.filter((values) => fits(values, taken));
        expect(possible.length).toBeGreaterThan(0);
        for (const index of [1, 2, 3]) {
          expect(system.low(index)).toBe(Math.min(...possible.map((values) => values[index] ?? 0)));
        }
        for (const refused of arcs.filter((one) => !taken.includes(one))) {
          const earlier = taken.filter((one) => arcs.indexOf(one) < arcs.indexOf(refused));
          expect(all.some((values) => fits(values, [...earlier, refused]))).toBe(false);
        }
      }),
      { seed: 9, numRuns: 60 },
    );
  });
});
