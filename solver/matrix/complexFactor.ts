/** Factorisation of a complex matrix: fresh pivots, and refactorisation in their order. */
import { placesFor, type FactorPlaces } from './factors.ts';
import type { EliminationOrder } from './order.ts';
import type { SparsePattern } from './pattern.ts';
import type { ColumnArithmetic, PivotFailure } from './pivots.ts';
import { isUsable, sound } from './refactor.ts';
import { refactorThreshold } from './tolerances.ts';

/** Real and imaginary parts of as many complex numbers. */
export interface ComplexArray {
  readonly real: Float64Array;
  readonly imaginary: Float64Array;
}

export const complexArray = (length: number): ComplexArray => ({
  real: new Float64Array(length),
  imaginary: new Float64Array(length),
});

/** |re| + |im|, within √2 of the modulus: enough for choosing pivots, and free of overflow on the way. */
export const oneNorm = (real: number, imaginary: number): number => Math.abs(real) + Math.abs(imaginary);

/** The complex counterpart of `FactorNumbers`. */
export interface ComplexNumbers {
  readonly entries: ComplexArray;
  readonly inversePivot: ComplexArray;
  readonly column: ComplexArray;
}

export function complexNumbersFor(places: FactorPlaces): ComplexNumbers {
  return {
    entries: complexArray(places.position.length),
    inversePivot: complexArray(places.size),
    column: complexArray(places.size),
  };
}

/** Writes 1/(a + ib) to place `k` (R. L. Smith, "Algorithm 116: complex division", Comm. ACM 5, 1962, 435). */
function invert(a: number, b: number, into: ComplexArray, k: number): void {
  if (Math.abs(a) >= Math.abs(b)) {
    const ratio = b / a;
    const scale = 1 / (a + b * ratio);
    into.real[k] = scale;
    into.imaginary[k] = -ratio * scale;
  } else {
    const ratio = a / b;
    const scale = 1 / (a * ratio + b);
    into.real[k] = ratio * scale;
    into.imaginary[k] = -scale;
  }
}

/** As `factor`: the places only, with pivots chosen for these values. */
export function complexFactor(
  pattern: SparsePattern,
  order: EliminationOrder,
  values: ComplexArray,
): FactorPlaces | PivotFailure {
  return placesFor(pattern, order, complexColumn(pattern.size, values));
}

function complexColumn(size: number, values: ComplexArray): ColumnArithmetic {
  const { real, imaginary } = complexArray(size);
  const term = new Float64Array(size);
  const inverse = complexArray(1);
  let lower = complexArray(0);
  return {
    load(slot, row) {
      real[row]! += values.real[slot]!;
      imaginary[row]! += values.imaginary[slot]!;
      term[row] = oneNorm(values.real[slot]!, values.imaginary[slot]!);
    },
    eliminate(pivotRow, rows, from, to) {
      const a = real[pivotRow]!;
      const b = imaginary[pivotRow]!;
      for (let p = from; p < to; p++) {
        const row = rows[p]!;
        const c = lower.real[p]!;
        const d = lower.imaginary[p]!;
        const productReal = a * c - b * d;
        const productImaginary = a * d + b * c;
        real[row]! -= productReal;
        imaginary[row]! -= productImaginary;
        term[row] = Math.max(term[row]!, oneNorm(productReal, productImaginary));
      }
    },
    magnitude: (row) => oneNorm(real[row]!, imaginary[row]!),
    largestTerm: (row) => term[row]!,
    keep(row, pivotRow, place) {
      invert(real[pivotRow]!, imaginary[pivotRow]!, inverse, 0);
      const c = inverse.real[0]!;
      const d = inverse.imaginary[0]!;
      lower.real[place] = real[row]! * c - imaginary[row]! * d;
      lower.imaginary[place] = real[row]! * d + imaginary[row]! * c;
    },
    clear(row) {
      real[row] = 0;
      imaginary[row] = 0;
      term[row] = 0;
    },
    reserve(places) {
      if (lower.real.length >= places) return;
      const longer = complexArray(places);
      longer.real.set(lower.real);
      longer.imaginary.set(lower.imaginary);
      lower = longer;
    },
  };
}

/** As `refactor`, with magnitudes measured by `oneNorm`; allocates nothing. */
export function complexRefactor(places: FactorPlaces, values: ComplexArray, numbers: ComplexNumbers): number {
  const { size, start, diagonal, outer, position, placeOfSlot, fill } = places;
  const { real, imaginary } = numbers.entries;
  const columnReal = numbers.column.real;
  const columnImaginary = numbers.column.imaginary;
  const slotCount = placeOfSlot.length;
  for (let slot = 0; slot < slotCount; slot++) {
    real[placeOfSlot[slot]!] = values.real[slot]!;
    imaginary[placeOfSlot[slot]!] = values.imaginary[slot]!;
  }
  const fillCount = fill.length;
  for (let f = 0; f < fillCount; f++) {
    real[fill[f]!] = 0;
    imaginary[fill[f]!] = 0;
  }

  for (let k = 0; k < size; k++) {
    const first = start[k]!;
    const pivotPlace = diagonal[k]!;
    const end = outer[k]!;
    for (let p = first; p < end; p++) {
      columnReal[position[p]!] = real[p]!;
      columnImaginary[position[p]!] = imaginary[p]!;
    }
    for (let p = first; p < pivotPlace; p++) {
      const earlier = position[p]!;
      const a = columnReal[earlier]!;
      const b = columnImaginary[earlier]!;
      real[p] = a;
      imaginary[p] = b;
      const last = outer[earlier]!;
      for (let q = diagonal[earlier]! + 1; q < last; q++) {
        const row = position[q]!;
        const c = real[q]!;
        const d = imaginary[q]!;
        columnReal[row]! -= a * c - b * d;
        columnImaginary[row]! -= a * d + b * c;
      }
    }
    const pivotReal = columnReal[k]!;
    const pivotImaginary = columnImaginary[k]!;
    real[pivotPlace] = pivotReal;
    imaginary[pivotPlace] = pivotImaginary;
    invert(pivotReal, pivotImaginary, numbers.inversePivot, k);
    const c = numbers.inversePivot.real[k]!;
    const d = numbers.inversePivot.imaginary[k]!;
    const largestAllowed = oneNorm(pivotReal, pivotImaginary) / refactorThreshold;
    let fits = isUsable(oneNorm(c, d));
    for (let p = pivotPlace + 1; p < end; p++) {
      const a = columnReal[position[p]!]!;
      const b = columnImaginary[position[p]!]!;
      if (!(oneNorm(a, b) <= largestAllowed)) fits = false;
      real[p] = a * c - b * d;
      imaginary[p] = a * d + b * c;
    }
    for (let p = first; p < end; p++) {
      columnReal[position[p]!] = 0;
      columnImaginary[position[p]!] = 0;
    }
    if (!fits) return k;
  }
  return sound;
}
