/** The backward error of a complex solution. */
import type { Equations } from './backwardError.ts';
import { oneNorm, type ComplexArray } from './complexFactor.ts';
import { epsilon, underflowAllowance } from './tolerances.ts';

/**
 * As `isWithin`, with magnitudes measured by `oneNorm`.
 *
 * @param x length 2·size: the real parts, then the imaginary parts; so is `b`.
 */
export function complexIsWithin(
  bound: number,
  equations: Equations,
  values: ComplexArray,
  x: Float64Array,
  b: Float64Array,
): boolean {
  const { start, unknown, slot } = equations;
  const size = start.length - 1;
  let at = 0;
  for (let row = 0; row < size; row++) {
    let leftReal = b[row]!;
    let leftImaginary = b[size + row]!;
    let magnitude = oneNorm(leftReal, leftImaginary);
    const end = start[row + 1]!;
    for (; at < end; at++) {
      const a = values.real[slot[at]!]!;
      const c = values.imaginary[slot[at]!]!;
      const u = x[unknown[at]!]!;
      const v = x[size + unknown[at]!]!;
      leftReal -= a * u - c * v;
      leftImaginary -= a * v + c * u;
      magnitude += oneNorm(a, c) * oneNorm(u, v);
    }
    if (!(oneNorm(leftReal, leftImaginary) <= bound * magnitude + underflowAllowance)) return false;
  }
  return true;
}

/**
 * As `backwardError`, with magnitudes measured by `oneNorm`.
 *
 * @param x length 2·size: the real parts, then the imaginary parts; so are `b` and `residual`.
 */
export function complexBackwardError(
  equations: Equations,
  values: ComplexArray,
  x: Float64Array,
  b: Float64Array,
  residual: Float64Array,
): number {
  const { start, unknown, slot } = equations;
  const size = start.length - 1;
  let largestUnknown = 0;
  for (let k = 0; k < size; k++) largestUnknown = Math.max(largestUnknown, oneNorm(x[k]!, x[size + k]!));
  let worst = 0;
  for (let row = 0; row < size; row++) {
    let leftReal = b[row]!;
    let leftImaginary = b[size + row]!;
    let magnitude = 0;
    let rowSum = 0;
    let rowLargest = 0;
    for (let at = start[row]!; at < start[row + 1]!; at++) {
      const a = values.real[slot[at]!]!;
      const c = values.imaginary[slot[at]!]!;
      const u = x[unknown[at]!]!;
      const v = x[size + unknown[at]!]!;
      leftReal -= a * u - c * v;
      leftImaginary -= a * v + c * u;
      const coefficient = oneNorm(a, c);
      magnitude += coefficient * oneNorm(u, v);
      rowSum += coefficient;
      rowLargest = Math.max(rowLargest, coefficient);
    }
    residual[row] = leftReal;
    residual[size + row] = leftImaginary;
    const left = oneNorm(leftReal, leftImaginary);
    if (left <= underflowAllowance) continue;
    const right = oneNorm(b[row]!, b[size + row]!);
    const rounding = 1000 * size * epsilon * (rowLargest * largestUnknown + right);
    const measure = magnitude + (magnitude + right > rounding ? right : rowSum * largestUnknown);
    const error = left / measure;
    if (!(error <= Number.MAX_VALUE)) return Infinity;
    worst = Math.max(worst, error);
  }
  return worst;
}
