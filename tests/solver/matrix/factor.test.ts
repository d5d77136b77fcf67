import { describe, expect, it } from 'vitest';
import { factor } from '../../../solver/matrix/factor.ts';
import { byColumns, byListedSteps } from '../../../solver/matrix/factorisation.ts';
import { parity, type FactorPlaces } from '../../../solver/matrix/factors.ts';
import { eliminationOrder } from '../../../solver/matrix/order.ts';
import { numbersFor, refactor, sound } from '../../../solver/matrix/refactor.ts';
import { caseOf, caseOfDense, circuitCase, vectorOf, type MatrixCase } from './cases.ts';

function placesOf({ pattern, values }: MatrixCase): FactorPlaces {
  const places = factor(pattern, eliminationOrder(pattern), values);
  if ('kind' in places) throw new Error(`${places.kind} at ${places.column}`);
  return places;
}

const at = (array: ArrayLike<number>, index: number): number => array[index] ?? NaN;

/** L·U in every diagonal block and the entries between blocks as they stand, multiplied out plainly. */
function multipliedOut(places: FactorPlaces, entries: Float64Array): number[][] {
  const { size, start, diagonal, outer, position } = places;
  const square = () => Array.from({ length: size }, () => new Array<number>(size).fill(0));
  const [lower, upper, product] = [square(), square(), square()];
  for (let k = 0; k < size; k++) {
    const put = (into: number[][], from: number, to: number) => {
      for (let p = from; p < to; p++) (into[at(position, p)] ?? [])[k] = at(entries, p);
    };
    (lower[k] ?? [])[k] = 1;
    put(upper, at(start, k), at(diagonal, k) + 1);
    put(lower, at(diagonal, k) + 1, at(outer, k));
    put(product, at(outer, k), at(start, k + 1));
  }
  for (let i = 0; i < size; i++)
    for (let j = 0; j < size; j++) {
      const row = product[i] ?? [];
      for (let k = 0; k < size; k++) row[j] = at(row, j) + at(lower[i] ?? [], k) * at(upper[k] ?? [], j);
    }
  return product;
}

const shapes = Array.from({ length: 40 }, (_, i) => ({
  seed: i + 1,
  shape: { nodes: 2 + ((i * 7) % 38), sources: i % 5, transconductances: i % 9, decades: 1 + (i % 6) },
}));

