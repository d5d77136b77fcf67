/** Solves with the factors of a matrix, in place. */
import type { FactorPlaces } from './factors.ts';
import type { FactorNumbers } from './refactor.ts';

/**
 * Block by block: forward through L, back through U, then the solved unknowns act on later blocks.
 *
 * @param y length `size`: the right-hand side by row position on entry, the solution by column position on
 *   return.
 */
export function solve(places: FactorPlaces, numbers: FactorNumbers, y: Float64Array): void {
  const { blockStart, start, diagonal, outer, position } = places;
  const { entries, inversePivot } = numbers;
  for (let block = 0; block + 1 < blockStart.length; block++) {
    const first = blockStart[block]!;
    const end = blockStart[block + 1]!;
    for (let k = first; k < end; k++) {
      const known = y[k]!;
      if (known === 0) continue;
      const last = outer[k]!;
      for (let p = diagonal[k]! + 1; p < last; p++) y[position[p]!]! -= entries[p]! * known;
    }
    for (let k = end - 1; k >= first; k--) {
      const known = y[k]! * inversePivot[k]!;
      y[k] = known;
      if (known === 0) continue;
      const last = diagonal[k]!;
      for (let p = start[k]!; p < last; p++) y[position[p]!]! -= entries[p]! * known;
      const lastOuter = start[k + 1]!;
      for (let p = outer[k]!; p < lastOuter; p++) y[position[p]!]! -= entries[p]! * known;
    }
  }
}
