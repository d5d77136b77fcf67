import { describe, expect, it } from 'vitest';
import { createPattern } from '../../../solver/matrix/pattern.ts';

describe('createPattern', () => {
  it('compresses the columns, rows ascending, each place once', () => {
    // Hand-worked: column 0 has rows 0 and 2, column 1 none, column 2 has rows 0 and 1.
    const pattern = createPattern(3, [[2, 0], [0, 2], [1, 2], [0, 0], [2, 0]]); // prettier-ignore
    expect(Array.from(pattern.columnStart)).toEqual([0, 2, 2, 4]);
    expect(Array.from(pattern.rowIndex)).toEqual([0, 2, 0, 1]);
    expect(pattern.entryCount).toBe(4);
  });

  it('finds the slot of every entry', () => {
    const pattern = createPattern(3, [[2, 0], [0, 2], [1, 2], [0, 0]]); // prettier-ignore
    expect([pattern.slotOf(0, 0), pattern.slotOf(2, 0), pattern.slotOf(0, 2), pattern.slotOf(1, 2)]).toEqual([
      0, 1, 2, 3,
    ]);
  });

  it('sends what belongs to the reference node to the spare slot', () => {
    const pattern = createPattern(2, [[0, 0], [-1, 1], [1, -1], [-1, -1]]); // prettier-ignore
    expect(pattern.entryCount).toBe(1);
    expect([pattern.slotOf(-1, 1), pattern.slotOf(1, -1), pattern.slotOf(-1, -1)]).toEqual([1, 1, 1]);
  });

  it('holds an empty matrix', () => {
    const pattern = createPattern(0, []);
    expect(pattern.entryCount).toBe(0);
    expect(Array.from(pattern.columnStart)).toEqual([0]);
  });

  it('throws with the place where an entry lies outside the matrix or is not in the pattern', () => {
    expect(() => createPattern(2, [[0, 2]])).toThrow('entry (0, 2) is outside a matrix of size 2');
    expect(() => createPattern(2, [[0.5, 1]])).toThrow(RangeError);
    expect(() => createPattern(-1, [])).toThrow('pattern size must be 0 or more, got -1');
    expect(() => createPattern(2, [[0, 0]]).slotOf(1, 0)).toThrow('entry (1, 0) is not in the pattern');
  });
});
