import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  isPreferred,
  nearestPreferred,
  neighbours,
  preferredAtOrAbove,
  preferredAtOrBelow,
  preferredBetween,
  seriesNames,
} from '../../../src/values/series.ts';

const size = fc.double({ min: 1e-12, max: 1e11, noNaN: true });
const series = fc.constantFrom(...seriesNames);
const runs = { seed: 60063, numRuns: 2000 };

describe('preferred values', () => {
  it('stand on both sides of a value, without one between', () => {
    expect(neighbours('E24', 4800)).toEqual({ down: 4700, up: 5100 });
    expect(neighbours('E24', 4700)).toEqual({ down: 4300, up: 5100 });
    expect(neighbours('E3', 1000)).toEqual({ down: 470, up: 2200 });
    expect(neighbours('E12', 0.99)).toEqual({ down: 0.82, up: 1 });
    fc.assert(
      fc.property(series, size, (name, value) => {
        const { down, up } = neighbours(name, value);
        expect(down < value && value < up).toBe(true);
        expect(preferredBetween(name, down, up)).toHaveLength(isPreferred(name, value) ? 3 : 2);
      }),
      runs,
    );
  });
  it('are nearest in ratio', () => {
    expect(nearestPreferred('E3', 1480)).toBe(1000); // √(1000·2200) = 1483.2…
    expect(nearestPreferred('E3', 1490)).toBe(2200);
    fc.assert(
      fc.property(series, size, (name, value) => {
        const distance = (other: number) => Math.abs(Math.log(other / value));
        const nearest = nearestPreferred(name, value);
        const { down, up } = neighbours(name, value);
        expect(distance(nearest)).toBeLessThanOrEqual(Math.min(distance(down), distance(up)) + 1e-15);
      }),
      runs,
    );
  });
  it('are found in every decade, to the digit', () => {
    for (const decade of [-12, -3, 0, 3, 9]) {
      const value = Number(`4.7e${decade}`);
      expect(preferredAtOrBelow('E6', value)).toBe(value);
      expect(preferredAtOrAbove('E6', value)).toBe(value);
      expect(isPreferred('E96', value)).toBe(false);
    }
  });
  it('between two limits are listed rising', () => {
    expect(preferredBetween('E6', 90, 1000)).toEqual([100, 150, 220, 330, 470, 680, 1000]);
    expect(preferredBetween('E6', 160, 210)).toEqual([]);
  });
  it('near nothing are a programmer’s mistake', () => {
    expect(() => nearestPreferred('E24', 0)).toThrow(RangeError);
    expect(() => nearestPreferred('E24', Number.NaN)).toThrow(RangeError);
  });
});
