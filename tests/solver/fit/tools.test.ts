import { describe, expect, it } from 'vitest';
import { leastSquares } from '../../../solver/fit/leastSquares.ts';
import { findRoot } from '../../../solver/fit/root.ts';

describe('findRoot', () => {
  it('finds √2 to the last digit', () => {
    expect(findRoot((x) => x * x - 2, 0, 10)).toBeCloseTo(Math.SQRT2, 15);
  });

  it('finds the root of a function of many decades', () => {
    expect(findRoot((x) => Math.exp(x) - 1e-12, -100, 100)).toBeCloseTo(Math.log(1e-12), 12);
  });

  it('takes an end that is a root, and finds none without a change of sign', () => {
    expect(findRoot((x) => x, 0, 1)).toBe(0);
    expect(findRoot((x) => x * x + 1, -1, 1)).toBeUndefined();
    expect(findRoot(() => NaN, -1, 1)).toBeUndefined();
  });
});

describe('leastSquares', () => {
  const everywhere = { low: [-10, -10], high: [10, 10] };

  it('finds the minimum of the banana valley (Rosenbrock 1960): (1, 1)', () => {
    const { x, cost } = leastSquares(([a = 0, b = 0]) => [10 * (b - a * a), 1 - a], [-1.2, 1], everywhere);
    expect(x[0]).toBeCloseTo(1, 8);
    expect(x[1]).toBeCloseTo(1, 8);
    expect(cost).toBeLessThan(1e-16);
  });

  it('finds the straight line through points that are on none (normal equations by hand)', () => {
    // Points (0, 0), (1, 1), (2, 1): slope 1/2, intercept 1/6.
    const { x } = leastSquares(
      ([slope = 0, intercept = 0]) => [intercept, slope + intercept - 1, 2 * slope + intercept - 1],
      [0, 0],
      everywhere,
    );
    expect(x[0]).toBeCloseTo(1 / 2, 8);
    expect(x[1]).toBeCloseTo(1 / 6, 8);
  });

  it('stays in its box, and goes on along a bound', () => {
    const { x } = leastSquares(([a = 0, b = 0]) => [a - 3, b - 2], [0, 0], {
      low: [-1, -10],
      high: [1, 10],
    });
    expect(x[0]).toBe(1);
    expect(x[1]).toBeCloseTo(2, 8);
  });
});
