/** The determinant, as its sign and the logarithm of its magnitude: the product itself overflows easily. */
import type { FactorPlaces } from './factors.ts';

/**
 * The product of the pivots' signs and of the parities of both permutations.
 *
 * @param inversePivot length `size`: one over each pivot, none of them zero.
 */
export function determinantSign(places: FactorPlaces, inversePivot: Float64Array): -1 | 1 {
  let negative = places.permutationSign === -1;
  const { size } = places;
  for (let k = 0; k < size; k++) if (inversePivot[k]! < 0) negative = !negative;
  return negative ? -1 : 1;
}

/** Natural logarithm of the product of the pivots' magnitudes. */
export function logDeterminant(inversePivot: Float64Array): number {
  const size = inversePivot.length;
  let sum = 0;
  for (let k = 0; k < size; k++) sum -= Math.log(Math.abs(inversePivot[k]!));
  return sum;
}
