/** Runs the listed steps of a small system: the same results as `refactor`, `solve` and `transposeSolve`. */
import { isUsable, sound } from './refactor.ts';
import type { EliminationSteps, SolveSteps } from './steps.ts';
import { refactorThreshold } from './tolerances.ts';

/** Room for the entries: one more than the slots at least, for the spare slot comes along in the block copy. */
export function entriesFor(steps: EliminationSteps): Float64Array {
  return new Float64Array(Math.max(steps.entryCount, steps.slotCount + 1));
}

/**
 * @param values length `slotCount + 1`, slot by slot, the spare slot last.
 * @param entries as made by `entriesFor`; overwritten.
 * @param inversePivot length `size`; overwritten.
 * @returns as `refactor` does.
 */
export function runElimination(
  steps: EliminationSteps,
  values: Float64Array,
  entries: Float64Array,
  inversePivot: Float64Array,
): number {
  const { size, slotCount, pivotEntry, lowerEntry, lowerEnd, products, productsEnd } = steps;
  entries.set(values);
  for (let entry = slotCount; entry < entries.length; entry++) entries[entry] = 0;
  let at = 0;
  let lower = 0;
  for (let k = 0; k < size; k++) {
    const end = productsEnd[k]!;
    for (; at < end; at += 3)
      entries[products[at]!]! -= entries[products[at + 1]!]! * entries[products[at + 2]!]!;
    const pivot = entries[pivotEntry[k]!]!;
    const inverse = 1 / pivot;
    inversePivot[k] = inverse;
    if (!isUsable(inverse)) return k;
    const lastLower = lowerEnd[k]!;
    if (lower === lastLower) continue;
    const largestAllowed = Math.abs(pivot) / refactorThreshold;
    for (; lower < lastLower; lower++) {
      const place = lowerEntry[lower]!;
      const entry = entries[place]!;
      if (!(Math.abs(entry) <= largestAllowed)) return k;
      entries[place] = entry * inverse;
    }
  }
  return sound;
}

/** @param y as for `solve` with the forward steps, as for `transposeSolve` with the transposed ones. */
export function runSolve(
  steps: SolveSteps,
  entries: Float64Array,
  inversePivot: Float64Array,
  y: Float64Array,
): void {
  const { products, scaled, end } = steps;
  const size = scaled.length;
  let at = 0;
  for (let s = 0; s < size; s++) {
    const last = end[s]!;
    for (; at < last; at += 3) y[products[at]!]! -= entries[products[at + 1]!]! * y[products[at + 2]!]!;
    const unknown = scaled[s]!;
    y[unknown]! *= inversePivot[unknown]!;
  }
  const last = end[size]!;
  for (; at < last; at += 3) y[products[at]!]! -= entries[products[at + 1]!]! * y[products[at + 2]!]!;
}
