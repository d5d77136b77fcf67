/** Numeric refactorisation: new values in a known pattern and pivot order. */
import type { FactorPlaces } from './factors.ts';
import { refactorThreshold } from './tolerances.ts';

/** The numbers that go with a set of places. */
export interface FactorNumbers {
  /** Length `start[size]`: U with its diagonal, L without its unit one, and the entries between blocks. */
  readonly entries: Float64Array;
  /** Length `size`: one over each pivot. */
  readonly inversePivot: Float64Array;
  /** Length `size`: the column on hand, spread out by position; zero between calls. */
  readonly column: Float64Array;
}

export function numbersFor(places: FactorPlaces): FactorNumbers {
  return {
    entries: new Float64Array(places.position.length),
    inversePivot: new Float64Array(places.size),
    column: new Float64Array(places.size),
  };
}

/** A refactorisation that met no objection. */
export const sound = -1;

/**
 * Left-looking, a column at a time; allocates nothing.
 *
 * @param values length `entryCount` or more, slot by slot.
 * @returns `sound`, or the position of the first pivot that is below `refactorThreshold` of its column's
 *   largest, zero, or not finite; the numbers are then of no use and pivots have to be chosen anew.
 */
export function refactor(places: FactorPlaces, values: Float64Array, numbers: FactorNumbers): number {
  const { size, start, diagonal, outer, position, placeOfSlot, fill, nested } = places;
  const { entries, inversePivot, column } = numbers;
  const slotCount = placeOfSlot.length;
  for (let slot = 0; slot < slotCount; slot++) entries[placeOfSlot[slot]!] = values[slot]!;
  const fillCount = fill.length;
  for (let f = 0; f < fillCount; f++) entries[fill[f]!] = 0;

  for (let k = 0; k < size; k++) {
    const first = start[k]!;
    const pivotPlace = diagonal[k]!;
    const end = outer[k]!;
    for (let p = first; p < end; p++) column[position[p]!] = entries[p]!;
    for (let p = first; p < pivotPlace;) {
      const earlier = position[p]!;
      const together = nested[earlier]! >= 4 && pivotPlace - p >= 4;
      p += together ? actByFour(places, numbers, p) : actAlone(places, numbers, p);
    }
    const pivot = column[k]!;
    const inverse = 1 / pivot;
    entries[pivotPlace] = pivot;
    inversePivot[k] = inverse;
    const largestAllowed = Math.abs(pivot) / refactorThreshold;
    let fits = isUsable(inverse);
    for (let p = pivotPlace + 1; p < end; p++) {
      const entry = column[position[p]!]!;
      if (!(Math.abs(entry) <= largestAllowed)) fits = false;
      entries[p] = entry * inverse;
    }
    for (let p = first; p < end; p++) column[position[p]!] = 0;
    if (!fits) return k;
  }
  return sound;
}

/** Lets the earlier column at place `p` of U act on the column on hand. */
function actAlone(places: FactorPlaces, numbers: FactorNumbers, p: number): 1 {
  const { diagonal, outer, position } = places;
  const { entries, column } = numbers;
  const earlier = position[p]!;
  const u = column[earlier]!;
  entries[p] = u;
  const last = outer[earlier]!;
  for (let q = diagonal[earlier]! + 1; q < last; q++) column[position[q]!]! -= entries[q]! * u;
  return 1;
}

/** The same for four nested columns: each row of theirs is fetched and put back once instead of four times. */
function actByFour(places: FactorPlaces, numbers: FactorNumbers, p: number): 4 {
  const { diagonal, outer, position } = places;
  const { entries, column } = numbers;
  const k = position[p]!;
  let q0 = diagonal[k]! + 1;
  let q1 = diagonal[k + 1]! + 1;
  let q2 = diagonal[k + 2]! + 1;
  let q3 = diagonal[k + 3]! + 1;
  const u0 = column[k]!;
  const u1 = column[k + 1]! - entries[q0]! * u0;
  const u2 = column[k + 2]! - entries[q0 + 1]! * u0 - entries[q1]! * u1;
  const u3 = column[k + 3]! - entries[q0 + 2]! * u0 - entries[q1 + 1]! * u1 - entries[q2]! * u2;
  entries[p] = u0;
  entries[p + 1] = u1;
  entries[p + 2] = u2;
  entries[p + 3] = u3;
  q0 += 3;
  q1 += 2;
  q2 += 1;
  const last = outer[k + 3]!;
  for (; q3 < last; q3++) {
    const row = position[q3]!;
    column[row] =
      column[row]! - entries[q0++]! * u0 - entries[q1++]! * u1 - entries[q2++]! * u2 - entries[q3]! * u3;
  }
  return 4;
}

/** False for what one over a zero, an infinity, a denormal or not-a-number comes to. */
export function isUsable(inverse: number): boolean {
  const magnitude = Math.abs(inverse);
  return magnitude > 0 && magnitude <= Number.MAX_VALUE;
}
