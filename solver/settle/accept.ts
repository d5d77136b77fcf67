/** Acceptance by row: a point is a reading only where every row holds to its own bound. */
import { at, codeAt } from '../elements/at.ts';
import { assembleMagnitudes } from './evaluate.ts';
import { CURRENT_FLOOR, CURRENT_PART, ROUNDING_PART, VOLTAGE_FLOOR, VOLTAGE_PART } from './limits.ts';
import { UnknownKind, type Prepared } from './prepared.ts';

export interface Residual {
  /** Worst current row, A. */
  amperes: number;
  /** Worst row's ratio to its bound: at most 1 when every row holds. */
  ratio: number;
}

/**
 * Measures the rows against their bounds, from the elements as loaded last. A current row's bound is
 * 1e-9·Σ|I| + 1e-15·Σ|G||V| + 1e-15 A; a branch row's 1e-9·max|V| + 1e-9 V, with the same term for rounding.
 */
export function measureRows(prepared: Prepared, result: Residual): void {
  const { x, residual, size, kinds, magnitude, rounding } = prepared;
  assembleMagnitudes(prepared);
  let greatest = 0; // V
  for (let row = 0; row < size; row++)
    if (codeAt(kinds, row) !== UnknownKind.branch) greatest = Math.max(greatest, Math.abs(at(x, row)));
  const branchBound = VOLTAGE_PART * greatest + VOLTAGE_FLOOR;
  result.amperes = 0;
  result.ratio = 0;
  for (let row = 0; row < size; row++) {
    const miss = Math.abs(at(residual, row));
    const rounded = ROUNDING_PART * at(rounding, row);
    const isCurrent = codeAt(kinds, row) !== UnknownKind.branch;
    const bound = rounded + (isCurrent ? CURRENT_PART * at(magnitude, row) + CURRENT_FLOOR : branchBound);
    if (isCurrent && miss > result.amperes) result.amperes = miss;
    const ratio = miss / bound;
    // Written so that NaN is never taken for an answer.
    if (!(ratio <= result.ratio)) result.ratio = ratio;
  }
}
