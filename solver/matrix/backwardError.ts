/** How far a computed solution is from solving exactly, as a relative change of the matrix and right side. */
import type { SparsePattern } from './pattern.ts';
import { epsilon, underflowAllowance } from './tolerances.ts';
import { rowsOf } from './transpose.ts';

/** The equations of a matrix, or of its transpose, one by one. */
export interface Equations {
  /** Length `size + 1`. */
  readonly start: Int32Array;
  /** The unknown of each term, and the slot its coefficient is in. */
  readonly unknown: Int32Array;
  readonly slot: Int32Array;
}

export function equationsOf(pattern: SparsePattern): Equations {
  const { rowStart, columnIndex, slot } = rowsOf(pattern);
  return { start: rowStart, unknown: columnIndex, slot };
}

export function transposedEquationsOf(pattern: SparsePattern): Equations {
  return {
    start: pattern.columnStart,
    unknown: pattern.rowIndex,
    slot: Int32Array.from({ length: pattern.entryCount }, (_, slot) => slot),
  };
}

/**
 * Whether every row holds |b − A·x| ≤ bound·(|A|·|x| + |b|), the componentwise backward error of W. Oettli and
 * W. Prager, "Compatibility of approximate solution of linear equations with given error bounds for
 * coefficients and right-hand sides", Numer. Math. 6, 1964, 405–409. False where anything is not a number.
 *
 * @param x length `size` or more.
 * @param b length `size` or more: the right-hand side.
 */
export function isWithin(
  bound: number,
  equations: Equations,
  values: Float64Array,
  x: Float64Array,
  b: Float64Array,
): boolean {
  const { start, unknown, slot } = equations;
  const size = start.length - 1;
  let at = 0;
  for (let row = 0; row < size; row++) {
    let residual = b[row]!;
    let magnitude = Math.abs(residual);
    const end = start[row + 1]!;
    for (; at < end; at++) {
      const term = values[slot[at]!]! * x[unknown[at]!]!;
      residual -= term;
      magnitude += Math.abs(term);
    }
    if (!(Math.abs(residual) <= bound * magnitude + underflowAllowance)) return false;
  }
  return true;
}

/**
 * The backward error itself, and the residual. Where a row's |A|·|x| + |b| is itself no more than rounding, its
 * measure is ‖A_row‖₁·‖x‖∞ instead of |b| (M. Arioli, J. W. Demmel and I. S. Duff, "Solving sparse linear
 * systems with sparse backward error", SIAM J. Matrix Anal. Appl. 10, 1989, 165–190): else a row that is zero
 * but for rounding would decide.
 *
 * @param residual length `size`; receives b − A·x.
 * @returns the largest row's error; Infinity where anything is not a number.
 */
export function backwardError(
  equations: Equations,
  values: Float64Array,
  x: Float64Array,
  b: Float64Array,
  residual: Float64Array,
): number {
  const { start, unknown, slot } = equations;
  const size = start.length - 1;
  let largestUnknown = 0;
  for (let k = 0; k < size; k++) largestUnknown = Math.max(largestUnknown, Math.abs(x[k]!));
  let worst = 0;
  for (let row = 0; row < size; row++) {
    let left = b[row]!;
    let magnitude = 0;
    let rowSum = 0;
    let rowLargest = 0;
    for (let at = start[row]!; at < start[row + 1]!; at++) {
      const coefficient = values[slot[at]!]!;
      const term = coefficient * x[unknown[at]!]!;
      left -= term;
      magnitude += Math.abs(term);
      rowSum += Math.abs(coefficient);
      rowLargest = Math.max(rowLargest, Math.abs(coefficient));
    }
    residual[row] = left;
    if (Math.abs(left) <= underflowAllowance) continue;
    const right = Math.abs(b[row]!);
    const rounding = 1000 * size * epsilon * (rowLargest * largestUnknown + right);
    const measure = magnitude + (magnitude + right > rounding ? right : rowSum * largestUnknown);
    const error = Math.abs(left) / measure;
    if (!(error <= Number.MAX_VALUE)) return Infinity;
    worst = Math.max(worst, error);
  }
  return worst;
}
