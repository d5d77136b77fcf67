/** Full factorisation of a real matrix: pivots chosen anew, and the places of L and U for them. */
import { placesFor, type FactorPlaces } from './factors.ts';
import type { EliminationOrder } from './order.ts';
import type { SparsePattern } from './pattern.ts';
import type { ColumnArithmetic, PivotFailure } from './pivots.ts';

/**
 * @param values length `entryCount` or more, slot by slot.
 * @returns the places only; `refactor` fills in the numbers, so that a matrix factorised with fresh pivots and
 *   one refactorised in the same pivot order come out alike to the last bit.
 */
export function factor(
  pattern: SparsePattern,
  order: EliminationOrder,
  values: Float64Array,
): FactorPlaces | PivotFailure {
  return placesFor(pattern, order, realColumn(pattern.size, values));
}

function realColumn(size: number, values: Float64Array): ColumnArithmetic {
  const x = new Float64Array(size);
  const term = new Float64Array(size);
  let lower = new Float64Array(0);
  return {
    load(slot, row) {
      x[row]! += values[slot]!;
      term[row] = Math.abs(values[slot]!);
    },
    eliminate(pivotRow, rows, from, to) {
      const u = x[pivotRow]!;
      for (let p = from; p < to; p++) {
        const row = rows[p]!;
        const product = lower[p]! * u;
        x[row]! -= product;
        if (Math.abs(product) > term[row]!) term[row] = Math.abs(product);
      }
    },
    magnitude: (row) => Math.abs(x[row]!),
    largestTerm: (row) => term[row]!,
    keep(row, pivotRow, place) {
      lower[place] = x[row]! / x[pivotRow]!;
    },
    clear(row) {
      x[row] = 0;
      term[row] = 0;
    },
    reserve(places) {
      if (lower.length >= places) return;
      const longer = new Float64Array(places);
      longer.set(lower);
      lower = longer;
    },
  };
}
