/** Solves with the factors of a matrix for its transpose, in place. */
import type { FactorPlaces } from './factors.ts';
import type { FactorNumbers } from './refactor.ts';

/**
 * The steps of `solve` in reverse and transposed: from the last block to the first, what later blocks
 * contribute, forward through Uᵀ, back through Lᵀ.
 *
 * @param y length `size`: the right-hand side by column position on entry, the solution by row position on
 *   return.
 */
export function transposeSolve(places: FactorPlaces, numbers: FactorNumbers, y: Float64Array): void {
  const { blockStart, start, diagonal, outer, position } = places;
  const { entries, inversePivot } = numbers;
  for (let block = blockStart.length - 2; block >= 0; block--) {
    const first = blockStart[block]!;
    const end = blockStart[block + 1]!;
    for (let k = first; k < end; k++) {
      let sum = y[k]!;
      const lastOuter = start[k + 1]!;
      for (let p = outer[k]!; p < lastOuter; p++) sum -= entries[p]! * y[position[p]!]!;
      const last = diagonal[k]!;
      for (let p = start[k]!; p < last; p++) sum -= entries[p]! * y[position[p]!]!;
      y[k] = sum * inversePivot[k]!;
    }
    for (let k = end - 1; k >= first; k--) {
      let sum = y[k]!;
      const last = outer[k]!;
      for (let p = diagonal[k]! + 1; p < last; p++) sum -= entries[p]! * y[position[p]!]!;
      y[k] = sum;
    }
  }
}
