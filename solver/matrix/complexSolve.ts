/** Solves with the factors of a complex matrix, in place. */
import type { ComplexArray, ComplexNumbers } from './complexFactor.ts';
import type { FactorPlaces } from './factors.ts';

/** As `solve`, in complex numbers. */
export function complexSolve(places: FactorPlaces, numbers: ComplexNumbers, y: ComplexArray): void {
  const { blockStart, start, diagonal, outer } = places;
  for (let block = 0; block + 1 < blockStart.length; block++) {
    const first = blockStart[block]!;
    const end = blockStart[block + 1]!;
    for (let k = first; k < end; k++) subtractColumn(places, numbers, y, k, diagonal[k]! + 1, outer[k]!);
    for (let k = end - 1; k >= first; k--) {
      const a = y.real[k]!;
      const b = y.imaginary[k]!;
      const c = numbers.inversePivot.real[k]!;
      const d = numbers.inversePivot.imaginary[k]!;
      y.real[k] = a * c - b * d;
      y.imaginary[k] = a * d + b * c;
      subtractColumn(places, numbers, y, k, start[k]!, diagonal[k]!);
      subtractColumn(places, numbers, y, k, outer[k]!, start[k + 1]!);
    }
  }
}

/** y −= y[k] · the entries from place `from` up to `to`. */
function subtractColumn(
  places: FactorPlaces,
  numbers: ComplexNumbers,
  y: ComplexArray,
  k: number,
  from: number,
  to: number,
): void {
  const { position } = places;
  const { real, imaginary } = numbers.entries;
  const a = y.real[k]!;
  const b = y.imaginary[k]!;
  if (a === 0 && b === 0) return;
  for (let p = from; p < to; p++) {
    const row = position[p]!;
    const c = real[p]!;
    const d = imaginary[p]!;
    y.real[row]! -= a * c - b * d;
    y.imaginary[row]! -= a * d + b * c;
  }
}