describe('factor and refactor', () => {
  it('multiply back to the permuted matrix, to rounding relative to its largest terms', () => {
    for (const { seed, shape } of shapes) {
      const given = circuitCase(seed, shape);
      const places = placesOf(given);
      const numbers = numbersFor(places);
      expect(refactor(places, given.values, numbers)).toBe(sound);
      const product = multipliedOut(places, numbers.entries);
      const magnitudes = multipliedOut(places, numbers.entries.map(Math.abs));
      for (let i = 0; i < places.size; i++)
        for (let j = 0; j < places.size; j++) {
          const original = at(given.dense[at(places.rows, i)] ?? [], at(places.columns, j));
          const size = at(magnitudes[i] ?? [], j);
          // Each product and sum rounds to half a unit in 2⁻⁵²; at most `size` of them meet in one entry.
          const bound = places.size * Number.EPSILON * size;
          expect(
            Math.abs(at(product[i] ?? [], j) - original),
            `seed ${seed} (${i}, ${j})`,
          ).toBeLessThanOrEqual(bound);
        }
    }
  });

  it('keep every multiplier of fresh pivots within the threshold of a tenth', () => {
    for (const { seed, shape } of shapes) {
      const given = circuitCase(seed, shape);
      const places = placesOf(given);
      const numbers = numbersFor(places);
      refactor(places, given.values, numbers);
      for (let k = 0; k < places.size; k++)
        for (let p = at(places.diagonal, k) + 1; p < at(places.outer, k); p++)
          expect(Math.abs(at(numbers.entries, p)), `seed ${seed}`).toBeLessThanOrEqual(10 * (1 + 1e-9));
    }
  });

  it('take rows in an order of their own where the diagonal is zero', () => {
    // Three unknowns each standing in the next one's row: the only pivots are off the diagonal.
    const given = caseOfDense([[0, 3, 0], [0, 0, 5], [7, 0, 0]]); // prettier-ignore
    const places = placesOf(given);
    const numbers = numbersFor(places);
    expect(refactor(places, given.values, numbers)).toBe(sound);
    for (let k = 0; k < 3; k++) expect(at(places.rows, k)).toBe((at(places.columns, k) + 2) % 3);
  });

  it('have the same pattern where an entry happens to be zero', () => {
    const given = circuitCase(5, { nodes: 12, sources: 2, transconductances: 6, decades: 2 });
    const places = placesOf(given);
    // An off-diagonal value set to zero leaves pivots and places as they were.
    const values = given.values.slice();
    const slot = given.pattern.slotOf(3, 3) === 0 ? 1 : given.pattern.slotOf(3, 3) - 1;
    values[slot] = 0;
    const other = factor(given.pattern, eliminationOrder(given.pattern), values);
    if ('kind' in other) throw new Error(other.kind);
    if (Array.from(other.rows).join() === Array.from(places.rows).join())
      expect(Array.from(other.position)).toEqual(Array.from(places.position));
    expect(refactor(places, values, numbersFor(places))).toBe(sound);
  });

  it('refuse a pivot below a thousandth of its column, and take one just above', () => {
    // Pivots chosen at (1, 1; 1, 2) are the diagonal; then the first is made small against the 1 below it.
    const given = caseOfDense([[1, 1], [1, 2]]); // prettier-ignore
    const places = placesOf(given);
    const [column, row] = [at(places.columns, 0), at(places.rows, 0)];
    const slot = given.pattern.slotOf(row, column);
    for (const form of [byColumns, byListedSteps]) {
      const factors = form(places);
      const values = given.values.slice();
      values[slot] = 0.00101 * at(given.dense[1 - row] ?? [], column);
      expect(factors.refactor(values)).toBe(sound);
      values[slot] = 0.00099 * at(given.dense[1 - row] ?? [], column);
      expect(factors.refactor(values)).toBe(0);
      values[slot] = NaN;
      expect(factors.refactor(values)).toBe(0);
      values[slot] = Infinity;
      expect(factors.refactor(values)).toBe(0);
    }
  });
});

describe('the two forms of a factorisation', () => {
  it('give the same pivots and answers to the last bit, small and large', () => {
    const large = circuitCase(99, { nodes: 260, sources: 4, transconductances: 60, decades: 2 });
    for (const given of [...shapes.map(({ seed, shape }) => circuitCase(seed, shape)), large]) {
      const places = placesOf(given);
      const [columns, listed] = [byColumns(places), byListedSteps(places)];
      expect(columns.refactor(given.values)).toBe(sound);
      expect(listed.refactor(given.values)).toBe(sound);
      expect(Array.from(listed.inversePivot)).toEqual(Array.from(columns.inversePivot));
      const b = vectorOf(3, places.size);
      const [x, y] = [b.slice(), b.slice()];
      columns.solve(x);
      listed.solve(y);
      expect(Array.from(y)).toEqual(Array.from(x));
      columns.solveTransposed(x);
      listed.solveTransposed(y);
      expect(Array.from(y)).toEqual(Array.from(x));
    }
  });

  it('meet columns that are nested four and more deep', () => {
    const size = 14;
    const stamps = Array.from({ length: size * size }, (_, i): [number, number, number] => [
      Math.floor(i / size),
      i % size,
      Math.floor(i / size) === i % size ? size : at(vectorOf(i, 1), 0),
    ]);
    const places = placesOf(caseOf(size, stamps));
    expect(at(places.nested, 0)).toBeGreaterThanOrEqual(4);
  });
});

describe('parity', () => {
  it('is that of the number of exchanges', () => {
    expect(parity(Int32Array.of())).toBe(1);
    expect(parity(Int32Array.of(0, 1, 2))).toBe(1);
    expect(parity(Int32Array.of(1, 0, 2))).toBe(-1);
    expect(parity(Int32Array.of(1, 2, 0))).toBe(1);
    expect(parity(Int32Array.of(1, 0, 3, 2))).toBe(1);
    expect(parity(Int32Array.of(3, 0, 1, 2))).toBe(-1);
  });
});
