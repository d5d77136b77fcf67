import { describe, expect, it } from 'vitest';
import { createPattern } from '../../../solver/matrix/pattern.ts';
import { createLinearSystem } from '../../../solver/matrix/linearSystem.ts';

describe('createLinearSystem', () => {
  it('solves a 2 × 2 system and its transpose', () => {
    // Worked by hand: [[2, 1], [4, 5]]·[1, 2] = [4, 14]; transposed: [2 + 8, 1 + 10] = [10, 11]; det = 6.
    const system = createLinearSystem(createPattern(2, [[0, 0], [0, 1], [1, 0], [1, 1]])); // prettier-ignore
    system.values.set([2, 4, 1, 5]);
    expect(system.factorise().kind).toBe('factored');
    const b = Float64Array.of(4, 14);
    system.solve(b);
    expect(Array.from(b)).toEqual([1, 2]);
    const c = Float64Array.of(10, 11);
    system.solveTransposed(c);
    expect(Array.from(c)).toEqual([1, 2]);
    expect(system.determinantSign()).toBe(1);
    expect(system.logDeterminant()).toBeCloseTo(Math.log(6), 14);
  });
});
